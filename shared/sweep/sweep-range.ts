import { MEASURE_IDS } from '../engine/measures.ts';
import type { ChunkResult } from './chunk.ts';
import type { Combination } from './combination.ts';
import { FeasibleKeeper, type KeptPiece } from './feasible-keeper.ts';
import { Kernel, type SweepColumns } from './kernel.ts';
import { placementAt, type PreparedSweep } from './prepared-sweep.ts';
import { Tally } from './tally.ts';
import type { AddedSections, VisitRow } from './widening.ts';

/**
 * Evaluates the sections with index in [from, to) and adds them up.
 * Agrees with `evaluateSection` bit for bit in every measure and every check; a property test holds the two together.
 * Cost: see bench/sweep.ts.
 */
export function sweepRange(prepared: PreparedSweep, from: number, to: number): ChunkResult {
  const steps = openSweep(prepared);
  steps.advance(from, to);
  return steps.finish();
}

/** A range done in steps, for who looks up between them; each step starts where the last one ended or later. */
export interface SweepSteps {
  advance(from: number, to: number): void;
  /** Whether a section found so far is at least as good as (x, y), oriented, in both measures and better in one. */
  isBeaten(x: number, y: number): boolean;
  /** Largest oriented x that a section of the near-best band can have, by those found so far. */
  bandReach(): number;
  finish(): ChunkResult;
  /** What was kept for other views; null where nothing was to be. */
  kept(): KeptPiece | null;
}

/** What of a sweep is kept for other views and rates: the sections that meet every check, with or without their numbers. */
export interface Keeping {
  readonly hasNumbers: boolean;
}

interface SweepOptions {
  readonly keeping?: Keeping | null;
  /** Steps go by the places of these sections instead of the space's indices. */
  readonly added?: AddedSections | null;
}

/** Steps added up in one tally: merging a result after each step would cost some 5 % of the sweep. */
export function openSweep(
  prepared: PreparedSweep,
  { keeping = null, added = null }: SweepOptions = {},
): SweepSteps {
  const tally = new Tally(prepared.space, prepared.view);
  const kernel = new Kernel(prepared, tally, null);
  const keeper = keeping && new FeasibleKeeper(keeping.hasNumbers, kernel.built);
  tally.keeper = keeper;
  const run = rowRunner(prepared, kernel, tally);
  return {
    advance: (from, to) =>
      added === null ? forEachRow(prepared, from, to, run) : added.visit(from, to, run),
    isBeaten: (x, y) => tally.isBeaten(x, y),
    bandReach: () => tally.bandReach,
    finish: () => tally.finish(),
    kept: () => keeper?.finish() ?? null,
  };
}

/** The same loop with every section's outcome written out: failure mask and measures (NaN where there is no number). */
export function sweepColumns(prepared: PreparedSweep, from: number, to: number): SweepColumns {
  const columns = {
    masks: new Uint32Array(to - from),
    measures: new Float64Array((to - from) * MEASURE_IDS.length).fill(NaN),
  };
  const tally = new Tally(prepared.space, prepared.view);
  const kernel = new Kernel(prepared, tally, { ...columns, first: from });
  forEachRow(prepared, from, to, rowRunner(prepared, kernel, tally));
  return columns;
}

/** Runs the hot loop on a part of one row, with everything invariant hoisted. */
function rowRunner(prepared: PreparedSweep, kernel: Kernel, tally: Tally): VisitRow {
  const depthCount = prepared.space.depthsMm.length;
  return (rowNumber, from, to) => {
    const { combination, widthAt, fcAt } = combinationAt(prepared, rowNumber);
    const feasible = kernel.runRow(combination, { firstIndex: rowNumber * depthCount, from, to });
    tally.widthEvaluated[widthAt]! += to - from;
    tally.fcEvaluated[fcAt]! += to - from;
    tally.widthFeasible[widthAt]! += feasible;
    tally.fcFeasible[fcAt]! += feasible;
  };
}

/** Walks the sections [from, to) row by row. */
function forEachRow({ space }: PreparedSweep, from: number, to: number, visitRow: VisitRow): void {
  if (!(from >= 0 && from <= to && to <= space.size))
    throw new RangeError(`[${from}, ${to}) is not a range of this space of ${space.size} sections`);
  const depthCount = space.depthsMm.length;
  for (let index = from; index < to;) {
    const rowNumber = Math.floor(index / depthCount);
    const firstIndex = rowNumber * depthCount;
    const end = Math.min(firstIndex + depthCount, to);
    visitRow(rowNumber, index - firstIndex, end - firstIndex);
    index = end;
  }
}

/** One row of depths: its combination, and where it stands on the axes that are counted. */
interface RowPlace {
  readonly combination: Combination;
  readonly widthAt: number;
  readonly fcAt: number;
}

export function combinationAt(prepared: PreparedSweep, rowNumber: number): RowPlace {
  const { space } = prepared;
  let rest = rowNumber;
  const fcAt = rest % space.fcMPa.length;
  rest = Math.floor(rest / space.fcMPa.length);
  const fyAt = rest % space.fyMPa.length;
  rest = Math.floor(rest / space.fyMPa.length);
  const compressionAt = rest % space.compression.length;
  rest = Math.floor(rest / space.compression.length);
  const tensionAt = rest % space.tension.length;
  rest = Math.floor(rest / space.tension.length);
  const placement = placementAt(prepared, rest);
  const combination = {
    placement,
    tension: placement.tension[tensionAt]!,
    compression: placement.compression[compressionAt]!,
    concrete: prepared.concretes[fcAt]!,
    shear: placement.shear[fcAt]!,
    fyMPa: space.fyMPa[fyAt]!,
  };
  return { combination, widthAt: Math.floor(rest / (space.stirrups.length * space.coversMm.length)), fcAt };
}
