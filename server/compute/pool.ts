import { Piscina, queueOptionsSymbol } from 'piscina';
import type { SweepReply, SweepTask } from './protocol.ts';
import { SmallestFirst, type TaskSize } from './smallest-first.ts';
import { resolveWorkerFile } from './worker-file.ts';

/** The threads that sweep. Tasks of smaller pieces of work are served first. */
export interface ComputePool {
  readonly threads: number;
  /** `ofSections` is the size of the whole that the task is a chunk of. */
  sweep(task: SweepTask, ofSections: number): Promise<SweepReply>;
  /** Stops the threads at once; unfinished tasks are rejected. */
  close(): Promise<void>;
}

/**
 * Sweeps give way to whoever waits for an answer: the event loop and the database share the cores with them. At 5 the slowest
 * answers beside a sweep took a third longer; 19 gained nothing more, and would stop sweeps beside any other program.
 */
const NICE = 10;

/** `threads` is explicit: the default, one and a half per core, only adds turns between threads. */
export async function startComputePool(threads: number): Promise<ComputePool> {
  const piscina = new Piscina<SweepTask, SweepReply>({
    filename: await resolveWorkerFile('sweep-worker'),
    execArgv: ['--enable-source-maps'],
    minThreads: threads,
    maxThreads: threads,
    concurrentTasksPerWorker: 1,
    taskQueue: new SmallestFirst(),
    niceIncrement: NICE,
  });
  return {
    threads,
    sweep: (task, ofSections) => {
      const size: TaskSize = { sections: ofSections };
      return piscina.run(Object.assign(task, { [queueOptionsSymbol]: size }));
    },
    close: () => piscina.destroy(),
  };
}
