/**
 * Numbers of a one-way shear rule of the ACI form, in MPa and mm: Vc = a √f′c b d with at least the least stirrups, and
 * Vc = λs e ρ^(1/3) √f′c b d with fewer where the edition has the size effect.
 */
export interface ShearRules {
  readonly reduction: number;
  /** a of Vc = a √f′c b d. */
  readonly concrete: number;
  /** e of the size-effect form; null where the edition does not have it. */
  readonly concreteWithoutStirrups: number | null;
  /** λs = √(2/(1 + d / sizeDepthMm)), at most 1. */
  readonly sizeDepthMm: number;
  /** Largest √f′c that may be used. */
  readonly largestRootFc: number;
  /** Vs counts to this times √f′c b d; more makes the section too small. */
  readonly largestStirrupShare: number;
  /** Above this times √f′c b d the spacing limits halve. */
  readonly closeSpacingShare: number;
  /** Share of √f′c b d, times φ, above which the least stirrups are required; null for half of φ Vc. */
  readonly stirrupsFromShare: number | null;
  /** Least Av/s = max(p √f′c, q) b/fyt. */
  readonly leastStirrupRoot: number;
  readonly leastStirrupFloorMPa: number;
  readonly fytCapMPa: number;
  /** Largest spacing along the beam, besides d/2. */
  readonly longestSpacingMm: number;
}
