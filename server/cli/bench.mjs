// `npm run bench [name...]`: every file directly in bench/, or the named ones, each in a process of its own so that one
// cannot warm the compiler for the next.
import fs from 'node:fs';
import path from 'node:path';
import { ensurePackages } from './packages.mjs';
import { PROJECT_ROOT } from './project-paths.mjs';
import { runProgram } from './run-program.mjs';

await ensurePackages();
const wanted = process.argv.slice(2);
const files = fs
  .readdirSync(path.join(PROJECT_ROOT, 'bench'))
  .filter((file) => file.endsWith('.ts'))
  .filter((file) => wanted.length === 0 || wanted.includes(file.replace(/([.]bench)?[.]ts$/, '')));

if (files.length === 0) throw new Error(`bench/ holds none of: ${wanted.join(', ')}`);
let failures = 0;
for (const file of files) {
  console.log(`\n${file}`);
  const script = path.join('bench', file);
  const { code } = await runProgram(process.execPath, ['--import', 'tsx', script], { cwd: PROJECT_ROOT });
  if (code !== 0) failures++;
}
process.exitCode = failures === 0 ? 0 : 1;
