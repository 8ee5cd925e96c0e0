import { randomUUID } from 'node:crypto';
import { eq, inArray } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { MAX_SECTIONS_PER_RUN } from '#shared/sweep/run-method.ts';
import type { Run, ViewProgress } from '#shared/contract/records.ts';
import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import type { View } from '#shared/sweep/problem.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { runs } from '#server/db/schema/runs.ts';
import { addProject, SMALL_SWEEP, type OfficeProject } from '../support/office-project.ts';
import { parseCsv, readTable } from '../support/read-table.ts';
import { followRun, hasEnded } from '../support/run-stream.ts';
import type { TestOffice } from '../support/office.ts';
import type { SignedIn } from '../support/signed-in.ts';
import { openTestOffice } from '../support/test-office.ts';

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
  const answer = await engineer.post(`/sweeps/${sweepId}/runs`).expect(200);
  return answer.body;
}

async function finish(run: Run): Promise<ViewProgress> {
  const stream = await followRun(office, engineer, { runId: run.id });
  const { progress } = await stream.until(hasEnded);
  stream.close();
  return progress;
}

const runOf = async (id: string): Promise<Run> => (await engineer.get(`/runs/${id}`).expect(200)).body;

/** The oracle: the whole range in one go on this thread. */
function sweepAtOnce(run: Run, view: View = run.definition.view) {
  const { space, demand, rules } = run.definition;
  const problem = { space, demand, rules, basis: run.basis };
  return finishResult(problem, view, sweepRange(prepareSweep(problem, view), 0, run.sectionCount));
}

describe('a run', () => {
  test('ends with what one sweep over the whole range gives, hash and all', async () => {
    const run = await start(SMALL_SWEEP);
    expect(run).toMatchObject({ sectionCount: 2880, number: 1 });
    const progress = await finish(run);
    const expected = sweepAtOnce(run);
    expect(progress.state).toBe('finished');
    expect(progress.result).toEqual(JSON.parse(JSON.stringify(expected)));
    expect(expected.front.length).toBeGreaterThan(3);
    expect(expected.feasible).toBeGreaterThan(100);
    const after = await runOf(run.id);
    expect(after).toMatchObject({
      state: 'finished',
      hash: expected.hash,
      evaluated: 2880,
      feasible: expected.feasible,
      frontCount: expected.front.length,
    });
  });

  test('keeps the basis and rates it was started with', async () => {
    const run = await start(SMALL_SWEEP);
    await finish(run);
    const dearer = { ...run.basis.rates!, steelPerKg: 99, source: 'later' };
    const estimator = await office.as('estimator');
    await estimator.put(`/projects/${project.projectId}/price-book`, dearer).expect(200);
    expect((await runOf(run.id)).basis).toEqual(run.basis);
    const section = await engineer.get(`/runs/${run.id}/sections/17`).expect(200);
    const { demand, rules } = run.definition;
    const again = evaluateSection(section.body.section, { basis: run.basis, demand, rules });
    expect(section.body.evaluation).toEqual(JSON.parse(JSON.stringify(again)));
    await estimator
      .put(`/projects/${project.projectId}/price-book`, { ...run.basis.rates!, source: 'back' })
      .expect(200);
  });

  test('in which no section meets the checks finishes with an empty front and counts of the reasons', async () => {
    const run = await start({ ...SMALL_SWEEP, demand: { ...SMALL_SWEEP.demand, muNmm: 9e9 } });
    const { state, result, feasible } = await finish(run);
    expect({ state, feasible, front: result!.front }).toEqual({ state: 'finished', feasible: 0, front: [] });
    const strength = result!.failures.find(({ check }) => check === 'strength')!;
    expect(strength.failed + result!.cannotFit!).toBe(2880);
  });

  test('in which every section meets the checks counts them all, Mu = 0 included', async () => {
    const { space, demand } = SMALL_SWEEP;
    const run = await start({
      ...SMALL_SWEEP,
      demand: { ...demand, muNmm: 0, ductilityTarget: 0 },
      space: {
        ...space,
        width: { kind: 'list', values: [400] },
        depth: { kind: 'list', values: [400] },
        tension: { kind: 'bars', sizes: ['25'], counts: [3, 4], none: false },
      },
    });
    const { result } = await finish(run);
    expect(result).toMatchObject({ sectionCount: 16, evaluated: 16, feasible: 16, cannotFit: 0 });
  });

  test('numbers the runs of a sweep one after the other, also when they are started at once', async () => {
    const sweepId = await project.addSweep(SMALL_SWEEP);
    const answers = await Promise.all(
      Array.from({ length: 5 }, () => engineer.post(`/sweeps/${sweepId}/runs`).expect(200)),
    );
    expect(answers.map((answer) => answer.body.number).sort()).toEqual([1, 2, 3, 4, 5]);
    for (const answer of answers) await finish(answer.body);
  });
});

describe('a run is refused', () => {
  test('with the count and the axis to coarsen when each of five billion sections is to be evaluated', async () => {
    const { space } = SMALL_SWEEP;
    const sweepId = await project.addSweep({
      ...SMALL_SWEEP,
      method: 'every-section',
      space: {
        ...space,
        width: { kind: 'range', from: 200, to: 1199, step: 1 },
        depth: { kind: 'range', from: 300, to: 1499, step: 1 },
        tension: {
          kind: 'bars',
          sizes: ['20', '25', '28'],
          counts: Array.from({ length: 15 }, (_, i) => i + 1),
          none: false,
        },
        compression: {
          kind: 'bars',
          sizes: ['20', '25'],
          counts: Array.from({ length: 23 }, (_, i) => i + 1),
          none: true,
        },
      },
    });
    const { status, body } = await engineer.post(`/sweeps/${sweepId}/runs`);
    expect(status).toBe(422);
    expect(body.error.code).toBe('too-many-sections');
    expect(1000 * 1200 * 2 * 45 * 47).toBe(5_076_000_000);
    expect(body.error.message).toContain('5,076,000,000');
    expect(body.error.message).toContain(MAX_SECTIONS_PER_RUN.toLocaleString('en-US'));
    expect(body.error.issues[0].path).toEqual(['definition', 'space', 'depth', 'step']);
  });

  test('when a measure it compares by has no value, naming the field and what is missing', async () => {
    const poor = await addProject(office, null);
    const byCost = { ...SMALL_SWEEP, view: { x: 'costPerM', y: 'co2eKgPerM' } } as const;
    const cost = await engineer.post(`/sweeps/${await poor.addSweep(byCost)}/runs`).expect(400);
    expect(cost.body.error.issues).toEqual([
      { path: ['definition', 'view', 'x'], message: expect.stringMatching(/steel.*formwork.*28 MPa/) },
      { path: ['definition', 'view', 'y'], message: expect.stringMatching(/steel.*28 MPa/) },
    ]);
    const noMoment = {
      ...SMALL_SWEEP,
      demand: { ...SMALL_SWEEP.demand, muNmm: null },
      view: { x: 'steelKgPerM', y: 'utilisation' },
    } as const;
    const utilisation = await engineer.post(`/sweeps/${await poor.addSweep(noMoment)}/runs`).expect(400);
    expect(utilisation.body.error.issues[0].path).toEqual(['definition', 'view', 'y']);
  });

  test('when it names a bar that the project’s standard does not have', async () => {
    const tension = { kind: 'bars', sizes: ['20', '#8'], counts: [3], none: false } as const;
    const sweepId = await project.addSweep({
      ...SMALL_SWEEP,
      space: { ...SMALL_SWEEP.space, tension: { ...tension, sizes: [...tension.sizes], counts: [3] } },
    });
    const { body } = await engineer.post(`/sweeps/${sweepId}/runs`).expect(400);
    expect(body.error.issues[0].path).toEqual(['definition', 'space', 'tension', 'sizes', 1]);
    expect(body.error.issues[0].message).toContain('#8');
  });

  test('to whoever may not start one, or is not on the project', async () => {
    const sweepId = await project.addSweep(SMALL_SWEEP);
    for (const account of ['checker', 'estimator', 'viewer'] as const) {
      const person = await office.as(account);
      await person.post(`/sweeps/${sweepId}/runs`).expect(403);
    }
    const outsider = await office.as('outsider');
    await outsider.post(`/sweeps/${sweepId}/runs`).expect(404);
  });
});

describe('views of a run', () => {
  test.for<View>([
    { x: 'concreteM3PerM', y: 'curvatureDuctility' },
    { x: 'concreteM3PerM', y: 'curvatureDuctility', z: 'designStrengthNmm' },
  ])('are computed once from the frozen inputs and found again: %o', async (view) => {
    const run = await start(SMALL_SWEEP);
    await finish(run);
    const opened = await engineer.post(`/runs/${run.id}/views`, view).expect(200);
    const stream = await followRun(office, engineer, { runId: run.id });
    const { progress } = await stream.until(
      (event) => hasEnded(event) && event.progress.viewId === opened.body.viewId,
    );
    stream.close();
    const expected = sweepAtOnce(run, view);
    expect(progress.view).toEqual(view);
    expect(progress.result!.hash).toBe(expected.hash);
    expect(progress.result!.frontInThree).toEqual(expected.frontInThree);
    const again = await engineer.post(`/runs/${run.id}/views`, view).expect(200);
    expect(again.body).toEqual(progress);
    expect((await engineer.get(`/runs/${run.id}/views/${progress.viewId}`).expect(200)).body).toEqual(
      progress,
    );
    expect((await runOf(run.id)).views).toHaveLength(2);
  });

  test('by a pair and by the same pair with a third measure are two, with one line and one cloud', async () => {
    const run = await start(SMALL_SWEEP);
    await finish(run);
    const { x, y } = run.definition.view;
    const opened = await engineer.post(`/runs/${run.id}/views`, { x, y, z: 'widthMm' }).expect(200);
    const own = await engineer.post(`/runs/${run.id}/views`, { x, y, z: null }).expect(200);
    expect(own.body.viewId).toBe(run.views[0]!.viewId);
    expect(opened.body.viewId).not.toBe(own.body.viewId);
    const stream = await followRun(office, engineer, { runId: run.id });
    const { progress } = await stream.until(
      (event) => hasEnded(event) && event.progress.viewId === opened.body.viewId,
    );
    stream.close();
    const { front, density, frontInThree } = progress.result!;
    expect({ front, density }).toEqual({ front: own.body.result.front, density: own.body.result.density });
    expect(frontInThree!.count).toBeGreaterThan(front.length);
    expect((await runOf(run.id)).state).toBe('finished');

    const listed = async (query: string) => {
      const { text } = await engineer.get(`/runs/${run.id}/sections.csv?list=front&x=${x}&y=${y}${query}`);
      return readTable(parseCsv(Buffer.from(text))).rows.map((row) => Number(row['Section']));
    };
    expect(await listed('&z=widthMm')).toEqual(frontInThree!.points.map(({ index }) => index));
    // At one width the third measure tells nothing: what is left is a front of two.
    expect(await listed('&z=widthMm&f=widthMm:300~300')).toEqual(await listed('&f=widthMm:300~300'));
  });

  test('opened by several at once are one', async () => {
    const run = await start(SMALL_SWEEP);
    const view = { x: 'depthMm', y: 'widthMm' };
    const answers = await Promise.all(
      Array.from({ length: 5 }, () => engineer.post(`/runs/${run.id}/views`, view).expect(200)),
    );
    expect(new Set(answers.map((answer) => answer.body.viewId)).size).toBe(1);
  });

  test('of equal or unknown measures, or without a value, are refused at the field', async () => {
    const poor = await addProject(office, null);
    const answer = await engineer.post(`/sweeps/${await poor.addSweep(SMALL_SWEEP)}/runs`).expect(200);
    const path = `/runs/${answer.body.id}/views`;
    const same = await engineer.post(path, { x: 'depthMm', y: 'depthMm' }).expect(400);
    expect(same.body.error.issues[0].path).toEqual(['y']);
    const third = await engineer.post(path, { x: 'depthMm', y: 'widthMm', z: 'widthMm' }).expect(400);
    expect(third.body.error.issues[0].path).toEqual(['z']);
    const unknown = await engineer.post(path, { x: 'beauty', y: 'depthMm' }).expect(400);
    expect(unknown.body.error.issues[0].path).toEqual(['x']);
    const cost = await engineer.post(path, { x: 'depthMm', y: 'costPerM' }).expect(400);
    expect(cost.body.error.issues[0].path).toEqual(['y']);
    const byCost = await engineer.post(path, { x: 'depthMm', y: 'widthMm', z: 'costPerM' }).expect(400);
    expect(byCost.body.error.issues[0].path).toEqual(['z']);
  });
});

describe('the runs of one person', () => {
  test('are fifty at most under way, whatever is finished', async () => {
    const { db } = office.deps;
    const run = await start(SMALL_SWEEP);
    await finish(run);
    const [row] = await db.select().from(runs).where(eq(runs.id, run.id));
    const waiting = Array.from({ length: 50 }, (_, i) => ({
      ...row!,
      id: randomUUID(),
      number: 100 + i,
      state: 'queued' as const,
    }));
    await db.insert(runs).values(waiting);
    const again = () => engineer.post(`/sweeps/${run.sweepId}/runs`);
    const refused = await again().expect(409);
    expect(refused.body.error.message).toBe(
      'You have 50 runs under way. Wait for some of them, or cancel them.',
    );
    await (await office.as('admin')).post(`/sweeps/${run.sweepId}/runs`).expect(200);
    await db.update(runs).set({ state: 'cancelled' }).where(eq(runs.id, waiting[0]!.id));
    await again().expect(200);
    const ids = waiting.map(({ id }) => id);
    await db.update(runs).set({ state: 'cancelled' }).where(inArray(runs.id, ids));
  });
});

describe('sections of a run', () => {
  test('beyond the space, or that are no number, do not exist', async () => {
    const run = await start(SMALL_SWEEP);
    await engineer.get(`/runs/${run.id}/sections/2879`).expect(200);
    for (const index of ['2880', '-1', '1.5', 'first', '1e400'])
      await engineer.get(`/runs/${run.id}/sections/${index}`).expect(404);
  });
});

describe('another project’s run', () => {
  test('does not exist for an outsider, whatever is asked of it', async () => {
    const run = await start(SMALL_SWEEP);
    const outsider = await office.as('outsider');
    const [{ viewId }] = run.views as [Run['views'][number]];
    await outsider.get(`/runs/${run.id}`).expect(404);
    await outsider.get(`/runs/${run.id}/events`).expect(404);
    await outsider.get(`/runs/${run.id}/views/${viewId}`).expect(404);
    await outsider.get(`/runs/${run.id}/sections/0`).expect(404);
    await outsider.post(`/runs/${run.id}/views`, { x: 'depthMm', y: 'widthMm' }).expect(404);
    await outsider.post(`/runs/${run.id}/cancel`).expect(404);
    const admin = await office.as('admin');
    await admin.get(`/runs/${run.id}`).expect(200);
  });

  test('does not lend its views to a run of one’s own', async () => {
    const [one, other] = [await start(SMALL_SWEEP), await start(SMALL_SWEEP)];
    await engineer.get(`/runs/${one.id}/views/${other.views[0]!.viewId}`).expect(404);
  });
});
