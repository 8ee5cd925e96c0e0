import { randomUUID } from 'node:crypto';
import { get, type IncomingMessage } from 'node:http';
import path from 'node:path';
import pg from 'pg';
import { findFreePort } from '#server/cli/free-port.mjs';
import { joinPostgres, leavePostgres } from '#server/cli/postgres.mjs';
import { TEST_FOLDER } from '#server/cli/project-paths.mjs';
import { startService, waitUntilHealthy } from '#server/cli/service.mjs';
import { startPasswords } from '#server/compute/passwords.ts';
import { createDatabase, createPool } from '#server/db/client.ts';
import { migrateDatabase } from '#server/db/migrate.ts';
import { createLog } from '#server/log.ts';
import { buildForDrills } from '../tests/support/drill-office.ts';
import { PASSWORD } from '../tests/support/factories.ts';
import { insertPeople } from '../tests/support/office.ts';
import { addProject, type OfficeProject } from '../tests/support/office-project.ts';
import { signInAs, type SignedIn } from '../tests/support/signed-in.ts';
import { testEnvironment } from '../tests/support/test-environment.ts';

/** The service as it is built, in a process of its own on a database of its own, and an engineer who is signed in. */
export interface OfficeApart {
  readonly origin: string;
  readonly project: OfficeProject;
  readonly engineer: SignedIn;
  readonly call: (method: 'GET' | 'POST', path: string, body?: object) => Promise<unknown>;
  /** Follows a run as a page does, and leaves unread what it is told. */
  readonly follow: (runId: string) => Promise<() => void>;
  close(): Promise<void>;
}

export async function openOfficeApart(): Promise<OfficeApart> {
  const { maintenanceUrl } = await joinPostgres(TEST_FOLDER, { isDisposable: true });
  const name = `bench_${randomUUID().replaceAll('-', '')}`;
  const url = maintenanceUrl.replace(/\/postgres$/, `/${name}`);
  await administer(maintenanceUrl, `create database ${name}`);
  await migrateDatabase(url);
  const pool = createPool(url, createLog('silent'));
  const db = createDatabase(pool);
  const passwords = await startPasswords(4);
  const people = await insertPeople(db, await passwords.hash(PASSWORD));
  await passwords.close();
  const project = await addProject({ deps: { db }, idOf: (account) => people.get(account)! });
  const build = await buildForDrills();
  const port = await findFreePort();
  const origin = `http://127.0.0.1:${port}`;
  const service = startService(['--enable-source-maps', path.join(build.folder, 'main.js')], {
    ...definedOf(testEnvironment(url)),
    PORT: String(port),
    LOG_LEVEL: 'error',
  });
  await waitUntilHealthy(service, origin);
  const engineer = await signInAs(origin, { email: 'engineer@office.example' });
  return {
    origin,
    project,
    engineer,
    call: caller(origin, engineer),
    follow: async (runId) => {
      const response = await new Promise<IncomingMessage>((resolve, reject) => {
        const headers = { cookie: engineer.cookie, accept: 'text/event-stream' };
        get(`${origin}/api/runs/${runId}/events`, { headers }, resolve).on('error', reject);
      });
      response.on('error', () => undefined).resume();
      return () => response.destroy();
    },
    close: async () => {
      service.stop();
      await service.ended;
      build.remove();
      await pool.end();
      await administer(maintenanceUrl, `drop database ${name} with (force)`);
      await leavePostgres(TEST_FOLDER);
    },
  };
}

const definedOf = (environment: NodeJS.ProcessEnv): Record<string, string> =>
  Object.fromEntries(
    Object.entries(environment).flatMap(([key, value]) => (value === undefined ? [] : [[key, value]])),
  );

/** As little of a client as there can be, on connections that stay open. */
function caller(origin: string, { cookie, csrfToken }: SignedIn): OfficeApart['call'] {
  const headers = { cookie, 'x-csrf-token': csrfToken, 'content-type': 'application/json' };
  return async (method, path, body) => {
    const sent = body === undefined ? {} : { body: JSON.stringify(body) };
    const response = await fetch(`${origin}/api${path}`, { method, headers, ...sent });
    const text = await response.text();
    if (!response.ok) throw new Error(`${method} ${path}: ${response.status} ${text.slice(0, 200)}`);
    return JSON.parse(text) as unknown;
  };
}

async function administer(maintenanceUrl: string, sql: string): Promise<void> {
  const connection = new pg.Client({ connectionString: maintenanceUrl });
  await connection.connect();
  await connection.query(sql);
  await connection.end();
}
