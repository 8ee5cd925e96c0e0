import { getBar } from './bars.ts';
import type { BuiltStirrups, SkinSteel } from './evaluation.ts';
import type { RuleSet } from './rules/rule-set.ts';
import type { SeismicRules } from './rules/seismic-rules.ts';
import type { DesignBasis, Demand, Reinforcement, SectionInput } from './section.ts';
import { shearConstantsOf, type ShearConstants } from './shear.ts';
import type { PlacedSteel } from './steel-layout.ts';
import type { SpacingLimit } from './spacing-limits.ts';
import {
  designSpacingMm,
  governingLimit,
  setSpacingRules,
  spacingRules,
  spacingState,
  type SpacingRules,
  type SpacingState,
} from './stirrup-design.ts';
import { MM_PER_IN } from './units.ts';

/** A section with its stirrups at the spacing they are built with, and how that was found. */
export interface ResolvedStirrups {
  /** As given, but for a designed spacing. */
  readonly section: SectionInput;
  /** Null without stirrups. */
  readonly rules: SpacingRules | null;
  /** Null unless designed and placed. */
  readonly design: { readonly state: SpacingState; readonly constants: ShearConstants } | null;
  readonly built: BuiltStirrups | null;
}

interface Unresolved {
  readonly section: SectionInput;
  readonly basis: DesignBasis;
  readonly demand: Demand;
  readonly ruleSet: RuleSet;
  readonly seismic: SeismicRules | null;
  readonly placed: PlacedSteel;
  readonly skin: SkinSteel | null;
}

/**
 * Finds the spacing of designed stirrups. A section whose bars cannot be placed has no depth to design for: its stirrups
 * are weighed at the widest spacing.
 * @throws InvalidSectionError for an unknown bar.
 */
export function resolveStirrups(source: Unresolved): ResolvedStirrups {
  const { section, basis, demand, ruleSet, placed, skin } = source;
  const { stirrup } = section;
  if (!stirrup) return { section, rules: null, design: null, built: null };
  const { bar, legs, spacingMm } = stirrup;
  const rules = rulesOf(source);
  const asGiven = { section, rules, design: null };
  if (!stirrup.isDesigned)
    return {
      ...asGiven,
      built: { bar, legs, spacingMm, isDesigned: false, governs: null, neededMm: null, reason: 'as given' },
    };
  const { layout } = placed;
  if (!layout)
    return {
      ...asGiven,
      built: {
        ...{ bar, legs, spacingMm, isDesigned: true, governs: null, neededMm: null },
        reason: 'bars are not placed: the widest spacing stands',
      },
    };
  const constants = shearConstantsOf(ruleSet.shear, {
    ...{ fcMPa: section.fcMPa, widthMm: section.widthMm, coverMm: section.coverMm, stirrup },
    stirrupBar: getBar(basis.barStandard, bar, ['stirrup', 'bar']),
    fytMPa: basis.fytMPa,
  });
  const state = spacingState();
  state.vuN = demand.vuN ?? NaN;
  state.dMm = layout.dMm;
  state.depthMm = section.depthMm;
  state.asMm2 = layout.asMm2;
  state.hasSkin = skin !== null && skin.perSide > 0;
  const designed = designSpacingMm(state, constants, rules);
  const governs = governingLimit(state);
  return {
    section: { ...section, stirrup: { ...stirrup, spacingMm: designed } },
    rules,
    design: { state, constants: { ...constants, spacingMm: designed } },
    built: {
      ...{ bar, legs, spacingMm: designed, isDesigned: true, governs, neededMm: state.neededMm },
      reason: reasonOf(governs, state.neededMm, rules, ruleSet.units),
    },
  };
}

const barsOf = (reinforcement: Reinforcement, standard: DesignBasis['barStandard']) =>
  reinforcement.kind === 'layers'
    ? { tension: [], compression: [] }
    : {
        tension: reinforcement.tension.map(({ bar }) => getBar(standard, bar).diameterMm),
        compression: reinforcement.compression.map(({ bar }) => getBar(standard, bar).diameterMm),
      };

function rulesOf({ section, basis, ruleSet, seismic }: Unresolved): SpacingRules {
  const stirrup = section.stirrup!;
  const { tension, compression } = barsOf(section.reinforcement, basis.barStandard);
  const rules = spacingRules();
  setSpacingRules(
    rules,
    {
      widestMm: stirrup.spacingMm,
      stirrupMm: getBar(basis.barStandard, stirrup.bar, ['stirrup', 'bar']).diameterMm,
      widthMm: section.widthMm,
      fyMPa: section.fyMPa,
      tiedBarMm: compression.length > 0 ? Math.min(...compression) : NaN,
      leastBarMm: Math.min(...tension, ...compression),
      skinBarMm: basis.skinBar
        ? getBar(basis.barStandard, basis.skinBar, ['basis', 'skinBar']).diameterMm
        : Infinity,
    },
    { basis, ruleSet, seismic },
  );
  return rules;
}

const GOVERNING: Readonly<Record<SpacingLimit, string>> = {
  given: 'the widest spacing allowed',
  'shear-strength': 'strength in shear',
  along: 'the largest spacing along the beam',
  'least-area': 'the least area of stirrups',
  ties: 'ties of the compression bars',
  'least-side': 'ties of the compression bars, the least side',
  'hoops-depth': 'hoops where hinges may form, by depth',
  'hoops-bars': 'hoops where hinges may form, by bar sizes',
};

function reasonOf(
  governs: SpacingLimit,
  neededMm: number,
  { leastMm }: SpacingRules,
  units: 'us' | 'si',
): string {
  const what = `governed by ${GOVERNING[governs]}`;
  if (neededMm + 1e-6 >= leastMm) return what;
  if (!(neededMm > 0)) return `${what}: no spacing is close enough`;
  const length = units === 'us' ? `${(neededMm / MM_PER_IN).toFixed(2)} in` : `${neededMm.toFixed(0)} mm`;
  return `${what}: ${length} would be needed, closer than stirrups are built`;
}
