import { readFileSync, renameSync, rmSync } from 'node:fs';
import path from 'node:path';
import pg from 'pg';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { DEMO_ACCOUNTS, DEMO_PASSWORD } from '#server/cli/demo-accounts.mjs';
import { findFreePort, isPortFree } from '#server/cli/free-port.mjs';
import { TEST_FOLDER } from '#server/cli/project-paths.mjs';
import {
  type FairweightProcess,
  isHealthy,
  launchFairweight,
  pressCtrlC,
  waitFor,
} from '../support/fairweight-process.ts';

const folder = path.join(TEST_FOLDER, `start-${process.pid}`);
const launched: FairweightProcess[] = [];

let firstRecords: unknown;
const untouchedFolder = `${folder}-interrupted`;

async function launch(port?: number, dataFolder = folder): Promise<FairweightProcess> {
  const fairweight = await launchFairweight(dataFolder, port);
  launched.push(fairweight);
  return fairweight;
}

/** Kills the database's server, as the machine does when memory runs out. */
function killPostgres(): void {
  const pidFile = readFileSync(path.join(readCluster().cluster, 'postmaster.pid'), 'utf8');
  process.kill(Number(pidFile.split('\n')[0]), 'SIGKILL');
}

function readCluster(dataFolder = folder): { port: number; password: string; cluster: string } {
  return JSON.parse(readFileSync(path.join(dataFolder, 'postgres.json'), 'utf8'));
}

const isPostgresStopped = () => isPortFree(readCluster().port, '127.0.0.1');

/** How many people, projects and candidates the office has: a start must neither lose any nor seed a second set. */
async function countRecords(dataFolder = folder): Promise<unknown> {
  const { port, password } = readCluster(dataFolder);
  const database = new pg.Client({
    host: '127.0.0.1',
    port,
    user: 'fairweight',
    database: 'fairweight',
    password,
  });
  await database.connect();
  try {
    const counts = ['people', 'projects', 'runs', 'candidates'].map(
      (table) => `(select count(*) from ${table}) ${table}`,
    );
    return (await database.query(`select ${counts.join(', ')}`)).rows[0];
  } finally {
    await database.end();
  }
}

async function expectNothingLeft(fairweight: FairweightProcess): Promise<void> {
  await waitFor('the service is gone', async () => !(await isHealthy(fairweight.origin)));
  await waitFor('PostgreSQL is stopped', isPostgresStopped);
}

/** `node server/cli/start.mjs`, which npm runs in its own place of `sh`. */
function findStartPid({ npm }: FairweightProcess): number {
  const children = readFileSync(`/proc/${npm.pid}/task/${npm.pid}/children`, 'utf8').trim().split(' ');
  return Number(children[0]);
}

describe('npm start', () => {
  // The first start on an empty folder creates the database, the schema and the demo office.
  beforeAll(async () => {
    const first = await launch();
    await first.ready;
    for (const { email } of DEMO_ACCOUNTS) expect(first.output()).toContain(email);
    expect(first.output()).toContain(DEMO_PASSWORD);
    expect(first.output()).toContain(first.origin);
    firstRecords = await countRecords();
    pressCtrlC(first);
    expect(await first.ended).toBe(0);
    await expectNothingLeft(first);
  });

  afterEach(async () => {
    for (const fairweight of launched.splice(0)) {
      pressCtrlC(fairweight);
      await fairweight.ended;
    }
  });

  afterAll(() => {
    for (const used of [folder, untouchedFolder]) {
      // The same folder, except where the postgres account may not enter it.
      rmSync(path.dirname(readCluster(used).cluster), { recursive: true, force: true });
      rmSync(used, { recursive: true, force: true });
    }
  });

  it('is soon ready once everything is in place, and stops service and database when npm alone gets a TERM', async () => {
    const startedAt = performance.now();
    const fairweight = await launch();
    await fairweight.ready;
    console.log(`warm start: ${((performance.now() - startedAt) / 1000).toFixed(1)} s`);
    expect(await isHealthy(fairweight.origin)).toBe(true);
    process.kill(fairweight.npm.pid!, 'SIGTERM');
    await fairweight.ended;
    await expectNothingLeft(fairweight);
  });

  it('starts a killed database again, where the service finds it by itself', async () => {
    const fairweight = await launch();
    await fairweight.ready;
    for (let i = 1; i <= 2; i++) {
      killPostgres();
      await waitFor(
        `PostgreSQL is back for the ${i}. time`,
        () => fairweight.output().split('PostgreSQL is back').length > i,
      );
      await waitFor('the service is well again', () => isHealthy(fairweight.origin));
      expect(await countRecords()).toEqual(firstRecords);
    }
    const version = path.join(readCluster().cluster, 'PG_VERSION');
    renameSync(version, `${version}.away`);
    killPostgres();
    expect(await fairweight.ended).toBe(1);
    renameSync(`${version}.away`, version);
    expect(fairweight.output()).toContain('cannot be started again, so Fairweight stops.');
  });

  it('frees its port after kill -9, and the next start finds the data as it was', async () => {
    const port = await findFreePort();
    const killed = await launch(port);
    await killed.ready;
    const database = readCluster();
    expect(await countRecords()).toEqual(firstRecords);
    process.kill(findStartPid(killed), 'SIGKILL');
    await killed.ended;
    await waitFor('the orphaned service gives its port free', () => isPortFree(port, '127.0.0.1'));

    const next = await launch(port);
    await next.ready;
    expect(readCluster(), 'joins the database that was left running').toEqual(database);
    expect(await countRecords()).toEqual(firstRecords);
    pressCtrlC(next);
    expect(await next.ended).toBe(0);
    await expectNothingLeft(next);
  });

  it('recovers when npm, the start and the database are all killed at once', async () => {
    const killed = await launch();
    await killed.ready;
    killPostgres();
    process.kill(-killed.npm.pid!, 'SIGKILL');
    await killed.ended;
    await waitFor('the orphaned service is gone', async () => !(await isHealthy(killed.origin)));

    const next = await launch();
    await next.ready;
    expect(await isHealthy(next.origin)).toBe(true);
    expect(await countRecords()).toEqual(firstRecords);
  });

  it('refuses a taken port in plain words, shares its database with an instance on another, and the last one out stops it', async () => {
    const port = await findFreePort();
    const first = await launch(port);
    await first.ready;
    const refused = await launch(port);
    expect(await refused.ended).toBe(1);
    expect(refused.output()).toContain(`http://127.0.0.1:${port} is taken`);
    expect(await isHealthy(first.origin)).toBe(true);

    const second = await launch();
    await second.ready;
    pressCtrlC(first);
    expect(await first.ended).toBe(0);
    expect(await isPostgresStopped()).toBe(false);
    expect(await isHealthy(second.origin)).toBe(true);
    pressCtrlC(second);
    expect(await second.ended).toBe(0);
    await expectNothingLeft(second);
  });

  it('leaves nothing half done when it is stopped during its very first start', async () => {
    for (const written of ['Packages:', 'Database:', 'Build:']) {
      const interrupted = await launch(undefined, untouchedFolder);
      await waitFor(written, () => interrupted.output().includes(written));
      pressCtrlC(interrupted);
      expect(await interrupted.ended).toBe(0);
      expect(interrupted.output()).not.toContain('Fairweight is ready');
    }
    const next = await launch(undefined, untouchedFolder);
    await next.ready;
    expect(await countRecords(untouchedFolder)).toEqual(firstRecords);
  });
});
