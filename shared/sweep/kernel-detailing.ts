import { barCoverMm } from '../engine/checks-detailing.ts';
import { isAtLeastTimes, isSameLength, isWithinLength } from '../engine/limits.ts';
import type { RuleSet } from '../engine/rules/rule-set.ts';
import type { Demand, UserRules } from '../engine/section.ts';
import type { Combination } from './combination.ts';
import { BAR_RULES, COLUMN_WIDTH, COMPRESSION_SHARE, CRACK_CONTROL, HANGER_BARS } from './kernel-places.ts';

/** The checks that look neither at the depth nor at the numbers. */
export function fixedMask({ placement, tension, compression }: Combination, rules: UserRules): number {
  let mask = 0;
  const hasBars = tension.barCount === tension.barCount;
  if (
    rules.requireHangers &&
    placement.stirrup &&
    hasBars &&
    !(Math.min(tension.barCount, compression.barCount) >= placement.stirrup.legs)
  )
    mask |= HANGER_BARS;
  if (rules.columnWidthMm !== null && !isSameLength(placement.widthMm, rules.columnWidthMm))
    mask |= COLUMN_WIDTH;
  if (
    rules.minCompressionShare !== null &&
    !isAtLeastTimes(compression.givenAreaMm2, rules.minCompressionShare, tension.givenAreaMm2)
  )
    mask |= COMPRESSION_SHARE;
  if (tension.breaksBarRules || compression.breaksBarRules) mask |= BAR_RULES;
  return mask;
}

/** What detailing asks of a combination: a mask for placed bars, and the least depth for ties (their spacing) and deflection. */
export function detailingOf(
  { placement, tension, compression, fyMPa }: Combination,
  demand: Demand,
  ruleSet: RuleSet,
) {
  const { coverMm, stirrupBar, given } = placement;
  let placedMask = 0;
  if (tension.largestSpacingMm === tension.largestSpacingMm) {
    const limitMm = ruleSet.crackSpacingMm(fyMPa, barCoverMm(coverMm, stirrupBar));
    if (!isWithinLength(tension.largestSpacingMm, limitMm)) placedMask |= CRACK_CONTROL;
  }
  // A spacing beyond any depth fails at every depth; none is asked without compression bars.
  let tieSpacingMm = -Infinity;
  if (compression.largestBarMm === compression.largestBarMm) {
    const isTied =
      given !== null &&
      stirrupBar !== null &&
      isWithinLength(ruleSet.leastTieDiameterMm(compression.largestBarMm), stirrupBar.diameterMm) &&
      isWithinLength(
        given.spacingMm,
        Math.min(
          ruleSet.tieSpacingMm(compression.leastBarMm, stirrupBar.diameterMm),
          ruleSet.isTieSpacingWithinLeastSide ? placement.widthMm : Infinity,
        ),
      );
    if (!isTied) tieSpacingMm = Infinity;
    else if (ruleSet.isTieSpacingWithinLeastSide) tieSpacingMm = given.spacingMm;
  }
  const { spanMm, support } = demand;
  const leastDepthMm = spanMm && support ? ruleSet.leastDepthMm(spanMm, support, fyMPa) : -Infinity;
  return { placedMask, tieSpacingMm, leastDepthMm };
}
