import { asBuilt } from './as-built.ts';
import { curveChoicesOf } from './curve-basis.ts';
import { getBar } from './bars.ts';
import type { CurveChoices } from './curve-choices.ts';
import { endOf, yieldStrainOf, type Bilinear } from './curve-marks.ts';
import type { CurvePoint } from './curve-point.ts';
import type { UltimateCause } from './ultimate-cause.ts';
import { ductilityConventions, type DuctilityByConvention } from './ductility-conventions.ts';
import type { EvaluationContext } from './evaluate.ts';
import { flexureAtUltimate } from './flexure.ts';
import { momentCurvature, type MomentCurvature } from './moment-curvature.ts';
import { plasticHingeOf, type PlasticHinge } from './plastic-hinge.ts';
import { ruleSetOf } from './rules/rule-set-of.ts';
import { secondOpinionOf, type SecondOpinion } from './second-opinion.ts';
import type { Demand, DesignBasis, SectionInput } from './section.ts';
import { placeSteel } from './steel-layout.ts';

/** A stress–strain law as a reader needs it; stresses in MPa. */
export interface LawText {
  readonly name: string;
  readonly formula: string;
  readonly source: string;
}

export const CURVE_MARK_IDS = ['cracking', 'first-yield', 'bilinear-yield', 'peak', 'ultimate'] as const;
export type CurveMarkId = (typeof CURVE_MARK_IDS)[number];

/** A marked state: curvature 1/mm, moment N·mm, axis mm; the corner of the bilinear curve is no state and has no strains. */
export interface CurveMark {
  readonly id: CurveMarkId;
  readonly label: string;
  readonly curvaturePerMm: number;
  readonly momentNmm: number;
  readonly axisMm: number | null;
  /** Strain of the compression face, shortening positive. */
  readonly topStrain: number | null;
  /** Strain of the outermost tension layer, tension positive. */
  readonly tensionStrain: number | null;
  readonly definition: string;
}

/** What the plastic hinge was worked out with, beside its results. */
export interface HingeReport extends PlasticHinge {
  /** Critical section to the point of contraflexure, mm. */
  readonly lengthMm: number;
  readonly lengthIs: string;
  readonly expectedYieldMPa: number;
  readonly barDiameterMm: number;
}

/** One section's full curve by the laws of its basis, ready to be drawn and printed: plain JSON. */
export interface CurveReport {
  readonly choices: CurveChoices;
  readonly concrete: LawText;
  /** Null where no core is confined. */
  readonly core: LawText | null;
  readonly steel: LawText;
  readonly confinementNote: string;
  /** At most 120, the marks among them; from the origin. */
  readonly points: readonly { readonly curvaturePerMm: number; readonly momentNmm: number }[];
  readonly marks: readonly CurveMark[];
  readonly cause: UltimateCause;
  readonly causeText: string;
  /** The first crack takes more than the cracked section can carry. */
  readonly failsAtCracking: boolean;
  readonly bilinear: Bilinear | null;
  readonly ductility: readonly DuctilityByConvention[];
  /** Null where no span and support are given, or the bars' diameter is not known (plain layers). */
  readonly hinge: HingeReport | null;
  /** Largest unbalanced force at the marks over the concrete's compression. */
  readonly equilibriumResidual: number;
}

const MOST_POINTS = 120;

/**
 * The full curve of a section, its marks and μφ under every convention.
 * @returns null where the bars cannot be placed.
 * @throws InvalidSectionError for an unknown bar or a choice of law that is not a number above zero.
 */
export function curveReportOf(section: SectionInput, context: EvaluationContext): CurveReport | null {
  const drawn = drawnCurve(section, context);
  if (!drawn) return null;
  const { layout, curve } = drawn;
  const { basis, demand } = context;
  const { model, cause, failsAtCracking, bilinear, equilibriumResidual } = curve;
  return {
    choices: curveChoicesOf(basis),
    concrete: textOf(model.cover),
    core: model.core && textOf(model.core),
    steel: textOf(model.steel),
    confinementNote: model.confinementNote,
    points: thinned(curve),
    marks: marksOf(curve),
    cause,
    causeText: endOf(model, cause),
    failsAtCracking,
    bilinear,
    ductility: ductilityConventions(section, layout, basis, curve),
    hinge: hingeOf(section, basis, demand, curve),
    equilibriumResidual,
  };
}

/**
 * Closed strength and the curve's marks again by strips. Some tens of milliseconds: to be asked after what is shown first.
 * @returns null where the bars cannot be placed.
 * @throws as `curveReportOf`.
 */
export function secondOpinionReport(section: SectionInput, context: EvaluationContext): SecondOpinion | null {
  const drawn = drawnCurve(section, context);
  if (!drawn) return null;
  const { basis } = context;
  const flexure = flexureAtUltimate(section, drawn.layout, basis, ruleSetOf(basis));
  return secondOpinionOf({ section, layout: drawn.layout, basis, flexure, curve: drawn.curve });
}

function drawnCurve(given: SectionInput, context: EvaluationContext) {
  const { basis, rules } = context;
  const placed = placeSteel(given, basis, rules.maxLayers);
  const { layout, arrangement } = placed;
  if (!layout) return null;
  const section = asBuilt(given, context, placed);
  const choices = curveChoicesOf(basis);
  return { layout, curve: momentCurvature({ section, layout, arrangement, basis, choices }) };
}

const textOf = ({ name, formula, source }: LawText): LawText => ({ name, formula, source });

function marksOf(curve: MomentCurvature): readonly CurveMark[] {
  const { model, cracking, firstYield, bilinear, peak, ultimate, cause } = curve;
  const at = (id: CurveMarkId, label: string, point: CurvePoint, definition: string): CurveMark => ({
    id,
    label,
    ...point,
    definition,
  });
  const where =
    model.yieldDepthMm === model.deepestMm
      ? 'the outermost tension layer'
      : 'the centroid of the tension steel';
  const marks = [
    cracking &&
      at(
        'cracking',
        'cracking',
        cracking,
        `the tension face reaches ${model.symbols.ruptureModulus}, uncracked`,
      ),
    firstYield && at('first-yield', 'first yield', firstYield, `${where} reaches ${yieldStrainOf(model)}`),
    bilinear && {
      id: 'bilinear-yield' as const,
      label: 'bilinear yield',
      curvaturePerMm: bilinear.yieldCurvaturePerMm,
      momentNmm: bilinear.momentNmm,
      axisMm: null,
      topStrain: null,
      tensionStrain: null,
      definition: bilinear.rule,
    },
    at('peak', 'peak', peak, 'highest moment of the cracked section'),
    at('ultimate', 'ultimate', ultimate, endOf(model, cause)),
  ];
  return marks.filter((mark) => mark !== null);
}

/** Origin, marks, and of the points between as many as there is room for. */
function thinned({ points, firstYield, cracking, peak, ultimate }: MomentCurvature) {
  const marks = new Set([firstYield, cracking, peak, ultimate]);
  const between = points.filter((point) => !marks.has(point)).length;
  const every = Math.ceil(between / (MOST_POINTS - 1 - marks.size));
  let seen = 0;
  const kept = points.filter((point) => marks.has(point) || seen++ % every === 0);
  return [
    { curvaturePerMm: 0, momentNmm: 0 },
    ...kept.map(({ curvaturePerMm, momentNmm }) => ({ curvaturePerMm, momentNmm })),
  ];
}

/** Contraflexure: the free end of a cantilever's own length, else taken at half the span (common practice, no source). */
function hingeOf(
  section: SectionInput,
  basis: DesignBasis,
  { spanMm, support }: Demand,
  curve: MomentCurvature,
): HingeReport | null {
  const { reinforcement } = section;
  if (!spanMm || !support || reinforcement.kind === 'layers') return null;
  const sizes = reinforcement.tension.map(({ bar }) => getBar(basis.barStandard, bar).diameterMm);
  const isCantilever = support === 'cantilever';
  const input = {
    lengthMm: isCantilever ? spanMm : spanMm / 2,
    expectedYieldMPa: section.fyMPa,
    // the thinner size gives the shorter hinge
    barDiameterMm: Math.min(...sizes),
  };
  return {
    ...plasticHingeOf(curve, input),
    ...input,
    lengthIs: isCantilever ? 'the cantilever' : 'half the span, from the critical section to contraflexure',
  };
}
