import connectPgSimple from 'connect-pg-simple';
import session from 'express-session';
import type pg from 'pg';
import type { Log } from '../log.ts';

const PgStore = connectPgSimple(session);

/** Sessions in PostgreSQL, in the table of db/schema/session.ts. `close` ends its sweeping of expired ones. */
export const createSessionStore = (pool: pg.Pool, log: Log) =>
  new PgStore({
    pool,
    tableName: 'session',
    createTableIfMissing: false,
    errorLog: (...details: unknown[]) => log.error({ details }, 'The session store failed'),
  });
