// `npm start`: from a clean clone to a running service. Node's own modules only, until the packages are installed.
import path from 'node:path';
import { ensureBuilt } from './build.mjs';
import { DEMO_ACCOUNTS, DEMO_PASSWORD } from './demo-accounts.mjs';
import { isPortFree } from './free-port.mjs';
import { requireNodeVersion } from './node-version.mjs';
import { ensurePackages } from './packages.mjs';
import { endedBesidePostgres } from './postgres-watch.mjs';
import { joinPostgres, leavePostgres } from './postgres.mjs';
import { dataFolder, PROJECT_ROOT } from './project-paths.mjs';
import { requireProgram } from './run-program.mjs';
import { startService, waitUntilHealthy } from './service.mjs';
import { ensureSessionSecret } from './session-secret.mjs';
import { createStopRequest } from './stop-request.mjs';

const host = process.env.HOST ?? '127.0.0.1';
const port = Number(process.env.PORT ?? 3000);
const origin = `http://${host}:${port}`;
const folder = dataFolder();
const stopRequest = createStopRequest();

/**
 * @template T
 * @param {string} name
 * @param {() => Promise<T>} action
 */
async function step(name, action) {
  const startedAt = performance.now();
  const result = await action();
  stopRequest.throwIfMade();
  console.log(`${name}: ${((performance.now() - startedAt) / 1000).toFixed(1)} s`);
  return result;
}

async function requireFreePort() {
  if (!Number.isInteger(port) || port < 1 || port > 65_535)
    throw new Error(`PORT=${process.env.PORT} is no port number`);
  if (await isPortFree(port, host)) return;
  throw new Error(
    `${origin} is taken. If Fairweight runs there already, open it in a browser; for a second one choose another port: PORT=${port + 1} npm start`,
  );
}

/** @param {Record<string, string>} environment */
async function prepareDatabase(environment) {
  for (const script of ['migrate', 'seed']) {
    await requireProgram(
      process.execPath,
      ['--enable-source-maps', path.join(PROJECT_ROOT, `dist/server/${script}.js`)],
      {
        cwd: PROJECT_ROOT,
        environment,
      },
    );
  }
}

function announce() {
  const width = Math.max(...DEMO_ACCOUNTS.map(({ role }) => role.length));
  const accounts = DEMO_ACCOUNTS.map(({ role, email }) => `  ${role.padEnd(width)}  ${email}`);
  console.log(
    [
      '',
      `Fairweight is ready: ${origin}`,
      '',
      `Demo accounts, all with the password ${DEMO_PASSWORD}`,
      ...accounts,
      '',
    ].join('\n'),
  );
}

async function serve() {
  const database = await step('Database', () => joinPostgres(folder));
  if (!database.cluster.startsWith(folder)) {
    console.log(`The database lies in ${database.cluster}, because its own account may not enter ${folder}`);
  }
  await step('Build', ensureBuilt);
  const environment = {
    NODE_ENV: 'production',
    APP_ROOT: PROJECT_ROOT,
    DATABASE_URL: database.url,
    SESSION_SECRET: ensureSessionSecret(folder),
    HOST: host,
    PORT: String(port),
  };
  await step('Schema and demo office', () => prepareDatabase(environment));
  const service = startService(['--enable-source-maps', 'dist/server/main.js'], environment);
  stopRequest.onMade(service.stop);
  await step('Service', () => waitUntilHealthy(service, origin)).catch(async (error) => {
    service.stop();
    await service.ended;
    throw error;
  });
  announce();
  return endedBesidePostgres(service, { folder, cluster: database.cluster, stopRequest });
}

async function main() {
  requireNodeVersion();
  await requireFreePort();
  // Before PostgreSQL starts: an installation cut short then leaves nothing running.
  await step('Packages', ensurePackages);
  try {
    return await serve();
  } finally {
    await leavePostgres(folder);
  }
}

try {
  process.exitCode = await main();
} catch (error) {
  if (!stopRequest.isMade()) console.error(`\n${error instanceof Error ? error.message : String(error)}`);
  process.exitCode = 1;
}
if (stopRequest.isMade()) process.exitCode = 0;
process.exit();
