import { drizzle, type NodePgDatabase } from 'drizzle-orm/node-postgres';
import pg from 'pg';
import type { Log } from '../log.ts';

/** Queries go through this; a transaction is one too, so that a query need not know which it is given. */
export type Database = NodePgDatabase;

/** Requests wait for a connection no longer than this before they are answered with 503. */
const CONNECTION_WAIT_MS = 5000;
const CONNECTIONS = 12;

export function createPool(databaseUrl: string, log: Log): pg.Pool {
  const pool = new pg.Pool({
    connectionString: databaseUrl,
    max: CONNECTIONS,
    connectionTimeoutMillis: CONNECTION_WAIT_MS,
    keepAlive: true,
  });
  // Without a listener the restart of the database, which breaks idle connections, would end the process.
  pool.on('error', (error) => log.warn({ err: error }, 'An idle database connection broke'));
  // Nor is anybody told when one breaks between two queries of a transaction, but by its next query.
  pool.on('connect', (client) => client.on('error', () => undefined));
  return pool;
}

export const createDatabase = (pool: pg.Pool): Database => drizzle({ client: pool });
