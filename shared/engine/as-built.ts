import type { EvaluationContext } from './evaluate.ts';
import { resolveStirrups } from './resolved-stirrups.ts';
import { ruleSetOf } from './rules/rule-set-of.ts';
import type { SectionInput } from './section.ts';
import { seismicRulesOf } from './seismic.ts';
import { skinSteelOf } from './skin-steel.ts';
import type { PlacedSteel } from './steel-layout.ts';

/** The section with its stirrups at the spacing they are built with, as `evaluateSection` finds it. */
export function asBuilt(
  section: SectionInput,
  { basis, demand }: EvaluationContext,
  placed: PlacedSteel,
): SectionInput {
  if (!section.stirrup?.isDesigned) return section;
  const ruleSet = ruleSetOf(basis);
  const seismic = seismicRulesOf(ruleSet, basis);
  const skin = skinSteelOf(section, placed.layout, basis, ruleSet);
  return resolveStirrups({ section, basis, demand, ruleSet, seismic, placed, skin }).section;
}
