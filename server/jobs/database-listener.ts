import { setTimeout as delay } from 'node:timers/promises';
import pg from 'pg';
import type { Log } from '../log.ts';

const FIRST_RETRY_MS = 100;
const LONGEST_RETRY_MS = 2000;

/** First key of the advisory locks that show which processes live; the second is the hash of the process's id. */
export const PROCESS_LOCK_CLASS = 72_710_216;

interface ListenerOptions {
  readonly databaseUrl: string;
  readonly channels: readonly string[];
  readonly log: Log;
  readonly onNotification: (channel: string, payload: string) => void;
  /** After a lost connection is replaced: notifications may have been missed. */
  readonly onReconnected: () => void;
}

/**
 * The process's one standing connection: listens to the channels, and holds a lock in the name of the process.
 * PostgreSQL frees it when the process dies, at once and without a clock, so others can tell. It is a shared lock,
 * because after a reconnect the lost connection's may still be there.
 */
export class DatabaseListener {
  readonly #options: ListenerOptions;
  #processId: string | undefined;
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

  async holdProcessLock(processId: string): Promise<void> {
    this.#processId = processId;
    this.#lastQuery = this.#connection === undefined ? this.#lastQuery : lock(this.#connection, processId);
    await this.#lastQuery;
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
    if (this.#processId !== undefined) await lock(connection, this.#processId);
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

const lock = (connection: pg.Client, processId: string): Promise<unknown> =>
  connection.query('select pg_advisory_lock_shared($1, hashtext($2))', [PROCESS_LOCK_CLASS, processId]);
