import connectPgSimple from 'connect-pg-simple';
import session, { type SessionData } from 'express-session';
import type pg from 'pg';
import type { Log } from '../log.ts';

const PgStore = connectPgSimple(session);

/** A session's end, hours away, is put off no more often than this: every answer would wait for the write. */
const TOUCH_EVERY_MS = 60_000;
/** Sessions of which that is remembered; of one forgotten it is put off once more. */
const MOST_REMEMBERED = 10_000;

class SessionStore extends PgStore {
  readonly #touchedAt = new Map<string, number>();

  override touch(sid: string, data: SessionData, callback?: () => void): void {
    const now = performance.now();
    if (now - (this.#touchedAt.get(sid) ?? -Infinity) < TOUCH_EVERY_MS) {
      callback?.();
      return;
    }
    if (this.#touchedAt.size >= MOST_REMEMBERED) this.#touchedAt.clear();
    this.#touchedAt.set(sid, now);
    super.touch(sid, data, callback);
  }
}

/** Sessions in PostgreSQL, in the table of db/schema/session.ts. `close` ends its sweeping of expired ones. */
export const createSessionStore = (pool: pg.Pool, log: Log) =>
  new SessionStore({
    pool,
    tableName: 'session',
    createTableIfMissing: false,
    errorLog: (...details: unknown[]) => log.error({ details }, 'The session store failed'),
  });
