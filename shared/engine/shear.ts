import type { Bar } from './bars.ts';
import type { ShearRules } from './rules/shear-rules.ts';
import type { Stirrup } from './section.ts';

/** Constants of one concrete, one width and one stirrup for shear. */
export interface ShearConstants {
  rules: ShearRules;
  rootFc: number;
  widthMm: number;
  /** Area of all legs, mm²; 0 without stirrups. */
  avMm2: number;
  /** Spacing along the beam, mm; Infinity without stirrups. */
  spacingMm: number;
  fytMPa: number;
  /** Spacing of legs across the width, mm; 0 without stirrups. */
  legSpacingMm: number;
  /** Least Av/s, mm. */
  leastAvPerMm: number;
}

interface ShearInputs {
  readonly fcMPa: number;
  readonly widthMm: number;
  readonly coverMm: number;
  readonly stirrup: Stirrup | null;
  readonly stirrupBar: Bar | null;
  readonly fytMPa: number;
}

/** Everything about shear that does not depend on the depth. */
export function shearConstantsOf(rules: ShearRules, inputs: ShearInputs): ShearConstants {
  const { fcMPa, widthMm, coverMm, stirrup, stirrupBar, fytMPa } = inputs;
  const rootFc = Math.min(Math.sqrt(fcMPa), rules.largestRootFc);
  const shared = {
    rules,
    rootFc,
    widthMm,
    fytMPa,
    leastAvPerMm: leastStirrupsPerMm(rules, rootFc, widthMm, fytMPa),
  };
  if (!stirrup || !stirrupBar) return { ...shared, avMm2: 0, spacingMm: Infinity, legSpacingMm: 0 };
  return {
    ...shared,
    avMm2: stirrup.legs * stirrupBar.areaMm2,
    spacingMm: stirrup.spacingMm,
    legSpacingMm: (widthMm - 2 * coverMm - stirrupBar.diameterMm) / (stirrup.legs - 1),
  };
}

/** Least Av/s of a width, mm²/mm (ACI 318 9.6.3.4). */
export function leastStirrupsPerMm(
  rules: ShearRules,
  rootFc: number,
  widthMm: number,
  fytMPa: number,
): number {
  const stress = Math.max(rules.leastStirrupRoot * rootFc, rules.leastStirrupFloorMPa);
  return (stress * widthMm) / Math.min(fytMPa, rules.fytCapMPa);
}

/** Shear carried by the concrete, N (ACI 318 22.5.5.1). */
export function concreteShearN(k: ShearConstants, dMm: number, asMm2: number): number {
  const { rules } = k;
  const rootArea = k.rootFc * k.widthMm * dMm;
  if (rules.concreteWithoutStirrups === null || k.avMm2 >= k.leastAvPerMm * k.spacingMm)
    return rules.concrete * rootArea;
  const size = Math.min(1, Math.sqrt(2 / (1 + dMm / rules.sizeDepthMm)));
  return size * rules.concreteWithoutStirrups * Math.cbrt(asMm2 / (k.widthMm * dMm)) * rootArea;
}

/** Shear carried by the stirrups, N: Av fyt d/s (22.5.8.5.3), counted up to the section limit (22.5.1.2). */
export function stirrupShearN(k: ShearConstants, dMm: number): number {
  if (k.avMm2 === 0) return 0;
  const carried = (k.avMm2 * Math.min(k.fytMPa, k.rules.fytCapMPa) * dMm) / k.spacingMm;
  return Math.min(carried, largestStirrupShearN(k, dMm));
}

/** φVn, N, with the concrete's share Vc. */
export function designShearN(k: ShearConstants, dMm: number, concreteN: number): number {
  return k.rules.reduction * (concreteN + stirrupShearN(k, dMm));
}

/** Whether Vs = Vu/φ − Vc is so large that the spacing limits halve (9.7.6.2.2). */
export function isCloselySpaced(k: ShearConstants, vuN: number, dMm: number, concreteN: number): boolean {
  const { rules } = k;
  return vuN / rules.reduction - concreteN > rules.closeSpacingShare * (k.rootFc * k.widthMm * dMm);
}

/** Vs counts up to this, N (22.5.1.2). */
export function largestStirrupShearN(k: ShearConstants, dMm: number): number {
  return k.rules.largestStirrupShare * k.rootFc * k.widthMm * dMm;
}

/**
 * Largest spacing along the beam allowed for Vu, mm: d/2, or d/4 where stirrups carry much; legs across the width; and
 * Av,min where Vu asks for it (9.6.3, 9.7.6.2.2). Infinity where Vu asks for no stirrups, 0 where the legs stand too far
 * apart or there are none though they are required.
 */
export function stirrupSpacingLimitMm(
  k: ShearConstants,
  vuN: number,
  dMm: number,
  concreteN: number,
): number {
  const { rules } = k;
  const rootArea = k.rootFc * k.widthMm * dMm;
  const from = rules.stirrupsFromShare === null ? 0.5 * concreteN : rules.stirrupsFromShare * rootArea;
  if (!(vuN > rules.reduction * from)) return Infinity;
  if (k.avMm2 === 0) return 0;
  const isClose = isCloselySpaced(k, vuN, dMm, concreteN);
  const along = isClose
    ? Math.min(dMm / 4, rules.longestSpacingMm / 2)
    : Math.min(dMm / 2, rules.longestSpacingMm);
  const across = isClose
    ? Math.min(dMm / 2, rules.longestSpacingMm / 2)
    : Math.min(dMm, rules.longestSpacingMm);
  if (k.legSpacingMm > across) return 0;
  return Math.min(along, k.avMm2 / k.leastAvPerMm);
}
