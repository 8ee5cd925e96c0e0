import { parabolaRectangleConstants } from '../concrete-laws/parabola-rectangle.ts';

/** EN 1992-1-1:2004 Table 3.1 and 3.1.7(3) as functions of fck, MPa (memory of the standard). */

/** fck above which concrete is high strength and most rules change, MPa. */
const HIGH_STRENGTH_FROM = 50;
export const isHighStrength = (fckMPa: number) => fckMPa > HIGH_STRENGTH_FROM;

/** Mean strength fcm = fck + 8, MPa. */
const meanStrengthMPa = (fckMPa: number) => fckMPa + 8;

/** fctm = 0.30 fck^(2/3) to C50, 2.12 ln(1 + fcm/10) above, MPa. */
export const meanTensionMPa = (fckMPa: number) =>
  isHighStrength(fckMPa)
    ? 2.12 * Math.log(1 + meanStrengthMPa(fckMPa) / 10)
    : 0.3 * Math.cbrt(fckMPa * fckMPa);

/** Ecm = 22 (fcm/10)^0.3 GPa, in MPa. */
export const secantModulusMPa = (fckMPa: number) => 22000 * (meanStrengthMPa(fckMPa) / 10) ** 0.3;

/** εcu2 = εcu3: 0.0035 to C50, 2.6 + 35 ((90 − fck)/100)⁴ per mille above. */
export const crushingStrainOf = (fckMPa: number) => parabolaRectangleConstants(fckMPa).crushingStrain;

/** λ of the block's depth λ x: 0.8 to C50, less (fck − 50)/400 above; as at C90 beyond it. */
export const blockDepthShare = (fckMPa: number) =>
  isHighStrength(fckMPa) ? 0.8 - (Math.min(fckMPa, 90) - 50) / 400 : 0.8;

/** η of the block's stress η fcd: 1 to C50, less (fck − 50)/200 above; as at C90 beyond it. */
export const blockStressShare = (fckMPa: number) =>
  isHighStrength(fckMPa) ? 1 - (Math.min(fckMPa, 90) - 50) / 200 : 1;

/** Largest x/d where moments were found by elastic analysis with or without redistribution (5.5(4)). */
export function elasticAxisShare(
  fckMPa: number,
  k: { readonly k1: number; readonly k2: number; readonly k3: number; readonly delta: number },
): number {
  const offset = isHighStrength(fckMPa) ? k.k3 : k.k1;
  return (k.delta - offset) / (k.k2 * (0.6 + 0.0014 / crushingStrainOf(fckMPa)));
}

/** Largest x/d for plastic analysis without a check of rotations: 0.25 to C50, 0.15 above (5.6.2(2)). */
export const plasticAxisShare = (fckMPa: number) => (isHighStrength(fckMPa) ? 0.15 : 0.25);
