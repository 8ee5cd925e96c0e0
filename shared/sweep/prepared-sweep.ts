import { depthNeededMm, leastForStirrupMm, type ArrangementContext } from '../engine/arrangement.ts';
import { getBar, type Bar } from '../engine/bars.ts';
import { compressedOverhang, flangeOf, type Overhang, type ResolvedFlange } from '../engine/flange.ts';
import { isWithinLength } from '../engine/limits.ts';
import { pricingFor, unformedSides, type Pricing, type UnformedSides } from '../engine/pricing.ts';
import type { RuleSet } from '../engine/rules/rule-set.ts';
import type { SeismicRules } from '../engine/rules/seismic-rules.ts';
import { ruleSetOf } from '../engine/rules/rule-set-of.ts';
import type { Stirrup } from '../engine/section.ts';
import { seismicRulesOf } from '../engine/seismic.ts';
import { shearConstantsOf, type ShearConstants } from '../engine/shear.ts';
import { stirrupShape, type StirrupShape } from '../engine/stirrup-length.ts';
import { faceTable, type FaceEntry } from './face-table.ts';
import type { Space, SweepProblem, View } from './problem.ts';
import { expandSpace } from './space.ts';

/** Constants of one concrete strength, MPa. */
export interface ConcreteConstants {
  readonly fcMPa: number;
  readonly crushingStrain: number;
  readonly blockStressMPa: number;
  readonly blockDepthFactor: number;
  readonly modularRatio: number;
  readonly ratioAbove: number;
  readonly pricing: Pricing;
}

/** Bars placed for one width, cover and stirrup. */
export interface Placement {
  readonly widthMm: number;
  readonly coverMm: number;
  readonly given: Stirrup | null;
  /** What its bars are arranged by. */
  readonly context: ArrangementContext;
  readonly flange: ResolvedFlange | null;
  readonly overhang: Overhang;
  readonly unformed: UnformedSides;
  readonly stirrupBar: Bar | null;
  readonly stirrup: StirrupShape | null;
  /** Least width and depth the stirrup can be bent in, mm. */
  readonly leastForStirrupMm: number;
  /** For each concrete strength. */
  readonly shear: readonly ShearConstants[];
  readonly tension: readonly FaceEntry[];
  readonly compression: readonly FaceEntry[];
}

/** A problem with everything that does not change from section to section worked out once. */
export interface PreparedSweep {
  readonly problem: SweepProblem;
  readonly view: View;
  readonly space: Space;
  readonly ruleSet: RuleSet;
  readonly concretes: readonly ConcreteConstants[];
  /** Null where no seismic system is asked. */
  readonly seismic: SeismicRules | null;
  /** Side bars; null where they are not asked, and no bar where none was chosen. */
  readonly skin: { readonly bar: Bar | null } | null;
  /** 1 at each depth of the space that asks for side bars; null where none does. */
  readonly deep: Uint8Array | null;
  /** Placements by width × cover × stirrup, made on first use and dropped when many. */
  readonly placements: Map<number, Placement>;
}

/** Placements held at once: a chunk crosses few widths, and a table of 1,000 sets is about 0.3 MB. */
const MAX_PLACEMENTS = 64;

/** @throws InvalidSectionError for an empty axis, an unknown bar or steel outside the section. */
export function prepareSweep(problem: SweepProblem, view: View): PreparedSweep {
  const { basis } = problem;
  const space = expandSpace(problem.space, basis.barStandard);
  const ruleSet = ruleSetOf(basis);
  const concretes = space.fcMPa.map((fcMPa) => {
    const modularRatio = basis.esMPa / ruleSet.concreteModulusMPa(fcMPa);
    return {
      fcMPa,
      crushingStrain: ruleSet.crushingStrain(fcMPa),
      blockStressMPa: ruleSet.blockStressMPa(fcMPa),
      blockDepthFactor: ruleSet.blockDepthFactor(fcMPa),
      modularRatio,
      ratioAbove: basis.displacedConcrete === 'ignore' ? modularRatio : modularRatio - 1,
      pricing: pricingFor(basis.rates, fcMPa),
    };
  });
  const { skinBar } = basis;
  const skin =
    skinBar === undefined
      ? null
      : { bar: skinBar === null ? null : getBar(basis.barStandard, skinBar, ['basis', 'skinBar']) };
  const deep = Uint8Array.from(space.depthsMm, (h) => (skin && ruleSet.isSkinSteelAsked(h) ? 1 : 0));
  return {
    ...{ problem, view, space, ruleSet, concretes },
    seismic: seismicRulesOf(ruleSet, basis),
    skin,
    deep: deep.includes(1) ? deep : null,
    placements: new Map(),
  };
}

/** The placement of the n-th combination of width, cover and stirrup (stirrup innermost). */
export function placementAt(prepared: PreparedSweep, combination: number): Placement {
  const known = prepared.placements.get(combination);
  if (known) return known;
  if (prepared.placements.size >= MAX_PLACEMENTS) prepared.placements.clear();
  const { space, problem, ruleSet } = prepared;
  const { basis, rules } = problem;
  const stirrup = space.stirrups[combination % space.stirrups.length]!;
  const rest = Math.floor(combination / space.stirrups.length);
  const coverMm = space.coversMm[rest % space.coversMm.length]!;
  const widthMm = space.widthsMm[Math.floor(rest / space.coversMm.length)]!;
  const stirrupBar = stirrup && getBar(basis.barStandard, stirrup.bar);
  const context: ArrangementContext = {
    rules: ruleSet,
    barStandard: basis.barStandard,
    widthMm,
    coverMm,
    stirrupBar,
    maxAggregateMm: basis.maxAggregateMm,
    bendAllowance: basis.bendAllowance,
    maxLayers: rules.maxLayers,
    barOversize: basis.barOversize,
  };
  const flange = flangeOf({ widthMm, flange: space.flange }, ruleSet);
  const judged = { rules, throughMm: prepared.seismic?.continuousBars?.leastDiameterMm ?? 0 };
  const placement = {
    widthMm,
    coverMm,
    flange,
    overhang: compressedOverhang(widthMm, flange),
    unformed: unformedSides(flange, basis.slabMm),
    given: stirrup,
    context,
    stirrupBar,
    stirrup: stirrup && stirrupBar && stirrupShape(stirrupBar, stirrup, coverMm, ruleSet),
    leastForStirrupMm: leastForStirrupMm(coverMm, stirrupBar, ruleSet),
    shear: space.fcMPa.map((fcMPa) =>
      shearConstantsOf(ruleSet.shear, { fcMPa, widthMm, coverMm, stirrup, stirrupBar, fytMPa: basis.fytMPa }),
    ),
    tension: faceTable('tension', space.tension, context, judged),
    compression: faceTable('compression', space.compression, context, judged),
  };
  prepared.placements.set(combination, placement);
  return placement;
}

/**
 * Least overall depth at which this pair of sets is placed, mm: Infinity where the width does not hold it. Plain areas need
 * no more than their stirrup.
 */
export function leastDepthMm(placement: Placement, tension: FaceEntry, compression: FaceEntry): number {
  const { leastForStirrupMm: leastMm, widthMm } = placement;
  if (!tension.fits || !compression.fits || !isWithinLength(leastMm, widthMm)) return Infinity;
  return isPlain(tension) ? leastMm : Math.max(leastMm, depthNeededMm(tension, compression));
}

/** Plain areas have no bars to count. */
export const isPlain = (entry: FaceEntry) => Number.isNaN(entry.barCount);

/** Whether plain compression steel lies above the tension steel in a section of depth h, mm. */
export function isAboveTension(tension: FaceEntry, compression: FaceEntry, depthMm: number): boolean {
  if (compression.layerCount === 0) return true;
  return offsetOf(compression, depthMm) < depthMm - offsetOf(tension, depthMm);
}

/** Distance of a face's centroid from that face in a section of depth h, mm. */
export function offsetOf(entry: FaceEntry, depthMm: number): number {
  return entry.shareOfDepth === 0 ? entry.centroidOffsetMm : entry.shareOfDepth * depthMm;
}
