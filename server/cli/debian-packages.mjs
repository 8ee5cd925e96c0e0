import { runProgram } from './run-program.mjs';

/** @type {import('node:child_process').StdioOptions} */
const DEBIAN_STDIO = ['ignore', 'inherit', 'inherit'];

export const isRoot = process.getuid?.() === 0;

/**
 * Installs Debian packages, as root or through a sudo that asks for no password. `prepare` is shell text to run first,
 * with the same rights. It runs in a process group of its own and is never signalled: Ctrl-C waits for it, because
 * half an installation would be the machine's problem and not only ours.
 *
 * @param {string[]} names
 * @param {{ prepare?: string }} [options]
 */
export async function installDebianPackages(names, { prepare = 'true' } = {}) {
  const list = names.join(' ');
  const script = [
    'set -e',
    'export DEBIAN_FRONTEND=noninteractive',
    prepare,
    'dpkg --configure -a',
    'apt-get update -q',
    `apt-get install -y -q --no-install-recommends -o Dpkg::Options::=--force-confold ${list}`,
  ].join('\n');
  const [command, ...args] = isRoot ? ['sh', '-c', script] : ['sudo', '-n', 'sh', '-c', script];
  console.log(`Installing from Debian: ${list}`);
  const options = { stdio: DEBIAN_STDIO, detached: true };
  const { code } = await runProgram(command, args, options).catch(() => ({ code: 1 }));
  if (code !== 0) {
    throw new Error(
      `${list} could not be installed. Install it by hand and start again: sudo apt-get install ${list}`,
    );
  }
}
