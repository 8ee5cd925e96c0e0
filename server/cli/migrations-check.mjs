import fs from 'node:fs';
import path from 'node:path';
import { PROJECT_ROOT, TEST_FOLDER } from './project-paths.mjs';
import { runProgram } from './run-program.mjs';

/**
 * Generates migrations into a copy of drizzle/ and sees whether that adds any: if so, the schema was changed without
 * `npm run db:generate`.
 *
 * @returns {Promise<{ isOk: boolean, output: string }>}
 */
export async function checkMigrations() {
  const copy = path.join(TEST_FOLDER, 'drizzle');
  fs.rmSync(copy, { recursive: true, force: true });
  fs.cpSync(path.join(PROJECT_ROOT, 'drizzle'), copy, { recursive: true });
  const before = listFiles(copy);
  const kit = path.join(PROJECT_ROOT, 'node_modules', 'drizzle-kit', 'bin.cjs');
  const options = ['--dialect', 'postgresql', '--schema', './server/db/schema/*.ts'];
  const out = ['--out', path.relative(PROJECT_ROOT, copy)];
  const { code, output } = await runProgram(process.execPath, [kit, 'generate', ...options, ...out], {
    cwd: PROJECT_ROOT,
    isQuiet: true,
  });
  const added = listFiles(copy).filter((file) => !before.includes(file));
  const complaint =
    added.length === 0 ? '' : `Not in drizzle/: ${added.join(', ')}. Run: npm run db:generate`;
  return { isOk: code === 0 && added.length === 0, output: [output, complaint].join('\n') };
}

/** @param {string} folder */
function listFiles(folder) {
  return fs.readdirSync(folder, { recursive: true, encoding: 'utf8' });
}
