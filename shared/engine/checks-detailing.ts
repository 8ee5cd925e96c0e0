import { getBar, type Bar } from './bars.ts';
import { check, type CheckContext } from './check-result.ts';
import type { CheckResult } from './evaluation.ts';
import { compressedOverhang, flangeOf } from './flange.ts';
import { isWithinLength } from './limits.ts';
import { seismicChecks } from './checks-seismic.ts';
import {
  concreteShearN,
  designShearN,
  detailingSpacingMm,
  isSpacingHalved,
  shearConstantsOf,
  stirrupSpacingLimitMm,
} from './shear.ts';
import { allowedSkinSpacingMm } from './skin-steel.ts';
import { leastEffectiveDepthMm, spanToDepthAt } from './span-to-depth.ts';
import type { SpacingLimit } from './spacing-limits.ts';
import { tieLimitMm } from './stirrup-design.ts';

/** Crack control, ties, shear and least depth, in the order of CHECK_IDS; those that do not apply are null. */
export function detailingChecks(context: CheckContext): readonly (CheckResult | null)[] {
  return [
    crackControl(context),
    compressionTies(context),
    shear(context),
    stirrupSpacing(context),
    leastDepth(context),
    axisDepth(context),
    mostSteel(context),
    skinSteel(context),
    ...seismicChecks(context),
  ];
}

export function stirrupBarOf({ section, basis }: Pick<CheckContext, 'section' | 'basis'>): Bar | null {
  return section.stirrup && getBar(basis.barStandard, section.stirrup.bar, ['stirrup', 'bar']);
}

/** Clear cover to the longitudinal bars, mm. */
export const barCoverMm = (coverMm: number, stirrupBar: Bar | null) =>
  coverMm + (stirrupBar?.diameterMm ?? 0);

function crackControl(context: CheckContext): CheckResult | null {
  const { placed, section, ruleSet } = context;
  const spacingMm = placed.layout && placed.arrangement?.faces[0]?.largestSpacingMm;
  if (spacingMm === null || spacingMm === undefined) return null;
  const limitMm = ruleSet.crackSpacingMm(section.fyMPa, barCoverMm(section.coverMm, stirrupBarOf(context)));
  return check({
    id: 'crack-control',
    passes: isWithinLength(spacingMm, limitMm),
    demand: spacingMm,
    capacity: limitMm,
    ratio: limitMm > 0 ? spacingMm / limitMm : null,
    kind: 'length',
    clause: ruleSet.clauses.crackControl,
    reason: `centre spacing of the bars nearest the tension face, ${ruleSet.texts.serviceStress}`,
  });
}

function compressionTies(context: CheckContext): CheckResult | null {
  const { section, basis, ruleSet } = context;
  const { reinforcement, stirrup } = section;
  if (reinforcement.kind === 'layers' || reinforcement.compression.length === 0) return null;
  const diameters = reinforcement.compression.map(({ bar }) => getBar(basis.barStandard, bar).diameterMm);
  const tie = stirrupBarOf(context);
  const base = { id: 'compression-ties', kind: 'length', clause: ruleSet.clauses.compressionTies } as const;
  if (!stirrup || !tie)
    return check({
      ...base,
      passes: false,
      demand: null,
      capacity: null,
      ratio: null,
      reason: 'no stirrups tie the compression bars',
    });
  const leastTieMm = ruleSet.leastTieDiameterMm(Math.max(...diameters));
  if (!isWithinLength(leastTieMm, tie.diameterMm))
    return check({
      ...base,
      passes: false,
      demand: leastTieMm,
      capacity: tie.diameterMm,
      ratio: leastTieMm / tie.diameterMm,
      reason: 'diameter of stirrup that ties bars of this size',
    });
  if (isDesignOpen(context)) return null;
  const limitMm = tieLimitMm(context.stirrups.rules!, section.depthMm);
  return check({
    ...base,
    passes: isWithinLength(stirrup.spacingMm, limitMm),
    demand: stirrup.spacingMm,
    capacity: limitMm,
    ratio: stirrup.spacingMm / limitMm,
    reason: withNeed(context, ['ties', 'least-side'], ruleSet.formulas.tieSpacing),
  });
}

/** Designed stirrups of bars that cannot be placed have no spacing to judge. */
const isDesignOpen = ({ section, placed }: CheckContext) =>
  section.stirrup?.isDesigned === true && !placed.layout;

/** What shear is worked out from, where Vu is given. */
export type ShearState = NonNullable<ReturnType<typeof shearOf>>;

/** Vu with everything shear needs; null where Vu is not asked or the bars are not placed. */
export function shearOf(context: Pick<CheckContext, 'section' | 'basis' | 'demand' | 'ruleSet' | 'placed'>) {
  const { section, basis, demand, ruleSet, placed } = context;
  const vuN = demand.vuN ?? null;
  if (vuN === null || !placed.layout) return null;
  const constants = shearConstantsOf(ruleSet.shear, {
    fcMPa: section.fcMPa,
    widthMm: section.widthMm,
    coverMm: section.coverMm,
    stirrup: section.stirrup,
    stirrupBar: stirrupBarOf(context),
    fytMPa: basis.fytMPa,
  });
  const { dMm, asMm2 } = placed.layout;
  return { vuN, constants, dMm, asMm2, concreteN: concreteShearN(constants, dMm, asMm2) };
}

function shear(context: CheckContext): CheckResult | null {
  const state = shearOf(context);
  if (!state) return null;
  const capacity = designShearN(state.constants, state.dMm, state.concreteN);
  return check({
    id: 'shear',
    passes: capacity >= state.vuN,
    demand: state.vuN,
    capacity,
    ratio: state.vuN / capacity,
    kind: 'force',
    clause: context.ruleSet.clauses.shear,
    reason: withNeed(context, ['shear-strength'], context.ruleSet.texts.shear),
  });
}

/** What the design asked for is said where its spacing is closer than is built, beside the check that fails by it. */
function withNeed({ stirrups }: CheckContext, limits: readonly SpacingLimit[], reason: string): string {
  const { built, rules } = stirrups;
  if (!built?.governs || !limits.includes(built.governs)) return reason;
  return isWithinLength(rules!.leastMm, built.neededMm!) ? reason : built.reason;
}

/** Largest spacing by Vu; a designed stirrup keeps to the limits of stirrups whether Vu asks for them or not. */
function spacingLimitMm({ stirrups, placed }: CheckContext, state: ReturnType<typeof shearOf>): number {
  if (!stirrups.design && state)
    return stirrupSpacingLimitMm(state.constants, state.vuN, state.dMm, state.concreteN);
  const isHalved = state !== null && isSpacingHalved(state.constants, state.vuN, state.dMm, state.concreteN);
  return detailingSpacingMm(stirrups.design!.constants, placed.layout!.dMm, isHalved);
}

function stirrupSpacing(context: CheckContext): CheckResult | null {
  const state = shearOf(context);
  const limits = state ?? context.stirrups.design;
  if (!limits) return null;
  const limitMm = spacingLimitMm(context, state);
  const { spacingMm } = limits.constants;
  const hasNumbers = spacingMm < Infinity && limitMm > 0 && limitMm < Infinity;
  const reason = {
    none: `${context.ruleSet.symbols.shear} asks for no stirrups`,
    missing: context.section.stirrup
      ? 'stirrup legs stand too far apart across the width'
      : context.ruleSet.texts.stirrupsMissing,
    numbers: withNeed(
      context,
      ['along', 'least-area'],
      `stirrup spacing along the beam, and ${context.ruleSet.symbols.stirrupArea},min`,
    ),
  }[limitMm === Infinity ? 'none' : limitMm === 0 ? 'missing' : 'numbers'];
  return check({
    id: 'stirrup-spacing',
    passes: limitMm === Infinity || isWithinLength(spacingMm, limitMm),
    demand: hasNumbers ? spacingMm : null,
    capacity: hasNumbers ? limitMm : null,
    ratio: hasNumbers ? spacingMm / limitMm : null,
    kind: 'length',
    clause: context.ruleSet.clauses.stirrupSpacing,
    reason,
  });
}

function leastDepth(context: CheckContext): CheckResult | null {
  const { section, demand, ruleSet } = context;
  const { spanMm, support } = demand;
  if (!spanMm || !support) return null;
  const toDepth = ruleSet.largestSpanToDepth === null ? null : spanToDepthOf(context);
  if (ruleSet.largestSpanToDepth !== null && toDepth === null) return null;
  const leastMm = toDepth?.leastMm ?? ruleSet.leastDepthMm(spanMm, support, section.fyMPa);
  const depthMm = toDepth?.dMm ?? section.depthMm;
  return check({
    id: 'least-depth',
    passes: isWithinLength(leastMm, depthMm),
    demand: leastMm,
    capacity: depthMm,
    ratio: leastMm / depthMm,
    kind: 'length',
    clause: ruleSet.clauses.leastDepth,
    reason: ruleSet.texts.leastDepth,
  });
}

/** Least effective depth by span over d, with what it follows from; null where it is not asked, or no bars are placed. */
export function spanToDepthOf({
  section,
  demand,
  ruleSet,
  placed,
}: Pick<CheckContext, 'section' | 'demand' | 'ruleSet' | 'placed'>) {
  const { spanMm, support } = demand;
  const { largestSpanToDepth } = ruleSet;
  if (!spanMm || !support || !placed.layout || largestSpanToDepth === null) return null;
  const { dMm, asMm2, asPrimeMm2 } = placed.layout;
  const { overhangMm } = compressedOverhang(section.widthMm, flangeOf(section, ruleSet));
  const at = spanToDepthAt({
    spanMm,
    support,
    fckMPa: section.fcMPa,
    fykMPa: section.fyMPa,
    webMm: section.widthMm,
    faceWidthMm: section.widthMm + overhangMm,
    asMm2,
    asPrimeMm2,
  });
  return { at, dMm, leastMm: leastEffectiveDepthMm(largestSpanToDepth, at, dMm) };
}

function axisDepth({ flexure, placed, section, ruleSet }: CheckContext): CheckResult | null {
  const limit = ruleSet.largestAxisShare(section.fcMPa);
  if (limit === null || !flexure || !placed.layout) return null;
  const { neutralAxisMm } = flexure;
  const { dMm } = placed.layout;
  return check({
    id: 'axis-depth',
    passes: neutralAxisMm <= limit * dMm,
    demand: neutralAxisMm / dMm,
    capacity: limit,
    ratio: neutralAxisMm / (limit * dMm),
    kind: 'ratio',
    clause: ruleSet.clauses.axisDepth,
    reason: 'depth of the neutral axis at ultimate over d',
  });
}

function mostSteel({ placed, section, ruleSet }: CheckContext): CheckResult | null {
  const share = ruleSet.largestFaceSteelShare;
  if (share === null || !placed.layout) return null;
  const demand = Math.max(placed.layout.asMm2, placed.layout.asPrimeMm2);
  const capacity = share * section.widthMm * section.depthMm;
  return check({
    id: 'most-steel',
    passes: demand <= capacity,
    demand,
    capacity,
    ratio: demand / capacity,
    kind: 'area',
    clause: ruleSet.clauses.mostSteel,
    reason: 'steel of either face, outside laps',
  });
}

function skinSteel({ section, basis, placed, ruleSet, skin }: CheckContext): CheckResult | null {
  if (basis.skinBar === undefined || !placed.layout || !ruleSet.isSkinSteelAsked(section.depthMm))
    return null;
  const base = { id: 'skin-steel', kind: 'length', clause: ruleSet.clauses.skinSteel } as const;
  if (!skin)
    return check({
      ...base,
      passes: false,
      demand: null,
      capacity: null,
      ratio: null,
      reason: basis.skinBar ? 'the side cover allows no spacing' : 'a section so deep asks for skin bars',
    });
  const capacity = allowedSkinSpacingMm(section, basis, ruleSet);
  return check({
    ...base,
    passes: true,
    demand: skin.spacingMm,
    capacity,
    ratio: skin.spacingMm === null ? null : skin.spacingMm / capacity,
    reason: 'skin bars at each side from the tension bars to mid-depth, not counted in strength',
  });
}
