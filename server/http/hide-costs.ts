import type { Evaluation } from '#shared/engine/evaluation.ts';

/** The evaluation for a reader who may not see rates: quantities and carbon stay, everything in money goes. The working holds none. */
export function hideCosts(evaluation: Evaluation): Evaluation {
  return {
    ...evaluation,
    measures: { ...evaluation.measures, costPerM: null },
    quantities: { ...evaluation.quantities, cost: null },
  };
}
