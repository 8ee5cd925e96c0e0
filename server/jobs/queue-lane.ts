import { EventEmitter } from 'node:events';
import { setTimeout as delay } from 'node:timers/promises';
import { Logger, run, type Runner, type TaskList, type WorkerEvents } from 'graphile-worker';
import type { Log } from '../log.ts';

/** Jobs are picked up by NOTIFY; the poll is for what a broken connection missed. */
const POLL_MS = 1000;
const RESTART_MS = 1000;

interface LaneOptions {
  readonly databaseUrl: string;
  readonly log: Log;
  /** Jobs taken at once. */
  readonly concurrency: number;
  readonly taskList: TaskList;
  /** A worker of the queue under this name begins, or has ended. */
  readonly onWorker: (change: 'begins' | 'ended', workerId: string) => void;
}

/** Workers of the queue that take some of its tasks; started again whenever the database was away for long. */
export class QueueLane {
  readonly #options: LaneOptions;
  #runner: Runner | undefined;
  #isStopped = false;

  constructor(options: LaneOptions) {
    this.#options = options;
  }

  async start(): Promise<void> {
    const { databaseUrl, concurrency, taskList, log } = this.#options;
    const runner = await run({
      connectionString: databaseUrl,
      maxPoolSize: concurrency + 2,
      concurrency,
      pollInterval: POLL_MS,
      noHandleSignals: true,
      crontab: '',
      taskList,
      events: this.#createEvents(),
      logger: adaptLog(log),
    });
    this.#runner = runner;
    // The runner gives up after some failures to reach the database in a row.
    runner.promise.catch((error: unknown) => this.#restart(error));
  }

  /** Takes no more jobs and returns when those in work have ended. */
  async stop(): Promise<void> {
    this.#isStopped = true;
    await this.#runner?.stop().catch(() => undefined);
  }

  async #restart(error: unknown): Promise<void> {
    const { log } = this.#options;
    log.warn({ err: error }, 'The queue stopped working and is started again');
    while (!this.#isStopped) {
      await delay(RESTART_MS, undefined, { ref: false });
      try {
        await this.start();
        return;
      } catch (failure) {
        log.warn({ err: failure }, 'The queue could not be started yet');
      }
    }
  }

  #createEvents(): WorkerEvents {
    const events: WorkerEvents = new EventEmitter();
    const { onWorker } = this.#options;
    events.on('worker:create', ({ worker }) => onWorker('begins', worker.workerId));
    events.on('worker:stop', ({ worker }) => onWorker('ended', worker.workerId));
    return events;
  }
}

/** The queue reports each job it takes; of interest here is only what goes wrong. */
function adaptLog(log: Log): Logger {
  const writers = { error: log.error, warning: log.warn, info: log.debug, debug: log.debug };
  return new Logger(() => (level, message, meta) => writers[level].call(log, { err: meta?.error }, message));
}
