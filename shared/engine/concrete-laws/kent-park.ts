import type { ConcreteLaw, LawSettings } from './concrete-law.ts';
import type { HoopConfinement } from './confinement.ts';
import { ParabolaLineLaw } from './parabola-line.ts';

const PEAK_STRAIN = 0.002;
/** Unconfined concrete begins to spall (common practice, no source). */
const SPALLING_STRAIN = 0.004;
/** Stress kept after the fall, over the peak. */
const FLOOR_SHARE = 0.2;
/** Below this the formula of the half-strength strain turns: 145 f′c − 1000 goes through zero at 6.9 MPa. */
const LEAST_FC_MPA = 8;
/** The published strains never meet; those of a caller might, and the fall must stay finite. */
const LEAST_FALL_LENGTH = 1e-4;

/** ε50u = (3 + 0.29 f′c)/(145 f′c − 1000), f′c in MPa: strain of unconfined concrete at half its strength. */
function halfStrengthStrain(fcMPa: number): number {
  const fc = Math.max(fcMPa, LEAST_FC_MPA);
  return (3 + 0.29 * fc) / (145 * fc - 1000);
}

const shown = (value: number) => Number(value.toPrecision(5));

const unconfinedFormula = ({ peakStrain, fallPerStrain }: ParabolaLineLaw) =>
  `f = f′c (2x − x²), x = ε/ε₀, ε₀ = ${peakStrain}; then f′c (1 − Z (ε − ε₀)) ≥ 0.2 f′c; Z = 0.5/((3 + 0.29 f′c)/(145 f′c − 1000) − ε₀) = ${shown(fallPerStrain)}, MPa`;

const confinedFormula = ({ peakStressMPa, peakStrain, fallPerStrain }: ParabolaLineLaw) =>
  `f = K f′c (2x − x²), x = ε/(ε₀ K); then K f′c (1 − Zm (ε − ε₀ K)) ≥ 0.2 K f′c; K = 1 + ρs fyh/f′c, K f′c = ${shown(peakStressMPa)} MPa, ε₀ K = ${shown(peakStrain)}, Zm = 0.5/(ε50u + 0.75 ρs √(h″/sh) − ε₀ K) = ${shown(fallPerStrain)}; crushed at 0.004 + 0.9 ρs fyh/300`;

/**
 * Modified Kent–Park, unconfined: parabola to f′c at 0.002, straight fall of slope Z = 0.5/(ε50u − 0.002) to 0.2 f′c
 * (Park, Priestley and Gill, ASCE, 1982; Scott, Park and Priestley, ACI Journal, 1982; memory).
 */
export function kentPark(
  fcMPa: number,
  { peakShare = 1, peakStrain = PEAK_STRAIN, crushingStrain = SPALLING_STRAIN }: LawSettings = {},
): ConcreteLaw {
  return new ParabolaLineLaw({
    name: 'Kent–Park, unconfined',
    source: 'Park, Priestley and Gill (1982), from memory; spalling at 0.004 common practice, no source',
    formulaOf: unconfinedFormula,
    peakStressMPa: peakShare * fcMPa,
    peakStrain,
    crushingStrain,
    fallPerStrain: 0.5 / Math.max(halfStrengthStrain(fcMPa) - peakStrain, LEAST_FALL_LENGTH),
    floorShare: FLOOR_SHARE,
  });
}

/**
 * Modified Kent–Park, confined by hoops: K = 1 + ρs fyh/f′c raises strength and strain at the peak,
 * Zm = 0.5/(ε50u + 0.75 ρs √(h″/sh) − 0.002 K), floor 0.2 K f′c. Crushed when the first hoop breaks:
 * 0.004 + 0.9 ρs fyh/300 (Scott, Park and Priestley, 1982; MPa; memory). ρs and the core's width h″ to the outside of the
 * hoops, sh their spacing.
 */
export function kentParkConfined(
  fcMPa: number,
  hoops: HoopConfinement,
  { peakShare = 1, peakStrain = PEAK_STRAIN, crushingStrain }: LawSettings = {},
): ConcreteLaw {
  const { volumetricRatioOutside: rho, outsideWidthMm, spacingMm, hoopYieldMPa } = hoops;
  const gain = 1 + (rho * hoopYieldMPa) / fcMPa;
  const half = halfStrengthStrain(fcMPa) + 0.75 * rho * Math.sqrt(outsideWidthMm / spacingMm);
  return new ParabolaLineLaw({
    name: 'Kent–Park, confined',
    source: 'Park, Priestley and Gill (1982); Scott, Park and Priestley (1982), from memory',
    formulaOf: confinedFormula,
    peakStressMPa: gain * peakShare * fcMPa,
    peakStrain: peakStrain * gain,
    crushingStrain: crushingStrain ?? SPALLING_STRAIN + (0.9 * rho * hoopYieldMPa) / 300,
    fallPerStrain: 0.5 / Math.max(half - peakStrain * gain, LEAST_FALL_LENGTH),
    floorShare: FLOOR_SHARE,
  });
}
