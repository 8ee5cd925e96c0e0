import { assertPositive } from './preconditions.ts';
import type { MomentCurvature } from './moment-curvature.ts';

/**
 * Length of the plastic hinge, mm: Lp = 0.08 L + 0.022 fye db, MPa and mm (Paulay and Priestley, 1992, Eq. 3.39; memory).
 * L from the critical section to the point of contraflexure, fye the expected yield strength, db the bars' diameter.
 */
export function plasticHingeLengthMm(of: {
  readonly lengthMm: number;
  readonly expectedYieldMPa: number;
  readonly barDiameterMm: number;
}): number {
  return 0.08 * of.lengthMm + 0.022 * of.expectedYieldMPa * of.barDiameterMm;
}

/** μΔ = 1 + 3 (μφ − 1) (Lp/L)(1 − 0.5 Lp/L) of a cantilever loaded at its tip (Park and Paulay, 1975; memory). */
export function displacementDuctility(curvatureDuctility: number, hingeShare: number): number {
  return 1 + 3 * (curvatureDuctility - 1) * hingeShare * (1 - 0.5 * hingeShare);
}

/** μφ that a cantilever needs for a displacement ductility: the same formula solved for μφ. */
export function curvatureDuctilityFor(displacement: number, hingeShare: number): number {
  return 1 + (displacement - 1) / (3 * hingeShare * (1 - 0.5 * hingeShare));
}

export interface HingeInput {
  /** Cantilever, or critical section to contraflexure, mm. */
  readonly lengthMm: number;
  readonly expectedYieldMPa: number;
  readonly barDiameterMm: number;
}

export interface PlasticHinge {
  readonly hingeLengthMm: number;
  /** θp = (φu − φy) Lp, rad, φy of the bilinear curve; null where no bar yields. */
  readonly plasticRotation: number | null;
  /** μΔ with the bilinear μφ; null where no bar yields. */
  readonly displacementDuctility: number | null;
  readonly definition: string;
}

const DEFINITION =
  'Lp = 0.08 L + 0.022 fye db (MPa, mm); θp = (φu − φy) Lp; μΔ = 1 + 3 (μφ − 1)(Lp/L)(1 − 0.5 Lp/L) of a cantilever loaded at its tip; φy and μφ of the bilinear curve';

/**
 * Plastic rotation and displacement ductility that a curve gives a cantilever.
 * @throws InvalidSectionError for a length, strength or diameter that is not a number above zero.
 */
export function plasticHingeOf(curve: MomentCurvature, input: HingeInput): PlasticHinge {
  assertPositive(input.lengthMm, 'Length to contraflexure', ['hinge', 'lengthMm']);
  assertPositive(input.expectedYieldMPa, 'Expected yield strength', ['hinge', 'expectedYieldMPa']);
  assertPositive(input.barDiameterMm, 'Bar diameter', ['hinge', 'barDiameterMm']);
  const hingeLengthMm = plasticHingeLengthMm(input);
  const { bilinear, ultimate, ductility } = curve;
  const mu = ductility.byBilinearYield.value;
  // the plastic length cannot pass the member's own
  const share = Math.min(1, hingeLengthMm / input.lengthMm);
  return {
    hingeLengthMm,
    plasticRotation: bilinear && (ultimate.curvaturePerMm - bilinear.yieldCurvaturePerMm) * hingeLengthMm,
    displacementDuctility: mu === null ? null : displacementDuctility(mu, share),
    definition: DEFINITION,
  };
}
