import { InvalidSectionError } from './preconditions.ts';
import type { RuleSet } from './rules/rule-set.ts';
import type { FaceSteelLimits, SeismicRules } from './rules/seismic-rules.ts';
import { SEISMIC_SYSTEMS, type DesignBasis, type SeismicSystem } from './section.ts';

/** Systems a code knows, none among them. */
export function seismicSystemsOf(ruleSet: RuleSet): readonly SeismicSystem[] {
  return SEISMIC_SYSTEMS.filter((system) => system === 'none' || ruleSet.seismic[system] !== undefined);
}

/**
 * Seismic rules of the basis; null where none are asked.
 * @throws InvalidSectionError for a system that the code does not know.
 */
export function seismicRulesOf(
  ruleSet: RuleSet,
  { seismicSystem = 'none' }: Pick<DesignBasis, 'seismicSystem'>,
): SeismicRules | null {
  if (seismicSystem === 'none') return null;
  const rules = ruleSet.seismic[seismicSystem];
  if (!rules)
    throw new InvalidSectionError(
      `${ruleSet.title} has no seismic system ${seismicSystem}; it has ${seismicSystemsOf(ruleSet).join(', ')}`,
      ['basis', 'seismicSystem'],
    );
  return rules;
}

/** Least width of a web in depth h, mm. */
export const leastWebMm = (
  { shareOfDepth, mostMm }: NonNullable<SeismicRules['leastWidth']>,
  depthMm: number,
) => Math.min(shareOfDepth * depthMm, mostMm);

/** Least steel of a face with effective depth d and so much at the other face, mm². */
export const faceLeastMm2 = (limits: FaceSteelLimits, widthMm: number, dMm: number, otherMm2: number) =>
  limits.leastShare * widthMm * dMm + limits.leastOfOther * otherMm2;

/** Most steel of a face, mm². */
export const faceMostMm2 = (limits: FaceSteelLimits, widthMm: number, dMm: number, otherMm2: number) =>
  limits.mostShare * widthMm * dMm + limits.mostOfOther * otherMm2;
