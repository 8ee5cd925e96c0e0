import { MEASURE_IDS } from '../engine/measures.ts';
import type { ChunkResult } from './chunk.ts';
import { emptyChunk } from './chunk.ts';
import { forEachRun, type FeasibleFrame } from './feasible-frame.ts';
import { FrameBuilder, type BuiltSteel } from './frame-builder.ts';
import { DESIGN_STRENGTH, MU_PHI } from './kernel-places.ts';
import type { Space } from './problem.ts';
import { renumbering, type Widening } from './widening.ts';

/** Kept sections by their numbers in the wider space; null where they cannot be kept. */
export function takeOverFrame(
  frame: FeasibleFrame,
  widening: Widening,
  wide: Space,
): Uint8Array<ArrayBuffer> | null {
  const indexOf = renumbering(widening, wide);
  const { numbers, spacingsMm, skinsKg } = frame;
  const builder = new FrameBuilder(numbers !== null);
  const steel: BuiltSteel = { spacingMm: 0, skinKg: 0 };
  const measures = new Float64Array(MEASURE_IDS.length).fill(NaN);
  forEachRun(frame, (first, length, at) => {
    for (let i = 0; i < length; i++) {
      const place = at + i;
      steel.spacingMm = spacingsMm.values[spacingsMm.codes?.[place] ?? 0]!;
      steel.skinKg = skinsKg.values[skinsKg.codes?.[place] ?? 0]!;
      if (numbers !== null) {
        measures[MU_PHI] = numbers.muPhi[place]!;
        measures[DESIGN_STRENGTH] = numbers.design[place]!;
      }
      builder.add(indexOf(first + i), steel, measures);
    }
  });
  return builder.finish();
}

/** What the narrower sweep counted, as the wider one counts it; without what is ranked anew, the front and all beside it. */
export function takeOverCounts(counted: ChunkResult, { places }: Widening, wide: Space): ChunkResult {
  const spread = (from: Float64Array, length: number, at: readonly number[]) => {
    const to = new Float64Array(length);
    from.forEach((count, i) => (to[at[i]!] = count));
    return to;
  };
  const widths = (from: Float64Array) => spread(from, wide.widthsMm.length, places.width);
  const depths = (from: Float64Array) => spread(from, wide.depthsMm.length, places.depth);
  const strengths = (from: Float64Array) => spread(from, wide.fcMPa.length, places.fc);
  const { front, band, density, withoutX, withoutY, withoutIndex } = emptyChunk();
  const renumber = renumbering({ places, taken: 0, added: 0 }, wide);
  return {
    ...counted,
    bestIndex: Float64Array.from(MEASURE_IDS, (_, i) =>
      counted.bestIndex[i] === -1 ? -1 : renumber(counted.bestIndex[i]!),
    ),
    ...{ front, band, density, withoutX, withoutY, withoutIndex, frontInThree: undefined },
    widthFeasible: widths(counted.widthFeasible),
    widthEvaluated: widths(counted.widthEvaluated),
    depthFeasible: depths(counted.depthFeasible),
    depthEvaluated: depths(counted.depthEvaluated),
    fcFeasible: strengths(counted.fcFeasible),
    fcEvaluated: strengths(counted.fcEvaluated),
  };
}
