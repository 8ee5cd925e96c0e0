import type { Bar } from './bars.ts';
import type { Stirrup } from './section.ts';

/** What shear is worked out from besides the depth; lengths mm, stresses MPa. */
export interface ShearInputs {
  readonly fcMPa: number;
  readonly widthMm: number;
  readonly coverMm: number;
  readonly stirrup: Stirrup | null;
  readonly stirrupBar: Bar | null;
  readonly fytMPa: number;
}

/** Constants of one width and one stirrup, in every form. */
export interface StirrupConstants {
  widthMm: number;
  /** Area of all legs, mm²; 0 without stirrups. */
  avMm2: number;
  /** Spacing along the beam as given, mm; Infinity without stirrups. */
  spacingMm: number;
  fytMPa: number;
  /** Spacing of legs across the width, mm; 0 without stirrups. */
  legSpacingMm: number;
  /** Least Av/s, mm. */
  leastAvPerMm: number;
}

export function stirrupsOf(inputs: ShearInputs): Omit<StirrupConstants, 'leastAvPerMm'> {
  const { widthMm, coverMm, stirrup, stirrupBar, fytMPa } = inputs;
  if (!stirrup || !stirrupBar) return { widthMm, fytMPa, avMm2: 0, spacingMm: Infinity, legSpacingMm: 0 };
  return {
    widthMm,
    fytMPa,
    avMm2: stirrup.legs * stirrupBar.areaMm2,
    spacingMm: stirrup.spacingMm,
    legSpacingMm: (widthMm - 2 * coverMm - stirrupBar.diameterMm) / (stirrup.legs - 1),
  };
}
