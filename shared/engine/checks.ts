import { getBar } from './bars.ts';
import { check, type CheckContext } from './check-result.ts';
import { detailingChecks } from './checks-detailing.ts';
import type { CheckResult } from './evaluation.ts';
import { compressedOverhang, flangeOf } from './flange.ts';
import { isAtLeastTimes, isAtMostTimes, isSameLength, isWithinLength, requiredSteelMm2 } from './limits.ts';
import type { BarGroup, DesignBasis, Reinforcement, UserRules } from './section.ts';
import type { SteelLayout } from './steel-layout.ts';

const OFFICE_RULE = 'office rule';
const PROJECT_TARGET = 'project target';

/** Every check that applies, in the order of CHECK_IDS. Checks that need placed bars are left out where there are none. */
export function checksOf(context: CheckContext): readonly CheckResult[] {
  return [
    barFit(context),
    hangerBars(context),
    strength(context),
    curvatureDuctility(context),
    tensionStrain(context),
    leastSteel(context),
    depthToWidth(context),
    depthCap(context),
    columnWidth(context),
    compressionShare(context),
    barRules(context),
    ...detailingChecks(context),
  ].filter((check) => check !== null);
}

function barFit({ placed, ruleSet }: CheckContext): CheckResult {
  const clause = ruleSet.clauses.barSpacing;
  const { shortfall } = placed;
  const base = { id: 'bar-fit', passes: placed.fits, kind: 'length', clause, reason: placed.reason } as const;
  if (shortfall)
    return check({
      ...base,
      demand: shortfall.neededMm,
      capacity: shortfall.availableMm,
      ratio: shortfall.neededMm / shortfall.availableMm,
    });
  const tightest = (placed.fits ? (placed.arrangement?.faces ?? []) : [])
    .filter((face) => face.clearGapMm !== null)
    .sort((a, b) => b.requiredGapMm / b.clearGapMm! - a.requiredGapMm / a.clearGapMm!)[0];
  if (!tightest) return check({ ...base, demand: null, capacity: null, ratio: null });
  return check({
    ...base,
    demand: tightest.requiredGapMm,
    capacity: tightest.clearGapMm,
    ratio: tightest.requiredGapMm / tightest.clearGapMm!,
    reason: `least clear gap, ${tightest.face} face: ${tightest.reason}`,
  });
}

export const barTotal = (group: BarGroup) => group.reduce((total, { count }) => total + count, 0);

function hangerBars({ section, rules, ruleSet }: CheckContext): CheckResult | null {
  const { reinforcement } = section;
  if (!rules.requireHangers || !section.stirrup || reinforcement.kind === 'layers') return null;
  const fewest = Math.min(barTotal(reinforcement.tension), barTotal(reinforcement.compression));
  return check({
    id: 'hanger-bars',
    passes: fewest >= section.stirrup.legs,
    demand: section.stirrup.legs,
    capacity: fewest,
    ratio: section.stirrup.legs / fewest,
    kind: 'count',
    clause: ruleSet.clauses.hangers,
    reason: 'a bar at each face for every stirrup leg to enclose',
  });
}

function strength({ flexure, demand, ruleSet }: CheckContext): CheckResult | null {
  if (!flexure || demand.muNmm === null) return null;
  return check({
    id: 'strength',
    passes: flexure.designMomentNmm >= demand.muNmm,
    demand: demand.muNmm,
    capacity: flexure.designMomentNmm,
    ratio: demand.muNmm / flexure.designMomentNmm,
    kind: 'moment',
    clause: ruleSet.clauses.strength,
    reason: `${ruleSet.symbols.designMoment} ≥ ${ruleSet.symbols.moment}`,
  });
}

function curvatureDuctility({ measured, demand }: CheckContext): CheckResult | null {
  if (!measured || demand.ductilityTarget === null) return null;
  const { value, definition } = measured;
  return check({
    id: 'curvature-ductility',
    passes: value !== null && value >= demand.ductilityTarget,
    demand: demand.ductilityTarget,
    capacity: value,
    ratio: value === null ? null : demand.ductilityTarget / value,
    kind: 'ratio',
    clause: PROJECT_TARGET,
    reason: definition,
  });
}

function tensionStrain({ flexure, section, basis, ruleSet }: CheckContext): CheckResult | null {
  if (!flexure) return null;
  const least = ruleSet.leastTensionStrain(ruleSet.designYieldMPa(section.fyMPa) / basis.esMPa);
  if (least === null) return null;
  return check({
    id: 'tension-strain',
    passes: flexure.tensionStrain >= least,
    demand: least,
    capacity: flexure.tensionStrain,
    ratio: flexure.tensionStrain > 0 ? least / flexure.tensionStrain : null,
    kind: 'strain',
    clause: ruleSet.clauses.tensionStrain,
    reason: 'εt of the outermost tension layer',
  });
}

/** As,min, the width it counts on, and, where that is not met, the steel at which it is waived. */
export function leastSteelOf(
  { section, demand, ruleSet }: Pick<CheckContext, 'section' | 'demand' | 'ruleSet'>,
  layout: SteelLayout,
): { leastMm2: number; waivedAtMm2: number | null; widthMm: number } {
  const { widthMm, depthMm, fcMPa, fyMPa } = section;
  const { dMm } = layout;
  const flange = flangeOf(section, ruleSet);
  const leastWidthMm = ruleSet.leastSteelWidthMm({
    widthMm,
    depthMm,
    flange,
    support: demand.support ?? null,
  });
  const waiver = ruleSet.leastSteelWaiver;
  const required =
    demand.muNmm === null || waiver === null
      ? null
      : requiredSteelMm2(demand.muNmm, ruleSet.tensionControlledReduction, {
          widthMm,
          dMm,
          blockStressMPa: ruleSet.blockStressMPa(fcMPa),
          fyMPa,
          ...compressedOverhang(widthMm, flange),
        });
  return {
    widthMm: leastWidthMm,
    leastMm2: ruleSet.leastSteelMm2({ fcMPa, fyMPa, widthMm: leastWidthMm, dMm }),
    waivedAtMm2: required !== null && required < Infinity ? waiver! * required : null,
  };
}

function leastSteel(context: CheckContext): CheckResult | null {
  const { layout } = context.placed;
  if (!layout) return null;
  const { leastMm2, waivedAtMm2 } = leastSteelOf(context, layout);
  const isWaiverLess = waivedAtMm2 !== null && waivedAtMm2 < leastMm2;
  const demand = isWaiverLess ? waivedAtMm2 : leastMm2;
  return check({
    id: 'least-steel',
    passes: layout.asMm2 >= demand,
    demand,
    capacity: layout.asMm2,
    ratio: demand / layout.asMm2,
    kind: 'area',
    clause: context.ruleSet.clauses.leastSteel,
    reason: isWaiverLess
      ? '4/3 of the steel Mu requires governs: As,min is waived from there'
      : 'As,min governs',
  });
}

function depthToWidth({ section, rules }: CheckContext): CheckResult | null {
  const { minDepthToWidth: least, maxDepthToWidth: most } = rules;
  if (least === null && most === null) return null;
  const { widthMm: b, depthMm: h } = section;
  const isTooFlat = least !== null && !isAtLeastTimes(h, least, b);
  const isTooSlender = most !== null && !isAtMostTimes(h, most, b);
  const isLeastGoverning = isTooFlat || most === null;
  return check({
    id: 'depth-to-width',
    passes: !isTooFlat && !isTooSlender,
    demand: isLeastGoverning ? least : h / b,
    capacity: isLeastGoverning ? h / b : most,
    ratio: isLeastGoverning ? (least! * b) / h : h / b / most,
    kind: 'ratio',
    clause: OFFICE_RULE,
    reason: isLeastGoverning ? 'least h/b' : 'largest h/b',
  });
}

function depthCap({ section, demand }: CheckContext): CheckResult | null {
  if (demand.depthCapMm === null) return null;
  return check({
    id: 'depth-cap',
    passes: isWithinLength(section.depthMm, demand.depthCapMm),
    demand: section.depthMm,
    capacity: demand.depthCapMm,
    ratio: section.depthMm / demand.depthCapMm,
    kind: 'length',
    clause: PROJECT_TARGET,
    reason: 'depth available for the beam',
  });
}

function columnWidth({ section, rules }: CheckContext): CheckResult | null {
  if (rules.columnWidthMm === null) return null;
  return check({
    id: 'column-width',
    passes: isSameLength(section.widthMm, rules.columnWidthMm),
    demand: section.widthMm,
    capacity: rules.columnWidthMm,
    ratio: null,
    kind: 'length',
    clause: OFFICE_RULE,
    reason: 'b equal to the column it meets',
  });
}

/** Steel areas at the two faces whether or not the bars can be placed, mm². */
function faceAreas(
  reinforcement: Reinforcement,
  basis: DesignBasis,
): { tension: number; compression: number } {
  const areaOf = (face: 'tension' | 'compression') =>
    reinforcement.kind === 'layers'
      ? reinforcement.layers.filter((l) => l.face === face).reduce((sum, l) => sum + l.areaMm2, 0)
      : reinforcement[face].reduce(
          (sum, { bar, count }) => sum + count * getBar(basis.barStandard, bar).areaMm2,
          0,
        );
  return { tension: areaOf('tension'), compression: areaOf('compression') };
}

function compressionShare({ section, basis, rules }: CheckContext): CheckResult | null {
  if (rules.minCompressionShare === null) return null;
  const { tension, compression } = faceAreas(section.reinforcement, basis);
  return check({
    id: 'compression-share',
    passes: tension > 0 && isAtLeastTimes(compression, rules.minCompressionShare, tension),
    demand: rules.minCompressionShare,
    capacity: compression / tension,
    ratio: (rules.minCompressionShare * tension) / compression,
    kind: 'ratio',
    clause: OFFICE_RULE,
    reason: 'A′s at least this share of As',
  });
}

/** What the bar rules object to in a group, or null. */
export function barRuleBreach(group: BarGroup, rules: UserRules): string | null {
  const excluded = group.find(({ bar }) => rules.excludedBars.includes(bar));
  if (excluded) return `size ${excluded.bar} is excluded`;
  if (rules.oneSizePerFace && new Set(group.map(({ bar }) => bar)).size > 1)
    return 'more than one size at a face';
  return null;
}

function barRules({ section, rules }: CheckContext): CheckResult | null {
  const { reinforcement } = section;
  if (reinforcement.kind === 'layers' || !(rules.oneSizePerFace || rules.excludedBars.length > 0))
    return null;
  const breach =
    barRuleBreach(reinforcement.tension, rules) ?? barRuleBreach(reinforcement.compression, rules);
  return check({
    id: 'bar-rules',
    passes: breach === null,
    demand: null,
    capacity: null,
    ratio: null,
    kind: 'count',
    clause: OFFICE_RULE,
    reason: breach ?? 'sizes allowed by the office',
  });
}
