import { fibreBlockState, fibreCurve, type FibreCurve } from './fibre.ts';
import type { FlexureResult } from './evaluation.ts';
import type { MomentCurvature } from './moment-curvature.ts';
import { reasonForDifference } from './opinion-reasons.ts';
import { ruleSetOf } from './rules/rule-set-of.ts';
import type { DesignBasis, SectionInput } from './section.ts';
import type { SteelLayout } from './steel-layout.ts';

/** Largest difference that counts as agreement: of a moment, and of a curvature. */
const STRENGTH_TOLERANCE = 0.005;
const CURVATURE_TOLERANCE = 0.02;
const STRIPS = 100;
const FINE_STRIPS = 1200;

export const OPINION_IDS = [
  'closed-strength',
  'closed-curvature',
  'first-yield',
  'peak',
  'ultimate',
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
const UNEXPLAINED = 'no reason found: treat both values with care';

const LABELS: Readonly<Record<OpinionId, string>> = {
  'closed-strength': 'strength, closed form',
  'closed-curvature': 'φu, closed form',
  'first-yield': 'curvature at first yield',
  peak: 'highest moment',
  ultimate: 'curvature at ultimate',
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
  const { strips, lines: marks, reason } = agreeingStrips(curve);
  const lines = [
    ...closed,
    ...marks.map((line) => (line.agrees ? line : { ...line, reason: reason ?? UNEXPLAINED })),
  ];
  return { method: METHOD, strips, lines, agrees: lines.every((line) => line.agrees) };
}

/** What a curve's marks differ by from those of strips. */
function curveLines(curve: MomentCurvature, fibre: FibreCurve): readonly OpinionLine[] {
  const yields = [curve.firstYield, fibre.firstYield].map((state) => state?.curvaturePerMm ?? null);
  return [
    lineOf('first-yield', yields[0]!, yields[1]!),
    lineOf('peak', curve.peak.momentNmm, fibre.peak.momentNmm),
    lineOf('ultimate', curve.ultimate.curvaturePerMm, fibre.ultimate.curvaturePerMm),
  ];
}

function lineOf(id: OpinionId, value: number | null, strips: number | null): OpinionLine {
  const kind = id === 'closed-strength' || id === 'peak' ? 'moment' : 'curvature';
  const tolerance = kind === 'moment' ? STRENGTH_TOLERANCE : CURVATURE_TOLERANCE;
  const difference = value === null || strips === null ? null : strips / value - 1;
  const agrees = difference === null ? value === strips : Math.abs(difference) <= tolerance;
  const reason = agrees ? null : UNEXPLAINED;
  return { id, label: LABELS[id], kind, value, strips, difference, tolerance, agrees, reason };
}

/** What strips of a curve came to, how finely they were cut, and why they differ where they do. */
export interface AgreeingStrips {
  readonly strips: number;
  readonly lines: readonly OpinionLine[];
  /** Null where they agree, or no reason is known. */
  readonly reason: string | null;
}

/** A curve's marks by strips as usual, or by finer ones where these do not agree. */
export function agreeingStrips(curve: MomentCurvature): AgreeingStrips {
  const coarse = curveLines(curve, fibreCurve(curve.model, STRIPS));
  if (coarse.every((line) => line.agrees)) return { strips: STRIPS, lines: coarse, reason: null };
  const fibre = fibreCurve(curve.model, FINE_STRIPS);
  const lines = curveLines(curve, fibre);
  if (lines.every((line) => line.agrees)) return { strips: FINE_STRIPS, lines, reason: null };
  const isPeakTheSame = lines.every((line) => line.id !== 'peak' || line.agrees);
  return { strips: FINE_STRIPS, lines, reason: reasonForDifference(curve, fibre, isPeakTheSame) };
}
