import type { ChunkResult } from '#shared/sweep/chunk.ts';
import type { KeptPiece } from '#shared/sweep/feasible-keeper.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import type { Keeping } from '#shared/sweep/sweep-range.ts';
import type { Widening } from '#shared/sweep/widening.ts';

/** What the pool sends to a thread: the sections [from, to) of one view of one problem. */
export interface SweepTask {
  /** The same for every task of one problem and view; a thread keeps what it prepared under it. */
  readonly key: string;
  readonly problem: SweepProblem;
  readonly view: View;
  readonly from: number;
  readonly to: number;
  /** Where given, from and to are places among the sections that are new beside another run's. */
  readonly widening: Widening | null;
  /** What is kept for other views; null for nothing. */
  readonly keeping: Keeping | null;
  /** One shared cell, looked at between batches: not zero means stop. */
  readonly cancelFlag: Int32Array;
}

/** What is done when it was told to stop is [from, doneTo). */
export interface SweepReply {
  readonly chunk: ChunkResult;
  readonly doneTo: number;
  readonly kept: KeptPiece | null;
}
