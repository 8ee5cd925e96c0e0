import type { ProjectDesignBasis } from '#shared/contract/design-basis.ts';
import { findBar } from '#shared/engine/bars.ts';
import { ruleSetOf } from '#shared/engine/rules/rule-set-of.ts';
import { seismicSystemsOf } from '#shared/engine/seismic.ts';
import type { BarStandard, RuleSetId } from '#shared/engine/section.ts';

/** The basis with what it leaves open spelled out, so that every choice shows what counts. */
export const basisFormValues = (basis: ProjectDesignBasis): ProjectDesignBasis => ({
  ...basis,
  seismicSystem: basis.seismicSystem ?? 'none',
  ductilityMeasure: basis.ductilityMeasure ?? 'closed',
});

/** Bars that go with a code until others are chosen: ASTM with the inch editions, millimetre sizes with the metric ones. */
export function usualBarStandard(code: RuleSetId): BarStandard {
  return ruleSetOf({ ruleSet: code }).units === 'us' ? 'astm' : 'iso';
}

/** What another code brings along: its bars where none were chosen, and no seismic system that it does not know. */
export function withCode(basis: ProjectDesignBasis, code: RuleSetId): Partial<ProjectDesignBasis> {
  const { ruleSet, barStandard, seismicSystem = 'none' } = basis;
  const follows = barStandard === usualBarStandard(ruleSet);
  const systems = seismicSystemsOf(ruleSetOf({ ...basis, ruleSet: code }));
  return {
    ruleSet: code,
    ...(follows ? withStandard(basis, usualBarStandard(code)) : {}),
    ...(systems.includes(seismicSystem) ? {} : { seismicSystem: 'none' }),
  };
}

/** Another bar standard has other names: a side bar it does not list is no choice any more. */
export function withStandard(basis: ProjectDesignBasis, standard: BarStandard): Partial<ProjectDesignBasis> {
  const { skinBar } = basis;
  const isKnown = skinBar && findBar(standard, skinBar) !== undefined;
  return { barStandard: standard, ...(skinBar && !isKnown ? { skinBar: null } : {}) };
}
