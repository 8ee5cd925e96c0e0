import fs from 'node:fs';
import path from 'node:path';
import { setTimeout as delay } from 'node:timers/promises';
import { revivePostgres } from './postgres.mjs';
import { isLiveProcess } from './process-mark.mjs';

const CHECK_MS = 500;
/** The memory of a killed server is free only when the last of its processes has noticed; a start fails until then. */
const ATTEMPTS = 5;
const BETWEEN_ATTEMPTS_MS = 2000;

/** @param {string} cluster */
function isServerAlive(cluster) {
  const pidFile = path.join(cluster, 'postmaster.pid');
  return fs.existsSync(pidFile) && isLiveProcess(Number(fs.readFileSync(pidFile, 'utf8').split('\n')[0]));
}

/** @param {string} folder */
async function revive(folder) {
  for (let attempt = 1; ; attempt++) {
    try {
      await revivePostgres(folder);
      return;
    } catch (error) {
      if (attempt === ATTEMPTS) throw error;
      await delay(BETWEEN_ATTEMPTS_MS);
    }
  }
}

/**
 * The exit code of a service, while PostgreSQL is started again whenever it has ended; the service finds it by itself. If
 * it does not start, the service is stopped and the code is 1. The cluster may be left once this has resolved.
 *
 * @param {import('./service.mjs').Service} service
 * @param {{ folder: string, cluster: string, stopRequest: { onMade: (listener: () => void) => void } }} options
 * @returns {Promise<number>}
 */
export async function endedBesidePostgres(service, { folder, cluster, stopRequest }) {
  const stopped = new AbortController();
  const { signal } = stopped;
  let isGivenUp = false;
  const watch = async () => {
    while (!signal.aborted) {
      if (!isServerAlive(cluster)) {
        console.error('PostgreSQL has ended; it is started again.');
        await revive(folder);
        console.error('PostgreSQL is back.');
      }
      await delay(CHECK_MS, undefined, { signal }).catch(() => undefined);
    }
  };
  const watched = watch().catch((/** @type {unknown} */ error) => {
    isGivenUp = true;
    const cause = error instanceof Error ? error.message : String(error);
    console.error(`PostgreSQL has ended and cannot be started again, so Fairweight stops. ${cause}`);
    service.stop();
  });
  stopRequest.onMade(() => stopped.abort());
  const code = await service.ended;
  stopped.abort();
  await watched;
  return isGivenUp ? 1 : code;
}
