import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { readConfig } from '#server/config.ts';
import { createDatabase, createPool } from '#server/db/client.ts';
import { runViews } from '#server/db/schema/run-views.ts';
import { runs } from '#server/db/schema/runs.ts';
import { startRun } from '#server/features/runs/commands.ts';
import { RunEvents } from '#server/jobs/run-events.ts';
import { createLog } from '#server/log.ts';
import { startServices, type Services } from '#server/services.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { addProject, scaledSweep } from '../support/office-project.ts';
import { createTestDatabase, type TestDatabase } from '../support/test-database.ts';
import { insertPeople, testEnvironment } from '../support/office.ts';

const log = createLog('silent');
const SWEEP = scaledSweep(20, 1801);

let database: TestDatabase;
let pool: ReturnType<typeof createPool>;
let runEvents: RunEvents;
let child: ChildProcess | undefined;
let services: Services | undefined;

beforeAll(async () => {
  database = await createTestDatabase();
  pool = createPool(database.url, log);
  runEvents = new RunEvents({ databaseUrl: database.url, log });
  await runEvents.start();
});
afterAll(async () => {
  child?.kill('SIGKILL');
  await services?.stop();
  await runEvents.stop();
  await pool.end();
  await database.drop();
});

const startService = () =>
  spawn(process.execPath, ['--import', 'tsx', 'server/main.ts'], {
    env: { ...process.env, ...testEnvironment(database.url), PORT: '0' },
    stdio: ['ignore', 'ignore', 'inherit'],
  });

test('a run whose process is killed in the middle is taken up by the next one and finishes the same', async () => {
  const db = createDatabase(pool);
  const ids = await insertPeople(db, 'nobody signs in');
  const project = await addProject({ deps: { db }, idOf: (account) => ids.get(account)! });
  const engineer = { id: ids.get('engineer')!, name: '', email: '', role: 'engineer' } as const;
  const runId = await startRun(db, engineer, await project.addSweep(SWEEP));

  const readView = async () => (await db.select().from(runViews).where(eq(runViews.runId, runId)))[0]!;
  const until = (holds: (view: Awaited<ReturnType<typeof readView>>) => boolean) =>
    new Promise<Awaited<ReturnType<typeof readView>>>((resolve, reject) => {
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

  child = startService();
  const halfDone = await until((view) => view.evaluated > 0);
  expect(halfDone.state).toBe('running');
  child.kill('SIGKILL');
  await once(child, 'exit');
  expect(await readView()).toMatchObject({ state: 'running', workerId: halfDone.workerId });

  services = await startServices(readConfig(testEnvironment(database.url)));
  const finished = await until((view) => view.state === 'finished');
  const [run] = await db.select().from(runs).where(eq(runs.id, runId));
  const problem = { ...run!.definition, basis: run!.basis };
  const { view } = run!.definition;
  const expected = finishResult(problem, view, sweepRange(prepareSweep(problem, view), 0, run!.sectionCount));
  expect(finished).toMatchObject({ hash: expected.hash, evaluated: run!.sectionCount, workerId: null });
  expect(run!.state).toBe('finished');
}, 60_000);
