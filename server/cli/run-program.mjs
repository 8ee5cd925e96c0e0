import { spawn } from 'node:child_process';

/** Output that is collected, to be shown later or not at all, is plain text. */
const WITHOUT_COLOURS = { NO_COLOR: '1', FORCE_COLOR: undefined };

/** @type {Set<import('node:child_process').ChildProcess>} */
const interruptible = new Set();

/**
 * Runs a program to its end. With `isQuiet` what it writes is collected in `output`, otherwise it goes to this
 * terminal. `environment` is added to this process's own, `env` replaces it. A detached program is left alone by
 * `interruptPrograms`.
 *
 * @param {string} command
 * @param {readonly string[]} args
 * @param {import('node:child_process').SpawnOptions & {
 *   isQuiet?: boolean, environment?: Record<string, string> }} [options]
 * @returns {Promise<{ code: number, output: string }>}
 */
export function runProgram(command, args, { isQuiet = false, environment = {}, ...options } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, {
      stdio: isQuiet ? ['ignore', 'pipe', 'pipe'] : 'inherit',
      env: { ...process.env, ...(isQuiet ? WITHOUT_COLOURS : {}), ...environment },
      ...options,
    });
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
