import { CHECK_IDS, type CheckId } from '#shared/engine/evaluation.ts';
import { MEASURE_DIRECTION, MEASURE_IDS, type MeasureId } from '#shared/engine/measures.ts';
import type { ViewResult } from '#shared/sweep/result.ts';

/** A count of both runs; null where a run does not count it, as by bounds. */
export interface CountDifference {
  readonly label: string;
  readonly before: number | null;
  readonly after: number | null;
}

export interface CheckDifference {
  readonly check: CheckId;
  /** Share of all sections that fail it. */
  readonly before: number;
  readonly after: number;
  readonly failedBefore: number;
  readonly failedAfter: number;
}

/** The best of one measure in both runs; null where none meets every check, or by bounds for measures not asked. */
export interface BestDifference {
  readonly measure: MeasureId;
  readonly before: { readonly value: number; readonly index: number } | null;
  readonly after: { readonly value: number; readonly index: number } | null;
  readonly verdict: 'better' | 'worse' | 'same' | null;
}

export function countDifferences(baseline: ViewResult, other: ViewResult): readonly CountDifference[] {
  const row = (label: string, of: (result: ViewResult) => number | null): CountDifference => ({
    ...{ label, before: of(baseline), after: of(other) },
  });
  return [
    row('Sections in the space', ({ sectionCount }) => sectionCount),
    row('Evaluated', ({ evaluated }) => evaluated),
    row('Bars cannot fit', ({ cannotFit }) => cannotFit),
    row('Meet every check', ({ feasible }) => feasible),
    row('On the front', ({ front }) => front.length),
  ];
}

/** Checks some section of either run fails, in the order of the checks; none where a run did not count them. */
export function checkDifferences(baseline: ViewResult, other: ViewResult): readonly CheckDifference[] {
  if (baseline.failures.length === 0 || other.failures.length === 0) return [];
  const failedOf = ({ failures }: ViewResult, check: CheckId) =>
    failures.find((one) => one.check === check)?.failed ?? 0;
  return CHECK_IDS.flatMap((check) => {
    const [failedBefore, failedAfter] = [failedOf(baseline, check), failedOf(other, check)];
    if (failedBefore === 0 && failedAfter === 0) return [];
    const before = failedBefore / Math.max(1, baseline.evaluated);
    const after = failedAfter / Math.max(1, other.evaluated);
    return [{ check, before, after, failedBefore, failedAfter }];
  });
}

const SAME_SHARE = 1e-9;

/** Whether a value moved to the better side of the measure. */
export function verdictOf(measure: MeasureId, before: number, after: number): 'better' | 'worse' | 'same' {
  if (Math.abs(after - before) <= SAME_SHARE * Math.max(Math.abs(before), Math.abs(after))) return 'same';
  return after < before === (MEASURE_DIRECTION[measure] === 'less') ? 'better' : 'worse';
}

export function bestDifferences(baseline: ViewResult, other: ViewResult): readonly BestDifference[] {
  const bestOf = ({ best }: ViewResult, measure: MeasureId) =>
    best.find((one) => one.measure === measure) ?? null;
  return MEASURE_IDS.flatMap((measure): BestDifference[] => {
    const [before, after] = [bestOf(baseline, measure), bestOf(other, measure)];
    if (before === null && after === null) return [];
    const verdict = before === null || after === null ? null : verdictOf(measure, before.value, after.value);
    return [{ measure, before, after, verdict }];
  });
}
