import fs from 'node:fs';
import path from 'node:path';
import { installDebianPackages } from './debian-packages.mjs';

/** The same engine without a desktop's browser around it: two thirds of the processor time. */
const WITHOUT_WINDOWS = 'chromium-headless-shell';
const NAMES = [WITHOUT_WINDOWS, 'chromium'];

/** The browser of the end-to-end tests: Debian's, found on the PATH. */
export function findChromium() {
  const folders = (process.env.PATH ?? '').split(':').filter(Boolean);
  return NAMES.flatMap((name) => folders.map((folder) => path.join(folder, name))).find((file) =>
    fs.existsSync(file),
  );
}

export async function ensureChromium() {
  if (findChromium() === undefined) await installDebianPackages([WITHOUT_WINDOWS]);
}
