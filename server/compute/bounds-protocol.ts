import type { MessagePort } from 'node:worker_threads';
import type { BandPoint } from '#shared/sweep/band.ts';
import type { SearchShare, SearchState } from '#shared/sweep/bounded-search.ts';
import type { ChunkResult } from '#shared/sweep/chunk.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';

/** The measures of a section that was found, oriented: less is better in both. */
export interface Beater {
  readonly x: number;
  readonly y: number;
}

/** What a thread is sent: one share of the search of a space. */
export interface BoundsTask {
  readonly problem: SweepProblem;
  readonly view: View;
  readonly share: SearchShare;
  /** Found by an earlier search of the same space that was stopped. */
  readonly known: readonly Beater[];
  /** One shared cell, looked at between slices: not zero means stop. */
  readonly cancelFlag: Int32Array;
  /** Hears what the other shares found (`Beater[]`), tells how far this one is (`BoundsReport`). */
  readonly port: MessagePort;
}

export interface BoundsReport {
  readonly state: SearchState;
  /** Oriented. */
  readonly found: ChunkResult['front'];
}

export interface BoundsReply extends BoundsReport {
  /** False where it was told to stop. */
  readonly isDone: boolean;
  /** Near-best sections, oriented. */
  readonly near: readonly BandPoint[];
}
