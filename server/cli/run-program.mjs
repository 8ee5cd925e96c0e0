import { spawn } from 'node:child_process';

/** @type {import('node:child_process').SpawnOptions} */
const LOUD = { stdio: 'inherit' };

/** @type {import('node:child_process').SpawnOptions} */
const QUIET = {
  stdio: ['ignore', 'pipe', 'pipe'],
  env: { ...process.env, NO_COLOR: '1', FORCE_COLOR: undefined },
};

/** @type {Set<import('node:child_process').ChildProcess>} */
const interruptible = new Set();

/**
 * Runs a program to its end. With `isQuiet` what it writes is collected in `output`, otherwise it goes to this
 * terminal. A detached program is left alone by `interruptPrograms`.
 *
 * @param {string} command
 * @param {readonly string[]} args
 * @param {Omit<import('node:child_process').SpawnOptions, 'stdio'> & {
 *   isQuiet?: boolean, stdio?: import('node:child_process').StdioOptions }} [options]
 * @returns {Promise<{ code: number, output: string }>}
 */
export function runProgram(command, args, { isQuiet = false, ...options } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { ...(isQuiet ? QUIET : LOUD), ...options });
    if (options.detached !== true) interruptible.add(child);
    let output = '';
    const collect = (/** @type {Buffer} */ chunk) => (output += chunk.toString());
    child.stdout?.on('data', collect);
    child.stderr?.on('data', collect);
    child.on('error', (error) => {
      interruptible.delete(child);
      reject(error);
    });
    child.on('close', (code) => {
      interruptible.delete(child);
      resolve({ code: code ?? 1, output });
    });
  });
}

/**
 * As `runProgram`, for a step without which nothing after it makes sense.
 *
 * @param {string} command
 * @param {readonly string[]} args
 * @param {Parameters<typeof runProgram>[2]} [options]
 */
export async function requireProgram(command, args, options) {
  const { code, output } = await runProgram(command, args, options);
  if (code !== 0) throw new Error(`${command} ${args.join(' ')} ended with code ${code}\n${output}`.trim());
  return output;
}

export function interruptPrograms() {
  for (const child of interruptible) child.kill('SIGTERM');
}
