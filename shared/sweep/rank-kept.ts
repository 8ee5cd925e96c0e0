import { CHECK_IDS } from '../engine/evaluation.ts';
import { MEASURE_IDS } from '../engine/measures.ts';
import type { ChunkResult } from './chunk.ts';
import { forEachRun, type FeasibleFrame } from './feasible-frame.ts';
import { Kernel } from './kernel.ts';
import { mergeChunks } from './merge.ts';
import { bestWithout, type NearMisses } from './near-misses.ts';
import type { PreparedSweep } from './prepared-sweep.ts';
import type { View } from './problem.ts';
import { isSolved, rankFrames, type Ranking } from './rank-frames.ts';
import { combinationAt } from './sweep-range.ts';
import { signOf, Tally } from './tally.ts';

/** Frames without numbers in a view that needs them go through the hot loop again: these sections only. */
function rankByKernel(frames: readonly FeasibleFrame[], prepared: PreparedSweep): ChunkResult {
  return frames.map((frame) => rankFrameByKernel(frame, prepared)).reduce(mergeChunks);
}

function rankFrameByKernel(frame: FeasibleFrame, prepared: PreparedSweep): ChunkResult {
  const tally = new Tally(prepared.space, prepared.view);
  const kernel = new Kernel(prepared, tally, null);
  const depthCount = prepared.space.depthsMm.length;
  forEachRun(frame, (first, length) => {
    for (let index = first; index < first + length;) {
      const rowNumber = Math.floor(index / depthCount);
      const firstIndex = rowNumber * depthCount;
      const to = Math.min(depthCount, first + length - firstIndex);
      const { combination } = combinationAt(prepared, rowNumber);
      kernel.runRow(combination, { firstIndex, from: index - firstIndex, to });
      index = firstIndex + to;
    }
  });
  return tally.finish();
}

/** Front, band, density and best values of kept sections; `prepare` is asked only where the hot loop is needed. */
export function rankKept(
  frames: readonly FeasibleFrame[],
  ranking: Ranking,
  prepare: () => PreparedSweep,
): ChunkResult {
  const { x, y, z } = ranking.view;
  const isByKernel = [x, y, ...(z ? [z] : [])].some(isSolved);
  const solve = isByKernel ? frames.filter(({ numbers }) => numbers === null) : [];
  const ranked = rankFrames(isByKernel ? frames.filter(({ numbers }) => numbers !== null) : frames, ranking);
  return solve.length === 0 ? ranked : mergeChunks(ranked, rankByKernel(solve, prepare()));
}

interface KeptRun {
  /** What a sweep of the whole space counted, in any view. */
  readonly counted: ChunkResult;
  readonly nearMisses: NearMisses;
}

/**
 * The result of a sweep in the view that the kept sections were ranked in. Null where the nearest misses that were kept do
 * not tell what would be best without a check.
 */
export function chunkOfView(
  { counted, nearMisses }: KeptRun,
  ranked: ChunkResult,
  view: View,
): ChunkResult | null {
  const without = bestWithout(nearMisses, view);
  if (without === null) return null;
  const valuesOf = (measure: View['x']) =>
    Float64Array.from(CHECK_IDS, (_, check) =>
      without.indices[check] === -1 ? NaN : signOf(measure) * without.valueOf(check, measure),
    );
  return {
    ...counted,
    withoutX: valuesOf(view.x),
    withoutY: valuesOf(view.y),
    withoutIndex: without.indices,
    // The best of a solved measure is the same in every view; its values may not have been kept.
    ...bestOfBoth(counted, ranked),
    front: ranked.front,
    frontInThree: ranked.frontInThree,
    band: ranked.band,
    density: ranked.density,
  };
}

function bestOfBoth(counted: ChunkResult, ranked: ChunkResult): Pick<ChunkResult, 'bestValue' | 'bestIndex'> {
  const choose = (from: (chunk: ChunkResult) => Float64Array) =>
    Float64Array.from(MEASURE_IDS, (measure, i) => from(isSolved(measure) ? counted : ranked)[i]!);
  return { bestValue: choose((chunk) => chunk.bestValue), bestIndex: choose((chunk) => chunk.bestIndex) };
}
