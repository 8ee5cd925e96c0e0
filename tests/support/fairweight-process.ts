import { type ChildProcess, spawn } from 'node:child_process';
import { setTimeout as delay } from 'node:timers/promises';
import { findFreePort } from '#server/cli/free-port.mjs';
import { PROJECT_ROOT } from '#server/cli/project-paths.mjs';

const READY = 'Fairweight is ready';

export interface FairweightProcess {
  origin: string;
  npm: ChildProcess;
  /** Everything it has written so far. */
  output: () => string;
  /** Resolves when the address is printed, rejects with the output when it ends before. */
  ready: Promise<void>;
  /** Resolves to npm's exit code, null after a signal. */
  ended: Promise<number | null>;
}

/**
 * `npm start` as a person runs it, on a data folder and a port of its own. It leads a process group, so that
 * `pressCtrlC` can signal all of it as a terminal does.
 */
export async function launchFairweight(dataFolder: string, port?: number): Promise<FairweightProcess> {
  const chosenPort = port ?? (await findFreePort());
  let output = '';
  const npm = spawn('npm', ['start'], {
    cwd: PROJECT_ROOT,
    detached: true,
    stdio: ['ignore', 'pipe', 'pipe'],
    env: { ...process.env, FAIRWEIGHT_DATA: dataFolder, HOST: '127.0.0.1', PORT: String(chosenPort) },
  });
  const ended = new Promise<number | null>((resolve) => npm.once('exit', (code) => resolve(code)));
  const ready = new Promise<void>((resolve, reject) => {
    const collect = (chunk: Buffer) => {
      output += chunk.toString();
      if (output.includes(READY)) resolve();
    };
    npm.stdout.on('data', collect);
    npm.stderr.on('data', collect);
    npm.once('close', () => reject(new Error(`npm start ended before it was ready:\n${output}`)));
  });
  // A caller that expects an early end looks at `ended` and may never look at `ready`.
  ready.catch(() => undefined);
  return { origin: `http://127.0.0.1:${chosenPort}`, npm, output: () => output, ready, ended };
}

export function pressCtrlC({ npm }: FairweightProcess): void {
  if (npm.exitCode === null && npm.signalCode === null) process.kill(-npm.pid!, 'SIGINT');
}

export async function isHealthy(origin: string): Promise<boolean> {
  return fetch(`${origin}/api/health`).then(
    (response) => response.ok,
    () => false,
  );
}

/** Waits for a fact of the world outside this process, which announces nothing. */
export async function waitFor(what: string, isTrue: () => Promise<boolean> | boolean): Promise<void> {
  const deadline = performance.now() + 20_000;
  while (!(await isTrue())) {
    if (performance.now() > deadline) throw new Error(`Never happened: ${what}`);
    await delay(50);
  }
}
