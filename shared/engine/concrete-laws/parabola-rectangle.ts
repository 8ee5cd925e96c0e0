import type { ConcreteLaw, LawSettings } from './concrete-law.ts';

/** Strains and exponent of EN 1992-1-1:2004 Table 3.1 for fck in MPa (memory). */
export function parabolaRectangleConstants(fckMPa: number): {
  readonly peakStrain: number;
  readonly crushingStrain: number;
  readonly exponent: number;
} {
  if (fckMPa <= 50) return { peakStrain: 0.002, crushingStrain: 0.0035, exponent: 2 };
  const toNinety = Math.max(0, (90 - fckMPa) / 100) ** 4;
  return {
    peakStrain: (2 + 0.085 * (fckMPa - 50) ** 0.53) / 1000,
    crushingStrain: (2.6 + 35 * toNinety) / 1000,
    exponent: 1.4 + 23.4 * toNinety,
  };
}

/**
 * With u = 1 − ε/εc2: F = fcd (ε − εc2 (1 − u^(n+1))/(n+1)),
 * G = fcd (ε²/2 − εc2² ((1 − u^(n+1))/(n+1) − (1 − u^(n+2))/(n+2))).
 */
class ParabolaRectangleLaw implements ConcreteLaw {
  readonly name = 'EN parabola–rectangle';
  readonly source = 'EN 1992-1-1:2004 3.1.7, Table 3.1, from memory';
  readonly peakStressMPa: number;
  readonly peakStrain: number;
  readonly crushingStrain: number;
  private readonly exponent: number;
  private readonly forceAtPeak: number;
  private readonly momentAtPeak: number;

  constructor(
    of: Pick<ConcreteLaw, 'peakStressMPa' | 'peakStrain' | 'crushingStrain'> & { readonly exponent: number },
  ) {
    const { peakStressMPa: fp, peakStrain, exponent: n } = of;
    this.peakStressMPa = fp;
    this.peakStrain = peakStrain;
    this.crushingStrain = of.crushingStrain;
    this.exponent = n;
    this.forceAtPeak = fp * peakStrain * (1 - 1 / (n + 1));
    this.momentAtPeak = fp * peakStrain * peakStrain * (0.5 - 1 / (n + 1) + 1 / (n + 2));
  }

  get formula(): string {
    const [peak, strain, n] = [this.peakStressMPa, this.peakStrain, this.exponent].map((value) =>
      Number(value.toPrecision(5)),
    );
    return `σ = fcd (1 − (1 − ε/εc2)^n) to εc2 = ${strain}, then fcd = ${peak} MPa; n = ${n}`;
  }

  get kinkStrains(): readonly number[] {
    return [this.peakStrain];
  }

  stress(strain: number): number {
    if (strain <= 0) return 0;
    if (strain >= this.peakStrain) return this.peakStressMPa;
    return this.peakStressMPa * (1 - this.power(1 - strain / this.peakStrain));
  }

  nearStress(strain: number): number {
    return this.stress(strain);
  }

  forceIntegral(strain: number): number {
    if (strain <= 0) return 0;
    const { peakStrain, peakStressMPa: fp, exponent: n } = this;
    if (strain >= peakStrain) return this.forceAtPeak + fp * (strain - peakStrain);
    const u = 1 - strain / peakStrain;
    return fp * (strain - (peakStrain * (1 - u * this.power(u))) / (n + 1));
  }

  momentIntegral(strain: number): number {
    if (strain <= 0) return 0;
    const { peakStrain, peakStressMPa: fp, exponent: n } = this;
    if (strain >= peakStrain)
      return this.momentAtPeak + 0.5 * fp * (strain * strain - peakStrain * peakStrain);
    const u = 1 - strain / peakStrain;
    const once = u * this.power(u);
    const arm = (1 - once) / (n + 1) - (1 - once * u) / (n + 2);
    return fp * (0.5 * strain * strain - peakStrain * peakStrain * arm);
  }

  private power(u: number): number {
    return this.exponent === 2 ? u * u : u ** this.exponent;
  }
}

/**
 * EN 1992-1-1:2004 3.1.7: σ = fcd (1 − (1 − ε/εc2)^n) to εc2, then fcd (memory). `peakShare` is fcd/fck, thus αcc/γc for
 * a design value; 1 unless set.
 */
export function parabolaRectangle(fckMPa: number, settings: LawSettings = {}): ConcreteLaw {
  const table = parabolaRectangleConstants(fckMPa);
  const { peakShare = 1, peakStrain = table.peakStrain, crushingStrain = table.crushingStrain } = settings;
  return new ParabolaRectangleLaw({
    peakStressMPa: peakShare * fckMPa,
    peakStrain,
    crushingStrain,
    exponent: table.exponent,
  });
}
