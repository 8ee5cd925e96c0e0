import type { Face, SeismicSystem } from '../section.ts';

/** Clause and edition printed beside each seismic check. */
export interface SeismicClauses {
  readonly width: string;
  readonly span: string;
  /** Steel of the faces as a whole; then the least and the most of one face. */
  readonly steel: string;
  leastSteel(face: Face): string;
  readonly mostSteel: string;
  readonly bars: string;
  readonly reversal: string;
  readonly hoops: string;
}

/** The rule as its book prints it, for the working. */
interface SeismicFormulas {
  readonly width: string;
  leastSteel(face: Face): string;
  readonly mostSteel: string;
  readonly hoops: string;
}

/**
 * Limits of one face's steel, linear so that the hot loop only multiplies: share × b d + other × steel of the other face,
 * d the effective depth of the face itself. None: 0 and 0 for the least, Infinity and 0 for the most.
 */
export interface FaceSteelLimits {
  readonly leastShare: number;
  readonly leastOfOther: number;
  readonly mostShare: number;
  readonly mostOfOther: number;
}

/** What the steel limits of a face may depend on besides its size. */
interface SeismicMaterials {
  readonly fcMPa: number;
  readonly fyMPa: number;
  readonly esMPa: number;
  /** Curvature ductility asked of the section; null where none is. */
  readonly ductilityTarget: number | null;
}

/** Spacing of hoops where hinges may form: min(a d, b h, by bars). Infinity leaves a limit out. */
interface HoopRules {
  readonly shareOfEffectiveDepth: number;
  readonly shareOfDepth: number;
  /** Limits by the smallest longitudinal bar, the hoop and fixed lengths, mm; a diameter is Infinity for plain layers. */
  byBarsMm(leastBarMm: number, hoopMm: number, fyMPa: number): number;
  /** Skin bars count among the bars enclosed. */
  readonly countsSkinBars: boolean;
  /** Least hoop diameter round bars of that diameter, mm. */
  leastHoopMm(largestBarMm: number): number;
}

/** What a class of moment frame asks of its beams, as data plus small functions. Null: the code does not ask it. */
export interface SeismicRules {
  readonly title: string;
  /** Web at least min(share × h, most) wide. */
  readonly leastWidth: { readonly shareOfDepth: number; readonly mostMm: number } | null;
  /** Clear span at least this many times d. */
  readonly leastSpanToDepth: number | null;
  /** Highest named yield strength of the bars, MPa. */
  readonly largestFyMPa: number | null;
  readonly steelLimits: ((face: Face, materials: SeismicMaterials) => FaceSteelLimits) | null;
  /** Bars that run through at each face, and the least diameter of these; 0 for any. */
  readonly continuousBars: { readonly count: number; readonly leastDiameterMm: number } | null;
  /** Nominal strength with the faces changed over, at least this share of the strength as asked. */
  readonly reversalShare: number | null;
  readonly hoops: HoopRules | null;
  readonly clauses: SeismicClauses;
  readonly formulas: SeismicFormulas;
}

/** Rules of each system that a code knows besides none. */
export type SeismicSystems = Readonly<Partial<Record<Exclude<SeismicSystem, 'none'>, SeismicRules>>>;
