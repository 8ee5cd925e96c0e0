import path from 'node:path';
import { ensureBuilt } from './build.mjs';
import { INITIAL_SCRIPT_LIMIT_KB, measureInitialScriptKb } from './initial-script-size.mjs';
import { checkMigrations } from './migrations-check.mjs';
import { PROJECT_ROOT } from './project-paths.mjs';
import { runProgram } from './run-program.mjs';

/**
 * What every commit is held to, besides the tests.
 *
 * @typedef {{ name: string, check: () => Promise<{ isOk: boolean, output: string }> }} Gate
 */

/** @param {string[]} command a script of npm's, with its arguments */
const npmScript = (...command) => {
  return async () => {
    const { code, output } = await runProgram('npm', ['run', '--silent', ...command], {
      cwd: PROJECT_ROOT,
      isQuiet: true,
    });
    return { isOk: code === 0, output };
  };
};

async function checkBuild() {
  await ensureBuilt();
  const sizeKb = measureInitialScriptKb();
  const output = `initial script ${sizeKb.toFixed(0)} kB gzip of at most ${INITIAL_SCRIPT_LIMIT_KB} kB`;
  return { isOk: sizeKb <= INITIAL_SCRIPT_LIMIT_KB, output };
}

/** @type {Gate[]} */
const GATES = [
  { name: 'types', check: npmScript('typecheck') },
  { name: 'lint', check: npmScript('lint') },
  { name: 'lint by types', check: npmScript('lint:types') },
  { name: 'import directions', check: npmScript('boundaries') },
  { name: 'unused code', check: npmScript('unused') },
  { name: 'format', check: npmScript('format:check') },
  { name: 'migrations match the schema', check: checkMigrations },
  { name: 'build and size of the initial script', check: checkBuild },
];

/**
 * @param {Gate} gate
 * @returns {Promise<boolean>}
 */
async function passes({ name, check }) {
  const startedAt = performance.now();
  const { isOk, output } = await check().catch((/** @type {unknown} */ error) => ({
    isOk: false,
    output: error instanceof Error ? error.message : String(error),
  }));
  const seconds = ((performance.now() - startedAt) / 1000).toFixed(1);
  console.log(`${isOk ? 'ok  ' : 'FAIL'} ${name} (${seconds} s)`);
  if (!isOk) console.log(output.trim().replaceAll(`${PROJECT_ROOT}${path.sep}`, ''));
  return isOk;
}

/** All of them, also after a failure: one run shows everything there is to mend. */
export async function runGates() {
  let passed = 0;
  for (const gate of GATES) passed += (await passes(gate)) ? 1 : 0;
  return { passed, failed: GATES.length - passed, skipped: 0 };
}
