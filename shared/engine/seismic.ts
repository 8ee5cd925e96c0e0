import { InvalidSectionError } from './preconditions.ts';
import type { RuleSet } from './rules/rule-set.ts';
import type { SeismicRules } from './rules/seismic-rules.ts';
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
