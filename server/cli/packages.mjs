import fs from 'node:fs';
import path from 'node:path';
import { withExclusive } from './exclusive.mjs';
import { PROJECT_ROOT } from './project-paths.mjs';
import { requireProgram } from './run-program.mjs';

const INSTALLED_LOCK = path.join(PROJECT_ROOT, 'node_modules', '.package-lock.json');

/** Installs what package-lock.json names, unless exactly that is there already. */
export async function ensurePackages() {
  await withExclusive(path.join(PROJECT_ROOT, 'node_modules'), async () => {
    if (areInstalled()) return;
    // --include=dev because NODE_ENV=production would leave the bundler out.
    await requireProgram('npm', ['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'], {
      cwd: PROJECT_ROOT,
    });
  });
}

/**
 * npm writes its own record of node_modules as the last act of an installation, so one that was cut short never
 * counts. Optional packages (binaries for other kinds of machine) are rightly missing from it.
 */
function areInstalled() {
  if (!fs.existsSync(INSTALLED_LOCK)) return false;
  const wanted = readPackages(path.join(PROJECT_ROOT, 'package-lock.json'));
  const installed = readPackages(INSTALLED_LOCK);
  return Object.entries(wanted).every(
    ([folder, { version, optional }]) => folder === '' || optional || installed[folder]?.version === version,
  );
}

/**
 * @param {string} lockFile
 * @returns {Record<string, { version?: string, optional?: boolean }>}
 */
function readPackages(lockFile) {
  return JSON.parse(fs.readFileSync(lockFile, 'utf8')).packages;
}
