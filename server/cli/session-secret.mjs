import { randomBytes } from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';

/**
 * The key that signs session cookies, made once per data folder so that people stay signed in over a restart.
 *
 * @param {string} folder
 */
export function ensureSessionSecret(folder) {
  const file = path.join(folder, 'session-secret');
  if (!fs.existsSync(file)) {
    fs.mkdirSync(folder, { recursive: true });
    const unfinished = `${file}.${process.pid}`;
    fs.writeFileSync(unfinished, randomBytes(32).toString('hex'), { mode: 0o600 });
    // A link, unlike a rename, never replaces the secret that another start made meanwhile.
    try {
      fs.linkSync(unfinished, file);
    } catch (error) {
      if (/** @type {NodeJS.ErrnoException} */ (error).code !== 'EEXIST') throw error;
    }
    fs.rmSync(unfinished);
  }
  return fs.readFileSync(file, 'utf8');
}
