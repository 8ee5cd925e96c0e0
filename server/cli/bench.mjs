// `npm run bench [name...]`: every file of bench/, or the named ones, each in a process of its own so that one cannot
// warm the compiler for the next.
import fs from 'node:fs';
import path from 'node:path';
import { ensurePackages } from './packages.mjs';
import { PROJECT_ROOT } from './project-paths.mjs';
import { runProgram } from './run-program.mjs';

const ENDING = '.bench.ts';

await ensurePackages();
const wanted = process.argv.slice(2);
const names = fs
  .readdirSync(path.join(PROJECT_ROOT, 'bench'))
  .filter((file) => file.endsWith(ENDING))
  .map((file) => file.slice(0, -ENDING.length))
  .filter((name) => wanted.length === 0 || wanted.includes(name));

if (names.length === 0) throw new Error(`bench/ holds none of: ${wanted.join(', ')}`);
let failures = 0;
for (const name of names) {
  console.log(`\n${name}`);
  const script = path.join('bench', `${name}${ENDING}`);
  const { code } = await runProgram(process.execPath, ['--import', 'tsx', script], { cwd: PROJECT_ROOT });
  if (code !== 0) failures++;
}
process.exitCode = failures === 0 ? 0 : 1;
