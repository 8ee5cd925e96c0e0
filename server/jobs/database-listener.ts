import { setTimeout as delay } from 'node:timers/promises';
import pg from 'pg';
import type { Log } from '../log.ts';

const FIRST_RETRY_MS = 100;
const LONGEST_RETRY_MS = 2000;

/** First key of the advisory locks that show which queue workers live; the second is the hash of the worker's id. */
export const WORKER_LOCK_CLASS = 72_710_216;

interface ListenerOptions {
  readonly databaseUrl: string;
  readonly channels: readonly string[];
  readonly log: Log;
  readonly onNotification: (channel: string, payload: string) => void;
  /** After a lost connection is replaced: notifications may have been missed. */
  readonly onReconnected: () => void;
}

/**
 * The process's one standing connection: listens to the channels, and holds a lock for each queue worker of this
 * process. PostgreSQL frees the locks when the process dies, at once and without a clock, so others can tell. They are
 * shared locks, because after a reconnect the lost connection's may still be there.
 */
export class DatabaseListener {
  readonly #options: ListenerOptions;
  readonly #workerIds = new Set<string>();
  #connection: pg.Client | undefined;
  #lastQuery: Promise<unknown> = Promise.resolve();
  #isStopped = false;

  constructor(options: ListenerOptions) {
    this.#options = options;
  }

  async start(): Promise<void> {
    await this.#connect();
  }

  /** What waits to be asked is asked first: ended under it, the connection would call it an error. */
  async stop(): Promise<void> {
    this.#isStopped = true;
    await this.#lastQuery;
    await this.#connection?.end().catch(() => undefined);
  }

  get workerIds(): readonly string[] {
    return [...this.#workerIds];
  }

  async holdWorkerLock(workerId: string): Promise<void> {
    this.#workerIds.add(workerId);
    await this.#query('select pg_advisory_lock_shared($1, hashtext($2))', workerId);
  }

  async releaseWorkerLock(workerId: string): Promise<void> {
    this.#workerIds.delete(workerId);
    await this.#query('select pg_advisory_unlock_shared($1, hashtext($2))', workerId);
  }

  /**
   * One after the other, as the connection wants them. Without a connection, reconnecting takes the locks; once
   * stopped, its end frees them.
   */
  #query(text: string, workerId: string): Promise<unknown> {
    if (this.#isStopped) return this.#lastQuery;
    const done = this.#lastQuery.then(() => this.#connection?.query(text, [WORKER_LOCK_CLASS, workerId]));
    this.#lastQuery = done.catch(() => undefined);
    return done;
  }

  async #connect(): Promise<void> {
    const { databaseUrl, channels, onNotification } = this.#options;
    const connection = new pg.Client({
      connectionString: databaseUrl,
      keepAlive: true,
      application_name: 'fairweight-listener',
    });
    connection.on('error', () => undefined);
    connection.on('notification', ({ channel, payload }) => onNotification(channel, payload ?? ''));
    await connection.connect();
    for (const channel of channels) await connection.query(`listen ${pg.escapeIdentifier(channel)}`);
    for (const id of this.#workerIds)
      await connection.query('select pg_advisory_lock_shared($1, hashtext($2))', [WORKER_LOCK_CLASS, id]);
    this.#connection = connection;
    connection.once('end', () => {
      this.#connection = undefined;
      if (!this.#isStopped) void this.#reconnect();
    });
  }

  async #reconnect(): Promise<void> {
    this.#options.log.warn('The connection that listens to the database was lost');
    for (let wait = FIRST_RETRY_MS; !this.#isStopped; wait = Math.min(2 * wait, LONGEST_RETRY_MS)) {
      try {
        await this.#connect();
        this.#options.log.info('Listening to the database again');
        this.#options.onReconnected();
        return;
      } catch {
        await delay(wait, undefined, { ref: false });
      }
    }
  }
}
