import { MEASURE_IDS } from '../engine/measures.ts';
import type { ChunkResult } from './chunk.ts';
import { Kernel, type SweepColumns } from './kernel.ts';
import { placementAt, type PreparedSweep } from './prepared-sweep.ts';
import { Tally } from './tally.ts';

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
  finish(): ChunkResult;
}

/** Steps added up in one tally: merging a result after each step would cost some 5 % of the sweep. */
export function openSweep(prepared: PreparedSweep): SweepSteps {
  const tally = new Tally(prepared.space, prepared.view);
  const kernel = new Kernel(prepared, tally, null);
  return {
    advance: (from, to) => forEachRow(prepared, from, to, kernel, tally),
    isBeaten: (x, y) => tally.isBeaten(x, y),
    finish: () => tally.finish(),
  };
}

/** The same loop with every section's outcome written out: failure mask and measures (NaN where there is no number). */
export function sweepColumns(prepared: PreparedSweep, from: number, to: number): SweepColumns {
  const columns = {
    masks: new Uint32Array(to - from),
    measures: new Float64Array((to - from) * MEASURE_IDS.length).fill(NaN),
  };
  const tally = new Tally(prepared.space, prepared.view);
  forEachRow(prepared, from, to, new Kernel(prepared, tally, { ...columns, first: from }), tally);
  return columns;
}

/** Walks the axes around the depth with everything invariant hoisted, and runs the hot loop on each row. */
function forEachRow(prepared: PreparedSweep, from: number, to: number, kernel: Kernel, tally: Tally): void {
  const { space } = prepared;
  if (!(from >= 0 && from <= to && to <= space.size))
    throw new RangeError(`[${from}, ${to}) is not a range of this space of ${space.size} sections`);
  const depthCount = space.depthsMm.length;
  for (let index = from; index < to;) {
    const rowNumber = Math.floor(index / depthCount);
    const firstIndex = rowNumber * depthCount;
    const end = Math.min(firstIndex + depthCount, to);
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
    const widthAt = Math.floor(rest / (space.stirrups.length * space.coversMm.length));
    const feasible = kernel.runRow(
      {
        placement,
        tension: placement.tension[tensionAt]!,
        compression: placement.compression[compressionAt]!,
        concrete: prepared.concretes[fcAt]!,
        shear: placement.shear[fcAt]!,
        fyMPa: space.fyMPa[fyAt]!,
      },
      { firstIndex, from: index - firstIndex, to: end - firstIndex },
    );
    tally.widthEvaluated[widthAt]! += end - index;
    tally.fcEvaluated[fcAt]! += end - index;
    tally.widthFeasible[widthAt]! += feasible;
    tally.fcFeasible[fcAt]! += feasible;
    index = end;
  }
}
