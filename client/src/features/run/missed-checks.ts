import type { CheckId, CheckResult } from '#shared/engine/evaluation.ts';
import { MEASURE_DIRECTION } from '#shared/engine/measures.ts';
import type { ViewResult } from '#shared/sweep/result.ts';
import type { SectionSource } from './section-source.ts';

/** One step of the way from all sections to those that meet every check. */
export interface Rung {
  readonly words: string;
  readonly count: number;
}

/**
 * How many sections are left at each step: placed at all, missing no more than one check, missing none. Empty where a
 * search by bounds left most sections unseen.
 */
export function ladder(result: ViewResult): readonly Rung[] {
  const { feasible, cannotFit } = result;
  if (feasible === null || cannotFit === null) return [];
  const missOne = result.failures
    .filter(({ check }) => check !== 'bar-fit')
    .reduce((sum, { failedOnlyThis }) => sum + failedOnlyThis, 0);
  return [
    { words: 'evaluated', count: result.evaluated },
    { words: 'have bars that fit', count: result.evaluated - cannotFit },
    { words: 'miss one check at most', count: feasible + missOne },
    { words: 'meet every check', count: feasible },
  ];
}

/** One check that sections failed: how many, how many because of it alone, and the best that it alone keeps out. */
export interface MissedCheck {
  readonly check: CheckId;
  readonly failed: number;
  readonly failedOnlyThis: number;
  readonly nearest: {
    readonly index: number;
    /** In the leading measure. */
    readonly value: number;
    /** Better than the best there is with the check; null where nothing meets every check. */
    readonly isBetter: boolean | null;
    readonly result: CheckResult | null;
  } | null;
}

/** Every check that some section failed, the one that took most first. */
export function missedChecks(result: ViewResult, source: SectionSource): readonly MissedCheck[] {
  const best = result.front[0]?.x ?? null;
  const sign = MEASURE_DIRECTION[result.view.x] === 'less' ? 1 : -1;
  return result.failures
    .filter(({ failed }) => failed > 0)
    .map(({ check, failed, failedOnlyThis, bestWithout }): MissedCheck => {
      if (bestWithout === null) return { check, failed, failedOnlyThis, nearest: null };
      const { index, x } = bestWithout;
      const { checks } = source.evaluatedAt(index).evaluation;
      const nearest = {
        index,
        value: x,
        isBetter: best === null ? null : sign * (best - x) > 0,
        result: checks.find((one) => one.id === check) ?? null,
      };
      return { check, failed, failedOnlyThis, nearest };
    })
    .sort((a, b) => b.failed - a.failed);
}
