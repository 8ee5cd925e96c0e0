import type { StrutShearRules } from './rules/shear-rules.ts';
import type { StirrupConstants } from './shear-inputs.ts';

/** ρl of VRd,c counts up to this (EN 1992-1-1 6.2.2(1)). */
const MOST_LONGITUDINAL = 0.02;

/** Constants of one concrete, one width and one stirrup for struts of a chosen slope. */
export interface StrutShear extends StirrupConstants {
  form: 'variable-strut';
  rules: StrutShearRules;
  fckMPa: number;
  rootFck: number;
  /** ν1 fcd b, N/mm. */
  strutPerMm: number;
  fywdMPa: number;
}

export function strutShearOf(
  rules: StrutShearRules,
  fckMPa: number,
  stirrups: Omit<StirrupConstants, 'leastAvPerMm'>,
): StrutShear {
  const { widthMm, fytMPa } = stirrups;
  const rootFck = Math.sqrt(fckMPa);
  return {
    form: 'variable-strut',
    rules,
    fckMPa,
    rootFck,
    strutPerMm: rules.strutReduction(fckMPa) * rules.strutStrengthMPa(fckMPa) * widthMm,
    fywdMPa: rules.stirrupDesignMPa(fytMPa),
    ...stirrups,
    // ρw,min b (9.2.2(5))
    leastAvPerMm: ((rules.leastStirrupRoot * rootFck) / fytMPa) * widthMm,
  };
}

/** k = 1 + √(200/d), at most 2 (6.2.2(1)). */
export const sizeFactor = (dMm: number) => Math.min(2, 1 + Math.sqrt(200 / dMm));

/** ρl = Asl/(b d), at most 0.02 (6.2.2(1)). */
export const longitudinalShare = (asMm2: number, widthMm: number, dMm: number) =>
  Math.min(MOST_LONGITUDINAL, asMm2 / (widthMm * dMm));

/** VRd,c of a member without axial force, N (6.2.2(1)). */
export function vRdcN(k: StrutShear, dMm: number, asMm2: number): number {
  const size = sizeFactor(dMm);
  const stress =
    k.rules.concrete * size * Math.cbrt(100 * longitudinalShare(asMm2, k.widthMm, dMm) * k.fckMPa);
  const floor = k.rules.concreteFloor * (size * Math.sqrt(size)) * k.rootFck;
  return Math.max(stress, floor) * k.widthMm * dMm;
}

/**
 * cot θ at which stirrups and struts carry the same, within the range allowed: the choice that carries most
 * (6.2.3(2), with 6.8 = 6.9).
 */
export function cotTheta(k: StrutShear, spacingMm: number): number {
  const { leastCot, mostCot } = k.rules;
  const cot = Math.sqrt((k.strutPerMm * spacingMm) / (k.avMm2 * k.fywdMPa) - 1);
  return cot >= mostCot ? mostCot : cot >= leastCot ? cot : leastCot;
}

/** VRd,s = Asw z fywd cot θ/s, N (6.8). */
export const vRdsN = (k: StrutShear, dMm: number, cot: number, spacingMm: number) =>
  ((k.avMm2 * k.fywdMPa * cot) / spacingMm) * (k.rules.leverArmShare * dMm);

/** VRd,max = αcw b z ν1 fcd/(cot θ + tan θ), N, αcw = 1 (6.9). */
export const vRdMaxN = (k: StrutShear, dMm: number, cot: number) =>
  (k.strutPerMm / (cot + 1 / cot)) * (k.rules.leverArmShare * dMm);

/** VRd, N: of the concrete alone, or of stirrups and struts. */
export function vRdN(k: StrutShear, dMm: number, concreteN: number, spacingMm: number): number {
  if (k.avMm2 === 0) return concreteN;
  const cot = cotTheta(k, spacingMm);
  return Math.max(concreteN, Math.min(vRdsN(k, dMm, cot, spacingMm), vRdMaxN(k, dMm, cot)));
}

/**
 * Widest spacing at which the stirrups carry VEd, mm, with the flattest struts that do not crush: cot θ from
 * VRd,max = VEd; see `strengthSpacingMm`.
 */
export function strutStrengthSpacingMm(k: StrutShear, vuN: number, dMm: number, concreteN: number): number {
  if (vuN <= concreteN) return Infinity;
  const { leastCot, mostCot, leverArmShare } = k.rules;
  // VEd (cot θ + 1/cot θ) = ν1 fcd b z: the larger root is the flatter strut
  const half = (k.strutPerMm * leverArmShare * dMm) / (2 * vuN);
  if (!(half >= 1)) return 0;
  const cot = half + Math.sqrt(half * half - 1);
  if (cot < leastCot) return 0;
  return (k.avMm2 * k.fywdMPa * Math.min(cot, mostCot) * (leverArmShare * dMm)) / vuN;
}
