import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { MEASURE_IDS } from '#shared/engine/measures.ts';
import { BoundedSearch, boundedFront, frontOf, hasBand } from '#shared/sweep/bounded-search.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import { nonDominated } from '#shared/sweep/front.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { OFFICE_PROBLEM, OFFICE_SIZE } from './office-problem.ts';
import { randomProblem } from './random-problems.ts';

const views = fc
  .tuple(fc.constantFrom(...MEASURE_IDS), fc.constantFrom(...MEASURE_IDS))
  .filter(([x, y]) => x !== y)
  .map(([x, y]) => ({ x, y }));

/** Random problems ask so much that few have a front: half of them here ask little. */
const problems = fc.oneof(
  randomProblem,
  randomProblem.map((problem) => ({
    ...problem,
    demand: {
      ...problem.demand,
      muNmm: problem.demand.muNmm && problem.demand.muNmm / 5,
      ductilityTarget: problem.demand.ductilityTarget && problem.demand.ductilityTarget / 3,
      depthCapMm: null,
      vuN: null,
      spanMm: null,
    },
    basis: { ...problem.basis, seismicSystem: undefined, skinBar: undefined },
    rules: {
      ...problem.rules,
      columnWidthMm: null,
      maxDepthToWidth: null,
      minCompressionShare: null,
      requireHangers: false,
    },
  })),
);

describe('branch and bound', () => {
  it('finds the front and the near-best band that evaluating every section finds, ties and all, in 500 random spaces', () => {
    let withFront = 0;
    fc.assert(
      fc.property(problems, views, (problem, view) => {
        const prepared = prepareSweep(problem, view);
        const swept = sweepRange(prepared, 0, prepared.space.size);
        const { front } = finishResult(problem, view, swept);
        const bounded = boundedFront(problem, view);
        if (front.length > 0) withFront++;
        expect(bounded.front).toEqual(front);
        expect(bounded.near).toEqual(hasBand(view) ? swept.band : []);
        expect(bounded.evaluated + bounded.provenUnnecessary).toBe(prepared.space.size);
      }),
      { numRuns: 500, seed: 500 },
    );
    expect(withFront).toBeGreaterThan(100);
  });

  it('finds it also from shares of the space that hear of each other, in steps, and from what was known before', () => {
    const view = { x: 'steelKgPerM', y: 'depthMm' } as const;
    const { front } = boundedFront(OFFICE_PROBLEM, view);
    const shares = [0, 1, 2].map((part) => new BoundedSearch(OFFICE_PROBLEM, view, { part, of: 3 }));
    for (const share of shares) share.noteElsewhere(front[1]!.x, front[1]!.y);
    while (shares.map((share) => share.advance(50)).includes(false))
      for (const share of shares)
        for (const { x, y } of share.found)
          for (const other of shares) if (other !== share) other.noteElsewhere(x, y);
    const all = shares.flatMap((share) => frontOf(share.found, view));
    expect(nonDominated(all, { x: 1, y: 1 }).map(({ index }) => index)).toEqual(
      front.map(({ index }) => index),
    );
    const looked = shares.map(({ state }) => state.evaluated + state.provenUnnecessary);
    expect(looked.reduce((sum, count) => sum + count)).toBe(OFFICE_SIZE);
  });

  it('finds it also where it keeps few boxes open at a time', () => {
    const view = { x: 'steelKgPerM', y: 'curvatureDuctility' } as const;
    const narrow = new BoundedSearch(OFFICE_PROBLEM, view, { part: 0, of: 1 }, 8);
    while (!narrow.advance(1000));
    expect(frontOf(narrow.found, view)).toEqual(boundedFront(OFFICE_PROBLEM, view).front);
  });

  it.each([
    ['steelKgPerM', 'curvatureDuctility'],
    ['costPerM', 'depthMm'],
    ['co2eKgPerM', 'designStrengthNmm'],
  ] as const)('finds the front of the office sweep in %s and %s', (x, y) => {
    const view = { x, y };
    const prepared = prepareSweep(OFFICE_PROBLEM, view);
    const { front } = finishResult(OFFICE_PROBLEM, view, sweepRange(prepared, 0, OFFICE_SIZE));
    const bounded = boundedFront(OFFICE_PROBLEM, view);
    expect(bounded.front).toEqual(front);
    expect(bounded.evaluated).toBeLessThan(OFFICE_SIZE / 2);
  });
});
