import { eq } from 'drizzle-orm';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Operations } from '#shared/contract/operations.ts';
import type { Run } from '#shared/contract/records.ts';
import { viewShards } from '#server/db/schema/view-shards.ts';
import { addProject, scaledSweep, SMALL_SWEEP, type OfficeProject } from '../support/office-project.ts';
import type { TestOffice } from '../support/office.ts';
import { followRun } from '../support/run-stream.ts';
import type { SignedIn } from '../support/signed-in.ts';
import { openTestOffice } from '../support/test-office.ts';

const SMALL = 2880;
/** Many shards, none of which is waited for. */
const LONG_SWEEP = scaledSweep(400, 1801);

describe('an office at work', () => {
  let office: TestOffice;
  let project: OfficeProject;
  let engineer: SignedIn;
  let admin: SignedIn;
  let run: Run;
  const look = async (): Promise<Operations> => (await admin.get('/operations').expect(200)).body;

  beforeAll(async () => {
    office = await openTestOffice();
    project = await addProject(office);
    [engineer, admin] = [await office.as('engineer'), await office.as('admin')];
    const sweepId = await project.addSweep(LONG_SWEEP);
    run = (await engineer.post(`/sweeps/${sweepId}/runs`).expect(200)).body;
  });
  afterAll(() => office.close());

  test('shows its operator the worker with its heartbeat, the queue and the shards in work', async () => {
    await expect.poll(async () => (await look()).shards.length, { timeout: 15_000 }).toBeGreaterThan(0);
    const { workers, queue, shards, views, load } = await look();
    expect(workers).toEqual([
      expect.objectContaining({ kind: 'service', pid: process.pid, threads: 2, end: null, shardsFailed: 0 }),
    ]);
    expect(workers[0]!.silentMs).toBeLessThan(15_000);
    expect(queue.find(({ kind }) => kind === 'shard')!.waiting).toBeGreaterThan(0);
    expect(shards[0]).toMatchObject({ runId: run.id, processId: workers[0]!.id, beamMark: 'B1' });
    expect(views).toEqual([
      expect.objectContaining({ runId: run.id, state: 'running', startedBy: 'The engineer' }),
    ]);
    expect(load.sections).toBeGreaterThan(0);
  });

  test('refuses to write a shard’s result a second time', async () => {
    const { db } = office.deps;
    const findDone = async () =>
      (await db.select().from(viewShards)).find(({ result }) => result !== null)?.fromIndex;
    await expect.poll(findDone, { timeout: 15_000 }).toBeDefined();
    const again = db
      .update(viewShards)
      .set({ result: Buffer.from('another') })
      .where(eq(viewShards.fromIndex, (await findDone())!));
    await expect(again).rejects.toMatchObject({ cause: { message: 'view_shards.result is frozen' } });
  });

  test('gives its metrics to a program on the machine and to an admin, and to nobody through a proxy', async () => {
    const path = '/api/metrics';
    const { text, headers } = await request(office.origin).get(path).expect(200);
    expect(headers['content-type']).toMatch(/^text\/plain/);
    for (const name of [
      'fairweight_jobs{kind="shard",state="waiting"}',
      'fairweight_worker_sections_per_second{worker=',
      'fairweight_running_sections',
      'fairweight_sections_total',
      'fairweight_http_request_seconds_bucket',
      'process_resident_memory_bytes',
    ])
      expect(text).toContain(name);
    await request(office.origin).get(path).set('x-forwarded-for', '127.0.0.1').expect(401);
    await engineer.get('/metrics').set('forwarded', 'for=127.0.0.1').expect(403);
    await admin.get('/metrics').set('x-forwarded-for', '10.0.0.7').expect(200);
  });

  test('takes a cancelled run up again from what it had done', async () => {
    await engineer.post(`/runs/${run.id}/cancel`).expect(200);
    const stream = await followRun(office, engineer, { runId: run.id });
    const { progress } = await stream.until((event) => event.progress.state === 'cancelled');
    const resumed = await engineer.post(`/runs/${run.id}/resume`).expect(200);
    expect(['queued', 'running']).toContain(resumed.body.state);
    expect(resumed.body.evaluated).toBeGreaterThanOrEqual(progress.evaluated);
    await stream.until(({ progress: { state, evaluated } }) => {
      return state === 'running' && evaluated > progress.evaluated;
    });
    stream.close();
    const again = await engineer.post(`/runs/${run.id}/resume`).expect(200);
    expect(again.body.state).toBe('running');
    await engineer.post(`/runs/${run.id}/cancel`).expect(200);
  });
});

describe('an office without a worker', () => {
  let office: TestOffice;
  let project: OfficeProject;
  let engineer: SignedIn;

  beforeAll(async () => {
    office = await openTestOffice({
      BUILT_IN_WORKER: 'off',
      RUNNING_SECTIONS_PER_PERSON: String(2 * SMALL + 1),
      RUNNING_SECTIONS_PER_OFFICE: String(3 * SMALL - 1),
    });
    project = await addProject(office);
    engineer = await office.as('engineer');
  });
  afterAll(() => office.close());

  const start = async (person: SignedIn) =>
    person.post(`/sweeps/${await project.addSweep(SMALL_SWEEP)}/runs`);

  test('tells runs where they stand, and says that nobody computes them', async () => {
    const first: Run = (await start(engineer)).body;
    const second: Run = (await start(engineer)).body;
    const positionOf = async (run: Run) => {
      const stream = await followRun(office, engineer, { runId: run.id });
      await expect.poll(() => stream.raw(), { timeout: 10_000 }).toContain('event: queue\n');
      stream.close();
      return JSON.parse(/event: queue\ndata: (.*)\n/.exec(stream.raw())![1]!);
    };
    expect(await positionOf(first)).toEqual({ viewId: first.views[0]!.viewId, ahead: 0, workers: 0 });
    expect(await positionOf(second)).toEqual({ viewId: second.views[0]!.viewId, ahead: 1, workers: 0 });
  });

  test('refuses what exceeds the sections of one person or of the office, with both figures, until some end', async () => {
    const own = { sections: 2 * SMALL, limit: 2 * SMALL + 1 };
    const whole = { sections: 2 * SMALL, limit: 3 * SMALL - 1 };
    expect((await engineer.get('/running-load').expect(200)).body).toEqual({ own, office: whole });
    const refused = await start(engineer);
    expect([refused.status, refused.body.error.message]).toEqual([
      409,
      'You would have 8,640 sections under way; the limit for one person is 5,761. Wait for some of your runs, or cancel them.',
    ]);
    const admin = await office.as('admin');
    const full = await start(admin);
    expect([full.status, full.body.error.message]).toEqual([
      409,
      'The office would have 8,640 sections under way; its limit is 8,639. Wait for some of the runs.',
    ]);
    const { views }: Operations = (await admin.get('/operations').expect(200)).body;
    const [{ runId }] = views as [Operations['views'][number]];
    const opened = await (
      await office.as('checker')
    ).post(`/runs/${runId}/views`, { x: 'depthMm', y: 'widthMm' });
    expect([opened.status, opened.body.error.message]).toEqual([409, full.body.error.message]);
    await engineer.post(`/runs/${runId}/cancel`).expect(200);
    expect((await start(admin)).status).toBe(200);
  });
});
