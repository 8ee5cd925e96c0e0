import { MEASURE_IDS, type MeasureId } from '../engine/measures.ts';
import type { Rates } from '../engine/section.ts';
import { amountsOfRow, pricingsOf, rowDigits, type AmountTables } from './amount-tables.ts';
import type { ChunkResult } from './chunk.ts';
import { forEachRun, type FeasibleFrame } from './feasible-frame.ts';
import type { BuiltSteel } from './frame-builder.ts';
import { writeAmounts } from './kernel-amounts.ts';
import { DESIGN_STRENGTH, MU_PHI, UTILISATION } from './kernel-places.ts';
import type { View } from './problem.ts';
import type { RowFilter } from './row-filter.ts';
import { mergeChunks } from './merge.ts';
import { Tally } from './tally.ts';

/** Measures that take an equilibrium: kept with the section, or worked out again by the hot loop. */
const SOLVED: readonly MeasureId[] = ['curvatureDuctility', 'designStrengthNmm', 'utilisation'];

export const isSolved = (measure: MeasureId): boolean => SOLVED.includes(measure);

/** Is handed each section that is ranked, with its measures in a row that is reused; a row starts with `beginRow`. */
export interface RankWitness {
  beginRow(rowNumber: number): void;
  see(index: number, depthMm: number, steel: BuiltSteel, measures: Float64Array): void;
}

export interface Ranking {
  readonly tables: AmountTables;
  readonly view: View;
  readonly rates: Rates | null;
  readonly muNmm: number | null;
  readonly filter: RowFilter | null;
  readonly witness: RankWitness | null;
}

/**
 * Ranks kept sections in any view at any rates, through the tally that a sweep counts by. Of the result the front, band,
 * density and best values are the sweep's; of a frame without numbers the solved measures are NaN.
 */
export function rankFrames(frames: readonly FeasibleFrame[], ranking: Ranking): ChunkResult {
  const newTally = () => new Tally(ranking.tables.space, ranking.view);
  const parts: Tally[] = [];
  let end = Infinity;
  for (const frame of frames) {
    // A tally takes indices as they ascend; frames of a run that was widened may lie between others.
    if (frame.count === 0) continue;
    if (frame.from < end) parts.push(newTally());
    end = rankFrame(frame, ranking, parts.at(-1)!);
  }
  return (parts.length === 0 ? [newTally()] : parts).map((part) => part.finish()).reduce(mergeChunks);
}

/** Answers where the frame's last run ends. */
function rankFrame(frame: FeasibleFrame, ranking: Ranking, tally: Tally): number {
  const { tables, filter, witness } = ranking;
  const { depthsMm } = tables.space;
  const depthCount = depthsMm.length;
  const pricings = pricingsOf(tables, ranking.rates);
  const muNmm = ranking.muNmm ?? NaN;
  const measures = new Float64Array(MEASURE_IDS.length);
  const steel: BuiltSteel = { spacingMm: 0, skinKg: 0 };
  const { numbers, spacingsMm, skinsKg } = frame;
  const muPhi = numbers?.muPhi ?? null;
  const design = numbers?.design ?? null;
  const { values: spacingValues, codes: spacingCodes } = spacingsMm;
  const { values: skinValues, codes: skinCodes } = skinsKg;
  measures[MU_PHI] = measures[DESIGN_STRENGTH] = measures[UTILISATION] = NaN;

  function rankPart(rowNumber: number, from: number, to: number, at: number): void {
    const digits = rowDigits(tables.space, rowNumber);
    if (filter !== null && !filter.isRowWithin(digits)) return;
    const amounts = amountsOfRow(tables, digits, pricings[digits.fcAt]!);
    witness?.beginRow(rowNumber);
    const firstIndex = rowNumber * depthCount;
    for (let j = from; j < to; j++) {
      const place = at + j - from;
      steel.spacingMm = spacingValues[spacingCodes === null ? 0 : spacingCodes[place]!]!;
      steel.skinKg = skinValues[skinCodes === null ? 0 : skinCodes[place]!]!;
      writeAmounts(amounts, depthsMm[j]!, steel, measures);
      if (muPhi !== null) {
        measures[MU_PHI] = muPhi[place]!;
        measures[DESIGN_STRENGTH] = design![place]!;
        measures[UTILISATION] = muNmm / design![place]!;
      }
      if (filter !== null && !filter.isWithin(measures)) continue;
      tally.addFeasible(firstIndex + j, measures);
      if (witness !== null) witness.see(firstIndex + j, depthsMm[j]!, steel, measures);
    }
  }

  let end = frame.from;
  forEachRun(frame, (first, length, at) => {
    end = first + length;
    let rowNumber = Math.floor(first / depthCount);
    let from = first - rowNumber * depthCount;
    for (let done = 0; done < length; rowNumber++, from = 0) {
      const to = Math.min(depthCount, from + length - done);
      rankPart(rowNumber, from, to, at + done);
      done += to - from;
    }
  });
  return end;
}
