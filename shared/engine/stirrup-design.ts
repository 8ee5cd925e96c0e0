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
import { SPACING_LIMITS, type SpacingLimit } from './spacing-limits.ts';
import { MM_PER_IN } from './units.ts';

/**
 * What bounds the spacing besides the depth: one combination of width, stirrup, bars and materials. Infinity: no bound.
 * Filled again for each combination in the hot loop.
 */
export interface SpacingRules {
  stepMm: number;
  /** Closest that is built: a multiple of the step, unless the engineer's widest is closer still. */
  leastMm: number;
  widestMm: number;
  /** By the diameters of compression bars and stirrup. */
  tiesMm: number;
  /** Least side of the section where it bounds the ties: the width, while the depth counts too. */
  leastSideMm: number;
  hoopsOfEffectiveDepth: number;
  hoopsOfDepth: number;
  hoopsByBarsMm: number;
  /** The same where skin bars are among the bars enclosed. */
  hoopsByBarsWithSkinMm: number;
}

export const spacingRules = (): SpacingRules => ({
  stepMm: NaN,
  leastMm: NaN,
  widestMm: Infinity,
  tiesMm: Infinity,
  leastSideMm: Infinity,
  hoopsOfEffectiveDepth: Infinity,
  hoopsOfDepth: Infinity,
  hoopsByBarsMm: Infinity,
  hoopsByBarsWithSkinMm: Infinity,
});

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
  /** Whether the spacing limits of stirrups halve. */
  isHalved: boolean;
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
  isHalved: false,
  concreteN: NaN,
  designN: NaN,
});

/** Step of the basis; 1 in or 25 mm unless set (common practice, no source). */
export const stirrupStepMm = (basis: Pick<DesignBasis, 'stirrupStepMm'>, units: 'us' | 'si') =>
  basis.stirrupStepMm ?? (units === 'us' ? MM_PER_IN : 25);

/** Closest spacing of the basis; 3 in or 75 mm unless set (common practice, no source). */
export const leastStirrupSpacingMm = (
  basis: Pick<DesignBasis, 'leastStirrupSpacingMm'>,
  units: 'us' | 'si',
) => basis.leastStirrupSpacingMm ?? 3 * (units === 'us' ? MM_PER_IN : 25);

/** Bars, stirrup and width that a combination's limits follow from; diameters mm. */
export interface SpacingSetting {
  widestMm: number;
  stirrupMm: number;
  widthMm: number;
  fyMPa: number;
  /** Smallest compression bar that is tied; NaN for none. */
  tiedBarMm: number;
  /** Smallest bar of both faces; Infinity for plain layers. */
  leastBarMm: number;
  /** Skin bar; Infinity for none. */
  skinBarMm: number;
}

/** What judges a spacing. */
export interface SpacingBooks {
  readonly basis: Pick<DesignBasis, 'stirrupStepMm' | 'leastStirrupSpacingMm'>;
  readonly ruleSet: RuleSet;
  readonly seismic: SeismicRules | null;
}

/** Fills the rules of one combination. */
export function setSpacingRules(
  r: SpacingRules,
  { widestMm, stirrupMm, widthMm, fyMPa, tiedBarMm, leastBarMm, skinBarMm }: SpacingSetting,
  { basis, ruleSet, seismic }: SpacingBooks,
): void {
  const isTied = tiedBarMm === tiedBarMm;
  r.stepMm = stirrupStepMm(basis, ruleSet.units);
  const multiple = Math.ceil(leastStirrupSpacingMm(basis, ruleSet.units) / r.stepMm - 1e-9) * r.stepMm;
  r.leastMm = Math.min(multiple, widestMm);
  r.widestMm = widestMm;
  r.tiesMm = isTied ? ruleSet.tieSpacingMm(tiedBarMm, stirrupMm) : Infinity;
  r.leastSideMm = isTied && ruleSet.isTieSpacingWithinLeastSide ? widthMm : Infinity;
  if (!seismic?.hoops) return;
  const { hoops } = seismic;
  r.hoopsOfEffectiveDepth = hoops.shareOfEffectiveDepth;
  r.hoopsOfDepth = hoops.shareOfDepth;
  r.hoopsByBarsMm = hoops.byBarsMm(leastBarMm, stirrupMm, fyMPa);
  r.hoopsByBarsWithSkinMm = hoops.countsSkinBars
    ? hoops.byBarsMm(Math.min(leastBarMm, skinBarMm), stirrupMm, fyMPa)
    : r.hoopsByBarsMm;
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

const LEAST_AREA = SPACING_LIMITS.indexOf('least-area');

/** Each limit of SPACING_LIMITS into `at.limits`, the least into `at.neededMm`. */
function findLimits(at: SpacingState, k: ShearConstants, r: SpacingRules): void {
  const { limits, vuN, dMm, depthMm } = at;
  const isShearAsked = vuN === vuN;
  // the stirrups of a design are at least the least there is
  const concreteN = isShearAsked ? concreteShearN(k, dMm, at.asMm2, 0) : NaN;
  limits[0] = r.widestMm;
  limits[1] = isShearAsked ? strengthSpacingMm(k, vuN, dMm, concreteN) : Infinity;
  at.concreteN = concreteN;
  at.isHalved = isShearAsked && isSpacingHalved(k, vuN, dMm, concreteN);
  limits[2] = longestAlongMm(k, dMm, at.isHalved);
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
  const { vuN, dMm } = at;
  const steps = Math.floor((at.neededMm + 1e-6) / r.stepMm);
  let spacingMm = steps * r.stepMm;
  if (!(spacingMm > r.leastMm && isWithinLength(spacingMm, at.neededMm))) spacingMm = r.leastMm;
  if (vuN !== vuN) return spacingMm;
  // fewer than the least stirrups only where the closest that is built is not close enough
  if (!(spacingMm <= at.limits[LEAST_AREA]!)) setReduced(at, k, spacingMm);
  at.designN = designShearN(k, dMm, at.concreteN, spacingMm);
  // the closed form of the strength may end a rounding above the multiple it asks for
  while (!(at.designN >= vuN) && spacingMm > r.leastMm) {
    spacingMm = Math.max(r.leastMm, spacingMm - r.stepMm);
    if (!(spacingMm <= at.limits[LEAST_AREA]!)) setReduced(at, k, spacingMm);
    at.designN = designShearN(k, dMm, at.concreteN, spacingMm);
  }
  return spacingMm;
}

/** Vc with the stirrups there are, and whether the spacing limits halve by it. */
function setReduced(at: SpacingState, k: ShearConstants, spacingMm: number): void {
  at.concreteN = concreteShearN(k, at.dMm, at.asMm2, spacingMm);
  at.isHalved = isSpacingHalved(k, at.vuN, at.dMm, at.concreteN);
}

/** Which limit is least; the first of equal ones. */
export function governingLimit({ limits }: Pick<SpacingState, 'limits'>): SpacingLimit {
  let governing = 0;
  for (let i = 1; i < limits.length; i++) if (limits[i]! < limits[governing]!) governing = i;
  return SPACING_LIMITS[governing]!;
}
