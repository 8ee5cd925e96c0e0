import type { TaskList } from 'graphile-worker';
import type { Database } from '../db/client.ts';
import type { Log } from '../log.ts';
import { QueueLane } from './queue-lane.ts';
import { recoverJobs } from './recover-jobs.ts';
import type { WorkerRegistry } from './worker-registry.ts';

/**
 * Places for small runs and merges, and for shards of large runs. Two shards, so that the threads have one while the other
 * is handed over; a small run never finds all places taken by a large one. A search by bounds takes all threads of its own.
 */
const CONCURRENCY = { quick: 6, bulk: 2, bounds: 1 } as const;
/** With the heartbeat's limit, the time within which another worker has what a dead one held. */
const RECOVERY_INTERVAL_MS = 1500;

interface QueueOptions {
  readonly databaseUrl: string;
  readonly db: Database;
  readonly log: Log;
  readonly registry: WorkerRegistry;
  /** Given a signal that fires when the process stops: a handler then puts its job back and returns at once. */
  readonly createTasks: (stopSignal: AbortSignal) => Readonly<Record<keyof typeof CONCURRENCY, TaskList>>;
}

/** This process's share of the queue's work. Jobs are added by SQL within the transaction that asks for them. */
export class Queue {
  readonly #options: QueueOptions;
  readonly #stopping = new AbortController();
  readonly #lanes: readonly QueueLane[];
  #recovery: NodeJS.Timeout | undefined;

  constructor(options: QueueOptions) {
    this.#options = options;
    const { databaseUrl, log, registry, createTasks } = options;
    const tasks = createTasks(this.#stopping.signal);
    this.#lanes = (['quick', 'bulk', 'bounds'] as const).map(
      (name) =>
        new QueueLane({
          databaseUrl,
          log,
          concurrency: CONCURRENCY[name],
          taskList: tasks[name],
          onWorker: (change, workerId) => registry.note(change, workerId),
        }),
    );
  }

  async start(): Promise<void> {
    await this.#options.registry.start();
    await this.#recover();
    this.#recovery = setInterval(() => void this.#recover(), RECOVERY_INTERVAL_MS);
    this.#recovery.unref();
    for (const lane of this.#lanes) await lane.start();
  }

  /** Takes no more jobs, has those in work put back, and returns when they are. */
  async stop(): Promise<void> {
    clearInterval(this.#recovery);
    const stopped = this.#lanes.map((lane) => lane.stop());
    this.#stopping.abort();
    await Promise.all(stopped);
    await this.#options.registry.stop();
  }

  async #recover(): Promise<void> {
    const { db, registry, log } = this.#options;
    if (!registry.isSteady) return;
    try {
      await recoverJobs(db, { ownProcessId: registry.id, log });
    } catch (error) {
      log.warn({ err: error }, 'Jobs of lost workers could not be looked for');
    }
  }
}
