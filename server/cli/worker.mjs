// `npm run worker`: a worker by itself, for the database that DATABASE_URL names or, without that, for the one of the
// `npm start` of this folder. Start as many as there are machines; each says in the database that it lives.
import { ensureBuilt } from './build.mjs';
import { requireNodeVersion } from './node-version.mjs';
import { ensurePackages } from './packages.mjs';
import { endedBesidePostgres } from './postgres-watch.mjs';
import { joinPostgres, leavePostgres } from './postgres.mjs';
import { dataFolder, PROJECT_ROOT } from './project-paths.mjs';
import { startService } from './service.mjs';
import { createStopRequest } from './stop-request.mjs';

const stopRequest = createStopRequest();
const folder = dataFolder();
const given = process.env.DATABASE_URL;

async function work() {
  const own = given === undefined ? await joinPostgres(folder) : undefined;
  await ensureBuilt();
  stopRequest.throwIfMade();
  const environment = {
    NODE_ENV: 'production',
    APP_ROOT: PROJECT_ROOT,
    DATABASE_URL: given ?? own?.url ?? '',
  };
  const worker = startService(['--enable-source-maps', 'dist/server/worker.js'], environment);
  stopRequest.onMade(worker.stop);
  return own === undefined
    ? worker.ended
    : endedBesidePostgres(worker, { folder, cluster: own.cluster, stopRequest });
}

try {
  requireNodeVersion();
  await ensurePackages();
  process.exitCode = await work();
} catch (error) {
  if (!stopRequest.isMade()) console.error(`\n${error instanceof Error ? error.message : String(error)}`);
  process.exitCode = 1;
} finally {
  if (given === undefined) await leavePostgres(folder);
}
if (stopRequest.isMade()) process.exitCode = 0;
process.exit();
