import { rmSync } from 'node:fs';
import path from 'node:path';
import { setTimeout as delay } from 'node:timers/promises';
import { sql } from 'drizzle-orm';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { joinPostgres, leavePostgres } from '#server/cli/postgres.mjs';
import { ensurePostgresPrograms, runPostgresProgram } from '#server/cli/postgres-programs.mjs';
import { TEST_FOLDER } from '#server/cli/project-paths.mjs';
import { migrateDatabase } from '#server/db/migrate.ts';
import { SHARD_TASK } from '#server/jobs/compute-jobs.ts';
import { mergeChunks } from '#shared/sweep/merge.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import type { ViewResult } from '#shared/sweep/result.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { buildForDrills, DrillOffice, type DrillRun } from '../support/drill-office.ts';
import { scaledSweep } from '../support/office-project.ts';
import { createTestDatabase, type TestDatabase } from '../support/test-database.ts';

/** Four shards: some second of two threads. */
const SWEEP = scaledSweep(26, 1801);
const SECTIONS = 26 * 1801 * 96;
/** A limit for a hang, not for speed. */
const PATIENCE_MS = 300_000;

/** Moments are random and can be had again: DRILL_SEED=… npx vitest run tests/server/drills.test.ts */
const SEED = Number(process.env.DRILL_SEED ?? 1 + (Date.now() % 1_000_000));
let lastRandom = SEED;
/** Park and Miller's sequence, 0 to 1. */
const random = () => (lastRandom = (lastRandom * 48_271) % 2_147_483_647) / 2_147_483_647;
const randomShare = () => Math.floor(random() * 0.9 * SECTIONS);

let server: Awaited<ReturnType<typeof buildForDrills>>;
let whole: ViewResult;
let database: TestDatabase;
let office: DrillOffice;

beforeAll(async () => {
  console.log(`drills with DRILL_SEED=${SEED}`);
  server = await buildForDrills();
});
afterAll(() => server.remove());
beforeEach(async () => {
  database = await createTestDatabase();
  office = await DrillOffice.open(database.url, server.folder);
});
afterEach(async () => {
  await office.close();
  await database.drop();
});

/** What one sweep over these ranges gives on this thread: nothing lost, nothing doubled. */
async function sweepAtOnce(run: DrillRun, ranges: readonly (readonly [number, number])[]) {
  const { definition, basis } = await run.read();
  const problem = { ...definition, basis };
  const prepared = prepareSweep(problem, definition.view);
  const chunk = ranges.map(([from, to]) => sweepRange(prepared, from, to)).reduce(mergeChunks);
  return finishResult(problem, definition.view, chunk);
}

async function expectWhole(run: DrillRun): Promise<void> {
  const finished = await run.until((view) => view.state === 'finished' || view.state === 'failed');
  whole ??= await sweepAtOnce(run, [[0, SECTIONS]]);
  expect(whole.feasible).toBeGreaterThan(10_000);
  expect(finished).toMatchObject({
    state: 'finished',
    hash: whole.hash,
    evaluated: SECTIONS,
    merged: SECTIONS,
    feasible: whole.feasible,
    message: null,
  });
  expect(finished.result).toEqual(JSON.parse(JSON.stringify(whole)));
  expect((await run.read()).state).toBe('finished');
  expect(await run.readShards()).toEqual([]);
}

describe('the result of a run is the same', () => {
  test(
    'from one thread of one worker, and from three worker processes',
    async () => {
      const one = office.start('worker', { COMPUTE_THREADS: '1' });
      await expectWhole(await office.startRun(SWEEP));
      await office.kill(one, 'SIGTERM');
      for (let i = 0; i < 3; i++) office.start('worker', { COMPUTE_THREADS: String(1 + (i % 2)) });
      await expectWhole(await office.startRun(SWEEP));
    },
    PATIENCE_MS,
  );

  test(
    'when workers and the service are killed in the middle of shards, and others take over',
    async () => {
      const children = [office.start('main'), office.start('worker')];
      const run = await office.startRun(SWEEP);
      for (const program of ['main', 'worker', 'main', 'worker'] as const) {
        const enough = randomShare();
        await run.until((view) => view.evaluated >= enough || view.state === 'finished');
        await delay(random() * 30);
        const [victim] = children.splice(random() < 0.5 ? 0 : 1, 1);
        await office.kill(victim!);
        children.push(office.start(program));
      }
      await expectWhole(run);
    },
    PATIENCE_MS,
  );

  test(
    'when workers are stopped in order, without anything computed twice',
    async () => {
      let worker = office.start('worker');
      const run = await office.startRun(SWEEP);
      for (let i = 0; i < 2; i++) {
        const enough = randomShare();
        await run.until((view) => view.evaluated >= enough || view.state === 'finished');
        const before = (await run.readView()).evaluated;
        await office.kill(worker, 'SIGTERM');
        const { state: left, evaluated } = await run.readView();
        expect(evaluated).toBeGreaterThanOrEqual(before);
        expect(['queued', 'finished']).toContain(left);
        worker = office.start('worker');
      }
      await expectWhole(run);
    },
    PATIENCE_MS,
  );

  test(
    'for two people at once, when the queue hands every shard out twice',
    async () => {
      const theirs = [await office.startRun(SWEEP, 'engineer'), await office.startRun(SWEEP, 'admin')];
      await office.db.execute(sql`
        select graphile_worker.add_job(${SHARD_TASK}, payload) from graphile_worker._private_jobs`);
      for (let i = 0; i < 2; i++) office.start('worker');
      for (const run of theirs) await expectWhole(run);
    },
    PATIENCE_MS,
  );

  test(
    'when it is cancelled at any moment and resumed, and what is kept meanwhile is what was done',
    async () => {
      office.start('worker');
      const run = await office.startRun(SWEEP);
      for (let i = 0; i < 3; i++) {
        const enough = randomShare();
        await run.until((view) => view.evaluated >= enough || view.state === 'finished');
        await run.cancel();
        const {
          state: end,
          evaluated,
          result,
          message,
        } = await run.until((view) => view.finishedAt !== null);
        if (end === 'finished') break;
        expect(end).toBe('cancelled');
        expect(message).toContain(`Cancelled after ${evaluated.toLocaleString('en')} of `);
        const done = (await run.readShards()).filter((shard) => shard.result !== null);
        const ranges = done.map(({ fromIndex, toIndex }) => [fromIndex, toIndex] as const);
        expect(ranges.reduce((sum, [from, to]) => sum + to - from, 0)).toBe(evaluated);
        if (ranges.length > 0) expect(result!.hash).toBe((await sweepAtOnce(run, ranges)).hash);
        await run.resume();
      }
      await expectWhole(run);
    },
    PATIENCE_MS,
  );
});

describe('a restart of PostgreSQL', () => {
  const folder = path.join(TEST_FOLDER, `drill-postgres-${process.pid}`);
  let cluster: string | undefined;
  afterAll(async () => {
    await leavePostgres(folder);
    if (cluster !== undefined) rmSync(cluster, { recursive: true, force: true });
    rmSync(folder, { recursive: true, force: true });
  });

  test(
    'in the middle of a run costs time and nothing else',
    async () => {
      const own = await joinPostgres(folder, { isDisposable: true });
      ({ cluster } = own);
      await migrateDatabase(own.url);
      const there = await DrillOffice.open(own.url, server.folder);
      try {
        there.start('main');
        there.start('worker');
        const run = await there.startRun(SWEEP);
        const enough = randomShare();
        await run.until((view) => view.evaluated >= enough);
        await restart(own.cluster);
        await expectWhole(run);
      } finally {
        await there.close();
      }
    },
    PATIENCE_MS,
  );
});

/** At once, as after a crash: open transactions are lost. */
async function restart(dataFolder: string): Promise<void> {
  const pgCtl = path.join(await ensurePostgresPrograms(), 'pg_ctl');
  const command = ['-D', dataFolder, '-m', 'immediate', '-w', '-l', `${dataFolder}.log`, 'restart'];
  const { code } = await runPostgresProgram(pgCtl, command, { stdio: 'ignore' });
  expect(code).toBe(0);
}
