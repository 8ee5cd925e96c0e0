import type { ResolvedFlange } from './flange.ts';
import type { DefinedDuctility } from './defined-ductility.ts';
import type { Measures } from './measures.ts';
import type { SpacingLimit } from './spacing-limits.ts';
import type { BendAllowance, DisplacedConcrete, Face, RuleSetId, YieldCurvatureAt } from './section.ts';
import type { UltimateCause } from './ultimate-cause.ts';

/** Closed list of checks, in the order they are shown; at most 31, since bit i of a failure mask is CHECK_IDS[i]. */
export const CHECK_IDS = [
  'bar-fit',
  'hanger-bars',
  'strength',
  'curvature-ductility',
  'tension-strain',
  'least-steel',
  'depth-to-width',
  'depth-cap',
  'column-width',
  'compression-share',
  'bar-rules',
  'crack-control',
  'compression-ties',
  'shear',
  'stirrup-spacing',
  'least-depth',
  'axis-depth',
  'most-steel',
  'skin-steel',
  'seismic-width',
  'seismic-span',
  'seismic-steel',
  'seismic-bars',
  'seismic-reversal',
  'hoop-spacing',
] as const;
export type CheckId = (typeof CHECK_IDS)[number];

/** Physical kind of a number, so that a client can print it in the project's units. */
export const QUANTITY_KINDS = [
  'length',
  'area',
  'stress',
  'force',
  'moment',
  'curvature',
  'strain',
  'inertia',
  'stiffness',
  'count',
  'ratio',
  'mass-per-length',
] as const;
/** SI base of each: mm, mm², MPa, N, N·mm, 1/mm, –, mm⁴, N·mm², –, –, kg/m. */
export type QuantityKind = (typeof QUANTITY_KINDS)[number];

/** One check. `ratio` ≤ 1 passes: demand over capacity, arranged so that more is worse. Null where it has no number. */
export interface CheckResult {
  readonly id: CheckId;
  readonly passes: boolean;
  readonly demand: number | null;
  readonly capacity: number | null;
  readonly ratio: number | null;
  readonly kind: QuantityKind;
  /** Clause and edition, or "office rule". */
  readonly clause: string;
  readonly reason: string;
}

/** One bar with its coordinates: x from the left side, y from the compression face (mm), centre of bar. */
export interface PlacedBar {
  readonly bar: string;
  readonly xMm: number;
  readonly yMm: number;
  readonly diameterMm: number;
  readonly areaMm2: number;
  readonly face: Face;
  /** 0 is the layer nearest its face. */
  readonly layer: number;
}

/** How one face's bars were placed, or why not. */
export interface FaceArrangement {
  readonly face: Face;
  readonly fits: boolean;
  /** Bars per layer from the face inwards. */
  readonly layerCounts: readonly number[];
  /** Least clear gap in any layer, mm; null with fewer than two bars in each. */
  readonly clearGapMm: number | null;
  /** Largest centre spacing in the layer nearest the face, mm. */
  readonly largestSpacingMm: number | null;
  readonly requiredGapMm: number;
  /** Least width at which this group would be placed within the allowed layers, mm (exact, not rounded). */
  readonly widthNeededMm: number;
  readonly reason: string;
}

export interface Arrangement {
  readonly bendAllowance: BendAllowance;
  readonly fits: boolean;
  readonly bars: readonly PlacedBar[];
  readonly faces: readonly FaceArrangement[];
  /** Least overall depth at which the two groups clear each other, mm. */
  readonly depthNeededMm: number;
  /** Inside radius of the stirrup's bend, mm; 0 without stirrup. */
  readonly bendRadiusMm: number;
  readonly reason: string;
}

/** State of one layer at ultimate. Strain and stress: tension positive. */
export interface LayerState {
  readonly face: Face;
  readonly depthMm: number;
  readonly areaMm2: number;
  readonly strain: number;
  readonly stressMPa: number;
  /** Net force, N, tension positive, displaced concrete already taken off where deducted. */
  readonly forceN: number;
  readonly yields: boolean;
  readonly displacedConcreteDeducted: boolean;
}

export interface FlexureResult {
  readonly beta1: number;
  readonly epsilonCu: number;
  readonly neutralAxisMm: number;
  readonly blockDepthMm: number;
  readonly concreteForceN: number;
  readonly layers: readonly LayerState[];
  /** Unbalanced force over the concrete force, dimensionless. */
  readonly equilibriumResidual: number;
  readonly nominalMomentNmm: number;
  /** Strain of the outermost tension layer, tension positive. */
  readonly tensionStrain: number;
  readonly strengthReduction: number;
  readonly designMomentNmm: number;
}

export interface ElasticResult {
  readonly ecMPa: number;
  readonly modularRatio: number;
  /** Uncracked: depth of the centroid of the transformed section, inertia, moment and curvature at the modulus of rupture. */
  readonly uncrackedAxisMm: number;
  readonly uncrackedInertiaMm4: number;
  readonly ruptureModulusMPa: number;
  readonly crackingMomentNmm: number;
  readonly crackingCurvaturePerMm: number;
  /** Cracked, linear elastic. */
  readonly crackedAxisMm: number;
  readonly crackedInertiaMm4: number;
  readonly yieldMomentNmm: number;
  readonly concreteStressAtYieldMPa: number;
  /** Share of f′c; above 0.7 the elastic picture is doubtful. */
  readonly concreteStressShareAtYield: number;
  readonly isElasticPictureDoubtful: boolean;
}

export interface DuctilityResult {
  readonly curvatureYieldPerMm: number;
  readonly curvatureUltimatePerMm: number;
  readonly curvatureDuctility: number;
  /** The convention in one sentence; never show the number without it. */
  readonly definition: string;
}

/** Ductility read off the full curve, by the laws of the basis. Curvatures 1/mm; null where no bar yields. */
export interface CurveDuctilityResult {
  readonly curvatureFirstYieldPerMm: number | null;
  readonly curvatureBilinearYieldPerMm: number | null;
  readonly curvatureUltimatePerMm: number;
  readonly cause: UltimateCause;
  readonly byFirstYield: DefinedDuctility;
  readonly byBilinearYield: DefinedDuctility;
}

export interface SteelLine {
  readonly bar: string;
  readonly position: 'tension' | 'compression' | 'skin' | 'stirrups';
  readonly count: number;
  /** Length of bar per metre of beam, m/m. */
  readonly lengthPerM: number;
  readonly kgPerM: number;
}

/** Stirrups with the spacing they are built with. */
export interface BuiltStirrups {
  readonly bar: string;
  readonly legs: number;
  readonly spacingMm: number;
  readonly isDesigned: boolean;
  /** The least of the limits; null where the spacing is not designed, or the bars are not placed. */
  readonly governs: SpacingLimit | null;
  /** That limit, mm, before it is rounded down to the step; 0 where no spacing is close enough. */
  readonly neededMm: number | null;
  readonly reason: string;
}

/** Bars along the sides of a deep section, not counted in strength. */
export interface SkinSteel {
  readonly bar: string;
  readonly perSide: number;
  /** Spacing from the tension layer nearest mid-depth on; null where none is needed. */
  readonly spacingMm: number | null;
  readonly allowedMm: number;
  /** x from the left side, y from the compression face, mm. */
  readonly bars: readonly {
    readonly bar: string;
    readonly xMm: number;
    readonly yMm: number;
    readonly diameterMm: number;
  }[];
}

/** Per metre of beam. */
export interface Quantities {
  readonly steel: readonly SteelLine[];
  readonly netSteelKgPerM: number;
  readonly lapsKgPerM: number;
  readonly wasteKgPerM: number;
  readonly totalSteelKgPerM: number;
  readonly concreteM3PerM: number;
  readonly formworkM2PerM: number;
  /** Null where a rate is missing. */
  readonly cost: {
    readonly currency: string;
    readonly steel: number | null;
    readonly stirrups: number | null;
    readonly concrete: number | null;
    readonly formwork: number | null;
    readonly total: number | null;
  } | null;
  readonly co2eKgPerM: number | null;
}

/** One line of working: symbol = formula, with the numbers put in by the reader's client in its own units. */
export interface WorkingStep {
  readonly id: string;
  readonly topic: 'materials' | 'ultimate' | 'strength' | 'elastic' | 'ductility' | 'limits' | 'quantities';
  readonly symbol: string;
  readonly formula: string;
  readonly inputs: readonly {
    readonly symbol: string;
    readonly value: number;
    readonly kind: QuantityKind;
  }[];
  readonly value: number;
  readonly kind: QuantityKind;
  readonly clause: string;
}

/** Everything the engine says about one section. A section that fails is data, never an exception. */
export interface Evaluation {
  readonly engineVersion: string;
  readonly ruleSet: { readonly id: RuleSetId; readonly title: string };
  readonly conventions: {
    readonly displacedConcrete: DisplacedConcrete;
    readonly yieldCurvatureAt: YieldCurvatureAt;
    readonly bendAllowance: BendAllowance;
  };
  readonly geometry: {
    readonly dMm: number;
    readonly dtMm: number;
    readonly dPrimeMm: number | null;
    readonly asMm2: number;
    readonly asPrimeMm2: number;
    readonly rho: number;
    readonly rhoPrime: number;
  } | null;
  /** The slab as it was counted; null for a rectangle, absent in results from before slabs were. */
  readonly flange?: ResolvedFlange | null | undefined;
  /** Null for plain layers. */
  readonly arrangement: Arrangement | null;
  /** Null without stirrups. */
  readonly stirrups: BuiltStirrups | null;
  /** Null where none is asked or none can be placed. */
  readonly skin: SkinSteel | null;
  /** Null when the bars cannot be placed or there is no tension steel. */
  readonly flexure: FlexureResult | null;
  readonly elastic: ElasticResult | null;
  /** The closed path's, whatever the basis measures by. */
  readonly ductility: DuctilityResult | null;
  /** Null where the basis measures by the closed path, absent in results from before it had the choice. */
  readonly curveDuctility?: CurveDuctilityResult | null | undefined;
  readonly checks: readonly CheckResult[];
  readonly meetsListedChecks: boolean;
  readonly measures: Measures;
  readonly quantities: Quantities;
  readonly working: readonly WorkingStep[];
  readonly notChecked: readonly string[];
}
