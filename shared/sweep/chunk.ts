import { CHECK_IDS } from '../engine/evaluation.ts';
import { MEASURE_IDS } from '../engine/measures.ts';
import type { BandPoint } from './band.ts';
import type { Density } from './density.ts';
import type { FrontInThree } from './front-in-three.ts';

/** A vertex of a chunk's front in oriented measures (less is better). */
export interface ChunkFrontPoint {
  readonly x: number;
  readonly y: number;
  readonly ties: number[];
  readonly tieCount: number;
}

/**
 * What one range of indices amounts to; plain data that crosses threads. Columns over CHECK_IDS, MEASURE_IDS or axis
 * values. x and y of front, band and best-without are oriented: less is better.
 */
export interface ChunkResult {
  readonly evaluated: number;
  readonly feasible: number;
  readonly failed: Float64Array;
  readonly failedOnly: Float64Array;
  /** Sections of which that check is the first they fail, in the order of CHECK_IDS: with the feasible ones they are all. */
  readonly failedFirst: Float64Array;
  /** Best section failing only that check; NaN and −1 for none. */
  readonly withoutX: Float64Array;
  readonly withoutY: Float64Array;
  readonly withoutIndex: Float64Array;
  /** Best oriented value and lowest index for each measure; NaN and −1 for none. */
  readonly bestValue: Float64Array;
  readonly bestIndex: Float64Array;
  readonly front: readonly ChunkFrontPoint[];
  /** Of a view with a third measure. */
  readonly frontInThree?: FrontInThree | undefined;
  readonly band: readonly BandPoint[];
  readonly density: Density;
  readonly widthFeasible: Float64Array;
  readonly widthEvaluated: Float64Array;
  readonly depthFeasible: Float64Array;
  readonly depthEvaluated: Float64Array;
  readonly fcFeasible: Float64Array;
  readonly fcEvaluated: Float64Array;
}

/** The result of no sections at all: the neutral element of merging. */
export function emptyChunk(): ChunkResult {
  const checks = CHECK_IDS.length;
  const measures = MEASURE_IDS.length;
  return {
    evaluated: 0,
    feasible: 0,
    failed: new Float64Array(checks),
    failedOnly: new Float64Array(checks),
    failedFirst: new Float64Array(checks),
    withoutX: new Float64Array(checks).fill(NaN),
    withoutY: new Float64Array(checks).fill(NaN),
    withoutIndex: new Float64Array(checks).fill(-1),
    bestValue: new Float64Array(measures).fill(NaN),
    bestIndex: new Float64Array(measures).fill(-1),
    front: [],
    band: [],
    density: { keys: new Uint32Array(0), counts: new Float64Array(0) },
    widthFeasible: new Float64Array(0),
    widthEvaluated: new Float64Array(0),
    depthFeasible: new Float64Array(0),
    depthEvaluated: new Float64Array(0),
    fcFeasible: new Float64Array(0),
    fcEvaluated: new Float64Array(0),
  };
}
