import type { ConcreteLawId } from '../curve-choices.ts';
import type { WorkingStep } from '../evaluation.ts';
import type { FlangeSetting, ResolvedFlange } from '../flange.ts';
import type { RuleSetId, Support } from '../section.ts';
import type { CodeSymbols } from './code-symbols.ts';
import type { SeismicSystems } from './seismic-rules.ts';
import type { ShearRules } from './shear-rules.ts';

/** Clause and edition printed beside each result. */
export interface Clauses {
  readonly block: string;
  readonly strengthReduction: string;
  readonly strength: string;
  readonly tensionStrain: string;
  readonly concreteModulus: string;
  readonly ruptureModulus: string;
  readonly leastSteel: string;
  readonly barSpacing: string;
  readonly hangers: string;
  readonly crackControl: string;
  readonly compressionTies: string;
  /** Shear as a whole; then the concrete's part, that of the stirrups, and the most the section takes. */
  readonly shear: string;
  readonly shearConcrete: string;
  readonly shearStirrups: string;
  readonly shearLimit: string;
  /** Stirrup spacing as a whole; then the widest along the beam, and the least stirrups. */
  readonly stirrupSpacing: string;
  readonly spacingAlong: string;
  readonly leastStirrups: string;
  readonly leastDepth: string;
  readonly axisDepth: string;
  readonly mostSteel: string;
  readonly skinSteel: string;
  readonly flangeWidth: string;
  /** The steel's elastic–plastic law. */
  readonly steelLaw: string;
}

/** The rule as its book prints it, in the book's units, for the working shown beside a result. */
export interface Formulas {
  readonly blockDepthFactor: string;
  readonly concreteModulus: string;
  readonly ruptureModulus: string;
  readonly leastSteel: string;
  readonly strengthReduction: string;
  /** Largest depth of the neutral axis; empty where the strain is limited instead. */
  axisShare(fcMPa: number): string;
  readonly crackSpacing: string;
  readonly tieSpacing: string;
  readonly skinSpacing: string;
  leastDepth(support: Support): string;
  /** Width that As,min counts on where it is not the web's. */
  readonly leastSteelWidth: string;
  /** Largest span over d, written with the branch and the factors that apply; empty where the code has none. */
  spanToDepth(of: SpanToDepthSection): string;
  /** Effective width bf from the web's b, hf, sw (clear to the next web) and ln (clear span). */
  effectiveFlange(of: Pick<FlangeSetting, 'shape' | 'face' | 'support'>): string;
}

/** What is said beside a check where codes differ. */
export interface Texts {
  readonly shear: string;
  /** Why a beam without stirrups fails. */
  readonly stirrupsMissing: string;
  readonly leastDepth: string;
  /** Steel stress that crack control takes for the service stress. */
  readonly serviceStress: string;
}

/** What the largest span over d may depend on; mm, MPa. */
export interface SpanToDepthSection {
  readonly spanMm: number;
  readonly support: Support;
  readonly fckMPa: number;
  readonly fykMPa: number;
  /** As/(b d) and A′s/(b d), b the width of the compression face. */
  readonly rho: number;
  readonly rhoPrime: number;
  /** Width of a flange in compression over the web's; 1 without. */
  readonly flangeToWeb: number;
}

/**
 * A design code as data plus small functions. Stresses MPa, lengths mm, areas mm². Adding a code is adding one file
 * that makes one of these, and its id in section.ts.
 */
export interface RuleSet {
  readonly id: RuleSetId;
  readonly title: string;
  readonly units: 'us' | 'si';
  /** Crushing strain of the extreme compression fibre. */
  crushingStrain(fcMPa: number): number;
  /** Yield stress that strength counts on: fy itself, or with a partial factor. */
  designYieldMPa(fyMPa: number): number;
  /** Stress of the rectangular block. */
  blockStressMPa(fcMPa: number): number;
  /** Depth of the block over the depth of the neutral axis. */
  blockDepthFactor(fcMPa: number): number;
  concreteModulusMPa(fcMPa: number): number;
  ruptureModulusMPa(fcMPa: number): number;
  /** Strength reduction factor φ for strain εt of the outermost tension layer and yield strain εty. */
  strengthReduction(epsilonT: number, epsilonTy: number): number;
  /** Strain εt from which that factor no longer changes, so that the hot loop need not ask for it. */
  fullReductionStrain(epsilonTy: number): number;
  /** Least εt of a beam; null where the code limits the axis depth instead. */
  leastTensionStrain(epsilonTy: number): number | null;
  /** Largest neutral-axis depth over d; null where the code limits the strain instead. */
  largestAxisShare(fcMPa: number): number | null;
  /**
   * Least tension steel of a beam of web width and effective depth, without the waiver. Proportional to d: the hot loop
   * calls it with d = 1.
   */
  leastSteelMm2(section: { fcMPa: number; fyMPa: number; widthMm: number; dMm: number }): number;
  /** Width `leastSteelMm2` counts on, mm: that of the web, unless a flange at the tension face asks for more. */
  leastSteelWidthMm(of: {
    readonly widthMm: number;
    readonly depthMm: number;
    readonly flange: ResolvedFlange | null;
    readonly support: Support | null;
  }): number;
  /** Effective width of a flange in all, the web in it, mm. */
  effectiveFlangeMm(of: FlangeSetting): number;
  /** Provided over required steel at which the least steel is waived; null where it never is. */
  readonly leastSteelWaiver: number | null;
  /** Largest steel of one face over the gross section; null where strain limits it. */
  readonly largestFaceSteelShare: number | null;
  /** Strength reduction of a tension-controlled section, used for the required steel of the waiver. */
  readonly tensionControlledReduction: number;
  /** Least clear gap between bars of one layer. */
  barGapMm(diameterMm: number, aggregateMm: number): number;
  /** Least clear gap between layers. */
  layerGapMm(diameterMm: number, aggregateMm: number): number;
  /** Inside bend radius of a stirrup. */
  bendRadiusMm(stirrupDiameterMm: number): number;
  /** Straight end of a 135° stirrup hook. */
  hookTailMm(stirrupDiameterMm: number): number;
  /** Largest centre spacing of the tension bars nearest the face, for clear cover cc to them. */
  crackSpacingMm(fyMPa: number, clearCoverMm: number): number;
  /** Largest spacing of stirrups that tie compression bars. */
  tieSpacingMm(barDiameterMm: number, stirrupDiameterMm: number): number;
  /** The least side of the section bounds that spacing too. */
  readonly isTieSpacingWithinLeastSide: boolean;
  /** Least stirrup diameter that ties a bar of that diameter. */
  leastTieDiameterMm(barDiameterMm: number): number;
  /** Least overall depth where deflections are not computed; 0 where the code limits the span over d instead. */
  leastDepthMm(spanMm: number, support: Support, fyMPa: number): number;
  /** Largest span over d where deflections are not computed; null where the code gives the overall depth. */
  readonly largestSpanToDepth: ((of: SpanToDepthSection) => number) | null;
  readonly shear: ShearRules;
  /** The code's own law for a section's full curve, and its peak over f′c for any law; Hognestad's, with each law's own peak, unless set. */
  readonly curveConcrete?: { readonly law: ConcreteLawId; readonly peakShare: number } | undefined;
  /** Whether a section so deep has bars along its sides. */
  isSkinSteelAsked(depthMm: number): boolean;
  /** Largest spacing of these, for the clear cover to them. */
  skinSpacingMm(fyMPa: number, clearCoverMm: number): number;
  /** What each class of moment frame asks. */
  readonly seismic: SeismicSystems;
  /** Values that strength counts on, worked out before anything else. */
  designSteps(fcMPa: number, fyMPa: number): readonly WorkingStep[];
  readonly symbols: CodeSymbols;
  readonly texts: Texts;
  readonly clauses: Clauses;
  readonly formulas: Formulas;
}
