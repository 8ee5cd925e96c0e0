import type { ViewResult } from '#shared/sweep/result.ts';
import type { ViewChange } from './change-view.ts';

/** What a view's row keeps of its result, whole or in part. */
export function describeResult(result: ViewResult): ViewChange {
  return {
    result,
    evaluated: result.evaluated,
    merged: result.evaluated,
    feasible: result.feasible,
    frontCount: result.front.length,
  };
}

export function describePart(evaluated: number, sectionCount: number): string {
  const share = new Intl.NumberFormat('en', { maximumFractionDigits: 1, style: 'percent' });
  const count = new Intl.NumberFormat('en');
  return `Cancelled after ${count.format(evaluated)} of ${count.format(sectionCount)} sections (${share.format(
    sectionCount === 0 ? 0 : evaluated / sectionCount,
  )})`;
}
