import fc from 'fast-check';
import { MEASURE_IDS } from '#shared/engine/measures.ts';
import { amountTables } from '#shared/sweep/amount-tables.ts';
import { emptyChunk, type ChunkResult } from '#shared/sweep/chunk.ts';
import { decodeFrames, type FeasibleFrame } from '#shared/sweep/feasible-frame.ts';
import { measureGaps } from '#shared/sweep/measure-gaps.ts';
import { mergeChunks } from '#shared/sweep/merge.ts';
import { mergeNearMisses, noNearMisses, type NearMisses } from '#shared/sweep/near-misses.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import { rankKept } from '#shared/sweep/rank-kept.ts';
import { openSweep } from '#shared/sweep/sweep-range.ts';
import { randomProblem } from './random-problems.ts';

export interface KeptSweep {
  readonly problem: SweepProblem;
  readonly counted: ChunkResult;
  readonly frames: readonly FeasibleFrame[];
  readonly nearMisses: NearMisses;
}

/** 0 … size in so many pieces of a size. */
export const cutsOf = (size: number, pieces: number): (readonly [number, number])[] =>
  Array.from({ length: pieces }, (_, i) => [
    Math.floor((size * i) / pieces),
    Math.floor((size * (i + 1)) / pieces),
  ]);

/** Sweeps a problem in pieces and keeps what other views need; every other piece keeps no numbers. */
export function sweepKeeping(problem: SweepProblem, view: View, pieces: number): KeptSweep {
  const prepared = prepareSweep(problem, view);
  const nothing = { problem, counted: emptyChunk(), frames: [], nearMisses: noNearMisses() };
  return cutsOf(prepared.space.size, pieces).reduce<KeptSweep>((sum, [from, to], i) => {
    const steps = openSweep(prepared, { keeping: { hasNumbers: i % 2 === 0 } });
    steps.advance(from, to);
    const { frame, nearMisses } = steps.kept()!;
    return {
      problem,
      counted: mergeChunks(sum.counted, steps.finish()),
      frames: [...sum.frames, ...decodeFrames(frame!)],
      nearMisses: mergeNearMisses(sum.nearMisses, nearMisses),
    };
  }, nothing);
}

/** Kept sections of a problem ranked in a view, at its own rates. */
export const rankProblem = (
  problem: SweepProblem,
  frames: readonly FeasibleFrame[],
  view: View,
): ChunkResult =>
  rankKept(
    frames,
    {
      tables: amountTables(problem),
      view,
      rates: problem.basis.rates,
      muNmm: problem.demand.muNmm,
      filter: null,
      witness: null,
    },
    () => prepareSweep(problem, view),
  );

/** Measures that have a value in every section of a problem. */
export const viewsOf = (problem: SweepProblem) =>
  MEASURE_IDS.filter((measure) => measureGaps(measure, problem).length === 0);

/** Random problems, half of them asked so little that much of the space meets every check. */
export const problemWithSections: fc.Arbitrary<SweepProblem> = fc
  .tuple(randomProblem, fc.boolean())
  .map(([problem, isEased]) =>
    isEased
      ? {
          ...problem,
          basis: { ...problem.basis, seismicSystem: 'none' },
          demand: { ...problem.demand, ductilityTarget: null, depthCapMm: null, vuN: null, spanMm: null },
          rules: { ...problem.rules, columnWidthMm: null, minCompressionShare: null, requireHangers: false },
        }
      : problem,
  );
