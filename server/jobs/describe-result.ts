import type { SearchProgress } from '#shared/contract/records.ts';
import type { ViewResult } from '#shared/sweep/result.ts';
import type { RunMethod } from '#shared/sweep/run-method.ts';
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

/** The same of a search by bounds, with how far it is. */
export function describeSearch(
  result: ViewResult,
  { boxesOpen, boxesClosed, provenUnnecessary }: SearchProgress,
): ViewChange {
  return { ...describeResult(result), search: { boxesOpen, boxesClosed, provenUnnecessary } };
}

/** What somebody who cancelled a view is left with. */
export function describePart(
  evaluated: number,
  { sectionCount, method }: { readonly sectionCount: number; readonly method: RunMethod },
): string {
  const share = new Intl.NumberFormat('en', { maximumFractionDigits: 1, style: 'percent' });
  const count = new Intl.NumberFormat('en');
  if (method === 'bounds')
    return `Cancelled after ${count.format(evaluated)} of ${count.format(sectionCount)} sections were evaluated: the front is not proven`;
  return `Cancelled after ${count.format(evaluated)} of ${count.format(sectionCount)} sections (${share.format(
    sectionCount === 0 ? 0 : evaluated / sectionCount,
  )})`;
}
