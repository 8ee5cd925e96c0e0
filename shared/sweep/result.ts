import type { CheckId } from '../engine/evaluation.ts';
import type { MeasureId } from '../engine/measures.ts';
import type { View } from './problem.ts';

/** A section of the space with the two measures of the view. */
export interface Point {
  readonly index: number;
  readonly x: number;
  readonly y: number;
}

/** A vertex of the front: the lowest index stands for all sections that tie with it exactly. */
export interface FrontPoint extends Point {
  /** Sections with exactly these two measures, the representative included. */
  readonly tieCount: number;
  /** The lowest indices among the ties, ascending, at most MAX_TIES_KEPT. */
  readonly ties: readonly number[];
}

/** A vertex of the front in three measures. */
export interface FrontPointInThree extends FrontPoint {
  readonly z: number;
}

/** Sections that no other equals or beats in all three measures at once. */
export interface ResultInThree {
  /** How many there are, exact ties as one; null where they were too many to be held. */
  readonly count: number | null;
  /** From best x, then best y; the first MOST_SHOWN_IN_THREE where there are more. */
  readonly points: readonly FrontPointInThree[];
}

/** Feasible sections in one cell of the density grid; bounds are [x0, x1) × [y0, y1) in the measures' SI units. */
export interface DensityCell {
  readonly x0: number;
  readonly x1: number;
  readonly y0: number;
  readonly y1: number;
  readonly count: number;
}

/** One value of one axis and how many feasible sections have it. */
export interface AxisCount {
  readonly value: number;
  readonly feasible: number;
  readonly evaluated: number;
}

export interface CheckFailures {
  readonly check: CheckId;
  /** Sections failing it, whatever else they fail. */
  readonly failed: number;
  /** Sections failing nothing else; for bar fit, sections of which nothing that needs placed bars could be asked. */
  readonly failedOnlyThis: number;
  /** Sections that pass every check before it and fail it. Undefined in results from before it was counted. */
  readonly failedFirst?: number | undefined;
  /** Best section in the leading measure among those failing only this; null where there is none or, as for bar fit, it
   * has no numbers. */
  readonly bestWithout: Point | null;
}

/** The axes whose use at their limit is worth a warning. */
export const EDGE_AXES = ['width', 'depth', 'fc'] as const;
export type EdgeAxis = (typeof EDGE_AXES)[number];

/** How much of the front sits on an end of a range that has more than one value. */
export interface EdgeShare {
  readonly axis: EdgeAxis;
  readonly end: 'low' | 'high';
  readonly share: number;
}

/** What a search by bounds says of the sections it never evaluated. */
export interface BoundsProof {
  /** Sections of boxes that fail a check whole, or are beaten whole: none of them can be on the front. */
  readonly provenUnnecessary: number;
  /** Boxes whose bounds were looked at. */
  readonly boxes: number;
  /** False for the front of a search that was stopped: it may yet be beaten. */
  readonly isProven: boolean;
  /** Whether the near-best band was looked for too: it is exact then. */
  readonly hasBand: boolean;
}

interface AxisCounts {
  readonly width: readonly AxisCount[];
  readonly depth: readonly AxisCount[];
  readonly fc: readonly AxisCount[];
}

/**
 * The finished (or partial) result of a run seen through one view. Plain JSON. A search by bounds (`bounds` is there)
 * leaves most sections unseen: what would have to be counted over all of them is null, or a list left empty.
 */
export interface ViewResult {
  readonly view: View;
  readonly sectionCount: number;
  readonly evaluated: number;
  /** Null by bounds. */
  readonly feasible: number | null;
  readonly cannotFit: number | null;
  /** Empty by bounds, as are the cloud, and the best of measures other than the two of the view. */
  readonly failures: readonly CheckFailures[];
  /** Non-dominated sections ordered from best x. */
  readonly front: readonly FrontPoint[];
  /** Of a view with a third measure only. */
  readonly frontInThree?: ResultInThree | undefined;
  /** Feasible sections within 10 % of the best x, best first, at most MAX_BAND_KEPT. */
  readonly band: readonly Point[];
  readonly isBandCut: boolean;
  /** Best feasible section of each measure, in its own direction. */
  readonly best: readonly { readonly measure: MeasureId; readonly index: number; readonly value: number }[];
  readonly density: readonly DensityCell[];
  /** Null by bounds. */
  readonly axisCounts: AxisCounts | null;
  readonly edges: readonly EdgeShare[];
  /** How the front was proven; undefined where every section was evaluated. */
  readonly bounds?: BoundsProof | undefined;
  /** 16 hex digits in groups of four; equal for equal results whatever the threads and chunks. */
  readonly hash: string;
}
