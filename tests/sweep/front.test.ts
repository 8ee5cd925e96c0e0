import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { MAX_TIES_KEPT, nonDominated, type Signs } from '#shared/sweep/front.ts';
import { PROPERTIES } from '#shared/verification/properties.ts';

interface Measured {
  readonly index: number;
  readonly x: number;
  readonly y: number;
}

/** The definition itself, O(n²): nobody is at least as good in both and better in one. */
function naiveFront(points: readonly Measured[], { x: sx, y: sy }: Signs): Measured[] {
  const isDominated = (p: Measured) =>
    points.some(
      (q) => sx * q.x <= sx * p.x && sy * q.y <= sy * p.y && (sx * q.x < sx * p.x || sy * q.y < sy * p.y),
    );
  return points.filter((p) => !Number.isNaN(p.x) && !Number.isNaN(p.y) && !isDominated(p));
}

const tieHeavy = fc
  .array(fc.tuple(fc.integer({ min: 0, max: 7 }), fc.integer({ min: 0, max: 7 })), { maxLength: 60 })
  .map((pairs) => pairs.map(([x, y], index) => ({ index, x, y })));
const signs = fc.record({
  x: fc.constantFrom(1 as const, -1 as const),
  y: fc.constantFrom(1 as const, -1 as const),
});

describe('the front of two measures', () => {
  it(PROPERTIES['naive-front'].statement, () => {
    fc.assert(
      fc.property(tieHeavy, signs, (points, directions) => {
        const front = nonDominated(points, directions);
        const expected = naiveFront(points, directions);
        const members = (of: readonly Measured[]) => of.map((p) => `${p.x},${p.y}`).sort();
        expect(members(front)).toEqual([...new Set(members(expected))]);
        for (const vertex of front) {
          const equal = expected.filter((p) => p.x === vertex.x && p.y === vertex.y).map((p) => p.index);
          expect(vertex.tieCount).toBe(equal.length);
          expect(vertex.ties).toEqual(equal.slice(0, MAX_TIES_KEPT));
          expect(vertex.index).toBe(equal[0]);
        }
      }),
      { numRuns: PROPERTIES['naive-front'].runs, seed: PROPERTIES['naive-front'].seed },
    );
  });

  it(PROPERTIES['front-order'].statement, () => {
    fc.assert(
      fc.property(
        tieHeavy.chain((points) =>
          fc.tuple(fc.constant(points), fc.shuffledSubarray(points, { minLength: points.length })),
        ),
        signs,
        ([points, shuffled], directions) => {
          expect(nonDominated(shuffled, directions)).toEqual(nonDominated(points, directions));
        },
      ),
      { numRuns: PROPERTIES['front-order'].runs, seed: PROPERTIES['front-order'].seed },
    );
  });

  it('of nothing is empty, and of one point is that point', () => {
    expect(nonDominated([], { x: 1, y: 1 })).toEqual([]);
    expect(nonDominated([{ index: 4, x: 2, y: 3 }], { x: 1, y: -1 })).toEqual([
      { index: 4, x: 2, y: 3, tieCount: 1, ties: [4] },
    ]);
  });

  it('never holds a point without a number', () => {
    const points = [
      { index: 0, x: NaN, y: 1 },
      { index: 1, x: 1, y: NaN },
      { index: 2, x: 5, y: 5 },
      { index: 3, x: 6, y: NaN },
    ];
    expect(nonDominated(points, { x: 1, y: 1 }).map((p) => p.index)).toEqual([2]);
  });

  it('counts a hundred thousand exact ties and keeps the lowest indices by name', () => {
    const points = Array.from({ length: 100_000 }, (_, i) => ({ index: 99_999 - i, x: 1, y: 1 }));
    const [vertex] = nonDominated(points, { x: 1, y: 1 });
    expect(vertex!.tieCount).toBe(100_000);
    expect(vertex!.ties).toEqual(Array.from({ length: MAX_TIES_KEPT }, (_, i) => i));
  });
});
