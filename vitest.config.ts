import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

const SERVER_GLOBAL_SETUP = './tests/support/global-setup.ts';

/** For what never ends, not for what is slow: the machine may be shared. */
const HANG_MS = 400_000;
/** What is waited for comes; how soon is no test's business. */
const POLL_MS = 60_000;

export default defineConfig({
  test: {
    passWithNoTests: true,
    maxWorkers: 2,
    projects: [
      {
        test: {
          name: 'unit',
          include: [
            'tests/{engine,sweep,contract,published,print,drawing,sheet}/**/*.test.ts',
            'tests/client/**/*.test.ts',
          ],
          testTimeout: HANG_MS,
          // Pure functions: one load of the engine serves every file, and none needs a document.
          isolate: false,
        },
      },
      {
        plugins: [react()],
        test: {
          name: 'client',
          include: ['tests/client/**/*.test.tsx'],
          environment: 'happy-dom',
          testTimeout: HANG_MS,
          expect: { poll: { timeout: POLL_MS } },
          isolate: false,
        },
      },
      {
        test: {
          name: 'server',
          include: ['tests/server/**/*.test.ts'],
          globalSetup: SERVER_GLOBAL_SETUP,
          testTimeout: HANG_MS,
          hookTimeout: HANG_MS,
          expect: { poll: { timeout: POLL_MS } },
        },
      },
      {
        // One browser and one running service at a time: the machine's two cores belong to the test in hand.
        test: {
          name: 'e2e',
          include: ['tests/e2e/**/*.test.ts'],
          globalSetup: SERVER_GLOBAL_SETUP,
          fileParallelism: false,
          testTimeout: HANG_MS,
          hookTimeout: HANG_MS,
          expect: { poll: { timeout: POLL_MS } },
        },
      },
    ],
  },
});
