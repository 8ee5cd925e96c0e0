import { spawn } from 'node:child_process';

/** @type {Set<import('node:child_process').ChildProcess>} */
const running = new Set();

/**
 * Runs a program to its end. Without `isQuiet` it writes straight to this terminal and `output` stays empty.
 *
 * @param {string} command
 * @param {readonly string[]} args
 * @param {import('node:child_process').SpawnOptions & { isQuiet?: boolean }} [options]
 * @returns {Promise<{ code: number, output: string }>}
 */
export function runProgram(command, args, { isQuiet = false, ...options } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, {
      stdio: isQuiet ? ['ignore', 'pipe', 'pipe'] : 'inherit',
      ...options,
    });
    running.add(child);
    let output = '';
    const collect = (/** @type {Buffer} */ chunk) => (output += chunk.toString());
    child.stdout?.on('data', collect);
    child.stderr?.on('data', collect);
    child.on('error', (error) => {
      running.delete(child);
      reject(error);
    });
    child.on('close', (code) => {
      running.delete(child);
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

/** @param {NodeJS.Signals} signal */
export function signalRunningPrograms(signal) {
  for (const child of running) child.kill(signal);
}
