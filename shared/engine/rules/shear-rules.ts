/** Numbers of a one-way shear rule, MPa and mm, in the form its code has. */
export type ShearRules = AdditiveShearRules | StrutShearRules;

/**
 * The ACI form, φ (Vc + Vs): Vc = a √f′c b d with at least the least stirrups, and Vc = λs e ρ^(1/3) √f′c b d with fewer
 * where the edition has the size effect.
 */
export interface AdditiveShearRules {
  readonly form: 'additive';
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
  /** The rules as the book prints them. */
  readonly formulas: {
    readonly concrete: string;
    readonly concreteWithoutStirrups: string;
    /** Largest Vs that counts. */
    readonly stirrupLimit: string;
    /** Least Av/s. */
    readonly leastStirrups: string;
  };
}

/**
 * The EN form, a truss with struts of a chosen slope: the concrete alone, or the stirrups alone up to the crushing of the
 * struts, whichever is more.
 */
export interface StrutShearRules {
  readonly form: 'variable-strut';
  /** C of VRd,c = C k (100 ρl fck)^(1/3) b d, the partial factor taken in. */
  readonly concrete: number;
  /** v of vmin = v k^1.5 √fck. */
  readonly concreteFloor: number;
  /** fcd of the struts for fck. */
  strutStrengthMPa(fckMPa: number): number;
  /** ν1 for fck. */
  strutReduction(fckMPa: number): number;
  /** fywd for fywk. */
  stirrupDesignMPa(fywkMPa: number): number;
  /** Range from which cot θ is chosen. */
  readonly leastCot: number;
  readonly mostCot: number;
  /** z over d. */
  readonly leverArmShare: number;
  /** w of ρw,min = w √fck/fywk. */
  readonly leastStirrupRoot: number;
  /** Largest spacing along the beam, and of the legs across it, over d. */
  readonly longestSpacingShare: number;
  readonly longestAcrossShare: number;
  readonly longestAcrossMm: number;
}
