import { evaluateSection, type EvaluationContext } from '#shared/engine/evaluate.ts';
import type { CheckId, Evaluation } from '#shared/engine/evaluation.ts';
import type { MeasureId } from '#shared/engine/measures.ts';
import { InvalidSectionError } from '#shared/engine/preconditions.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { stepsFrom, type Step, type StepSetting } from './steps.ts';

/** What is told of each step, beside whether it still meets its checks. */
export const STEP_MEASURES = [
  'steelKgPerM',
  'costPerM',
  'designStrengthNmm',
  'curvatureDuctility',
] as const satisfies readonly MeasureId[];
export type StepMeasure = (typeof STEP_MEASURES)[number];

export interface Neighbour extends Step {
  readonly meets: boolean;
  readonly failing: readonly CheckId[];
  /** The neighbour's own values; null where there is none, or a rate is missing. */
  readonly values: Readonly<Record<StepMeasure, number | null>>;
}

/** Sections one step away, judged by the same basis, demand and rules. One that cannot be stated at all is left out. */
export function neighboursOf(
  section: SectionInput,
  context: EvaluationContext,
  setting: StepSetting,
): Neighbour[] {
  return stepsFrom(section, setting).flatMap((step) => {
    try {
      return [{ ...step, ...judged(evaluateSection(step.section, context)) }];
    } catch (error) {
      // A slab as thick as the beam, for one: no section, so no neighbour.
      if (error instanceof InvalidSectionError) return [];
      throw error;
    }
  });
}

function judged({ meetsListedChecks, checks, measures }: Evaluation) {
  const values = Object.fromEntries(STEP_MEASURES.map((id) => [id, measures[id]]));
  return {
    meets: meetsListedChecks,
    failing: checks.filter((check) => !check.passes).map((check) => check.id),
    values: values as Neighbour['values'],
  };
}

/** The best of the neighbours that meet their checks, by a measure where less is better; null where none is better. */
export function betterNeighbour(
  neighbours: readonly Neighbour[],
  own: number | null,
  measure: 'steelKgPerM' | 'costPerM',
): Neighbour | null {
  if (own === null) return null;
  let best: Neighbour | null = null;
  for (const one of neighbours) {
    const value = one.values[measure];
    if (!one.meets || value === null || value >= (best?.values[measure] ?? own)) continue;
    best = one;
  }
  return best;
}

/** Cost per metre where one rate is a quarter lower or higher; every part of the cost is proportional to its rate. */
export interface RateShift {
  readonly rate: 'bars' | 'stirrups' | 'concrete' | 'formwork';
  /** Change of the cost for a rise of a quarter; the same with a minus for a fall. */
  readonly byQuarter: number;
  readonly shareOfCost: number;
}

export const RATE_SHIFT = 0.25;

/** What each rate does to the cost; empty where the cost is not known. */
export function rateShiftsOf({ quantities }: Evaluation): RateShift[] {
  const { cost } = quantities;
  if (cost?.total == null || cost.total === 0) return [];
  const { total } = cost;
  const parts = [
    ['bars', cost.steel],
    ['stirrups', cost.stirrups],
    ['concrete', cost.concrete],
    ['formwork', cost.formwork],
  ] as const;
  return parts.flatMap(([rate, part]) =>
    part === null || part === 0 ? [] : [{ rate, byQuarter: RATE_SHIFT * part, shareOfCost: part / total }],
  );
}
