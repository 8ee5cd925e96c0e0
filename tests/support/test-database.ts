import { randomUUID } from 'node:crypto';
import pg from 'pg';
import { inject } from 'vitest';

export interface TestDatabase {
  url: string;
  drop: () => Promise<void>;
}

/** A database of one test file's own, cloned from the migrated template in some 50 ms. */
export async function createTestDatabase(): Promise<TestDatabase> {
  const postgresUrl = inject('postgresUrl');
  const name = `test_${process.pid}_${randomUUID().replaceAll('-', '')}`;
  await runAsAdmin(postgresUrl, `create database ${name} template ${inject('templateDatabase')}`);
  return {
    url: postgresUrl.replace(/\/postgres$/, `/${name}`),
    drop: () => runAsAdmin(postgresUrl, `drop database ${name} with (force)`),
  };
}

async function runAsAdmin(postgresUrl: string, sql: string): Promise<void> {
  const connection = new pg.Client({ connectionString: postgresUrl });
  await connection.connect();
  try {
    await connection.query(sql);
  } finally {
    await connection.end();
  }
}
