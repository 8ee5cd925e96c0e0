// `npm run dev`: the service restarts and the page reloads on every change of a source file. The page is served by
// Vite on PORT and hands /api on to the service, one port higher.
import path from 'node:path';
import { ensurePackages } from './packages.mjs';
import { joinPostgres, leavePostgres } from './postgres.mjs';
import { dataFolder, PROJECT_ROOT } from './project-paths.mjs';
import { requireProgram, runProgram } from './run-program.mjs';
import { ensureSessionSecret } from './session-secret.mjs';
import { createStopRequest } from './stop-request.mjs';

const port = Number(process.env.PORT ?? 3000);
const folder = dataFolder();
const stopRequest = createStopRequest();

/** @param {Record<string, string>} environment */
async function prepareDatabase(environment) {
  for (const script of ['migrate', 'seed']) {
    await requireProgram(process.execPath, ['--import', 'tsx', `server/cli/${script}.ts`], {
      cwd: PROJECT_ROOT,
      environment,
    });
  }
}

await ensurePackages();
const database = await joinPostgres(folder);
try {
  const environment = {
    NODE_ENV: 'development',
    APP_ROOT: PROJECT_ROOT,
    DATABASE_URL: database.url,
    SESSION_SECRET: ensureSessionSecret(folder),
    HOST: '127.0.0.1',
    PORT: String(port + 1),
  };
  await prepareDatabase(environment);
  const tsx = path.join(PROJECT_ROOT, 'node_modules', 'tsx', 'dist', 'cli.mjs');
  const vite = path.join(PROJECT_ROOT, 'node_modules', 'vite', 'bin', 'vite.js');
  stopRequest.throwIfMade();
  await Promise.all([
    runProgram(process.execPath, [tsx, 'watch', '--clear-screen=false', 'server/main.ts'], {
      cwd: PROJECT_ROOT,
      environment,
    }),
    runProgram(process.execPath, [vite, '--port', String(port)], {
      cwd: PROJECT_ROOT,
      environment: { API_ORIGIN: `http://127.0.0.1:${port + 1}` },
    }),
  ]);
} catch (error) {
  if (!stopRequest.isMade()) throw error;
} finally {
  await leavePostgres(folder);
}
