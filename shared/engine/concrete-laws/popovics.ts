/**
 * The curve of Popovics (Cement and Concrete Research 3, 1973; memory), which Mander's law uses:
 * f = fp x r/(r − 1 + x^r), x = ε/ε₀, r = Ec/(Ec − fp/ε₀); its integrals have no closed form. With
 * s = fp r and D = r − 1 + x^r, f = s x/D and f′ = s (r − 1)(1 − x^r)/(D² ε₀).
 */
export class Popovics {
  readonly peakStrain: number;
  /** r. */
  readonly shape: number;
  /** s, MPa. */
  readonly scale: number;

  constructor(peakStressMPa: number, peakStrain: number, ecMPa: number) {
    this.peakStrain = peakStrain;
    this.shape = ecMPa / (ecMPa - peakStressMPa / peakStrain);
    this.scale = peakStressMPa * this.shape;
  }

  stress(strain: number): number {
    const x = strain / this.peakStrain;
    return (this.scale * x) / (this.shape - 1 + x ** this.shape);
  }
}
