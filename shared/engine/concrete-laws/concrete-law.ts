/**
 * Stress–strain law of concrete in compression with its running integrals, so that a strip of section is integrated
 * without quadrature. Strains and stresses of this folder are compression positive; in tension every law is zero.
 */
export interface ConcreteLaw {
  readonly name: string;
  /** The law in one line, stresses in MPa. */
  readonly formula: string;
  /** Where it was published; all from memory unless it says otherwise. */
  readonly source: string;
  readonly peakStressMPa: number;
  readonly peakStrain: number;
  /** Strain at which the concrete counts as crushed; the law is defined beyond it. */
  readonly crushingStrain: number;
  /** Strains where the law changes its formula, for whoever integrates or plots it. */
  readonly kinkStrains: readonly number[];
  /** f(ε), MPa. */
  stress(strain: number): number;
  /** f(ε) as F integrates it: the same, or within the error of a law's table; for slopes and concrete displaced by bars. */
  nearStress(strain: number): number;
  /** F(ε) = ∫₀^ε f dε, MPa; force of a strip of width b between strains: b/φ × the difference. */
  forceIntegral(strain: number): number;
  /** G(ε) = ∫₀^ε f ε dε, MPa; moment about the neutral axis: b/φ² × the difference. */
  momentIntegral(strain: number): number;
}

/** What a caller may set instead of a law's own values. */
export interface LawSettings {
  /** Peak stress of unconfined concrete over f′c. */
  readonly peakShare?: number | undefined;
  /** Strain at the peak of unconfined concrete. */
  readonly peakStrain?: number | undefined;
  readonly crushingStrain?: number | undefined;
}
