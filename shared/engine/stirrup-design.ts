import { isWithinLength } from './limits.ts';
import type { RuleSet } from './rules/rule-set.ts';
import type { SeismicRules } from './rules/seismic-rules.ts';
import type { DesignBasis } from './section.ts';
import {
  concreteShearN,
  designShearN,
  isSpacingHalved,
  longestAlongMm,
  strengthSpacingMm,
  type ShearConstants,
} from './shear.ts';
import { MM_PER_IN } from './units.ts';

/** What may bound the spacing of stirrups, in the order it is worked out; `given` is the widest allowed by the engineer. */
export const SPACING_LIMITS = [
  'given',
  'shear-strength',
  'along',
  'least-area',
  'ties',
  'least-side',
  'hoops-depth',
  'hoops-bars',
] as const;
export type SpacingLimit = (typeof SPACING_LIMITS)[number];

/** Steps in which spacings are built, mm. */
export interface SpacingSteps {
  readonly stepMm: number;
  /** Closest that is built: a multiple of the step, unless the engineer's widest is closer still. */
  readonly leastMm: number;
}

/** What bounds the spacing besides the depth: one combination of width, stirrup, bars and materials. Infinity: no bound. */
export interface SpacingRules extends SpacingSteps {
  readonly widestMm: number;
  /** By the diameters of compression bars and stirrup. */
  readonly tiesMm: number;
  /** Least side of the section where it bounds the ties: the width, while the depth counts too. */
  readonly leastSideMm: number;
  readonly hoopsOfEffectiveDepth: number;
  readonly hoopsOfDepth: number;
  readonly hoopsByBarsMm: number;
  /** The same where skin bars are among the bars enclosed. */
  readonly hoopsByBarsWithSkinMm: number;
}

/** One section going through the design; filled again for each in the hot loop. */
export interface SpacingState {
  /** Factored shear, N; NaN where none is asked. */
  vuN: number;
  dMm: number;
  depthMm: number;
  asMm2: number;
  hasSkin: boolean;
  /** Each limit of SPACING_LIMITS, mm. */
  readonly limits: Float64Array;
  /** The least of them. */
  neededMm: number;
  /** Results for the spacing chosen: Vc or VRd,c, and the design strength; NaN where no shear is asked. */
  concreteN: number;
  designN: number;
}

export const spacingState = (): SpacingState => ({
  vuN: NaN,
  dMm: NaN,
  depthMm: NaN,
  asMm2: NaN,
  hasSkin: false,
  limits: new Float64Array(SPACING_LIMITS.length),
  neededMm: NaN,
  concreteN: NaN,
  designN: NaN,
});

/** Steps of the basis; 1 in from 3 in, or 25 mm from 75 mm, unless set (common practice, no source). */
export function spacingStepsOf(
  basis: Pick<DesignBasis, 'stirrupStepMm' | 'leastStirrupSpacingMm'>,
  units: 'us' | 'si',
  widestMm: number,
): SpacingSteps {
  const stepMm = basis.stirrupStepMm ?? (units === 'us' ? MM_PER_IN : 25);
  const least = basis.leastStirrupSpacingMm ?? 3 * (units === 'us' ? MM_PER_IN : 25);
  const multiple = Math.ceil(least / stepMm - 1e-9) * stepMm;
  return { stepMm, leastMm: Math.min(multiple, widestMm) };
}

/** Bars, stirrup and width that a combination's limits follow from; diameters mm. */
export interface SpacingSetting {
  readonly widestMm: number;
  readonly stirrupMm: number;
  readonly widthMm: number;
  readonly fyMPa: number;
  /** Smallest compression bar that is tied; NaN for none. */
  readonly tiedBarMm: number;
  /** Smallest bar of both faces; Infinity for plain layers. */
  readonly leastBarMm: number;
  /** Skin bar; Infinity for none. */
  readonly skinBarMm: number;
}

export function spacingRulesOf(
  setting: SpacingSetting,
  basis: DesignBasis,
  ruleSet: RuleSet,
  seismic: SeismicRules | null,
): SpacingRules {
  const { widestMm, stirrupMm, widthMm, fyMPa, tiedBarMm, leastBarMm, skinBarMm } = setting;
  const isTied = tiedBarMm === tiedBarMm;
  const hoops = seismic?.hoops ?? null;
  const hoopsOf = (barMm: number) => (hoops ? hoops.byBarsMm(barMm, stirrupMm, fyMPa) : Infinity);
  return {
    ...spacingStepsOf(basis, ruleSet.units, widestMm),
    widestMm,
    tiesMm: isTied ? ruleSet.tieSpacingMm(tiedBarMm, stirrupMm) : Infinity,
    leastSideMm: isTied && ruleSet.isTieSpacingWithinLeastSide ? widthMm : Infinity,
    hoopsOfEffectiveDepth: hoops?.shareOfEffectiveDepth ?? Infinity,
    hoopsOfDepth: hoops?.shareOfDepth ?? Infinity,
    hoopsByBarsMm: hoopsOf(leastBarMm),
    hoopsByBarsWithSkinMm: hoopsOf(hoops?.countsSkinBars ? Math.min(leastBarMm, skinBarMm) : leastBarMm),
  };
}

/** Largest hoop spacing where hinges may form, mm; Infinity where no hoops are asked. */
export function hoopLimitMm(r: SpacingRules, dMm: number, depthMm: number, hasSkin: boolean): number {
  return Math.min(
    r.hoopsOfEffectiveDepth * dMm,
    r.hoopsOfDepth * depthMm,
    hasSkin ? r.hoopsByBarsWithSkinMm : r.hoopsByBarsMm,
  );
}

/** Largest spacing of stirrups that tie compression bars, mm; Infinity where none are tied. */
export const tieLimitMm = (r: SpacingRules, depthMm: number) =>
  r.leastSideMm === Infinity ? r.tiesMm : Math.min(r.tiesMm, r.leastSideMm, depthMm);

/** Each limit of SPACING_LIMITS into `at.limits`, the least into `at.neededMm`. */
function findLimits(at: SpacingState, k: ShearConstants, r: SpacingRules): void {
  const { limits, vuN, dMm, depthMm } = at;
  const isShearAsked = vuN === vuN;
  // the stirrups of a design are at least the least there is
  const concreteN = isShearAsked ? concreteShearN(k, dMm, at.asMm2, 0) : NaN;
  limits[0] = r.widestMm;
  limits[1] = isShearAsked ? strengthSpacingMm(k, vuN, dMm, concreteN) : Infinity;
  limits[2] = longestAlongMm(k, dMm, isShearAsked && isSpacingHalved(k, vuN, dMm, concreteN));
  limits[3] = k.avMm2 / k.leastAvPerMm;
  limits[4] = r.tiesMm;
  limits[5] = r.leastSideMm === Infinity ? Infinity : Math.min(r.leastSideMm, depthMm);
  limits[6] = Math.min(r.hoopsOfEffectiveDepth * dMm, r.hoopsOfDepth * depthMm);
  limits[7] = at.hasSkin ? r.hoopsByBarsWithSkinMm : r.hoopsByBarsMm;
  let needed = Infinity;
  for (let i = 0; i < limits.length; i++) if (!(limits[i]! >= needed)) needed = limits[i]!;
  at.neededMm = needed;
}

/**
 * Spacing of a designed stirrup, mm: the largest multiple of the step within every limit that applies, or the closest that
 * is built where that is not enough; what it then does not meet is a failed check. Vc, or VRd,c, and the design strength
 * are left in `at`. Shared by `evaluateSection` and the hot loop.
 */
export function designSpacingMm(at: SpacingState, k: ShearConstants, r: SpacingRules): number {
  findLimits(at, k, r);
  const { vuN, dMm, asMm2 } = at;
  const steps = Math.floor((at.neededMm + 1e-6) / r.stepMm);
  let spacingMm = steps * r.stepMm;
  if (!(spacingMm > r.leastMm && isWithinLength(spacingMm, at.neededMm))) spacingMm = r.leastMm;
  if (vuN !== vuN) return spacingMm;
  at.concreteN = concreteShearN(k, dMm, asMm2, spacingMm);
  at.designN = designShearN(k, dMm, at.concreteN, spacingMm);
  // the closed form of the strength may end a rounding above the multiple it asks for
  while (!(at.designN >= vuN) && spacingMm > r.leastMm) {
    spacingMm = Math.max(r.leastMm, spacingMm - r.stepMm);
    at.concreteN = concreteShearN(k, dMm, asMm2, spacingMm);
    at.designN = designShearN(k, dMm, at.concreteN, spacingMm);
  }
  return spacingMm;
}

/** Which limit is least; the first of equal ones. */
export function governingLimit({ limits }: Pick<SpacingState, 'limits'>): SpacingLimit {
  let governing = 0;
  for (let i = 1; i < limits.length; i++) if (limits[i]! < limits[governing]!) governing = i;
  return SPACING_LIMITS[governing]!;
}
