import pg from 'pg';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Run, ViewProgress } from '#shared/contract/records.ts';
import { MEASURE_IDS, type MeasureId } from '#shared/engine/measures.ts';
import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import { addProject, scaledSweep, SMALL_SWEEP, type OfficeProject } from '../support/office-project.ts';
import { followRun, hasEnded, type RunStream } from '../support/run-stream.ts';
import type { TestOffice } from '../support/office.ts';
import type { SignedIn } from '../support/signed-in.ts';
import { openTestOffice } from '../support/test-office.ts';

/** Some 7 s of work on two threads: long enough to be cancelled in the middle on any machine. */
const LONG_SWEEP = scaledSweep(400, 1801);
const LONG_COUNT = 400 * 1801 * 96;

let office: TestOffice;
let project: OfficeProject;
let engineer: SignedIn;

beforeAll(async () => {
  office = await openTestOffice();
  project = await addProject(office);
  engineer = await office.as('engineer');
});
afterAll(() => office.close());

async function start(definition: SweepDefinition): Promise<Run> {
  const sweepId = await project.addSweep(definition);
  return (await engineer.post(`/sweeps/${sweepId}/runs`).expect(200)).body;
}

const follow = (run: Run, lastEventId?: number) =>
  followRun(office, engineer, {
    runId: run.id,
    ...(lastEventId === undefined ? {} : { lastEventId }),
  });

const isUnderWay = ({ progress }: { progress: ViewProgress }) => progress.evaluated > 0;

describe('a run in work', () => {
  test('shows a front that grows, with partial counts, until it is cancelled', async () => {
    const run = await start(LONG_SWEEP);
    const stream = await follow(run);
    const first = await stream.until(isUnderWay);
    const later = await stream.until(
      ({ progress: { evaluated, result } }) => result !== null && evaluated > first.progress.evaluated,
    );
    expect(later.id).toBeGreaterThan(first.id);
    expect(later.progress).toMatchObject({ state: 'running', sectionCount: LONG_COUNT, message: null });
    expect(later.progress.result!.front.length).toBeGreaterThan(0);
    // The front covers the shards that are done, the count those in work too.
    expect(later.progress.result!.evaluated).toBeLessThanOrEqual(later.progress.evaluated);

    await engineer.post(`/runs/${run.id}/cancel`).expect(200);
    const { progress } = await stream.until(hasEnded);
    stream.close();
    expect(progress.state).toBe('cancelled');
    expect(progress.evaluated).toBeGreaterThanOrEqual(later.progress.evaluated);
    expect(progress.evaluated).toBeLessThan(LONG_COUNT);
    expect(progress.result).toMatchObject({ evaluated: progress.evaluated, sectionCount: LONG_COUNT });
    expect(progress.message).toBe(
      `Cancelled after ${progress.evaluated.toLocaleString('en')} of ${LONG_COUNT.toLocaleString('en')} sections (${(
        progress.evaluated / LONG_COUNT
      ).toLocaleString('en', { style: 'percent', maximumFractionDigits: 1 })})`,
    );
    const after = await engineer.get(`/runs/${run.id}`).expect(200);
    expect(after.body).toMatchObject({ state: 'cancelled', hash: null, evaluated: progress.evaluated });
  });

  test('does not hold up a small one', async () => {
    const long = await start(LONG_SWEEP);
    const longStream = await follow(long);
    await longStream.until(isUnderWay);
    const small = await follow(await start(SMALL_SWEEP));
    expect((await small.until(hasEnded)).progress.state).toBe('finished');
    expect(longStream.events.some(hasEnded)).toBe(false);
    await engineer.post(`/runs/${long.id}/cancel`).expect(200);
    await longStream.until(hasEnded);
    for (const stream of [small, longStream]) stream.close();
  });

  test('is looked at through eight pairs of measures at a time, no more', async () => {
    const run = await start(LONG_SWEEP);
    const open = async (x: MeasureId) =>
      (await engineer.post(`/runs/${run.id}/views`, { x, y: 'widthMm' })).status;
    const measures = MEASURE_IDS.filter((measure) => measure !== 'widthMm').slice(0, 8);
    const statuses: number[] = [];
    for (const measure of measures) statuses.push(await open(measure));
    expect(statuses).toEqual([...measures.slice(1).map(() => 200), 409]);
    expect(await open(measures[0]!)).toBe(200);
    await engineer.post(`/runs/${run.id}/cancel`).expect(200);
    const stream = await follow(run);
    await expect
      .poll(async () =>
        (await engineer.get(`/runs/${run.id}`)).body.views.map(({ state }: ViewProgress) => state),
      )
      .toEqual(measures.map(() => 'cancelled'));
    stream.close();
    expect(await open(measures.at(-1)!)).toBe(200);
    await engineer.post(`/runs/${run.id}/cancel`).expect(200);
  });

  test('that still waits is cancelled with nothing done', async () => {
    // More than the queue takes at once, so that the last one waits.
    const runs: Run[] = [];
    for (let i = 0; i < 5; i++) runs.push(await start(LONG_SWEEP));
    const waiting = runs.at(-1)!;
    const answer = await engineer.post(`/runs/${waiting.id}/cancel`).expect(200);
    expect(answer.body).toMatchObject({ state: 'cancelled', evaluated: 0, elapsedMs: 0 });
    const stream = await follow(waiting);
    expect((await stream.until(hasEnded)).progress.message).toContain('Cancelled after 0 of');
    stream.close();
    for (const run of runs.slice(0, -1)) {
      await engineer.post(`/runs/${run.id}/cancel`).expect(200);
      const rest = await follow(run);
      await rest.until(hasEnded);
      rest.close();
    }
  });

  test('cancelled when it is finished stays finished', async () => {
    const run = await start(SMALL_SWEEP);
    const stream = await follow(run);
    await stream.until(hasEnded);
    stream.close();
    const answer = await engineer.post(`/runs/${run.id}/cancel`).expect(200);
    expect(answer.body.state).toBe('finished');
  });
});

describe('the stream of a run', () => {
  test('is an event stream that no proxy holds back and a client reopens after a second', async () => {
    const stream = await follow(await start(SMALL_SWEEP));
    await stream.until(hasEnded);
    stream.close();
    expect(stream.headers['content-type']).toMatch(/^text\/event-stream/);
    expect(stream.headers['cache-control']).toBe('no-store, no-transform');
    expect(stream.headers['content-encoding']).toBeUndefined();
    expect(stream.raw()).toMatch(/^retry: 1000\n\n/);
  });

  test('tells whoever comes late the state of every view at once, and ids only increase', async () => {
    const run = await start(SMALL_SWEEP);
    const early = await follow(run);
    await early.until(hasEnded);
    const opened = await engineer.post(`/runs/${run.id}/views`, { x: 'depthMm', y: 'widthMm' }).expect(200);
    await early.until((event) => event.progress.viewId === opened.body.viewId && hasEnded(event));
    early.close();
    const ids = early.events.map(({ id }) => id);
    expect(ids).toEqual([...new Set(ids)].sort((a, b) => a - b));
    const late = await follow(run);
    await late.until((event) => event.id === ids.at(-1));
    late.close();
    expect(late.events.map(({ progress }) => progress.state)).toEqual(['finished', 'finished']);
  });

  test('resumed with Last-Event-ID tells only what changed after it', async () => {
    const run = await start(SMALL_SWEEP);
    const first = await follow(run);
    const { id } = await first.until(hasEnded);
    first.close();
    const resumed = await follow(run, id);
    const opened = await engineer.post(`/runs/${run.id}/views`, { x: 'depthMm', y: 'widthMm' }).expect(200);
    await resumed.until(hasEnded);
    resumed.close();
    expect(new Set(resumed.events.map(({ progress }) => progress.viewId))).toEqual(
      new Set([opened.body.viewId]),
    );
    expect(Math.min(...resumed.events.map((event) => event.id))).toBeGreaterThan(id);
  });

  test('with a Last-Event-ID of another run’s begins anew', async () => {
    const run = await start(SMALL_SWEEP);
    const stream = await follow(run, 999_999);
    const { progress } = await stream.until(hasEnded);
    stream.close();
    expect(progress.state).toBe('finished');
  });

  test('survives that the database cuts its listening connection, and misses nothing', async () => {
    const run = await start(LONG_SWEEP);
    const stream = await follow(run);
    await stream.until(isUnderWay);
    await cutConnections(`application_name = 'fairweight-listener'`);
    await engineer.post(`/runs/${run.id}/cancel`).expect(200);
    expect((await stream.until(hasEnded)).progress.state).toBe('cancelled');
    stream.close();
  });

  test('breaks off at worst when all connections are cut, and the run finishes all the same', async () => {
    const run = await start(scaledSweep(60, 901));
    const stream = await follow(run);
    await stream.until(isUnderWay);
    await cutConnections('pid <> pg_backend_pid()');
    const { progress } = await stream
      .until(hasEnded)
      .catch(async () => (await reconnect(run)).until(hasEnded));
    stream.close();
    expect(progress).toMatchObject({ state: 'finished', evaluated: 60 * 901 * 96 });
    const next = await follow(await start(SMALL_SWEEP));
    expect((await next.until(hasEnded)).progress.state).toBe('finished');
    next.close();
  });
});

async function cutConnections(which: string): Promise<void> {
  const admin = new pg.Client({ connectionString: office.databaseUrl });
  await admin.connect();
  await admin.query(
    `select pg_terminate_backend(pid) from pg_stat_activity where datname = current_database() and ${which}`,
  );
  await admin.end();
}

/** As a browser does: again until the server answers with a stream. */
async function reconnect(run: Run): Promise<RunStream> {
  const stream = await follow(run);
  return String(stream.headers['content-type']).startsWith('text/event-stream') ? stream : reconnect(run);
}
