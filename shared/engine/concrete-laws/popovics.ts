/**
 * The curve of Popovics (Cement and Concrete Research 3, 1973; memory), which Mander's law uses:
 * f = fp x r/(r − 1 + x^r), x = ε/ε₀, r = Ec/(Ec − fp/ε₀); its integrals have no closed form.
 */
export class Popovics {
  readonly peakStrain: number;
  /** r. */
  readonly shape: number;
  private readonly scale: number;

  constructor(peakStressMPa: number, peakStrain: number, ecMPa: number) {
    this.peakStrain = peakStrain;
    this.shape = ecMPa / (ecMPa - peakStressMPa / peakStrain);
    this.scale = peakStressMPa * this.shape;
  }

  stress(strain: number): number {
    const x = strain / this.peakStrain;
    return (this.scale * x) / (this.shape - 1 + x ** this.shape);
  }

  /**
   * f at a strain, and f′ from it: with r − 1 + x^r = s x/f, f′ = (r − 1)(1 − x^r) f²/(s x² ε₀), so that a node of a table
   * takes one power.
   */
  slopeFrom(strain: number, stress: number): number {
    const { shape: r, scale, peakStrain } = this;
    const x = strain / peakStrain;
    if (x === 0) return scale / ((r - 1) * peakStrain);
    const below = (scale * x) / stress;
    const power = below - (r - 1);
    return (scale * (r - 1) * (1 - power)) / (below * below * peakStrain);
  }
}
