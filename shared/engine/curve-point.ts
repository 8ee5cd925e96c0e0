import type { HeldStrain } from './section-balance.ts';

/** One state of a curve: curvature 1/mm, moment N·mm, axis mm below the compression face. */
export interface CurvePoint {
  readonly curvaturePerMm: number;
  readonly momentNmm: number;
  readonly axisMm: number;
  /** Strain of the compression face, shortening positive. */
  readonly topStrain: number;
  /** Strain of the outermost tension layer, tension positive. */
  readonly tensionStrain: number;
}

/** Three states of one curve, in any order. */
export type ThreeStates = readonly [CurvePoint, CurvePoint, CurvePoint];

/** Least distance of a trial from the highest point, over the bracket: keeps both sides moving where the crown is a kink. */
const LEAST_TRIAL = 0.03;

/** Top strain expected at a curvature from the last three states; from one or two, by a straight line. */
export function extrapolated(curvature: number, points: readonly CurvePoint[]): number {
  const before = points[points.length - 1]!;
  const earlier = points[points.length - 2];
  const earliest = points[points.length - 3];
  if (!earlier) return (before.topStrain * curvature) / before.curvaturePerMm;
  if (earliest) return topStrainThrough([earliest, earlier, before], curvature);
  return before.topStrain + slopeBetween(earlier, before) * (curvature - before.curvaturePerMm);
}

/** Top strain at a curvature on the parabola through three states (Newton's divided differences). */
export function topStrainThrough([a, b, c]: ThreeStates, curvature: number): number {
  const slope = slopeBetween(b, c);
  const bend = (slope - slopeBetween(a, b)) / (c.curvaturePerMm - a.curvaturePerMm);
  const from = curvature - c.curvaturePerMm;
  return c.topStrain + from * (slope + bend * (curvature - b.curvaturePerMm));
}

/** Moment at a curvature on the parabola through three states. */
export function momentThrough([a, b, c]: ThreeStates, curvature: number): number {
  const slope = (c.momentNmm - b.momentNmm) / (c.curvaturePerMm - b.curvaturePerMm);
  const before = (b.momentNmm - a.momentNmm) / (b.curvaturePerMm - a.curvaturePerMm);
  const bend = (slope - before) / (c.curvaturePerMm - a.curvaturePerMm);
  const from = curvature - c.curvaturePerMm;
  return c.momentNmm + from * (slope + bend * (curvature - b.curvaturePerMm));
}

/** Curvature of the crown of the parabola through three states, the middle one highest, held off the middle one. */
export function crownOf([left, middle, right]: ThreeStates): number {
  const x = middle.curvaturePerMm;
  const down = x - left.curvaturePerMm;
  const up = right.curvaturePerMm - x;
  const fallDown = (middle.momentNmm - left.momentNmm) * up;
  const fallUp = (middle.momentNmm - right.momentNmm) * down;
  const shift = (fallDown * up - fallUp * down) / (2 * (fallDown + fallUp));
  const least = LEAST_TRIAL * (down + up);
  if (shift > least || shift < -least) return x + shift;
  return up > down ? x + Math.min(least, up / 2) : x - Math.min(least, down / 2);
}

/** Strain of a state at a depth above a held one, compression positive. */
export const excess = (point: CurvePoint, { depthMm, strain }: HeldStrain) =>
  point.topStrain - point.curvaturePerMm * depthMm - strain;

export const slopeBetween = (a: CurvePoint, b: CurvePoint) =>
  (b.topStrain - a.topStrain) / (b.curvaturePerMm - a.curvaturePerMm);

/** A few states by curvature, each curvature once. */
export function inOrder(states: CurvePoint[]): CurvePoint[] {
  states.sort((a, b) => a.curvaturePerMm - b.curvaturePerMm);
  return states.filter((state, i) => states[i - 1]?.curvaturePerMm !== state.curvaturePerMm);
}

/** The points with the peak among them, in order of curvature. */
export function withPeak(points: readonly CurvePoint[], peak: CurvePoint): readonly CurvePoint[] {
  const after = points.findIndex((point) => point.curvaturePerMm >= peak.curvaturePerMm);
  if (points[after] === peak) return points;
  return [...points.slice(0, after), peak, ...points.slice(after)];
}
