import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CHECK_IDS } from '#shared/engine/evaluation.ts';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import { MEASURE_DIRECTION } from '#shared/engine/measures.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { BAND_SHARE } from '#shared/sweep/band.ts';
import { countCannotFit } from '#shared/sweep/cannot-fit.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import { nonDominated } from '#shared/sweep/front.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import { EDGE_AXES } from '#shared/sweep/result.ts';
import { sectionAt, spaceSize } from '#shared/sweep/space.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { PROPERTIES } from '#shared/verification/properties.ts';
import { remeasure } from '../engine/remeasure.ts';
import { OFFICE_PROBLEM, OFFICE_SIZE } from './office-problem.ts';
import { randomProblem } from './random-problems.ts';

const VIEW: View = { x: 'steelKgPerM', y: 'curvatureDuctility' };

function run(problem: SweepProblem, view: View = VIEW) {
  const prepared = prepareSweep(problem, view);
  return {
    space: prepared.space,
    result: finishResult(problem, view, sweepRange(prepared, 0, prepared.space.size)),
  };
}

const VALUE_ON = {
  width: (section: SectionInput) => section.widthMm,
  depth: (section: SectionInput) => section.depthMm,
  fc: (section: SectionInput) => section.fcMPa,
};

const sum = (counts: readonly { readonly count: number }[]) =>
  counts.reduce((total, { count }) => total + count, 0);

describe('the result of a sweep', () => {
  it(PROPERTIES.outcome.statement, () => {
    fc.assert(
      fc.property(randomProblem, (problem) => {
        const { space, result } = run(problem);
        const all = Array.from({ length: space.size }, (_, index) => {
          const { checks, flexure, measures } = evaluateSection(sectionAt(space, index), problem);
          const failed = checks.filter((check) => !check.passes).map((check) => check.id);
          return {
            index,
            failed,
            hasNumbers: flexure !== null,
            section: sectionAt(space, index),
            measures,
            x: measures.steelKgPerM!,
            y: measures.curvatureDuctility!,
          };
        });
        const feasible = all.filter((s) => s.failed.length === 0 && s.hasNumbers);
        expect(result.evaluated).toBe(space.size);
        expect(result.feasible).toBe(feasible.length);
        expect(result.front).toEqual(nonDominated(feasible, { x: 1, y: -1 }));
        expect(sum(result.density)).toBe(feasible.length);
        for (const axis of ['width', 'depth', 'fc'] as const)
          expect(result.axisCounts![axis].reduce((n, c) => n + c.feasible, 0)).toBe(feasible.length);
        for (const failure of result.failures) {
          const failing = all.filter((s) => s.failed.includes(failure.check));
          const only = failing.filter((s) => s.failed.length === 1);
          const first = failing.filter((s) => s.failed[0] === failure.check);
          expect([failure.failed, failure.failedOnlyThis, failure.failedFirst]).toEqual([
            failing.length,
            only.length,
            first.length,
          ]);
          const best = only.filter((s) => s.hasNumbers).sort((a, b) => a.x - b.x || a.index - b.index)[0];
          expect(failure.bestWithout).toEqual(best ? { index: best.index, x: best.x, y: best.y } : null);
        }
        const ends = EDGE_AXES.flatMap((axis) => {
          const values = all.map(({ section }) => VALUE_ON[axis](section));
          const [low, high] = [Math.min(...values), Math.max(...values)];
          const shareAt = (edge: number) =>
            result.front.filter(({ x, y }) =>
              feasible.every((s) => s.x !== x || s.y !== y || VALUE_ON[axis](s.section) === edge),
            ).length / result.front.length;
          if (low === high) return [];
          return [
            { axis, end: 'low', share: shareAt(low) },
            { axis, end: 'high', share: shareAt(high) },
          ];
        });
        expect(result.edges).toEqual(ends.filter(({ share }) => share > 0));
        const lightest = Math.min(...feasible.map((s) => s.x));
        const near = feasible
          .filter((s) => s.x <= lightest + BAND_SHARE * lightest)
          .sort((a, b) => a.x - b.x || a.index - b.index);
        expect(result.band).toEqual(near.map(({ index, x, y }) => ({ index, x, y })));
        for (const { measure, index, value } of result.best) {
          const sign = MEASURE_DIRECTION[measure] === 'less' ? 1 : -1;
          const values = feasible.map((s) => s.measures[measure]!);
          expect(value).toBe(sign * Math.min(...values.map((v) => sign * v)));
          expect(index).toBe(feasible[values.indexOf(value)]!.index);
        }
      }),
      { numRuns: PROPERTIES.outcome.runs, seed: PROPERTIES.outcome.seed },
    );
  });

  it(PROPERTIES['cannot-fit'].statement, () => {
    fc.assert(
      fc.property(randomProblem, (problem) => {
        fc.pre(problem.space.tension.kind === 'bars');
        expect(countCannotFit(problem)).toBe(run(problem).result.cannotFit!);
      }),
      { numRuns: PROPERTIES['cannot-fit'].runs, seed: PROPERTIES['cannot-fit'].seed },
    );
  });
});

describe('a sweep an office would run', () => {
  const { space, result } = run(OFFICE_PROBLEM);

  it('has at least 200,000 sections and a front', () => {
    expect(OFFICE_SIZE).toBeGreaterThanOrEqual(200_000);
    expect(result.feasible).toBeGreaterThan(1000);
    expect(result.front.length).toBeGreaterThan(5);
  });

  it('has a front whose every section re-evaluates to the same numbers, meets every check, and fits by re-measuring', () => {
    for (const { index, x, y } of result.front) {
      const section = sectionAt(space, index);
      const evaluation = evaluateSection(section, OFFICE_PROBLEM);
      expect(evaluation.measures.steelKgPerM).toBe(x);
      expect(evaluation.measures.curvatureDuctility).toBe(y);
      expect(evaluation.meetsListedChecks).toBe(true);
      expect(y).toBeGreaterThanOrEqual(6);
      expect(evaluation.flexure!.designMomentNmm).toBeGreaterThanOrEqual(300e6);
      expect(remeasure(section, OFFICE_PROBLEM.basis, evaluation.arrangement!)).toEqual([]);
    }
  });

  it('draws two wide measures in a few thousand density cells that still count every feasible section', () => {
    const wide: SweepProblem = {
      ...OFFICE_PROBLEM,
      space: { ...OFFICE_PROBLEM.space, depth: { kind: 'range', from: 400, to: 1200, step: 2.5 } },
      demand: { muNmm: 0, ductilityTarget: null, depthCapMm: null },
    };
    const { density, feasible } = run(wide, { x: 'curvatureDuctility', y: 'designStrengthNmm' }).result;
    expect(density.length).toBeGreaterThan(500);
    expect(density.length).toBeLessThanOrEqual(6000);
    expect(sum(density)).toBe(feasible);
    expect(density.every((cell) => cell.x0 < cell.x1 && cell.y0 < cell.y1)).toBe(true);
  });

  it('says what each check costs: the best section failing only that check, or none better', () => {
    const capped = { ...OFFICE_PROBLEM, demand: { ...OFFICE_PROBLEM.demand, depthCapMm: 550 } };
    const { failures, front } = run(capped).result;
    const without = (check: string) => failures.find((f) => f.check === check)!.bestWithout!.x;
    const best = front[0]!.x;
    const uncapped = result.front[0]!.x;
    expect(without('depth-cap')).toBe(uncapped);
    expect(uncapped).toBeLessThan(best);
    const untargeted = run({ ...capped, demand: { ...capped.demand, ductilityTarget: null } }).result
      .front[0]!.x;
    expect(Math.min(without('curvature-ductility'), best)).toBe(untargeted);
  });
});

describe('degenerate sweeps', () => {
  const changed = (change: Partial<SweepProblem>): SweepProblem => ({ ...OFFICE_PROBLEM, ...change });
  const narrow = { ...OFFICE_PROBLEM.space, width: { kind: 'list' as const, values: [120] } };

  it('nothing fits: every section counts as bar fit and the front is empty', () => {
    const { result } = run(changed({ space: narrow }));
    expect([result.feasible, result.front.length, result.band.length, result.density.length]).toEqual([
      0, 0, 0, 0,
    ]);
    expect(result.cannotFit).toBe(spaceSize(narrow));
  });

  it('nothing is feasible: the failures say why', () => {
    const { result } = run(changed({ demand: { ...OFFICE_PROBLEM.demand, muNmm: 9e10 } }));
    expect(result.feasible).toBe(0);
    expect(result.failures.find((f) => f.check === 'strength')!.failed).toBe(
      result.evaluated - result.cannotFit!,
    );
    expect(result.best).toEqual([]);
  });

  it('everything is feasible: no check fails', () => {
    const space = {
      ...OFFICE_PROBLEM.space,
      width: { kind: 'list' as const, values: [400] },
      tension: { kind: 'bars' as const, sizes: ['20'], counts: [4, 6], none: false },
      compression: { kind: 'bars' as const, sizes: ['16'], counts: [2], none: false },
    };
    const { result } = run(changed({ space, demand: { muNmm: 0, ductilityTarget: null, depthCapMm: null } }));
    expect(result.feasible).toBe(result.evaluated);
    expect(result.failures.every((f) => f.failed === 0 && f.bestWithout === null)).toBe(true);
  });

  it('Mu = 0 asks for nothing and utilisation is zero', () => {
    const view: View = { x: 'utilisation', y: 'steelKgPerM' };
    const { result } = run(changed({ demand: { muNmm: 0, ductilityTarget: 6, depthCapMm: null } }), view);
    expect(result.front).toHaveLength(1);
    expect(result.front[0]!.x).toBe(0);
    expect(sum(result.density)).toBe(result.feasible);
  });

  it('a missing rate leaves cost without a front, never at zero', () => {
    const rates = { ...OFFICE_PROBLEM.basis.rates!, formworkPerM2: null };
    const { result } = run(changed({ basis: { ...OFFICE_PROBLEM.basis, rates } }), {
      x: 'costPerM',
      y: 'steelKgPerM',
    });
    expect(result.feasible).toBeGreaterThan(0);
    expect(result.front).toEqual([]);
    expect(result.best.some((b) => b.measure === 'costPerM')).toBe(false);
  });

  it('a mix without a rate is left out of a cost front, its band and its misses alike', () => {
    const rates = OFFICE_PROBLEM.basis.rates!;
    const concrete = rates.concrete.map((mix) => (mix.fcMPa === 40 ? { ...mix, costPerM3: null } : mix));
    const basis = { ...OFFICE_PROBLEM.basis, rates: { ...rates, concrete } };
    const { result } = run(changed({ basis }), { x: 'steelKgPerM', y: 'costPerM' });
    const points = [...result.band, ...result.front, ...result.failures.flatMap((f) => f.bestWithout ?? [])];
    expect(points.length).toBeGreaterThan(10);
    expect(points.every((p) => Number.isFinite(p.x) && Number.isFinite(p.y))).toBe(true);
    expect(result.band[0]!.x).toBe(result.front[0]!.x);
  });

  it('equal amounts are equal whatever bars they are made of: 5-20M beats 3-25M of the same 11.775 kg/m', () => {
    const problem = changed({
      basis: {
        ...OFFICE_PROBLEM.basis,
        barStandard: 'csa',
        rates: { ...OFFICE_PROBLEM.basis.rates!, steelPerKg: 1.37, stirrupPerKg: 1.61, formworkPerM2: 33 },
      },
      demand: { muNmm: 0, ductilityTarget: null, depthCapMm: null },
      space: {
        ...OFFICE_PROBLEM.space,
        width: { kind: 'list', values: [400] },
        depth: { kind: 'list', values: [600] },
        fc: { kind: 'list', values: [25] },
        stirrups: [{ bar: '10M', legs: 2, spacingMm: 175 }],
        tension: { kind: 'bars', sizes: ['20M', '25M'], counts: [3, 5], none: false },
        compression: { kind: 'bars', sizes: ['15M'], counts: [2], none: false },
      },
    });
    const { space, result } = run(problem, { x: 'costPerM', y: 'curvatureDuctility' });
    const same = Array.from(
      { length: space.size },
      (_, i) => evaluateSection(sectionAt(space, i), problem).measures,
    );
    expect(same.map((m) => m.steelKgPerM).filter((kg, i, all) => all.indexOf(kg) !== i)).toHaveLength(1);
    expect(new Set(result.front.map((p) => p.x)).size).toBe(result.front.length);
  });

  it('typed lists are sorted and each value counts once, so that an edge is an edge', () => {
    const values = (list: readonly number[]) => ({
      ...OFFICE_PROBLEM.space,
      fc: { kind: 'list' as const, values: list },
    });
    const typed = run(changed({ space: values([35, 25, 40, 35, 30]) }));
    expect(typed.space.fcMPa).toEqual([25, 30, 35, 40]);
    expect(typed.result.hash).toBe(run(OFFICE_PROBLEM).result.hash);
    expect(spaceSize(values([35, 25, 40, 35, 30]))).toBe(OFFICE_SIZE);
  });

  it('an axis that moves neither measure is never said to sit on its edge', () => {
    const { result } = run(OFFICE_PROBLEM, { x: 'barCount', y: 'depthMm' });
    expect(result.front.length).toBeGreaterThan(0);
    expect(result.edges.filter((edge) => edge.axis === 'fc' && edge.share === 1)).toEqual([]);
  });

  it.each([
    ['from above to', { width: { kind: 'range', from: 500, to: 300, step: 50 } }, ['width', 'to']],
    ['a zero step', { depth: { kind: 'range', from: 300, to: 500, step: 0 } }, ['depth', 'step']],
    ['an empty list', { fc: { kind: 'list', values: [] } }, ['fc', 'values']],
    [
      'no tension steel',
      { tension: { kind: 'bars', sizes: ['20'], counts: [2], none: true } },
      ['tension', 'none'],
    ],
    ['no bars', { tension: { kind: 'bars', sizes: [], counts: [2], none: false } }, ['tension', 'sizes']],
    [
      'an unknown bar',
      { compression: { kind: 'bars', sizes: ['#8'], counts: [2], none: false } },
      ['compression', 'sizes', 0],
    ],
  ] as const)('%s is refused at its place', (_, change, path) => {
    const problem = changed({ space: { ...OFFICE_PROBLEM.space, ...(change as object) } });
    expect(() => prepareSweep(problem, VIEW)).toThrow(expect.objectContaining({ path }) as Error);
  });

  it('every failed check of the result is one of the listed checks', () => {
    expect(run(OFFICE_PROBLEM).result.failures.map((f) => f.check)).toEqual([...CHECK_IDS]);
  });
});
