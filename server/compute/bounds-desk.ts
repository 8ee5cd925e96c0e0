import { Piscina } from 'piscina';
import type { BoundsReply, BoundsTask } from './bounds-protocol.ts';
import { resolveWorkerFile } from './worker-file.ts';

/** Threads that search spaces by bounds: a search holds what it knows in its thread, so it keeps that to its end. */
export interface BoundsDesk {
  readonly threads: number;
  search(task: BoundsTask): Promise<BoundsReply>;
  /** Stops the threads at once; unfinished searches are rejected. */
  close(): Promise<void>;
}

/** The threads begin with the first search and end when there has been none in so long: each holds 100 MB and more. */
const IDLE_MS = 5000;
/** Behind the sweeps too: a small run beside a search of minutes is not to wait for it. */
const NICE = 8;

export async function startBoundsDesk(threads: number): Promise<BoundsDesk> {
  const piscina = new Piscina<BoundsTask, BoundsReply>({
    filename: await resolveWorkerFile('bounds-worker'),
    execArgv: ['--enable-source-maps'],
    minThreads: 0,
    maxThreads: threads,
    concurrentTasksPerWorker: 1,
    idleTimeout: IDLE_MS,
    niceIncrement: NICE,
  });
  return {
    threads,
    search: (task) => piscina.run(task, { transferList: [task.port] }),
    close: () => piscina.destroy(),
  };
}
