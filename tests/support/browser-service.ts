import { randomUUID } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import path from 'node:path';
import pg from 'pg';
import { ensureBuilt } from '#server/cli/build.mjs';
import { findFreePort } from '#server/cli/free-port.mjs';
import { PROJECT_ROOT } from '#server/cli/project-paths.mjs';
import { requireProgram } from '#server/cli/run-program.mjs';
import { startService, waitUntilHealthy } from '#server/cli/service.mjs';

/** Held while the demo office is seeded: several test runs may share the cluster. */
const SEEDING_LOCK = 88_120_332;

export interface DemoService {
  readonly origin: string;
  readonly databaseUrl: string;
  close(): Promise<void>;
}

const withDatabase = (postgresUrl: string, name: string): string =>
  postgresUrl.replace(/\/postgres$/, `/${name}`);

const environmentOf = (databaseUrl: string, port: number): Record<string, string> => ({
  NODE_ENV: 'production',
  APP_ROOT: PROJECT_ROOT,
  DATABASE_URL: databaseUrl,
  SESSION_SECRET: 'a secret of the tests, long enough to be one',
  HOST: '127.0.0.1',
  PORT: String(port),
  LOG_LEVEL: 'error',
  PASSWORD_COST: '4',
});

/** The service as it is built and started for real, on a port and a copy of the seeded demo office of its own. */
export async function startDemoService(postgresUrl: string): Promise<DemoService> {
  await ensureBuilt();
  const admin = new pg.Client({ connectionString: postgresUrl });
  await admin.connect();
  const name = `test_${process.pid}_${randomUUID().replaceAll('-', '')}`;
  await admin.query(`create database ${name} template ${await ensureSeeded(admin, postgresUrl)}`);
  const databaseUrl = withDatabase(postgresUrl, name);
  const port = await findFreePort();
  const origin = `http://127.0.0.1:${port}`;
  const service = startService(
    ['--enable-source-maps', 'dist/server/main.js'],
    environmentOf(databaseUrl, port),
  );
  const close = async () => {
    service.stop();
    await service.ended;
    await admin.query(`drop database ${name} with (force)`);
    await admin.end();
  };
  await waitUntilHealthy(service, origin).catch(async (error: unknown) => {
    await close();
    throw error;
  });
  return { origin, databaseUrl, close };
}

/** A database with the demo office in it, seeded once for each build by that build; every service gets a copy. */
async function ensureSeeded(admin: pg.Client, postgresUrl: string): Promise<string> {
  const build = await readFile(path.join(PROJECT_ROOT, 'dist', '.source-fingerprint'), 'utf8');
  const name = `demo_office_${build.slice(0, 12)}`;
  await admin.query('select pg_advisory_lock($1)', [SEEDING_LOCK]);
  try {
    const found = await admin.query<{ datname: string }>(
      String.raw`select datname from pg_database where datname like 'demo\_office\_%'`,
    );
    const existing = found.rows.map(({ datname }) => datname);
    if (existing.includes(name)) return name;
    for (const outdated of existing) await admin.query(`drop database ${outdated} with (force)`);
    const unfinished = `demo_office_unfinished`;
    await admin.query(`create database ${unfinished}`);
    for (const script of ['migrate', 'seed']) {
      await requireProgram(process.execPath, [`dist/server/${script}.js`], {
        cwd: PROJECT_ROOT,
        environment: environmentOf(withDatabase(postgresUrl, unfinished), 0),
        isQuiet: true,
      });
    }
    await admin.query(`alter database ${unfinished} rename to ${name}`);
    return name;
  } finally {
    await admin.query('select pg_advisory_unlock($1)', [SEEDING_LOCK]);
  }
}
