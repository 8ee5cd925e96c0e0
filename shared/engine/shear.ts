import type { ShearRules } from './rules/shear-rules.ts';
import {
  acrossLimitMm,
  additiveShearOf,
  additiveStrengthSpacingMm,
  alongLimitMm,
  isCloselySpaced,
  needsLeastStirrups,
  phiVnN,
  vcN,
  type AdditiveShear,
} from './shear-additive.ts';
import { stirrupsOf, type ShearInputs } from './shear-inputs.ts';
import { strutShearOf, strutStrengthSpacingMm, vRdcN, vRdN, type StrutShear } from './shear-strut.ts';

/**
 * Shear in one interface over the forms that codes have (φ (Vc + Vs); struts of a chosen slope), used by the checks, the
 * working and the hot loop. `concreteN` is Vc or VRd,c. Functions that depend on the spacing take it last, so that a
 * spacing may be looked for; by default it is the one given.
 */
export type ShearConstants = AdditiveShear | StrutShear;

/** Everything about shear that does not depend on the depth. */
export function shearConstantsOf(rules: ShearRules, inputs: ShearInputs): ShearConstants {
  return rules.form === 'additive'
    ? additiveShearOf(rules, inputs.fcMPa, stirrupsOf(inputs))
    : strutShearOf(rules, inputs.fcMPa, stirrupsOf(inputs));
}

/** Shear carried by the concrete alone, N: Vc, which may depend on whether there are the least stirrups, or VRd,c. */
export function concreteShearN(
  k: ShearConstants,
  dMm: number,
  asMm2: number,
  spacingMm = k.spacingMm,
): number {
  return k.form === 'additive' ? vcN(k, dMm, asMm2, spacingMm) : vRdcN(k, dMm, asMm2);
}

/** Design strength in shear, N: φVn, or VRd. */
export function designShearN(
  k: ShearConstants,
  dMm: number,
  concreteN: number,
  spacingMm = k.spacingMm,
): number {
  return k.form === 'additive' ? phiVnN(k, dMm, concreteN, spacingMm) : vRdN(k, dMm, concreteN, spacingMm);
}

/**
 * Widest spacing at which the design strength reaches Vu, mm: Infinity where the concrete alone carries it, 0 where no
 * stirrup helps (the section is too small) or there is none. Closed form: hold the spacing taken from it against
 * `designShearN`. `concreteN` of the additive form is that with the least stirrups.
 */
export function strengthSpacingMm(k: ShearConstants, vuN: number, dMm: number, concreteN: number): number {
  return k.form === 'additive'
    ? additiveStrengthSpacingMm(k, vuN, dMm, concreteN)
    : strutStrengthSpacingMm(k, vuN, dMm, concreteN);
}

/** Whether Vu asks for stirrups at all; by EN 1992-1-1 6.2.1(4) a beam always has them. */
const needsStirrups = (k: ShearConstants, vuN: number, dMm: number, concreteN: number) =>
  k.form !== 'additive' || needsLeastStirrups(k, vuN, dMm, concreteN);

/** Whether the spacing limits halve; only the additive form has that. */
export const isSpacingHalved = (k: ShearConstants, vuN: number, dMm: number, concreteN: number) =>
  k.form === 'additive' && isCloselySpaced(k, vuN, dMm, concreteN);

/** Largest spacing along the beam by the depth alone, mm. */
export const longestAlongMm = (k: ShearConstants, dMm: number, isHalved: boolean) =>
  k.form === 'additive' ? alongLimitMm(k, dMm, isHalved) : k.rules.longestSpacingShare * dMm;

/** Largest spacing of legs across the width, mm. */
const longestAcrossMm = (k: ShearConstants, dMm: number, isHalved: boolean) =>
  k.form === 'additive'
    ? acrossLimitMm(k, dMm, isHalved)
    : Math.min(k.rules.longestAcrossShare * dMm, k.rules.longestAcrossMm);

/**
 * Largest spacing of stirrups that are there, mm: along the beam, and their least area. 0 where the legs stand too far
 * apart across the width or there are none. (ACI 318 9.7.6.2.2, 9.6.3.4; EN 1992-1-1 9.2.2.)
 */
export function detailingSpacingMm(k: ShearConstants, dMm: number, isHalved = false): number {
  if (k.avMm2 === 0 || k.legSpacingMm > longestAcrossMm(k, dMm, isHalved)) return 0;
  return Math.min(longestAlongMm(k, dMm, isHalved), k.avMm2 / k.leastAvPerMm);
}

/** Largest spacing along the beam allowed for Vu, mm: Infinity where Vu asks for no stirrups, else `detailingSpacingMm`. */
export function stirrupSpacingLimitMm(
  k: ShearConstants,
  vuN: number,
  dMm: number,
  concreteN: number,
): number {
  if (!needsStirrups(k, vuN, dMm, concreteN)) return Infinity;
  return detailingSpacingMm(k, dMm, isSpacingHalved(k, vuN, dMm, concreteN));
}
