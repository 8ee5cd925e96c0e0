import { eq, sql } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { RankingInput } from '#shared/contract/ranking.ts';
import type { Run, ViewProgress } from '#shared/contract/records.ts';
import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import type { Rates } from '#shared/engine/section.ts';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import type { View } from '#shared/sweep/problem.ts';
import { changedRates } from '#shared/sweep/rate-changes.ts';
import { expandSpace, sectionAt } from '#shared/sweep/space.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { keptSections } from '#server/db/schema/kept-sections.ts';
import { runs } from '#server/db/schema/runs.ts';
import { sweeps } from '#server/db/schema/sweeps.ts';
import { takenSections } from '#server/db/schema/taken-sections.ts';
import { isKeptWhole, keepSections, makeRoom } from '#server/jobs/kept-sections.ts';
import {
  addProject,
  PRICE_BOOK,
  scaledSweep,
  SMALL_SWEEP,
  type OfficeProject,
} from '../support/office-project.ts';
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

const COST_AND_DEPTH: View = { x: 'costPerM', y: 'depthMm' };

async function until(run: Run, isIt: (progress: ViewProgress) => boolean): Promise<ViewProgress> {
  const stream = await followRun(office, engineer, { runId: run.id });
  const { progress } = await stream.until((event) => hasEnded(event) && isIt(event.progress));
  stream.close();
  return progress;
}

async function finishRun(sweepId: string): Promise<Run> {
  const { body: run } = await engineer.post(`/sweeps/${sweepId}/runs`).expect(200);
  await until(run, ({ viewId }) => viewId === run.views[0].viewId);
  // What is kept is written after the result, which people wait for.
  await expect.poll(() => isKeptWhole(office.deps.db, run.id)).toBe(true);
  return run;
}

const finishSweep = async (definition: SweepDefinition) => finishRun(await project.addSweep(definition));

async function openView(run: Run, view: View): Promise<ViewProgress> {
  const { body } = await engineer.post(`/runs/${run.id}/views`, view).expect(200);
  return until(run, ({ viewId }) => viewId === body.viewId);
}

/** The oracle: the whole range in one go on this thread. */
function sweepAtOnce(
  { definition, basis, sectionCount }: Run,
  view: View,
  rates: Rates | null = basis.rates,
) {
  const { space, demand, rules } = definition;
  const problem = { space, demand, rules, basis: { ...basis, rates } };
  return finishResult(problem, view, sweepRange(prepareSweep(problem, view), 0, sectionCount));
}

const input = (changes: Partial<RankingInput> = {}): RankingInput => ({
  view: COST_AND_DEPTH,
  rates: { base: 'run', changes: {} },
  filters: {},
  bandShare: 0.05,
  ...changes,
});

const rank = (run: Run, body: RankingInput, person = engineer) =>
  person.post(`/runs/${run.id}/rankings`, body);

const plain = <T>(value: T): T => JSON.parse(JSON.stringify(value)) as T;

const wider = (definition: SweepDefinition): SweepDefinition => ({
  ...definition,
  space: {
    ...definition.space,
    width: { kind: 'list', values: [275, 300, 350, 400] },
    depth: { kind: 'range', from: 400, to: 900, step: 25 },
    tension: { kind: 'bars', sizes: ['20', '25', '28', '32'], counts: [2, 3, 4, 5, 6], none: false },
  },
});

describe('another view of a finished run', () => {
  test('is ranked from what the run kept, and is what a sweep gives, hash and all', async () => {
    const run = await finishSweep(SMALL_SWEEP);
    const swept = office.deps.tally.sections;
    for (const view of [COST_AND_DEPTH, { x: 'curvatureDuctility', y: 'costPerM', z: 'barCount' }] as View[])
      expect((await openView(run, view)).result).toEqual(plain(sweepAtOnce(run, view)));
    expect(office.deps.tally.sections).toBe(swept);
  });

  test('is swept again where nothing was kept, to the same hash', async () => {
    const run = await finishSweep(SMALL_SWEEP);
    await office.deps.db.delete(keptSections).where(eq(keptSections.runId, run.id));
    const swept = office.deps.tally.sections;
    expect((await openView(run, COST_AND_DEPTH)).result!.hash).toBe(sweepAtOnce(run, COST_AND_DEPTH).hash);
    expect(office.deps.tally.sections).toBe(swept + run.sectionCount);
  });
});

describe('what a run keeps', () => {
  test('is written once, and never changed', async () => {
    const { db } = office.deps;
    const run = await finishSweep(SMALL_SWEEP);
    const mine = eq(keptSections.runId, run.id);
    const [before] = await db.select().from(keptSections).where(mine);
    const { space, demand, rules, view } = run.definition;
    const problem = { space, demand, rules, basis: run.basis };
    await keepSections(db, {
      runId: run.id,
      range: { from: 0, to: run.sectionCount },
      chunk: sweepRange(prepareSweep(problem, view), 0, 5),
      kept: { feasible: 0, frames: [], nearMisses: (await office.deps.keptShelf.find(run.id))!.nearMisses },
    });
    expect(await db.select().from(keptSections).where(mine)).toEqual([before]);
    await expect(db.update(keptSections).set({ feasible: 0 }).where(mine)).rejects.toThrow();
  });

  test('is whole and without overlaps after a cancel in the middle and a resume', async () => {
    const { db } = office.deps;
    // Over 2²² sections: several shards.
    const sweepId = await project.addSweep(scaledSweep(120, 370));
    const { body: run } = await engineer.post(`/sweeps/${sweepId}/runs`).expect(200);
    const stream = await followRun(office, engineer, { runId: run.id });
    await stream.until(({ progress }) => progress.evaluated > 0);
    await engineer.post(`/runs/${run.id}/cancel`).expect(200);
    await stream.until(hasEnded);
    stream.close();
    await engineer.post(`/runs/${run.id}/resume`).expect(200);
    await until(run, ({ state }) => state === 'finished');
    await expect.poll(() => isKeptWhole(db, run.id), { timeout: 10_000 }).toBe(true);
    const pieces = await db
      .select({ from: keptSections.fromPlace, to: keptSections.toPlace })
      .from(keptSections)
      .where(eq(keptSections.runId, run.id))
      .orderBy(keptSections.fromPlace);
    expect(pieces.length).toBeGreaterThan(1);
    expect(pieces.map(({ to }) => to)).toEqual([
      ...pieces.slice(1).map(({ from }) => from),
      run.sectionCount,
    ]);
    expect((await openView(run, COST_AND_DEPTH)).result!.hash).toBe(sweepAtOnce(run, COST_AND_DEPTH).hash);
  }, 60_000);

  test('makes room, the oldest first, but not where a run that is not done takes it over', async () => {
    const { db } = office.deps;
    const [older, old, young] = [
      await finishSweep(SMALL_SWEEP),
      await finishSweep(SMALL_SWEEP),
      await finishSweep(SMALL_SWEEP),
    ];
    const { sectionCount: sections } = older;
    await db.insert(takenSections).values({ runId: young.id, fromRunId: older.id, sections });
    await db.update(runs).set({ state: 'cancelled' }).where(eq(runs.id, young.id));
    const [{ bytes }] = (await db
      .select({ bytes: sql<number>`octet_length(frames)` })
      .from(keptSections)
      .where(eq(keptSections.runId, young.id))) as [{ bytes: number }];
    await makeRoom(db, bytes);
    const whole = ({ id }: Run) => isKeptWhole(db, id);
    expect(await Promise.all([older, old, young].map(whole))).toEqual([true, false, true]);
    await db.update(runs).set({ state: 'finished' }).where(eq(runs.id, young.id));
    await makeRoom(db, bytes);
    expect(await Promise.all([older, old, young].map(whole))).toEqual([false, false, true]);
  });
});

describe('a ranking at other rates', () => {
  let run: Run;
  test('of a run that has finished', async () => {
    run = await finishSweep(SMALL_SWEEP);
  });

  test('is what a run at these rates would give, with who wins at both', async () => {
    const changes = { steel: 60, formwork: -40, concrete: 12.5 };
    const { body } = await rank(run, input({ rates: { base: 'run', changes } })).expect(200);
    const rates = changedRates(run.basis.rates!, changes);
    const expected = sweepAtOnce(run, COST_AND_DEPTH, rates);
    expect(body.rates).toEqual(rates);
    const { front, band, density, best, edges, feasible, evaluated } = plain(expected);
    expect(body.result).toMatchObject({ front, band, density, best, edges, feasible, evaluated });
    const own = sweepAtOnce(run, COST_AND_DEPTH).front[0]!;
    const { demand, rules } = run.definition;
    const { space, basis } = {
      space: expandSpace(run.definition.space, 'iso'),
      basis: { ...run.basis, rates },
    };
    const { measures } = evaluateSection(sectionAt(space, own.index), { basis, demand, rules });
    expect(body.runWinner).toEqual({
      index: own.index,
      atRunRates: { x: own.x, y: own.y },
      atTheseRates: { x: measures.costPerM, y: measures.depthMm },
    });
    expect(body.isSameWinner).toBe(own.index === expected.front[0]!.index);
    const limit = front[0]!.x * 1.05;
    expect(body.bandCount).toBe(expected.band.filter(({ x }) => x <= limit).length);
  });

  test('follows the price book of today, and leaves the run as it is', async () => {
    const estimator = await office.as('estimator');
    const book = { ...PRICE_BOOK, steelPerKg: 7.5 };
    await estimator.put(`/projects/${project.projectId}/price-book`, book).expect(200);
    const { body } = await rank(run, input({ rates: { base: 'today', changes: {} } }), estimator).expect(200);
    expect(body.rates.steelPerKg).toBe(7.5);
    expect(body.result.front).toEqual(plain(sweepAtOnce(run, COST_AND_DEPTH, body.rates).front));
    const own = await rank(run, input()).expect(200);
    expect(own.body.result.front).toEqual(plain(sweepAtOnce(run, COST_AND_DEPTH).front));
    expect(own.body.isSameWinner).toBe(true);
    await estimator.put(`/projects/${project.projectId}/price-book`, PRICE_BOOK).expect(200);
  });

  test('within ranges ranks the sections that lie in them, and no other', async () => {
    const filters = {
      depthMm: { low: 500, high: 700 },
      fc: { low: 30, high: null },
      costPerM: { low: null, high: 250 },
    };
    const { body } = await rank(run, input({ filters })).expect(200);
    const { space, demand, rules } = run.definition;
    const expanded = expandSpace(space, 'iso');
    const costs = Array.from({ length: run.sectionCount }, (_, index) => {
      const section = sectionAt(expanded, index);
      const evaluation = evaluateSection(section, { basis: run.basis, demand, rules });
      return {
        section,
        index,
        isFeasible: evaluation.checks.every((check) => check.passes),
        ...evaluation.measures,
      };
    }).filter(
      ({ section, isFeasible, depthMm, costPerM }) =>
        isFeasible && depthMm! >= 500 && depthMm! <= 700 && section.fcMPa >= 30 && costPerM! <= 250,
    );
    expect(body.count).toBe(costs.length);
    expect(body.count).toBeGreaterThan(3);
    expect(body.result.front[0].x).toBe(Math.min(...costs.map(({ costPerM }) => costPerM!)));
  });

  test('judges the sections of a small run anew where none are kept', async () => {
    const other = await finishSweep(SMALL_SWEEP);
    await office.deps.db.delete(keptSections).where(eq(keptSections.runId, other.id));
    const { body } = await rank(other, input()).expect(200);
    expect(body.result.front).toEqual(plain(sweepAtOnce(other, COST_AND_DEPTH).front));
  });

  test('is refused to a viewer and an outsider, and of a run that has not finished', async () => {
    await rank(run, input(), await office.as('viewer')).expect(403);
    await rank(run, input(), await office.as('outsider')).expect(404);
    for (const account of ['checker', 'estimator', 'admin'] as const)
      await rank(run, input(), await office.as(account)).expect(200);
    await office.deps.db.update(runs).set({ state: 'running' }).where(eq(runs.id, run.id));
    await rank(run, input()).expect(409);
    await office.deps.db.update(runs).set({ state: 'finished' }).where(eq(runs.id, run.id));
  });

  test('names the field that is wrong', async () => {
    const wrong: [Record<string, unknown>, (string | number)[]][] = [
      [{ view: { x: 'costPerM', y: 'costPerM' } }, ['view', 'y']],
      [{ rates: { base: 'tomorrow', changes: {} } }, ['rates', 'base']],
      [{ rates: { base: 'run', changes: { steel: -100 } } }, ['rates', 'changes', 'steel']],
      [{ filters: { depthMm: { low: 'deep', high: null } } }, ['filters', 'depthMm', 'low']],
      [{ bandShare: 0.5 }, ['bandShare']],
    ];
    for (const [part, path] of wrong) {
      const { body } = await engineer.post(`/runs/${run.id}/rankings`, { ...input(), ...part }).expect(400);
      expect(body.error.issues[0].path).toEqual(path);
    }
    const poor = await addProject(office, null);
    const cheap = await finishRun(await poor.addSweep(SMALL_SWEEP));
    const none = await rank(cheap, input({ rates: { base: 'today', changes: {} } })).expect(400);
    expect(none.body.error.issues[0].path).toEqual(['rates', 'base']);
    const noRates = await rank(cheap, input()).expect(400);
    expect(noRates.body.error.issues[0]).toMatchObject({ path: ['view', 'x'], message: /steel/ });
  });
});

describe('a run of a sweep with further values', () => {
  test('takes the sections of the run before, computes the new ones, and is what a fresh sweep gives', async () => {
    const { db } = office.deps;
    const sweepId = await project.addSweep(SMALL_SWEEP);
    const first = await finishRun(sweepId);
    await db
      .update(sweeps)
      .set({ definition: wider(SMALL_SWEEP) })
      .where(eq(sweeps.id, sweepId));
    const swept = office.deps.tally.sections;
    const second = await finishRun(sweepId);
    expect(second.taken).toEqual({ runId: first.id, number: 1, sections: 2880 });
    expect(office.deps.tally.sections).toBe(swept + second.sectionCount - 2880);
    const { body } = await engineer.post(`/runs/${second.id}/views`, SMALL_SWEEP.view).expect(200);
    expect(body.result).toEqual(plain(sweepAtOnce(second, SMALL_SWEEP.view)));
    expect(body.result.evaluated).toBe(second.sectionCount);
    // Views, rankings and a third, wider run are served by what the second one kept.
    expect((await openView(second, COST_AND_DEPTH)).result).toEqual(
      plain(sweepAtOnce(second, COST_AND_DEPTH)),
    );
    const ranking = await rank(second, input({ rates: { base: 'run', changes: { steel: 30 } } })).expect(200);
    const expected = sweepAtOnce(second, COST_AND_DEPTH, ranking.body.rates);
    expect(ranking.body.result.front).toEqual(plain(expected.front));

    const widest = wider(SMALL_SWEEP);
    const width = { kind: 'list' as const, values: [275, 300, 325, 350, 400] };
    await db
      .update(sweeps)
      .set({ definition: { ...widest, space: { ...widest.space, width }, view: COST_AND_DEPTH } })
      .where(eq(sweeps.id, sweepId));
    const third = await finishRun(sweepId);
    expect(third.taken).toMatchObject({ runId: second.id, sections: second.sectionCount });
    const own = await engineer.post(`/runs/${third.id}/views`, COST_AND_DEPTH).expect(200);
    expect(own.body.result.hash).toBe(sweepAtOnce(third, COST_AND_DEPTH).hash);
  });

  test('computes all of them when the same sweep is run again, or nothing was kept', async () => {
    const { db } = office.deps;
    const sweepId = await project.addSweep(SMALL_SWEEP);
    const first = await finishRun(sweepId);
    const again = await finishRun(sweepId);
    expect(again.taken).toBeNull();
    for (const run of [first, again]) await db.delete(keptSections).where(eq(keptSections.runId, run.id));
    await db
      .update(sweeps)
      .set({ definition: wider(SMALL_SWEEP) })
      .where(eq(sweeps.id, sweepId));
    expect((await finishRun(sweepId)).taken).toBeNull();
  });

  test('says from which run it took sections, and that is never changed', async () => {
    const { db } = office.deps;
    const [taken] = await db.select().from(takenSections);
    const mine = eq(takenSections.runId, taken!.runId);
    await expect(db.update(takenSections).set({ sections: 1 }).where(mine)).rejects.toThrow();
  });
});
