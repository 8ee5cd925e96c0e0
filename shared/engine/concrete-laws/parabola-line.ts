import type { ConcreteLaw } from './concrete-law.ts';

/** What one of these laws is made of. Strains dimensionless, stresses MPa. */
export interface ParabolaLine {
  readonly name: string;
  readonly source: string;
  /** Writes the law's line for the reader, when it is asked for. */
  readonly formulaOf: (law: ParabolaLineLaw) => string;
  readonly peakStressMPa: number;
  readonly peakStrain: number;
  readonly crushingStrain: number;
  /** Loss of stress per unit strain beyond the peak, over the peak stress. */
  readonly fallPerStrain: number;
  /** Stress the fall ends at, over the peak stress. */
  readonly floorShare: number;
}

/**
 * Second-degree parabola to the peak, straight fall, and a floor: the shape of Hognestad and of Kent–Park.
 * f = fp (2x − x²) with x = ε/ε₀ to ε₀; fp (1 − k (ε − ε₀)) to the floor; constant beyond. Integrals in closed form.
 */
export class ParabolaLineLaw implements ConcreteLaw {
  readonly name: string;
  readonly source: string;
  readonly peakStressMPa: number;
  readonly peakStrain: number;
  readonly crushingStrain: number;
  readonly fallPerStrain: number;
  private readonly formulaOf: (law: ParabolaLineLaw) => string;
  private readonly floorMPa: number;
  private readonly floorStrain: number;
  private readonly forceAtPeak: number;
  private readonly momentAtPeak: number;
  private readonly forceAtFloor: number;
  private readonly momentAtFloor: number;

  constructor(of: ParabolaLine) {
    this.name = of.name;
    this.source = of.source;
    this.formulaOf = of.formulaOf;
    this.peakStressMPa = of.peakStressMPa;
    this.peakStrain = of.peakStrain;
    this.crushingStrain = of.crushingStrain;
    this.fallPerStrain = of.fallPerStrain;
    this.floorMPa = of.floorShare * of.peakStressMPa;
    this.floorStrain = of.peakStrain + (1 - of.floorShare) / of.fallPerStrain;
    this.forceAtPeak = (2 / 3) * of.peakStressMPa * of.peakStrain;
    this.momentAtPeak = (5 / 12) * of.peakStressMPa * of.peakStrain * of.peakStrain;
    this.forceAtFloor = this.forceOnLine(this.floorStrain - of.peakStrain);
    this.momentAtFloor = this.momentOnLine(this.floorStrain - of.peakStrain);
  }

  get formula(): string {
    return this.formulaOf(this);
  }

  get kinkStrains(): readonly number[] {
    return [this.peakStrain, this.floorStrain];
  }

  stress(strain: number): number {
    if (strain <= 0) return 0;
    const past = strain - this.peakStrain;
    if (past < 0) return ((this.peakStressMPa * strain) / this.peakStrain) * (2 - strain / this.peakStrain);
    return strain < this.floorStrain ? this.peakStressMPa * (1 - this.fallPerStrain * past) : this.floorMPa;
  }

  nearStress(strain: number): number {
    return this.stress(strain);
  }

  forceIntegral(strain: number): number {
    if (strain <= 0) return 0;
    const { peakStrain, floorStrain } = this;
    if (strain < peakStrain)
      return ((this.peakStressMPa * strain * strain) / peakStrain) * (1 - strain / (3 * peakStrain));
    if (strain < floorStrain) return this.forceOnLine(strain - peakStrain);
    return this.forceAtFloor + this.floorMPa * (strain - floorStrain);
  }

  momentIntegral(strain: number): number {
    if (strain <= 0) return 0;
    const { peakStrain, floorStrain } = this;
    if (strain < peakStrain)
      return (
        ((this.peakStressMPa * strain * strain * strain) / peakStrain) * (2 / 3 - strain / (4 * peakStrain))
      );
    if (strain < floorStrain) return this.momentOnLine(strain - peakStrain);
    return this.momentAtFloor + 0.5 * this.floorMPa * (strain * strain - floorStrain * floorStrain);
  }

  private forceOnLine(past: number): number {
    return this.forceAtPeak + this.peakStressMPa * past * (1 - 0.5 * this.fallPerStrain * past);
  }

  private momentOnLine(past: number): number {
    const { peakStrain, fallPerStrain: k } = this;
    const inner = peakStrain + past * (0.5 * (1 - k * peakStrain) - (k * past) / 3);
    return this.momentAtPeak + this.peakStressMPa * past * inner;
  }
}
