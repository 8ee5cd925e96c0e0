import type { ConcreteLaw, LawSettings } from './concrete-law.ts';

const PEAK_SHARE = 0.9;
const CRUSHING_STRAIN = 0.0038;
/** Below this x the closed form x − atan x loses digits and its series is used. */
const SERIES_BELOW = 0.05;

/** x − atan x = x³/3 − x⁵/5 + x⁷/7 − … */
function lessArctangent(x: number): number {
  if (x > SERIES_BELOW) return x - Math.atan(x);
  const s = x * x;
  return x * s * (1 / 3 - s * (1 / 5 - s * (1 / 7 - s * (1 / 9 - s / 11))));
}

/** F = f″c ε₀ ln(1 + x²), G = 2 f″c ε₀² (x − atan x). */
class TodeschiniLaw implements ConcreteLaw {
  readonly name = 'Todeschini';
  readonly source = 'Todeschini, Bianchini and Kesler (1964), from memory';
  readonly kinkStrains: readonly number[] = [];
  readonly peakStressMPa: number;
  readonly peakStrain: number;
  readonly crushingStrain: number;

  constructor(of: Pick<ConcreteLaw, 'peakStressMPa' | 'peakStrain' | 'crushingStrain'>) {
    this.peakStressMPa = of.peakStressMPa;
    this.peakStrain = of.peakStrain;
    this.crushingStrain = of.crushingStrain;
  }

  get formula(): string {
    const [peak, strain] = [this.peakStressMPa, this.peakStrain].map((value) => Number(value.toPrecision(5)));
    return `f = 2 f″c x/(1 + x²), x = ε/ε₀; f″c = ${peak} MPa, ε₀ = ${strain} (0.9 f′c and 1.71 f′c/Ec unless set)`;
  }

  stress(strain: number): number {
    if (strain <= 0) return 0;
    const x = strain / this.peakStrain;
    return (2 * this.peakStressMPa * x) / (1 + x * x);
  }

  nearStress(strain: number): number {
    return this.stress(strain);
  }

  forceIntegral(strain: number): number {
    if (strain <= 0) return 0;
    const x = strain / this.peakStrain;
    return this.peakStressMPa * this.peakStrain * Math.log1p(x * x);
  }

  momentIntegral(strain: number): number {
    if (strain <= 0) return 0;
    return 2 * this.peakStressMPa * this.peakStrain ** 2 * lessArctangent(strain / this.peakStrain);
  }
}

/**
 * Todeschini: one smooth curve f = 2 f″c x/(1 + x²), x = ε/ε₀, f″c = 0.9 f′c, ε₀ = 1.71 f′c/Ec (Todeschini, Bianchini and
 * Kesler, ACI Journal, 1964; memory). The curve has no end of its own; 0.0038 unless set (common practice, no source).
 */
export function todeschini(
  fcMPa: number,
  ecMPa: number,
  {
    peakShare = PEAK_SHARE,
    peakStrain = (1.71 * fcMPa) / ecMPa,
    crushingStrain = CRUSHING_STRAIN,
  }: LawSettings = {},
): ConcreteLaw {
  return new TodeschiniLaw({ peakStressMPa: peakShare * fcMPa, peakStrain, crushingStrain });
}
