import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { ConcreteLawId } from '#shared/engine/curve-choices.ts';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import { CHECK_IDS } from '#shared/engine/evaluation.ts';
import type { DuctilityMeasure } from '#shared/engine/section.ts';
import { mergeChunks } from '#shared/sweep/merge.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import { sizeRefusal } from '#shared/sweep/size-limit.ts';
import { sectionAt } from '#shared/sweep/space.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { signOf } from '#shared/sweep/tally.ts';
import { OFFICE_PROBLEM } from './office-problem.ts';

const DUCTILITY = CHECK_IDS.indexOf('curvature-ductility');

const VIEWS: readonly View[] = [
  { x: 'steelKgPerM', y: 'curvatureDuctility' },
  { x: 'curvatureDuctility', y: 'costPerM' },
  { x: 'depthMm', y: 'costPerM' },
];

/** A small office sweep whose ductility is read off the full curve. */
function problemOf(concreteLaw: ConcreteLawId, measure: DuctilityMeasure): SweepProblem {
  return {
    ...OFFICE_PROBLEM,
    space: {
      ...OFFICE_PROBLEM.space,
      width: { kind: 'list', values: [250, 350] },
      depth: { kind: 'range', from: 400, to: 600, step: 50 },
      fc: { kind: 'list', values: [25, 40] },
      tension: { kind: 'bars', sizes: ['20', '25'], counts: [3, 4, 6, 8], none: false },
      compression: { kind: 'bars', sizes: ['16'], counts: [2, 4], none: false },
    },
    basis: {
      ...OFFICE_PROBLEM.basis,
      ductilityMeasure: measure,
      curve: { concreteLaw, steelLaw: 'strain-hardening' },
    },
    demand: { ...OFFICE_PROBLEM.demand, ductilityTarget: 9, vuN: 150e3 },
  };
}

/** Every section explained one by one. */
function explained(problem: SweepProblem) {
  const { space } = prepareSweep(problem, VIEWS[0]!);
  return Array.from({ length: space.size }, (_, index) => {
    const { checks, flexure, measures } = evaluateSection(sectionAt(space, index), problem);
    const fails = checks.filter((check) => !check.passes).map(({ id }) => CHECK_IDS.indexOf(id));
    const others = fails.filter((bit) => bit !== DUCTILITY);
    return { index, fails, others, hasNumbers: flexure !== null, measures };
  });
}

/** What a sweep is to add up of them. */
function expectedOf(rows: ReturnType<typeof explained>, view: View) {
  const xOf = ({ measures }: (typeof rows)[number]) => signOf(view.x) * (measures[view.x] ?? NaN);
  const best = CHECK_IDS.map((_, bit) =>
    rows
      .filter((row) => row.hasNumbers && row.fails.length === 1 && row.fails[0] === bit)
      .reduce((a, row) => (xOf(row) < a.x ? { index: row.index, x: xOf(row) } : a), {
        index: -1,
        x: Infinity,
      }),
  );
  return {
    feasible: rows.filter((row) => row.fails.length === 0).length,
    // ductility is not asked of a section that fails another check
    failed: CHECK_IDS.map((_, bit) =>
      bit === DUCTILITY
        ? rows.filter((row) => row.others.length === 0 && row.fails.length === 1).length
        : rows.filter((row) => row.others.includes(bit)).length,
    ),
    withoutIndex: best.map(({ index }) => index),
  };
}

describe('a sweep whose ductility is read off the full curve', () => {
  it('counts, and finds the best without each check, as sections explained one by one do', () => {
    let priced = 0;
    let refused = 0;
    for (const [law, measure] of [
      ['hognestad', 'curve-bilinear'],
      ['mander-confined', 'curve-first-yield'],
    ] as const) {
      const problem = problemOf(law, measure);
      const rows = explained(problem);
      for (const view of VIEWS) {
        const prepared = prepareSweep(problem, view);
        const swept = sweepRange(prepared, 0, prepared.space.size);
        const expected = expectedOf(rows, view);
        expect(swept.feasible).toBe(expected.feasible);
        expect([...swept.failed]).toEqual(expected.failed);
        expect([...swept.withoutIndex]).toEqual(expected.withoutIndex);
        expect(swept.feasible).toBeGreaterThan(0);
        refused += expected.failed[DUCTILITY]!;
        priced += expected.withoutIndex.filter((index, bit) => index >= 0 && bit !== DUCTILITY).length;
      }
    }
    expect(refused).toBeGreaterThan(20);
    expect(priced).toBeGreaterThan(5);
  });

  it('may hold fewer sections, and says why', () => {
    const { space } = OFFICE_PROBLEM;
    const long = { space: { ...space, depth: { kind: 'range' as const, from: 400, to: 800, step: 1 } } };
    expect(sizeRefusal(long, {})).toBeNull();
    expect(sizeRefusal(long, { ductilityMeasure: 'closed' })).toBeNull();
    const refusal = sizeRefusal(long, { ductilityMeasure: 'curve-bilinear' });
    expect(refusal?.message).toContain(
      '4,000,000 that one run takes where ductility is read off the full curve',
    );
    expect(refusal?.issues[0]?.path).toEqual(['space', 'depth', 'step']);
    expect(sizeRefusal(OFFICE_PROBLEM, { ductilityMeasure: 'curve-bilinear' })).toBeNull();
  });

  it('adds up to the same whatever its chunks', () => {
    const prepared = prepareSweep(problemOf('mander', 'curve-bilinear'), VIEWS[0]!);
    const { size } = prepared.space;
    const whole = sweepRange(prepared, 0, size);
    fc.assert(
      fc.property(fc.uniqueArray(fc.integer({ min: 1, max: size - 1 }), { maxLength: 4 }), (cuts) => {
        const edges = [0, ...cuts.sort((a, b) => a - b), size];
        const parts = edges.slice(1).map((to, i) => sweepRange(prepared, edges[i]!, to));
        expect(parts.reduce(mergeChunks)).toEqual(whole);
      }),
      { numRuns: 5, seed: 3 },
    );
  });
});
