import { Piscina } from 'piscina';
import type { SweepReply, SweepTask } from './protocol.ts';
import { resolveWorkerFile } from './worker-file.ts';

/** The threads that sweep. Tasks are served in the order they came, so runs that keep few in flight take turns. */
export interface ComputePool {
  readonly threads: number;
  sweep(task: SweepTask): Promise<SweepReply>;
  /** Stops the threads at once; unfinished tasks are rejected. */
  close(): Promise<void>;
}

/** Sweeps give way to whoever waits for an answer: the event loop and the database share the cores with them. */
const NICE = 5;

/** `threads` is explicit: the default, one and a half per core, only adds turns between threads. */
export async function startComputePool(threads: number): Promise<ComputePool> {
  const piscina = new Piscina<SweepTask, SweepReply>({
    filename: await resolveWorkerFile('sweep-worker'),
    execArgv: ['--enable-source-maps'],
    minThreads: threads,
    maxThreads: threads,
    concurrentTasksPerWorker: 1,
    niceIncrement: NICE,
  });
  return {
    threads,
    sweep: (task) => piscina.run(task),
    close: () => piscina.destroy(),
  };
}
