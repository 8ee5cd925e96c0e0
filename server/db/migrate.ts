import { fileURLToPath } from 'node:url';
import { drizzle } from 'drizzle-orm/node-postgres';
import { migrate } from 'drizzle-orm/node-postgres/migrator';
import { runMigrations } from 'graphile-worker';
import pg from 'pg';

/** Any number will do as long as nothing else in this database locks it. */
const MIGRATION_LOCK = 72_710_215;

/** Two levels up from here, and just as well from dist/server, where this file is bundled to. */
const MIGRATIONS_FOLDER = fileURLToPath(new URL('../../drizzle', import.meta.url));

/**
 * Brings a database to the newest schema, and the job queue's own schema with it. Two services may start at once and
 * Drizzle's migrator takes no lock of its own, so one connection holds an advisory lock for the whole of it; ending
 * the connection frees the lock, also after a failure.
 */
export async function migrateDatabase(databaseUrl: string): Promise<void> {
  const connection = new pg.Client({ connectionString: databaseUrl });
  await connection.connect();
  try {
    await connection.query('select pg_advisory_lock($1)', [MIGRATION_LOCK]);
    await migrate(drizzle({ client: connection }), { migrationsFolder: MIGRATIONS_FOLDER });
    await runMigrations({ connectionString: databaseUrl });
  } finally {
    await connection.end();
  }
}
