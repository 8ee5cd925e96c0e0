import { createHash } from 'node:crypto';
import { readdir, readFile } from 'node:fs/promises';
import path from 'node:path';
import pg from 'pg';
import type { TestProject } from 'vitest/node';
import { joinPostgres, leavePostgres } from '#server/cli/postgres.mjs';
import { PROJECT_ROOT, TEST_FOLDER } from '#server/cli/project-paths.mjs';
import { migrateDatabase } from '#server/db/migrate.ts';

declare module 'vitest' {
  interface ProvidedContext {
    postgresUrl: string;
    templateDatabase: string;
  }
}

/** Held while the template is made and leftovers are swept: several test runs may share the cluster. */
const SETUP_LOCK = 88_120_331;

/** A real PostgreSQL with one migrated template, which every test file clones (see test-database.ts). */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  const { maintenanceUrl } = await joinPostgres(TEST_FOLDER, { isDisposable: true });
  const admin = new pg.Client({ connectionString: maintenanceUrl });
  await admin.connect();
  try {
    await admin.query('select pg_advisory_lock($1)', [SETUP_LOCK]);
    await dropLeftovers(admin);
    project.provide('templateDatabase', await ensureTemplate(admin, maintenanceUrl));
    project.provide('postgresUrl', maintenanceUrl);
  } finally {
    await admin.end();
  }
  return () => leavePostgres(TEST_FOLDER);
}

/** Named after all that shapes it, so that a change of schema makes a new one and never disturbs a run on the old. */
async function ensureTemplate(admin: pg.Client, maintenanceUrl: string): Promise<string> {
  const name = `template_${await digestMigrations()}`;
  const existing = await admin.query('select 1 from pg_database where datname = $1', [name]);
  if (existing.rowCount === 1) return name;
  const unfinished = `${name}_unfinished`;
  await admin.query(`drop database if exists ${unfinished} with (force)`);
  await admin.query(`create database ${unfinished}`);
  await migrateDatabase(maintenanceUrl.replace(/\/postgres$/, `/${unfinished}`));
  await admin.query(`alter database ${unfinished} rename to ${name}`);
  return name;
}

async function digestMigrations(): Promise<string> {
  const folder = path.join(PROJECT_ROOT, 'drizzle');
  const hash = createHash('sha256').update(await readFile(path.join(PROJECT_ROOT, 'server/db/migrate.ts')));
  const files = (await readdir(folder, { recursive: true })).sort();
  for (const file of files.filter((name) => /[.](sql|json)$/.test(name))) {
    hash.update(file).update(await readFile(path.join(folder, file)));
  }
  return hash.digest('hex').slice(0, 12);
}

/** A test file's database bears the pid of the process that made it; without that process nobody will drop it. */
async function dropLeftovers(admin: pg.Client): Promise<void> {
  const found = await admin.query<{ datname: string }>(
    String.raw`select datname from pg_database where datname like 'test\_%'`,
  );
  for (const { datname } of found.rows) {
    const pid = Number(datname.split('_')[1]);
    if (!isAlive(pid)) await admin.query(`drop database if exists ${datname} with (force)`);
  }
}

function isAlive(pid: number): boolean {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return (error as NodeJS.ErrnoException).code === 'EPERM';
  }
}
