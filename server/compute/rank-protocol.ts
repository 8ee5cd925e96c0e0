import type { Rates } from '#shared/engine/section.ts';
import type { ChunkResult } from '#shared/sweep/chunk.ts';
import type { NearMisses } from '#shared/sweep/near-misses.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import type { RangeFilters } from '#shared/sweep/range-filters.ts';
import type { RateWinner } from '#shared/sweep/rate-watch.ts';
import type { Widening } from '#shared/sweep/widening.ts';

/** Part of a block of kept sections, shared between threads. */
export interface BlockPart {
  readonly block: SharedArrayBuffer;
  readonly from: number;
  readonly to: number;
}

/** Kept sections ranked in a view at some rates. */
export interface RankTask {
  readonly kind: 'rank';
  readonly part: BlockPart;
  /** The run's own, with its own rates. */
  readonly problem: SweepProblem;
  readonly view: View;
  readonly rates: Rates | null;
  readonly filters: RangeFilters;
  /** Also who wins at the run's own rates, and every leading value near the best. */
  readonly isCompared: boolean;
}

export interface RankReply {
  readonly chunk: ChunkResult;
  /** Sections within the filters. */
  readonly count: number;
  /** Oriented leading values within the widest band of the part's best. */
  readonly near: Float64Array;
  readonly winner: RateWinner | null;
}

/** Sections judged anew, where a run kept none. */
export interface JudgeTask {
  readonly kind: 'judge';
  readonly problem: SweepProblem;
  readonly view: View;
  readonly from: number;
  readonly to: number;
}

export interface JudgeReply {
  readonly chunk: ChunkResult;
  readonly frame: Uint8Array;
  readonly nearMisses: NearMisses;
}

/** Kept sections by their numbers in a wider space, and ranked there. */
export interface TakeTask {
  readonly kind: 'take';
  readonly part: BlockPart;
  readonly problem: SweepProblem;
  readonly view: View;
  readonly widening: Widening;
}

export interface TakeReply {
  readonly chunk: ChunkResult;
  readonly frames: Uint8Array;
  readonly count: number;
}
