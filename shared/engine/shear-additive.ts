import { isAtLeastTimes } from './limits.ts';
import type { AdditiveShearRules } from './rules/shear-rules.ts';
import type { StirrupConstants } from './shear-inputs.ts';

/** Constants of one concrete, one width and one stirrup where strength is φ (Vc + Vs). */
export interface AdditiveShear extends StirrupConstants {
  form: 'additive';
  rules: AdditiveShearRules;
  rootFc: number;
}

export function additiveShearOf(
  rules: AdditiveShearRules,
  fcMPa: number,
  stirrups: Omit<StirrupConstants, 'leastAvPerMm'>,
): AdditiveShear {
  const rootFc = Math.min(Math.sqrt(fcMPa), rules.largestRootFc);
  const leastAvPerMm = leastStirrupsPerMm(rules, rootFc, stirrups.widthMm, stirrups.fytMPa);
  return { form: 'additive', rules, rootFc, ...stirrups, leastAvPerMm };
}

/** Least Av/s of a width, mm²/mm (ACI 318 9.6.3.4). */
export function leastStirrupsPerMm(
  rules: AdditiveShearRules,
  rootFc: number,
  widthMm: number,
  fytMPa: number,
): number {
  const stress = Math.max(rules.leastStirrupRoot * rootFc, rules.leastStirrupFloorMPa);
  return (stress * widthMm) / Math.min(fytMPa, rules.fytCapMPa);
}

/** Vc, N (ACI 318 22.5.5.1). */
export function vcN(k: AdditiveShear, dMm: number, asMm2: number, spacingMm: number): number {
  const { rules } = k;
  const rootArea = k.rootFc * k.widthMm * dMm;
  if (rules.concreteWithoutStirrups === null || hasLeastStirrups(k, spacingMm))
    return rules.concrete * rootArea;
  const size = Math.min(1, Math.sqrt(2 / (1 + dMm / rules.sizeDepthMm)));
  return size * rules.concreteWithoutStirrups * Math.cbrt(asMm2 / (k.widthMm * dMm)) * rootArea;
}

/** Whether the stirrups are at least Av,min. */
export const hasLeastStirrups = (k: AdditiveShear, spacingMm: number) =>
  isAtLeastTimes(k.avMm2, k.leastAvPerMm, spacingMm);

/** Vs, N: Av fyt d/s (22.5.8.5.3), counted up to the section limit (22.5.1.2). */
export function stirrupShearN(k: AdditiveShear, dMm: number, spacingMm = k.spacingMm): number {
  if (k.avMm2 === 0) return 0;
  const carried = (stirrupForceFactor(k) * dMm) / spacingMm;
  return Math.min(carried, largestStirrupShearN(k, dMm));
}

/** Av fyt, N: Vs is this times d/s. */
export const stirrupForceFactor = (k: AdditiveShear) => k.avMm2 * Math.min(k.fytMPa, k.rules.fytCapMPa);

/** Vs counts up to this, N (22.5.1.2). */
export function largestStirrupShearN(k: AdditiveShear, dMm: number): number {
  return largestStirrupFactor(k) * dMm;
}

/** The same over d, N/mm. */
export const largestStirrupFactor = (k: AdditiveShear) => k.rules.largestStirrupShare * k.rootFc * k.widthMm;

/** φVn, N. */
export function phiVnN(k: AdditiveShear, dMm: number, concreteN: number, spacingMm: number): number {
  return k.rules.reduction * (concreteN + stirrupShearN(k, dMm, spacingMm));
}

/** Widest spacing at which φ (Vc + Vs) carries Vu, mm; see `strengthSpacingMm`. */
export function additiveStrengthSpacingMm(
  k: AdditiveShear,
  vuN: number,
  dMm: number,
  concreteN: number,
): number {
  const vsN = vuN / k.rules.reduction - concreteN;
  if (vsN <= 0) return Infinity;
  if (!(vsN <= largestStirrupShearN(k, dMm))) return 0;
  return (k.avMm2 * Math.min(k.fytMPa, k.rules.fytCapMPa) * dMm) / vsN;
}

/** Whether Vs = Vu/φ − Vc is so large that the spacing limits halve (9.7.6.2.2). */
export function isCloselySpaced(k: AdditiveShear, vuN: number, dMm: number, concreteN: number): boolean {
  const { rules } = k;
  return vuN / rules.reduction - concreteN > rules.closeSpacingShare * (k.rootFc * k.widthMm * dMm);
}

/** Whether Vu asks for the least stirrups (9.6.3). */
export function needsLeastStirrups(k: AdditiveShear, vuN: number, dMm: number, concreteN: number): boolean {
  const { rules } = k;
  const rootArea = k.rootFc * k.widthMm * dMm;
  const from = rules.stirrupsFromShare === null ? 0.5 * concreteN : rules.stirrupsFromShare * rootArea;
  return vuN > rules.reduction * from;
}

/** Largest spacing along the beam and across the width, mm (9.7.6.2.2). */
export const alongLimitMm = ({ rules }: AdditiveShear, dMm: number, isClose: boolean) =>
  isClose ? Math.min(dMm / 4, rules.longestSpacingMm / 2) : Math.min(dMm / 2, rules.longestSpacingMm);
export const acrossLimitMm = ({ rules }: AdditiveShear, dMm: number, isClose: boolean) =>
  isClose ? Math.min(dMm / 2, rules.longestSpacingMm / 2) : Math.min(dMm, rules.longestSpacingMm);
