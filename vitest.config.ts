import react from '@vitejs/plugin-react';
import { defineConfig } from 'vitest/config';

const SERVER_GLOBAL_SETUP = './tests/support/global-setup.ts';

export default defineConfig({
  test: {
    passWithNoTests: true,
    maxWorkers: 2,
    projects: [
      {
        test: {
          name: 'unit',
          include: ['tests/{engine,sweep,contract,published,print,drawing,sheet}/**/*.test.ts'],
          // thousands of random sections; the limit is for a hang, not for speed
          testTimeout: 400_000,
          sequence: { groupOrder: 0 },
        },
      },
      {
        plugins: [react()],
        test: {
          name: 'client',
          include: ['tests/client/**/*.test.{ts,tsx}'],
          environment: 'happy-dom',
          sequence: { groupOrder: 0 },
        },
      },
      {
        test: {
          name: 'server',
          include: ['tests/server/**/*.test.ts'],
          globalSetup: SERVER_GLOBAL_SETUP,
          testTimeout: 20_000,
          hookTimeout: 60_000,
          sequence: { groupOrder: 0 },
        },
      },
      {
        // One browser and one running service at a time: the machine's two cores belong to the test in hand.
        test: {
          name: 'e2e',
          include: ['tests/e2e/**/*.test.ts'],
          globalSetup: SERVER_GLOBAL_SETUP,
          fileParallelism: false,
          testTimeout: 400_000,
          hookTimeout: 180_000,
          expect: { poll: { timeout: 15_000 } },
          sequence: { groupOrder: 1 },
        },
      },
    ],
  },
});
