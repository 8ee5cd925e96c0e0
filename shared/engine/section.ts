/** What a caller hands to the engine: one section, the design basis it is judged by, the demand on it, the user's rules. */

import type { CurveChoices } from './curve-choices.ts';
import type { NationalValues } from './rules/national-values.ts';

export const FACES = ['tension', 'compression'] as const;
/** The face a bar group belongs to. Sagging is positive, so the tension face is the soffit. */
export type Face = (typeof FACES)[number];

export const RULE_SET_IDS = ['aci318-19', 'aci318m-19', 'aci318-14', 'aci318m-14', 'en1992'] as const;
/** Design code and edition; the `m` sets are the metric editions with their own rounded coefficients. */
export type RuleSetId = (typeof RULE_SET_IDS)[number];

export const BAR_STANDARDS = ['astm', 'csa', 'iso'] as const;
/** ASTM A615/A706, CSA G30.18, EN 10080 / ISO 6935. */
export type BarStandard = (typeof BAR_STANDARDS)[number];

export const DISPLACED_CONCRETE = ['deduct', 'deduct-above-axis', 'ignore'] as const;
/**
 * Concrete displaced by compression bars. `deduct`: subtract the block's stress from each bar inside the block (default).
 * `deduct-above-axis`: from each bar above the neutral axis, block or not (some hand calculations). `ignore`: never.
 */
export type DisplacedConcrete = (typeof DISPLACED_CONCRETE)[number];

export const YIELD_CURVATURE_AT = ['outermost-layer', 'centroid'] as const;
/** Where first yield is measured: the outermost tension layer (default) or the centroid of the tension group. */
export type YieldCurvatureAt = (typeof YIELD_CURVATURE_AT)[number];

export const BEND_ALLOWANCES = ['corner-in-bend', 'none'] as const;
/** `corner-in-bend`: corner-bar centre at max(r, db/2) from the stirrup leg (default). `none`: bar against the leg. */
export type BendAllowance = (typeof BEND_ALLOWANCES)[number];

/** A plain layer of steel: depth from the compression face (mm), area (mm²), and the group it is counted with. */
export interface Layer {
  readonly depthMm: number;
  readonly areaMm2: number;
  readonly face: Face;
}

/** So many bars of one size, by the designation its standard prints: `#8`, `25M`, `25`. */
export interface BarCount {
  readonly bar: string;
  readonly count: number;
}

/** Bars of one face: one or two sizes; empty for none. */
export type BarGroup = readonly BarCount[];

/** Closed stirrups along the beam. */
export interface Stirrup {
  readonly bar: string;
  readonly legs: number;
  /** Spacing as given; where the spacing is designed, the widest that is used. */
  readonly spacingMm: number;
  /** The spacing is found for each section, in practical steps, from shear and detailing. */
  readonly isDesigned?: boolean | undefined;
}

/** Bars to be arranged in layers, or layers exactly as printed in a published section. */
export type Reinforcement =
  | { readonly kind: 'bars'; readonly tension: BarGroup; readonly compression: BarGroup }
  | { readonly kind: 'layers'; readonly layers: readonly Layer[] };

export const FLANGE_SHAPES = ['t', 'l'] as const;
/** Slab on both sides of the web, or on one. */
export type FlangeShape = (typeof FLANGE_SHAPES)[number];

/** What the effective width of a flange follows from, or the width as the engineer gives it. Lengths mm. */
export type FlangeWidth =
  | { readonly kind: 'given'; readonly widthMm: number }
  | {
      readonly kind: 'effective';
      readonly clearToNextWebMm: number;
      /** Clear span ln, or the span l₀ is taken from. */
      readonly spanMm: number;
      /** Needed where the code takes the distance between points of no moment; simple unless set. */
      readonly support?: Support | undefined;
    };

/** The slab that works with the web. */
export interface Flange {
  readonly shape: FlangeShape;
  readonly thicknessMm: number;
  /** At the compression face in sagging, at the tension face in hogging. */
  readonly face: Face;
  readonly width: FlangeWidth;
}

/** One section: a rectangle, or a web with a flange. Lengths mm, stresses MPa. */
export interface SectionInput {
  /** Width of the web. */
  readonly widthMm: number;
  readonly depthMm: number;
  readonly fcMPa: number;
  readonly fyMPa: number;
  /** Clear cover to the stirrup. */
  readonly coverMm: number;
  readonly stirrup: Stirrup | null;
  readonly reinforcement: Reinforcement;
  readonly flange?: Flange | null | undefined;
}

/** Unit rate and carbon factor of one concrete mix, matched to f′c exactly (within 0.01 MPa). */
export interface ConcreteRate {
  readonly fcMPa: number;
  readonly costPerM3: number | null;
  readonly co2eKgPerM3: number | null;
}

/** A price book as the engine needs it. A missing rate is null and leaves the cost blank, never zero. */
export interface Rates {
  readonly currency: string;
  readonly steelPerKg: number | null;
  readonly stirrupPerKg: number | null;
  readonly formworkPerM2: number | null;
  readonly concrete: readonly ConcreteRate[];
  /** A1–A3 factor of reinforcing steel, kg CO2e per kg. */
  readonly steelCo2ePerKg: number | null;
  /** Laps as a share of net longitudinal steel, e.g. 0.08. */
  readonly lapShare: number;
  /** Waste as a share of net steel (stirrups too) and laps, e.g. 0.03. */
  readonly wasteShare: number;
}

export const DUCTILITY_MEASURES = ['closed', 'curve-first-yield', 'curve-bilinear'] as const;
/** What μφ is held against the target: the closed path, or the full curve by either of its yields. */
export type DuctilityMeasure = (typeof DUCTILITY_MEASURES)[number];

export const SEISMIC_SYSTEMS = ['none', 'ordinary', 'intermediate', 'special', 'dcm', 'dch'] as const;
/** Moment frame the beam belongs to: ordinary, intermediate, special (ACI 318 18); ductility class M, H (EN 1998-1). */
export type SeismicSystem = (typeof SEISMIC_SYSTEMS)[number];

/** The part of a project's design basis that decides numbers. What is optional was added later; absent is as before. */
export interface DesignBasis {
  readonly ruleSet: RuleSetId;
  readonly barStandard: BarStandard;
  readonly esMPa: number;
  /** Yield strength of the stirrups. */
  readonly fytMPa: number;
  readonly maxAggregateMm: number;
  readonly bendAllowance: BendAllowance;
  readonly displacedConcrete: DisplacedConcrete;
  readonly yieldCurvatureAt: YieldCurvatureAt;
  /** Slab thickness whose height is not formed on the two sides, mm; 0 for none. */
  readonly slabMm: number;
  readonly rates: Rates | null;
  readonly seismicSystem?: SeismicSystem | undefined;
  /** Side bars of deep beams; null for none, so that a deep beam fails the check. */
  readonly skinBar?: string | null | undefined;
  /** Stirrup spacings are multiples of this where designed; 1 in or 25 mm unless set. */
  readonly stirrupStepMm?: number | undefined;
  /** Closest stirrup spacing that is built; 3 in or 75 mm unless set. */
  readonly leastStirrupSpacingMm?: number | undefined;
  /** Outside of a bar over its nominal diameter where bars are fitted, 1.10 to 1.18 for deformed bars; 1 unless set. */
  readonly barOversize?: number | undefined;
  readonly ductilityMeasure?: DuctilityMeasure | undefined;
  /** Values a code leaves to the country; recommended ones where left out. */
  readonly nationalValues?: NationalValues | null | undefined;
  /** Laws of the full curve; those of the design code unless set. */
  readonly curve?: CurveChoices | undefined;
}

export const SUPPORTS = ['simple', 'one-end-continuous', 'both-ends-continuous', 'cantilever'] as const;
/** How the span is held, for the least depth. */
export type Support = (typeof SUPPORTS)[number];

/** What the section must do. Null: not asked, so the check is not listed. */
export interface Demand {
  /** Factored moment Mu, N·mm, sagging positive. */
  readonly muNmm: number | null;
  /** Least curvature ductility μφ. */
  readonly ductilityTarget: number | null;
  /** Largest overall depth h, mm. */
  readonly depthCapMm: number | null;
  /** Factored shear Vu, N. */
  readonly vuN?: number | null | undefined;
  /** Span, mm, and its support: with both, the least depth for deflection is checked. */
  readonly spanMm?: number | null | undefined;
  readonly support?: Support | null | undefined;
}

/** The user's own rules (no code behind them). Null: not asked. */
export interface UserRules {
  readonly minDepthToWidth: number | null;
  readonly maxDepthToWidth: number | null;
  readonly maxLayers: number;
  readonly oneSizePerFace: boolean;
  readonly excludedBars: readonly string[];
  /** Beam as wide as the column it meets, mm. */
  readonly columnWidthMm: number | null;
  /** Least A′s / As. */
  readonly minCompressionShare: number | null;
  /** A bar at each face for every stirrup leg, so two at least, for the stirrups to hang on. */
  readonly requireHangers: boolean;
}
