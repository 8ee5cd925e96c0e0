import type { CheckId } from '#shared/engine/evaluation.ts';
import type { ViewResult } from '#shared/sweep/result.ts';

/** One check asked of the sections that the checks before it left. */
export interface SequenceStep {
  readonly check: CheckId;
  /** Sections that fail it first. */
  readonly taken: number;
  /** Sections left after it. */
  readonly left: number;
}

export interface CheckSequence {
  readonly evaluated: number;
  /** Checks that took some, in the order they are asked. */
  readonly steps: readonly SequenceStep[];
  /** Checks that took none of those left to them, though some section fails them. */
  readonly idle: readonly CheckId[];
  readonly feasible: number;
}

/**
 * How many sections are left after each check, one after another. Null where that was not counted: a result from before it
 * was, or one by bounds, which leaves most sections unseen.
 */
export function checkSequence(result: ViewResult): CheckSequence | null {
  const { failures, feasible, evaluated } = result;
  if (feasible === null || failures.length === 0) return null;
  let left = evaluated;
  const steps: SequenceStep[] = [];
  const idle: CheckId[] = [];
  for (const { check, failed, failedFirst } of failures) {
    if (failedFirst === undefined) return null;
    left -= failedFirst;
    if (failedFirst > 0) steps.push({ check, taken: failedFirst, left });
    else if (failed > 0) idle.push(check);
  }
  return { evaluated, steps, idle, feasible };
}
