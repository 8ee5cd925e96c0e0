import { EventEmitter } from 'node:events';
import { setTimeout as delay } from 'node:timers/promises';
import { Logger, run, type Runner, type TaskList, type WorkerEvents } from 'graphile-worker';
import type { Log } from '../log.ts';
import type { Database } from '../db/client.ts';
import type { DatabaseListener } from './database-listener.ts';
import { recoverJobs } from './recover-jobs.ts';

/** Runs computed side by side. They share the pool's threads chunk by chunk, so a small one passes a huge one. */
const CONCURRENT_JOBS = 4;
/** Jobs are picked up by NOTIFY; the poll is for what a broken connection missed. */
const POLL_MS = 1000;
const RECOVERY_INTERVAL_MS = 10_000;
const RESTART_MS = 1000;

interface QueueOptions {
  readonly databaseUrl: string;
  readonly db: Database;
  readonly log: Log;
  readonly listener: DatabaseListener;
  /** Given a signal that fires when the service stops: a handler then puts its job back and returns at once. */
  readonly createTasks: (stopSignal: AbortSignal) => TaskList;
}

/** The built-in worker of the queue. Jobs are added by SQL within the transaction that asks for them. */
export class Queue {
  readonly #options: QueueOptions;
  readonly #stopping = new AbortController();
  #runner: Runner | undefined;
  #recovery: NodeJS.Timeout | undefined;

  constructor(options: QueueOptions) {
    this.#options = options;
  }

  async start(): Promise<void> {
    await this.#recover();
    this.#recovery = setInterval(() => void this.#recover(), RECOVERY_INTERVAL_MS);
    this.#recovery.unref();
    await this.#startRunner();
  }

  /** Takes no more jobs, has those in work put back, and returns when they are. */
  async stop(): Promise<void> {
    clearInterval(this.#recovery);
    const stopped = this.#runner?.stop();
    this.#stopping.abort();
    await stopped?.catch(() => undefined);
  }

  async #startRunner(): Promise<void> {
    const { databaseUrl, createTasks, log } = this.#options;
    const runner = await run({
      connectionString: databaseUrl,
      maxPoolSize: CONCURRENT_JOBS + 2,
      concurrency: CONCURRENT_JOBS,
      pollInterval: POLL_MS,
      noHandleSignals: true,
      crontab: '',
      taskList: createTasks(this.#stopping.signal),
      events: this.#createEvents(),
      logger: adaptLog(log),
    });
    this.#runner = runner;
    // The runner gives up after some failures to reach the database in a row.
    runner.promise.catch((error: unknown) => this.#restartRunner(error));
  }

  async #restartRunner(error: unknown): Promise<void> {
    this.#options.log.warn({ err: error }, 'The queue stopped working and is started again');
    while (!this.#stopping.signal.aborted) {
      await delay(RESTART_MS, undefined, { ref: false });
      try {
        await this.#startRunner();
        return;
      } catch (failure) {
        this.#options.log.warn({ err: failure }, 'The queue could not be started yet');
      }
    }
  }

  #createEvents(): WorkerEvents {
    const events: WorkerEvents = new EventEmitter();
    const { listener, log } = this.#options;
    const report = (error: unknown) => log.warn({ err: error }, 'A worker could not show that it lives');
    events.on('worker:create', ({ worker }) => void listener.holdWorkerLock(worker.workerId).catch(report));
    events.on('worker:stop', ({ worker }) => void listener.releaseWorkerLock(worker.workerId).catch(report));
    return events;
  }

  async #recover(): Promise<void> {
    const { db, listener, log } = this.#options;
    try {
      await recoverJobs(db, { ownWorkerIds: listener.workerIds, log });
    } catch (error) {
      log.warn({ err: error }, 'Jobs of lost workers could not be looked for');
    }
  }
}

/** The queue reports each job it takes; of interest here is only what goes wrong. */
function adaptLog(log: Log): Logger {
  const writers = { error: log.error, warning: log.warn, info: log.debug, debug: log.debug };
  return new Logger(() => (level, message, meta) => writers[level].call(log, { err: meta?.error }, message));
}
