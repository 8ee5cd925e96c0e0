import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { Run, ViewProgress } from '#shared/contract/records.ts';
import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import type { View } from '#shared/sweep/problem.ts';
import type { ViewResult } from '#shared/sweep/result.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { projects } from '#server/db/schema/projects.ts';
import { runViews } from '#server/db/schema/run-views.ts';
import { addProject, SMALL_SWEEP, type OfficeProject } from '../support/office-project.ts';
import { followRun, hasEnded, type RunEvent } from '../support/run-stream.ts';
import type { TestOffice } from '../support/office.ts';
import type { SignedIn } from '../support/signed-in.ts';
import { openTestOffice } from '../support/test-office.ts';

const COUNTS = Array.from({ length: 20 }, (_, i) => i + 2);
const bars = { kind: 'bars', sizes: ['16', '20', '25', '28', '32'], counts: COUNTS, none: false } as const;
/** 61 widths × 901 depths × 2 strengths × 100 × 100 bar sets = 1,099,220,000 sections. */
const VAST_SWEEP: SweepDefinition = {
  ...SMALL_SWEEP,
  space: {
    ...SMALL_SWEEP.space,
    width: { kind: 'range', from: 300, to: 600, step: 5 },
    depth: { kind: 'range', from: 400, to: 850, step: 0.5 },
    tension: { ...bars, sizes: [...bars.sizes] },
    compression: { ...bars, sizes: [...bars.sizes] },
  },
};
const VAST_SIZE = 61 * 901 * 2 * 100 * 100;
const BY_BOUNDS: SweepDefinition = { ...SMALL_SWEEP, method: 'bounds' };

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

async function until(run: Run, holds: (event: RunEvent) => boolean): Promise<ViewProgress> {
  const stream = await followRun(office, engineer, { runId: run.id });
  const { progress } = await stream.until(holds);
  stream.close();
  return progress;
}
const finish = (run: Run) => until(run, hasEnded);

function sweepAtOnce(run: Run, view: View = run.definition.view): ViewResult {
  const { space, demand, rules } = run.definition;
  const problem = { space, demand, rules, basis: run.basis };
  return finishResult(problem, view, sweepRange(prepareSweep(problem, view), 0, run.sectionCount));
}

describe('a run by bounds', () => {
  test('has the front that evaluating every section has, and leaves out what it did not count', async () => {
    const run = await start(BY_BOUNDS);
    expect(run).toMatchObject({ method: 'bounds', sectionCount: 2880, feasible: null });
    const { state, result, feasible, evaluated, search } = await finish(run);
    const expected = sweepAtOnce(run);
    expect(state).toBe('finished');
    expect(result!.front).toEqual(expected.front);
    expect(result!.edges).toEqual(expected.edges);
    expect(expected.front.length).toBeGreaterThan(3);
    expect([feasible, result!.feasible, result!.cannotFit, result!.axisCounts]).toEqual([
      null,
      null,
      null,
      null,
    ]);
    expect([result!.failures, result!.density]).toEqual([[], []]);
    expect({ band: result!.band, isBandCut: result!.isBandCut }).toEqual({
      band: expected.band,
      isBandCut: expected.isBandCut,
    });
    expect(result!.bounds!.isProven).toBe(true);
    expect(evaluated + result!.bounds!.provenUnnecessary).toBe(2880);
    expect(search).toMatchObject({ boxesOpen: 0, provenUnnecessary: result!.bounds!.provenUnnecessary });
    expect(result!.best).toEqual(
      [expected.view.x, expected.view.y].map((measure) => ({
        ...expected.best.find((one) => one.measure === measure),
        index: expect.any(Number),
      })),
    );
  });

  test('gives the same hash again, and shows any other pair of measures', async () => {
    const [one, other] = [await start(BY_BOUNDS), await start(BY_BOUNDS)];
    const [first, second] = [await finish(one), await finish(other)];
    expect(second.result!.hash).toBe(first.result!.hash);
    const view = { x: 'costPerM', y: 'curvatureDuctility' } as const;
    const opened = await engineer.post(`/runs/${one.id}/views`, view).expect(200);
    const { result } = await until(one, (event) => hasEnded(event) && event.progress.view.x === 'costPerM');
    expect(result!.front).toEqual(sweepAtOnce(one, view).front);
    expect(opened.body.view).toEqual(view);
    await engineer.post(`/runs/${one.id}/views`, { ...view, z: 'depthMm' }).expect(400);
  });

  test('of a sweep in which nothing meets the checks says so of the whole space', async () => {
    const run = await start({ ...BY_BOUNDS, demand: { ...SMALL_SWEEP.demand, muNmm: 9e9 } });
    const { result } = await finish(run);
    expect(result).toMatchObject({ front: [], best: [], bounds: { isProven: true } });
    expect(result!.evaluated + result!.bounds!.provenUnnecessary).toBe(2880);
  });

  test('hides costs from whoever may not see them', async () => {
    const run = await start({ ...BY_BOUNDS, view: { x: 'depthMm', y: 'costPerM' } });
    const { viewId } = await finish(run);
    const viewer = await office.as('viewer');
    await viewer.get(`/runs/${run.id}/views/${viewId}`).expect(403);
  });

  test('is started and stopped by who may run sweeps', async () => {
    const sweepId = await project.addSweep(BY_BOUNDS);
    const run = await start(BY_BOUNDS);
    for (const account of ['checker', 'estimator', 'viewer'] as const) {
      const person = await office.as(account);
      await person.post(`/sweeps/${sweepId}/runs`).expect(403);
      await person.post(`/runs/${run.id}/cancel`).expect(403);
    }
  });
});

describe('a space of a billion sections', () => {
  let whole: ViewProgress;
  let run: Run;

  test('is searched by bounds without being asked, and its sections are found, judged and pinned', async () => {
    run = await start(VAST_SWEEP);
    expect(run).toMatchObject({ method: 'bounds', sectionCount: VAST_SIZE });
    const load = (await engineer.get('/running-load').expect(200)).body;
    expect(load.own.sections).toBeLessThan(VAST_SIZE / 10);
    whole = await finish(run);
    const result = whole.result!;
    expect(result.evaluated + result.bounds!.provenUnnecessary).toBe(VAST_SIZE);
    expect(result.evaluated).toBeLessThan(VAST_SIZE / 100);
    const { index } = result.front.at(-1)!;
    const { body } = await engineer.get(`/runs/${run.id}/sections/${index}`).expect(200);
    expect(body.evaluation.checks.every((check: { passes: boolean }) => check.passes)).toBe(true);
    expect(body.evaluation.measures.depthMm).toBe(result.front.at(-1)!.y);
    await engineer
      .post(`/projects/${project.projectId}/candidates`, {
        beamId: project.beamId,
        source: { kind: 'run', runId: run.id, index },
        note: '',
      })
      .expect(200);
  });

  test('has no section at random that beats its front', () => {
    const { space, demand, rules, view } = run.definition;
    const prepared = prepareSweep({ space, demand, rules, basis: run.basis }, view);
    const { front } = whole.result!;
    let feasible = 0;
    for (let i = 0; i < 60; i++) {
      const from = Math.floor((VAST_SIZE / 60) * i + ((i * 7919) % 1000) * 1000);
      const part = sweepRange(prepared, from, from + 20_000);
      feasible += part.feasible;
      for (const { x, y } of part.front) expect(front.some((best) => best.x <= x && best.y <= y)).toBe(true);
    }
    expect(feasible).toBeGreaterThan(0);
  });

  test('stopped on the way keeps the front it has, not proven, and resumed comes to the same one', async () => {
    const again = await start(VAST_SWEEP);
    await until(again, ({ progress }) => progress.state === 'running');
    await engineer.post(`/runs/${again.id}/cancel`).expect(200);
    const stopped = await finish(again);
    expect(stopped.state).toBe('cancelled');
    expect(stopped.message).toContain('the front is not proven');
    expect(stopped.result?.bounds?.isProven ?? false).toBe(false);
    await engineer.post(`/runs/${again.id}/resume`).expect(200);
    const { result } = await until(again, ({ progress }) => progress.state === 'finished');
    expect(result!.hash).toBe(whole.result!.hash);
    expect(result!.evaluated + result!.bounds!.provenUnnecessary).toBe(VAST_SIZE);
  });

  test('begun anew with what it had found before comes to the same front', async () => {
    const { db } = office.deps;
    const again = await start(VAST_SWEEP);
    await engineer.post(`/runs/${again.id}/cancel`).expect(200);
    const { viewId } = await finish(again);
    const some = whole.result!.front.filter((_, i) => i % 2 === 0);
    const result = { ...whole.result!, front: some, bounds: { ...whole.result!.bounds!, isProven: false } };
    await db.update(runViews).set({ result }).where(eq(runViews.id, viewId));
    await engineer.post(`/runs/${again.id}/resume`).expect(200);
    const finished = await until(again, ({ progress }) => progress.state === 'finished');
    expect(finished.result!.front).toEqual(whole.result!.front);
  });
});

describe('a search by bounds is refused', () => {
  test('where μφ is read off the full curve, which has no bounds', async () => {
    const { db } = office.deps;
    const curved = await addProject(office);
    const [row] = await db.select().from(projects).where(eq(projects.id, curved.projectId));
    const designBasis = { ...row!.designBasis, ductilityMeasure: 'curve-first-yield' } as const;
    await db.update(projects).set({ designBasis }).where(eq(projects.id, curved.projectId));
    const sweepId = await curved.addSweep(VAST_SWEEP);
    const { body } = await engineer.post(`/sweeps/${sweepId}/runs`).expect(422);
    expect(body.error.message).toContain('has no bounds');
  });
});
