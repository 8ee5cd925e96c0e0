import type { QuantityKind, WorkingStep } from './evaluation.ts';

/** A number put into a formula. */
export type Input = readonly [symbol: string, value: number, kind: QuantityKind];

/** One line of working. */
export const step = (
  id: string,
  topic: WorkingStep['topic'],
  [symbol, formula, value, kind]: readonly [string, string, number, QuantityKind],
  inputs: readonly Input[],
  clause: string,
): WorkingStep => ({
  id,
  topic,
  symbol,
  formula,
  inputs: inputs.map(([s, v, k]) => ({ symbol: s, value: v, kind: k })),
  value,
  kind,
  clause,
});

/** The clause of what follows from equilibrium and compatibility alone. */
export const STATICS = 'statics';
