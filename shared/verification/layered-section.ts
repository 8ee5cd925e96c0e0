import { evaluateSection } from '#shared/engine/evaluate.ts';
import type { Evaluation } from '#shared/engine/evaluation.ts';
import type {
  DesignBasis,
  Demand,
  Face,
  Flange,
  Layer,
  RuleSetId,
  SectionInput,
  UserRules,
} from '#shared/engine/section.ts';
import { MM2_PER_IN2, MM_PER_IN, MPA_PER_PSI, NMM_PER_KIPFT } from '#shared/engine/units.ts';

/** Sections with plain layers, as books print them, in the book's units. */

export const NO_DEMAND: Demand = { muNmm: null, ductilityTarget: null, depthCapMm: null };

export const NO_RULES: UserRules = {
  minDepthToWidth: null,
  maxDepthToWidth: null,
  maxLayers: 2,
  oneSizePerFace: false,
  excludedBars: [],
  columnWidthMm: null,
  minCompressionShare: null,
  requireHangers: false,
};

export const METRIC_BASIS: DesignBasis = {
  ruleSet: 'aci318m-19',
  barStandard: 'iso',
  esMPa: 200000,
  fytMPa: 420,
  maxAggregateMm: 19,
  bendAllowance: 'none',
  displacedConcrete: 'deduct',
  yieldCurvatureAt: 'outermost-layer',
  slabMm: 0,
  rates: null,
};

export const US_BASIS: DesignBasis = {
  ...METRIC_BASIS,
  ruleSet: 'aci318-19',
  barStandard: 'astm',
  esMPa: 29e6 * MPA_PER_PSI,
};

interface LayeredSection {
  readonly b: number;
  /** Overall depth; one tenth more than d where the source does not say. */
  readonly h?: number;
  readonly d: number;
  readonly As: number;
  readonly d2?: number;
  readonly As2?: number;
  readonly fc: number;
  readonly fy: number;
  /** Flange in all and its thickness; none unless both are given. */
  readonly bf?: number;
  readonly hf?: number;
  /** Face the flange lies at; the compression face unless set. */
  readonly slabAt?: Face;
}

function layersOf({ d, As, d2, As2 }: LayeredSection, length: number, area: number): Layer[] {
  const tension: Layer = { depthMm: d * length, areaMm2: As * area, face: 'tension' };
  if (d2 === undefined || As2 === undefined) return [tension];
  return [{ depthMm: d2 * length, areaMm2: As2 * area, face: 'compression' }, tension];
}

function flangeOf({ bf, hf, slabAt = 'compression' }: LayeredSection, length: number): Flange | null {
  if (bf === undefined || hf === undefined) return null;
  const width = { kind: 'given', widthMm: bf * length } as const;
  return { shape: 't', thicknessMm: hf * length, face: slabAt, width };
}

function sectionOf(
  printed: LayeredSection,
  { length, area, stress }: { length: number; area: number; stress: number },
): SectionInput {
  return {
    widthMm: printed.b * length,
    depthMm: (printed.h ?? 1.1 * printed.d) * length,
    fcMPa: printed.fc * stress,
    fyMPa: printed.fy * stress,
    coverMm: 40,
    stirrup: null,
    reinforcement: { kind: 'layers', layers: layersOf(printed, length, area) },
    flange: flangeOf(printed, length),
  };
}

/** mm, mm², MPa. */
export const metricSection = (printed: LayeredSection) =>
  sectionOf(printed, { length: 1, area: 1, stress: 1 });
/** in, in², psi. */
const usSection = (printed: LayeredSection) =>
  sectionOf(printed, { length: MM_PER_IN, area: MM2_PER_IN2, stress: MPA_PER_PSI });

export function evaluateMetric(printed: LayeredSection, basis: Partial<DesignBasis> = {}): Evaluation {
  return evaluateSection(metricSection(printed), {
    basis: { ...METRIC_BASIS, ...basis },
    demand: NO_DEMAND,
    rules: NO_RULES,
  });
}

/** US evaluation with the results a book prints: in, kip·ft, psi. */
export function evaluateUs(printed: LayeredSection, ruleSet: RuleSetId = 'aci318-19') {
  const evaluation = evaluateSection(usSection(printed), {
    basis: { ...US_BASIS, ruleSet },
    demand: NO_DEMAND,
    rules: NO_RULES,
  });
  const { flexure } = evaluation;
  if (!flexure) throw new Error('no strength');
  return {
    evaluation,
    a: flexure.blockDepthMm / MM_PER_IN,
    c: flexure.neutralAxisMm / MM_PER_IN,
    eps_t: flexure.tensionStrain,
    Mn: flexure.nominalMomentNmm / NMM_PER_KIPFT,
    phi: flexure.strengthReduction,
    phiMn: flexure.designMomentNmm / NMM_PER_KIPFT,
  };
}
