import fs from 'node:fs';
import path from 'node:path';
import { installDebianPackages } from './debian-packages.mjs';

/** The browser of the end-to-end tests: Debian's, found on the PATH. */
export function findChromium() {
  const folders = (process.env.PATH ?? '').split(':').filter(Boolean);
  return folders.map((folder) => path.join(folder, 'chromium')).find((file) => fs.existsSync(file));
}

export async function ensureChromium() {
  if (findChromium() === undefined) await installDebianPackages(['chromium']);
}
