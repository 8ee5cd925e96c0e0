import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  FrontInThreeBuilder,
  MOST_HELD_IN_THREE,
  MOST_SHOWN_IN_THREE,
  joinFronts,
  resultInThree,
  type FrontInThree,
} from '#shared/sweep/front-in-three.ts';
import { MAX_TIES_KEPT } from '#shared/sweep/front.ts';
import { PROPERTIES } from '#shared/verification/properties.ts';

type Triple = readonly [number, number, number];

const LESS = { x: 1, y: 1, z: 1 } as const;

/** The definition itself, O(n²): nobody is at least as good in all three and better in one. */
function naiveFront(points: readonly Triple[]) {
  const isBeaten = (p: Triple) =>
    points.some((q) => q.every((value, k) => value <= p[k]!) && q.some((value, k) => value < p[k]!));
  const whole = points.filter((p) => !p.some(Number.isNaN));
  const kept = whole.filter((p) => !isBeaten(p));
  const distinct = [...new Map(kept.map((p) => [String(p), p])).values()];
  const inOrder = distinct.toSorted((a, b) => a[0] - b[0] || a[1] - b[1] || a[2] - b[2]);
  return inOrder.map((p) => {
    const equal = points.flatMap((q, index) => (String(q) === String(p) ? [index] : []));
    const ties = equal.slice(0, MAX_TIES_KEPT);
    return { index: equal[0], x: p[0], y: p[1], z: p[2], tieCount: equal.length, ties };
  });
}

function build(points: readonly Triple[], indices = points.map((_, index) => index)): FrontInThree {
  const builder = new FrontInThreeBuilder();
  for (const index of indices) builder.add(...points[index]!, index);
  return builder.finish();
}

const small = fc.integer({ min: 0, max: 5 });
const value = fc.oneof({ weight: 20, arbitrary: small }, { weight: 1, arbitrary: fc.constant(NaN) });
const tieHeavy = fc.array(fc.tuple(value, value, value), { maxLength: 70 });

/**
 * Points near a slope on which no two beat each other, on a grid that makes many of them tie: a long front. A fixed
 * sequence of pseudo-random numbers (linear congruential, Numerical Recipes' constants).
 */
function slope(count: number): Triple[] {
  let state = 20261201;
  const next = (below: number) =>
    Math.floor(((state = (Math.imul(state, 1664525) + 1013904223) >>> 0) / 2 ** 32) * below);
  return Array.from({ length: count }, (): Triple => {
    const [x, y] = [next(60), next(60)];
    return [x, y, 120 - x - y + next(12)];
  });
}

const isBeatenBy = (p: Triple, q: Triple) =>
  q[0] <= p[0] && q[1] <= p[1] && q[2] <= p[2] && (q[0] < p[0] || q[1] < p[1] || q[2] < p[2]);

describe('the front of three measures', () => {
  it(PROPERTIES['naive-front-in-three'].statement, () => {
    const { runs, seed } = PROPERTIES['naive-front-in-three'];
    fc.assert(
      fc.property(tieHeavy, (points) => {
        expect(resultInThree(build(points), LESS).points).toEqual(naiveFront(points));
      }),
      { numRuns: runs, seed },
    );
  });

  it(PROPERTIES['cut-front-in-three'].statement, () => {
    const { runs, seed } = PROPERTIES['cut-front-in-three'];
    const cut = tieHeavy.chain((points) =>
      fc.record({
        points: fc.constant(points),
        order: fc.shuffledSubarray([...points.keys()], { minLength: points.length }),
        ends: fc.tuple(fc.nat(points.length), fc.nat(points.length)),
      }),
    );
    fc.assert(
      fc.property(cut, ({ points, order, ends: [a, b] }) => {
        const whole = build(points);
        const parts = [
          order.slice(0, Math.min(a, b)),
          order.slice(Math.min(a, b), Math.max(a, b)),
          order.slice(Math.max(a, b)),
        ].map((indices) => build(points, indices));
        const [first, second, third] = parts as [FrontInThree, FrontInThree, FrontInThree];
        expect(joinFronts(joinFronts(first, second), third)).toEqual(whole);
        expect(joinFronts(joinFronts(third, first), second)).toEqual(whole);
        expect(joinFronts(first, joinFronts(second, third))).toEqual(whole);
      }),
      { numRuns: runs, seed },
    );
  });

  it('of more points than are gathered at a time beats each that is not on it, and none that is', () => {
    const points = slope(40_000);
    const { points: shown } = resultInThree(build(points), LESS);
    const vertices = shown.map(({ x, y, z }): Triple => [x, y, z]);
    expect(vertices.length).toBeGreaterThan(1000);
    expect(vertices.filter((p) => vertices.some((q) => isBeatenBy(p, q)))).toEqual([]);
    const keys = new Set(vertices.map(String));
    const others = points.filter((p) => !keys.has(String(p)));
    expect(others.filter((p) => !vertices.some((q) => isBeatenBy(p, q)))).toEqual([]);
    expect(shown.reduce((sum, { tieCount }) => sum + tieCount, 0)).toBe(points.length - others.length);
  });

  it('counts a hundred thousand exact ties and keeps the lowest indices by name', () => {
    const points = new Array<Triple>(100_000).fill([1, 2, 3]);
    const {
      points: [vertex],
    } = resultInThree(build(points, [...points.keys()].reverse()), LESS);
    expect(vertex!.tieCount).toBe(100_000);
    expect(vertex!.ties).toEqual(Array.from({ length: MAX_TIES_KEPT }, (_, i) => i));
  });

  it('judges endless values as any other', () => {
    const points: Triple[] = [
      [Infinity, -Infinity, 0],
      [0, Infinity, Infinity],
      [1, Infinity, Infinity],
      [Infinity, Infinity, Infinity],
    ];
    expect(resultInThree(build(points), LESS).points.map(({ index }) => index)).toEqual([1, 0]);
    expect(resultInThree(build(points.slice(3)), LESS).points).toHaveLength(1);
  });

  it('shows a longer front from its best end on, with the count of all', () => {
    const count = MOST_SHOWN_IN_THREE + 5;
    const points = Array.from({ length: count }, (_, i): Triple => [i, 0, -i]);
    const shown = resultInThree(build(points), { x: 1, y: 1, z: -1 });
    expect(shown.count).toBe(count);
    expect(shown.points).toHaveLength(MOST_SHOWN_IN_THREE);
    expect(shown.points.at(-1)).toMatchObject({ x: MOST_SHOWN_IN_THREE - 1, z: MOST_SHOWN_IN_THREE - 1 });
  });

  it('gives a front up that is too long to be held, and whatever it is joined to, rather than thin it out', () => {
    const builder = new FrontInThreeBuilder();
    for (let i = 0; i <= MOST_HELD_IN_THREE; i++) builder.add(i, 0, -i, i);
    const given = builder.finish();
    expect(resultInThree(given, LESS)).toEqual({ count: null, points: [] });
    expect(resultInThree(joinFronts(build([[0, 0, 0]]), given), LESS).count).toBeNull();
  });
});
