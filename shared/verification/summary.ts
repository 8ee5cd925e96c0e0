import type { Comparison } from './comparison.ts';
import type { ComputedCase, TopicResult } from './book.ts';

export interface WorstDifference {
  readonly caseId: string;
  readonly comparison: Comparison;
}

/** What stands at the head of the book for one topic or for all. */
export interface Summary {
  readonly cases: number;
  readonly reproduced: number;
  readonly values: number;
  readonly valuesWithin: number;
  readonly outOfScope: number;
  /** Of the values held to a tolerance; null where there is none. */
  readonly worst: WorstDifference | null;
}

/** A value that is no number differs more than any other. */
const sizeOf = ({ relative }: Comparison) => (Number.isNaN(relative) ? Infinity : relative);

/** The largest relative difference, without the values that must only lie below the printed ones. */
export function findWorst(computed: readonly ComputedCase[]): WorstDifference | null {
  let worst: WorstDifference | null = null;
  for (const { published, comparisons } of computed)
    for (const comparison of comparisons)
      if (
        comparison.allowed.kind !== 'below' &&
        (worst === null || sizeOf(comparison) > sizeOf(worst.comparison))
      )
        worst = { caseId: published.id, comparison };
  return worst;
}

export function summarise(topics: readonly TopicResult[]): Summary {
  const computed = topics.flatMap((topic) => topic.computed);
  const comparisons = computed.flatMap((one) => one.comparisons);
  return {
    cases: computed.length,
    reproduced: computed.filter(({ isReproduced }) => isReproduced).length,
    values: comparisons.length,
    valuesWithin: comparisons.filter(({ isWithin }) => isWithin).length,
    outOfScope: topics.reduce((sum, { outOfScope }) => sum + outOfScope.length, 0),
    worst: findWorst(computed),
  };
}
