import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import path from 'node:path';
import { eq } from 'drizzle-orm';
import { afterAll, afterEach, beforeAll, beforeEach, expect, test } from 'vitest';
import { PROJECT_ROOT } from '#server/cli/project-paths.mjs';
import { readConfig } from '#server/config.ts';
import { createDatabase, createPool } from '#server/db/client.ts';
import { runViews } from '#server/db/schema/run-views.ts';
import { runs } from '#server/db/schema/runs.ts';
import { cancelRun, startRun } from '#server/features/runs/commands.ts';
import { requireRun } from '#server/features/runs/queries.ts';
import { RunEvents } from '#server/jobs/run-events.ts';
import { createLog } from '#server/log.ts';
import { startServices, type Services } from '#server/services.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { buildForDrills } from '../support/drill-office.ts';
import { addProject, scaledSweep } from '../support/office-project.ts';
import { createTestDatabase, type TestDatabase } from '../support/test-database.ts';
import { insertPeople } from '../support/office.ts';
import { testEnvironment } from '../support/test-environment.ts';

const log = createLog('silent');
const SWEEP = scaledSweep(20, 1801);

let server: Awaited<ReturnType<typeof buildForDrills>>;
let database: TestDatabase;
let pool: ReturnType<typeof createPool>;
let runEvents: RunEvents;
let child: ChildProcess | undefined;
let services: Services | undefined;

beforeAll(async () => {
  server = await buildForDrills();
});
afterAll(() => server.remove());
beforeEach(async () => {
  database = await createTestDatabase();
  pool = createPool(database.url, log);
  runEvents = new RunEvents({ databaseUrl: database.url, log });
  await runEvents.start();
});
afterEach(async () => {
  child?.kill('SIGKILL');
  await services?.stop();
  services = undefined;
  await runEvents.stop();
  await pool.end();
  await database.drop();
});

const startService = () =>
  spawn(process.execPath, [path.join(server.folder, 'main.js')], {
    cwd: PROJECT_ROOT,
    env: { ...process.env, ...testEnvironment(database.url), PORT: '0' },
    stdio: ['ignore', 'ignore', 'inherit'],
  });

async function startOfficeRun() {
  const db = createDatabase(pool);
  const ids = await insertPeople(db, 'nobody signs in');
  const project = await addProject({ deps: { db }, idOf: (account) => ids.get(account)! });
  const engineer = { id: ids.get('engineer')!, name: '', email: '', role: 'engineer' } as const;
  const runId = await startRun(db, engineer, {
    sweepId: await project.addSweep(SWEEP),
    limits: { person: Infinity, office: Infinity },
  });
  const readRun = async () => (await db.select().from(runs).where(eq(runs.id, runId)))[0]!;
  const readView = async () => (await db.select().from(runViews).where(eq(runViews.runId, runId)))[0]!;
  type View = Awaited<ReturnType<typeof readView>>;
  const until = (holds: (view: View) => boolean) =>
    new Promise<View>((resolve, reject) => {
      const check = () => {
        readView().then((view) => {
          if (!holds(view)) return;
          unfollow();
          resolve(view);
        }, reject);
      };
      const unfollow = runEvents.follow(runId, { onViewChanged: check, onGap: check, onClosed: reject });
      check();
    });
  return {
    readRun,
    readView,
    until,
    cancel: async () => cancelRun(db, engineer, await requireRun(db, engineer, runId)),
  };
}

function sweepAtOnce({ definition, basis, sectionCount }: typeof runs.$inferSelect) {
  const problem = { ...definition, basis };
  const prepared = prepareSweep(problem, definition.view);
  return finishResult(problem, definition.view, sweepRange(prepared, 0, sectionCount));
}

/** Killed, the process leaves its job locked; asked to stop, it puts the job back. */
const ENDINGS = [
  { signal: 'SIGKILL', leaves: 'running' },
  { signal: 'SIGTERM', leaves: 'queued' },
] as const;

test.each(ENDINGS)(
  'a run whose process gets $signal in the middle is left $leaves, and the next process finishes it the same',
  async ({ signal, leaves }) => {
    const { readRun, readView, until } = await startOfficeRun();
    child = startService();
    await until((view) => view.evaluated > 0);
    child.kill(signal);
    await once(child, 'exit');
    expect((await readView()).state).toBe(leaves);

    services = await startServices(readConfig(testEnvironment(database.url)));
    const finished = await until((view) => view.state === 'finished');
    const run = await readRun();
    const expected = sweepAtOnce(run);
    expect(expected.feasible).toBeGreaterThan(1000);
    expect(finished).toMatchObject({
      hash: expected.hash,
      evaluated: run.sectionCount,
      feasible: expected.feasible,
    });
    expect(run.state).toBe('finished');
  },
  120_000,
);

test('a run cancelled while nobody computes it keeps what the killed process had done', async () => {
  const { readView, until, cancel } = await startOfficeRun();
  child = startService();
  await until((view) => view.evaluated > 0);
  child.kill('SIGKILL');
  await once(child, 'exit');
  const left = await readView();
  await cancel();
  services = await startServices(readConfig(testEnvironment(database.url)));
  const { evaluated, result } = await until((view) => view.state === 'cancelled');
  expect(evaluated).toBe(left.evaluated);
  expect(result).toEqual(left.result);
}, 120_000);

test('a run whose job ends its process each time is given up, and says so', async () => {
  const { until } = await startOfficeRun();
  await pool.query('update graphile_worker._private_jobs set attempts = max_attempts');
  services = await startServices(readConfig(testEnvironment(database.url)));
  const { message } = await until((view) => view.state === 'failed');
  expect(message).toContain('stopped unexpectedly');
});
