import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { MEASURE_IDS } from '#shared/engine/measures.ts';
import { emptyChunk, type ChunkResult } from '#shared/sweep/chunk.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import { mergeChunks } from '#shared/sweep/merge.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import type { View } from '#shared/sweep/problem.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { PROPERTIES } from '#shared/verification/properties.ts';
import { randomProblem } from './random-problems.ts';

const view = fc
  .uniqueArray(fc.constantFrom(...MEASURE_IDS), { minLength: 2, maxLength: 3 })
  .map(([x, y, z]): View => ({ x: x!, y: y!, z }));

/** Cuts 0 … size at the given shares. */
function cut(size: number, shares: readonly number[]): readonly (readonly [number, number])[] {
  const ends = [0, ...shares.map((share) => Math.floor(share * size)), size].sort((a, b) => a - b);
  return ends.slice(1).map((end, i) => [ends[i]!, end] as const);
}

const withCuts = fc.tuple(
  randomProblem,
  view,
  fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { maxLength: 6 }),
  fc.integer({ min: 0, max: 1e6 }),
);

describe('merging chunks', () => {
  it(PROPERTIES['merge-cuts'].statement, () => {
    fc.assert(
      fc.property(withCuts, ([problem, axes, shares, salt]) => {
        const prepared = prepareSweep(problem, axes);
        const { size } = prepared.space;
        const whole = finishResult(problem, axes, sweepRange(prepared, 0, size));
        const chunks = cut(size, shares).map(([from, to]) => sweepRange(prepared, from, to));
        const shuffled = chunks
          .map((chunk, i) => ({ chunk, key: ((i + 1) * (salt + 7919)) % 104729 }))
          .sort((a, b) => a.key - b.key);
        const merged = shuffled.reduce((sum, { chunk }) => mergeChunks(sum, chunk), emptyChunk());
        expect(finishResult(problem, axes, merged)).toEqual(whole);
        expect(whole.hash).toMatch(/^([0-9a-f]{4}·){3}[0-9a-f]{4}$/);
      }),
      { numRuns: PROPERTIES['merge-cuts'].runs, seed: PROPERTIES['merge-cuts'].seed },
    );
  });

  it(PROPERTIES['merge-algebra'].statement, () => {
    fc.assert(
      fc.property(withCuts, ([problem, axes]) => {
        const prepared = prepareSweep(problem, axes);
        const { size } = prepared.space;
        const [a, b, c] = cut(size, [1 / 3, 2 / 3]).map(([from, to]) => sweepRange(prepared, from, to)) as [
          ChunkResult,
          ChunkResult,
          ChunkResult,
        ];
        const left = mergeChunks(mergeChunks(a, b), c);
        expect(mergeChunks(a, mergeChunks(b, c))).toEqual(left);
        expect(mergeChunks(c, mergeChunks(b, a))).toEqual(left);
        expect(mergeChunks(emptyChunk(), a)).toEqual(mergeChunks(a, emptyChunk()));
        expect(mergeChunks(a, emptyChunk()).front).toEqual(a.front);
      }),
      { numRuns: PROPERTIES['merge-algebra'].runs, seed: PROPERTIES['merge-algebra'].seed },
    );
  });
});
