import { compare, type Comparison } from './comparison.ts';
import { COMPUTATIONS } from './computations.ts';
import { OUT_OF_SCOPE } from './out-of-scope.ts';
import type { CaseInputs, PublishedCase } from './published-case.ts';
import { TOPICS, type Topic } from './topics.ts';

/** A case with what this engine makes of it. */
export interface ComputedCase {
  readonly published: PublishedCase;
  readonly comparisons: readonly Comparison[];
  readonly isReproduced: boolean;
}

export interface CaseOutOfScope {
  readonly published: PublishedCase;
  readonly reason: string;
}

export interface TopicResult {
  readonly topic: Topic;
  readonly computed: readonly ComputedCase[];
  readonly outOfScope: readonly CaseOutOfScope[];
}

export const isComputed = ({ id }: PublishedCase): boolean => Object.hasOwn(COMPUTATIONS, id);

/** Every printed number of a case that has a computation, beside ours. */
export function computeCase(published: PublishedCase): ComputedCase {
  const computation = COMPUTATIONS[published.id];
  if (!computation) throw new Error(`${published.id} has no computation`);
  const computed = computation(published.inputs as unknown as CaseInputs, published.inputs);
  const comparisons = compare(published, computed);
  return {
    published,
    comparisons,
    isReproduced: comparisons.length > 0 && comparisons.every(({ isWithin }) => isWithin),
  };
}

export function computeTopic(topic: Topic): TopicResult {
  return {
    topic,
    computed: topic.cases.filter(isComputed).map(computeCase),
    outOfScope: topic.cases
      .filter((published) => !isComputed(published))
      .map((published) => ({ published, reason: OUT_OF_SCOPE[published.id] ?? 'not computed' })),
  };
}

export const computeBook = (): TopicResult[] => TOPICS.map(computeTopic);
