import { spawn } from 'node:child_process';
import { setTimeout as delay } from 'node:timers/promises';
import { PROJECT_ROOT } from './project-paths.mjs';

/** Longer than the service takes to finish the requests in hand and to hand its jobs back. */
const STOP_GRACE_MS = 10_000;
const START_LIMIT_MS = 60_000;

/**
 * A running service and the promise of its end.
 *
 * @typedef {object} Service
 * @property {Promise<number>} ended resolves to its exit code
 * @property {() => void} stop asks it to stop, and insists when it does not
 */

/**
 * Starts a script that serves HTTP. It gets a process group of its own, so that Ctrl-C reaches it once, through us.
 *
 * @param {string[]} nodeArgs
 * @param {Record<string, string>} environment
 * @returns {Service}
 */
export function startService(nodeArgs, environment) {
  const child = spawn(process.execPath, ['--import', './server/cli/stop-with-parent.mjs', ...nodeArgs], {
    cwd: PROJECT_ROOT,
    stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
    detached: true,
    env: { ...process.env, ...environment },
  });
  /** @type {Promise<number>} */
  const ended = new Promise((resolve) => {
    child.once('error', () => resolve(1));
    child.once('exit', (code) => resolve(code ?? 1));
  });
  const stop = () => {
    child.kill('SIGTERM');
    setTimeout(() => child.kill('SIGKILL'), STOP_GRACE_MS).unref();
  };
  return { ended, stop };
}

/**
 * Waits until the service says it is well.
 *
 * @param {Service} service
 * @param {string} origin
 */
export async function waitUntilHealthy(service, origin) {
  let hasEnded = false;
  void service.ended.then(() => (hasEnded = true));
  const deadline = performance.now() + START_LIMIT_MS;
  while (performance.now() < deadline) {
    if (hasEnded) throw new Error('The service ended while it was starting; its own message stands above.');
    const isHealthy = await fetch(`${origin}/api/health`).then(
      (response) => response.ok,
      () => false,
    );
    if (isHealthy) return;
    await delay(50);
  }
  throw new Error(`The service did not answer on ${origin} within ${START_LIMIT_MS / 1000} s`);
}
