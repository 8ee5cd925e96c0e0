import { MEASURE_DIRECTION } from '#shared/engine/measures.ts';
import type { CheckId } from '#shared/engine/evaluation.ts';
import type { ViewResult } from '#shared/sweep/result.ts';

/** What one check costs: the best that would be had without it, in the leading measure. */
export interface PriceOfCheck {
  readonly check: CheckId;
  readonly index: number;
  readonly without: number;
  /** The best there is with it; null where nothing meets every check. */
  readonly best: number | null;
}

/** The checks whose removal would improve the leading measure, the dearest first. */
export function pricesOfChecks(result: ViewResult): PriceOfCheck[] {
  const best = result.front[0]?.x ?? null;
  const sign = MEASURE_DIRECTION[result.view.x] === 'less' ? 1 : -1;
  return result.failures
    .flatMap(({ check, bestWithout }): PriceOfCheck[] => {
      if (bestWithout === null) return [];
      const { index, x } = bestWithout;
      if (best === null) return [{ check, index, without: x, best }];
      return sign * (best - x) > 0 ? [{ check, index, without: x, best }] : [];
    })
    .sort((a, b) => sign * (a.without - b.without));
}
