import type { CurveChoices } from './curve-choices.ts';
import { ruleSetOf } from './rules/rule-set-of.ts';
import type { DesignBasis, DuctilityMeasure } from './section.ts';

/** What μφ is held against the target; the closed path unless the basis says otherwise. */
export const ductilityMeasureOf = (basis: Pick<DesignBasis, 'ductilityMeasure'>): DuctilityMeasure =>
  basis.ductilityMeasure ?? 'closed';

/** Whether μφ of this basis is read off the full curve. */
export const isCurveMeasure = (basis: Pick<DesignBasis, 'ductilityMeasure'>) =>
  ductilityMeasureOf(basis) !== 'closed';

/**
 * The laws of the full curve: the basis's own, else those of its design code. Where a code works with design strengths,
 * every law's peak is lowered by the code's factor unless the basis sets it.
 */
export function curveChoicesOf(basis: DesignBasis): CurveChoices {
  const { curveConcrete } = ruleSetOf(basis);
  const chosen = basis.curve ?? {
    concreteLaw: curveConcrete?.law ?? 'hognestad',
    steelLaw: 'elastic-plastic',
  };
  const peakShare = chosen.peakShare ?? curveConcrete?.peakShare;
  return peakShare === chosen.peakShare ? chosen : { ...chosen, peakShare };
}
