import type { ConcreteLaw, LawSettings } from './concrete-law.ts';
import { ParabolaLineLaw } from './parabola-line.ts';

const PEAK_STRAIN = 0.002;
const LAST_STRAIN = 0.0038;
const FALL = 0.15;

const formulaOf = ({ peakStressMPa, peakStrain }: ConcreteLaw) =>
  `f = f″c (2x − x²), x = ε/ε₀; beyond ε₀ f″c (1 − 0.15 (ε − ε₀)/(0.0038 − ε₀)); f″c = ${Number(peakStressMPa.toPrecision(5))} MPa, ε₀ = ${peakStrain}`;

/**
 * Hognestad: parabola to f″c at ε₀, then a straight fall of 15 % at 0.0038 (Hognestad, University of Illinois Bulletin
 * 399, 1951; memory). The bulletin has f″c = 0.85 f′c for columns and ε₀ = 1.8 f″c/Ec; for beams 0.9 to 1.0 f′c is quoted.
 * Here f″c = f′c and ε₀ = 0.002 unless set. A crushing strain above 0.0038 follows the same line down to zero.
 */
export function hognestad(
  fcMPa: number,
  { peakShare = 1, peakStrain = PEAK_STRAIN, crushingStrain = LAST_STRAIN }: LawSettings = {},
): ConcreteLaw {
  // a peak set at or beyond 0.0038 would leave no room for the fall
  const fallLength = Math.max(LAST_STRAIN - peakStrain, 0.1 * LAST_STRAIN);
  return new ParabolaLineLaw({
    name: 'Hognestad',
    source: 'Hognestad (1951), from memory',
    formulaOf,
    peakStressMPa: peakShare * fcMPa,
    peakStrain,
    crushingStrain,
    fallPerStrain: FALL / fallLength,
    floorShare: 0,
  });
}
