import { createHash } from 'node:crypto';
import net from 'node:net';
import { setTimeout as delay } from 'node:timers/promises';

const RETRY_MS = 50;

/**
 * Lets one process at a time do something to a folder. The lock is a socket in Linux's abstract namespace and not a
 * file: the kernel takes it away with its process, also after kill -9, so there is never a stale one to judge.
 *
 * @template T
 * @param {string} resource
 * @param {() => Promise<T>} action
 * @returns {Promise<T>}
 */
export async function withExclusive(resource, action) {
  const digest = createHash('sha256').update(resource).digest('hex').slice(0, 32);
  const lock = await acquire(`\0fairweight-${digest}`);
  try {
    return await action();
  } finally {
    lock.close();
  }
}

/** @param {string} address */
async function acquire(address) {
  for (;;) {
    const lock = await tryListen(address);
    if (lock !== undefined) return lock;
    await delay(RETRY_MS);
  }
}

/**
 * @param {string} address
 * @returns {Promise<net.Server | undefined>}
 */
function tryListen(address) {
  return new Promise((resolve, reject) => {
    const server = net.createServer((socket) => socket.destroy());
    server.once('error', (/** @type {NodeJS.ErrnoException} */ error) => {
      if (error.code === 'EADDRINUSE') resolve(undefined);
      else reject(error);
    });
    server.listen(address, () => resolve(server));
  });
}
