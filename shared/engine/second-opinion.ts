import type { CurveModel } from './curve-model.ts';
import { Tracer } from './curve-trace.ts';
import { fibreBlockState, fibreCurve, type FibreCurve } from './fibre.ts';
import type { FlexureResult } from './evaluation.ts';
import type { MomentCurvature } from './moment-curvature.ts';
import { ruleSetOf } from './rules/rule-set-of.ts';
import type { DesignBasis, SectionInput } from './section.ts';
import type { SteelLayout } from './steel-layout.ts';

/** Largest difference that counts as agreement: of a moment, and of a curvature. */
export const STRENGTH_TOLERANCE = 0.005;
export const CURVATURE_TOLERANCE = 0.02;
const STRIPS = 100;
const FINE_STRIPS = 1200;
/** A limit is only touched where the section nowhere passes it by more than this share. */
const TOUCHED = 0.01;
/** States looked at between two ends. */
const TOUCH_STATES = 101;

export const OPINION_IDS = [
  'closed-strength',
  'closed-curvature',
  'first-yield',
  'peak',
  'ultimate',
  'ultimate-moment',
] as const;
export type OpinionId = (typeof OPINION_IDS)[number];

/** One value by two ways: `moment` N·mm, `curvature` 1/mm. */
export interface OpinionLine {
  readonly id: OpinionId;
  readonly label: string;
  readonly kind: 'moment' | 'curvature';
  /** Null where there is no such state, as where no bar yields. */
  readonly value: number | null;
  readonly strips: number | null;
  /** strips/value − 1; null where one of them is. */
  readonly difference: number | null;
  readonly tolerance: number;
  readonly agrees: boolean;
  /** Why it does not agree; null where it does. */
  readonly reason: string | null;
}

export interface SecondOpinion {
  readonly method: string;
  /** Strips of the curve's states; finer ones are cut where the usual ones do not agree. */
  readonly strips: number;
  readonly lines: readonly OpinionLine[];
  readonly agrees: boolean;
}

const METHOD =
  'the section cut into strips with the stress at the middle of each, led by the strain of the compression face, the axis found by halving; the same laws, another algorithm';
const TOUCHES =
  'between the two ends the section stays within 1 % of a limit without passing it: which of the states is called the end hangs on rounding';
const UNEXPLAINED = 'no reason found: treat both values with care';

const LABELS: Readonly<Record<OpinionId, string>> = {
  'closed-strength': 'Mn, closed form',
  'closed-curvature': 'φu, closed form',
  'first-yield': 'curvature at first yield',
  peak: 'highest moment',
  ultimate: 'curvature at ultimate',
  'ultimate-moment': 'moment at ultimate',
};

/** The closed strength and the curve's marks once more by strips, with every difference and, where it is large, its reason. */
export function secondOpinionOf(of: {
  readonly section: SectionInput;
  readonly layout: SteelLayout;
  readonly basis: DesignBasis;
  readonly flexure: FlexureResult;
  readonly curve: MomentCurvature;
}): SecondOpinion {
  const { section, layout, basis, flexure, curve } = of;
  const rules = ruleSetOf(basis);
  const { esMPa, displacedConcrete } = basis;
  const block = fibreBlockState({ section, layout, rules, esMPa, displacedConcrete });
  const closed = [
    lineOf('closed-strength', flexure.nominalMomentNmm, block.momentNmm),
    lineOf('closed-curvature', flexure.epsilonCu / flexure.neutralAxisMm, block.curvaturePerMm),
  ];
  const { strips, fibre, isTouching } = agreeingStrips(curve);
  const marks = curveLines(curve, fibre).map((line) =>
    line.agrees ? line : { ...line, reason: isTouching && line.id !== 'peak' ? TOUCHES : UNEXPLAINED },
  );
  const lines = [...closed, ...marks];
  return { method: METHOD, strips, lines, agrees: lines.every((line) => line.agrees) };
}

/** What a curve's marks differ by from those of strips. */
export function curveLines(curve: MomentCurvature, fibre: FibreCurve): readonly OpinionLine[] {
  const yields = [curve.firstYield, fibre.firstYield].map((state) => state?.curvaturePerMm ?? null);
  return [
    lineOf('first-yield', yields[0]!, yields[1]!),
    lineOf('peak', curve.peak.momentNmm, fibre.peak.momentNmm),
    lineOf('ultimate', curve.ultimate.curvaturePerMm, fibre.ultimate.curvaturePerMm),
    lineOf('ultimate-moment', curve.ultimate.momentNmm, fibre.ultimate.momentNmm),
  ];
}

function lineOf(id: OpinionId, value: number | null, strips: number | null): OpinionLine {
  const kind = id === 'closed-strength' || id === 'peak' || id === 'ultimate-moment' ? 'moment' : 'curvature';
  const tolerance = kind === 'moment' ? STRENGTH_TOLERANCE : CURVATURE_TOLERANCE;
  const difference = value === null || strips === null ? null : strips / value - 1;
  const agrees = difference === null ? value === strips : Math.abs(difference) <= tolerance;
  const reason = agrees ? null : UNEXPLAINED;
  return { id, label: LABELS[id], kind, value, strips, difference, tolerance, agrees, reason };
}

/** Strips as usual; finer ones where these do not agree, and then whether the two ends only touch a limit. */
export function agreeingStrips(curve: MomentCurvature): {
  readonly strips: number;
  readonly fibre: FibreCurve;
  readonly isTouching: boolean;
} {
  const isClose = (fibre: FibreCurve) => curveLines(curve, fibre).every((line) => line.agrees);
  const coarse = fibreCurve(curve.model, STRIPS);
  if (isClose(coarse)) return { strips: STRIPS, fibre: coarse, isTouching: false };
  const fine = fibreCurve(curve.model, FINE_STRIPS);
  const isTouching = !isClose(fine) && isTouchingBetween(curve.model, curve, fine);
  return { strips: FINE_STRIPS, fibre: fine, isTouching };
}

/** From the earlier end to the later one the section never passes a limit by more than the share that counts as touching. */
function isTouchingBetween(model: CurveModel, curve: MomentCurvature, fibre: FibreCurve): boolean {
  const ends = [curve.ultimate.curvaturePerMm, fibre.ultimate.curvaturePerMm].sort((a, b) => a - b);
  const tracer = new Tracer(model);
  return Array.from(
    { length: TOUCH_STATES },
    (_, i) => ends[0]! + (i / TOUCH_STATES) * (ends[1]! - ends[0]!),
  ).every((phi) => {
    const point = tracer.pointAt(phi);
    const crushing = point.topStrain - phi * model.crushingDepthMm;
    return (
      crushing <= (1 + TOUCHED) * model.crushingStrain &&
      point.tensionStrain <= (1 + TOUCHED) * model.steel.ruptureStrain &&
      point.momentNmm >= (1 - TOUCHED) * 0.8 * curve.peak.momentNmm
    );
  });
}
