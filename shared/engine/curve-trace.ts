import { bracketedRoot } from './bracketed-root.ts';
import { CurvatureGrid, GRID_POINTS } from './curve-grid.ts';
import type { CurveModel } from './curve-model.ts';
import {
  crownOf,
  excess,
  extrapolated,
  inOrder,
  momentThrough,
  slopeBetween,
  topStrainThrough,
  withPeak,
  type CurvePoint,
  type ThreeStates,
} from './curve-point.ts';
import type { UltimateCause } from './ultimate-cause.ts';
import {
  balancedCurvature,
  balancedTopStrain,
  emptyBalance,
  momentNmm,
  netForceN,
  type Balance,
  type HeldStrain,
  type Stage,
} from './section-balance.ts';

/** Share of the peak moment at which a falling curve ends. */
const KEPT_SHARE = 0.8;
/** Share below which the peak, and a trough between the points, are found exactly before the curve is let go on. */
const NEAR_DROP = 0.82;
/** Share of the highest point above which another one's neighbourhood may hold the peak. */
const NEAR_PEAK = 0.98;
/** Share of a limiting strain by which a point is past it, and not at it but for rounding. */
const PAST = 1e-7;
/** Share of a limiting strain by which the last point may miss it. */
const SHORT = 1e-3;
/** Steps past the expected end, over the curvature before. */
const BEYOND = 1.03;
const PEAK_STEPS = 5;
/** Share of the moment within which a parabola foretold a state: its crown is the curve's. */
const SAME_CROWN = 1e-9;
/** Steps where the crown is as sharp as that of a slab being lost: until both neighbours are within this share of it. */
const MOST_PEAK_STEPS = 14;
const CROWN_SHARE = 0.002;
/** Difference from the expected top strain, over it, that counts as a leap: elsewhere, and close to a bar's rupture. */
const LEAP = 0.25;
const LEAP_NEAR_RUPTURE = 0.02;
const NEAR_RUPTURE = 0.95;
/** Shortest step a leap is halved to, over the last curvature. */
const LEAST_STEP = 1 / 2000;

/** The cracked section's curve from rest to its end, in order of curvature, its marks among the points. */
export interface Trace {
  readonly points: readonly CurvePoint[];
  /** Null where no bar yields before the end. */
  readonly firstYield: CurvePoint | null;
  readonly peak: CurvePoint;
  readonly ultimate: CurvePoint;
  readonly cause: UltimateCause;
}

/** Walks a section's curve. Holds one balance to write into, so that a curve allocates little but its points. */
export class Tracer {
  private readonly model: CurveModel;
  private readonly out: Balance = emptyBalance();

  private readonly yielded: HeldStrain;
  private readonly crushed: HeldStrain;
  private readonly broken: HeldStrain;
  /** The extreme fibre at its own peak, and at each bend of a cover that is lost: the moment may crest there. */
  private readonly crests: readonly HeldStrain[];
  private readonly crushingCause: UltimateCause;

  constructor(model: CurveModel) {
    const { steel } = model;
    this.model = model;
    this.yielded = { depthMm: model.yieldDepthMm, strain: -steel.yieldStrain };
    this.crushed = { depthMm: model.crushingDepthMm, strain: model.crushingStrain };
    this.broken = { depthMm: model.deepestMm, strain: -steel.ruptureStrain };
    const { peakStrain, kinkStrains } = model.cover;
    const falls = model.core ? kinkStrains.filter((strain) => strain > peakStrain) : [];
    this.crests = [peakStrain, ...falls].map((strain) => ({ depthMm: 0, strain }));
    this.crushingCause = model.core ? 'core-crushing' : 'concrete-crushing';
  }

  trace(): Trace {
    const end = this.expectedEnd();
    const walked = this.walk(end);
    const dropped = this.cutAtDrop(walked.points, walked.cause);
    const { points } = dropped;
    const ultimate = points[points.length - 1]!;
    const firstYield =
      walked.firstYield && walked.firstYield.curvaturePerMm <= ultimate.curvaturePerMm
        ? walked.firstYield
        : null;
    return { points, firstYield, peak: dropped.peak, ultimate, cause: dropped.cause };
  }

  /** The cracked state at a curvature; a near state's top strain speeds it up. */
  pointAt(curvature: number, guess = -1): CurvePoint {
    const topStrain = balancedTopStrain(this.model, curvature, guess, this.out);
    return this.pointOf(curvature, topStrain, 'cracked');
  }

  /** Net force over the concrete's compression. */
  residualOf({ curvaturePerMm, topStrain }: CurvePoint): number {
    const force = netForceN(this.model, 'cracked', { curvature: curvaturePerMm, topStrain }, this.out);
    return Math.abs(force) / this.out.concreteN;
  }

  /** The uncracked state whose tension face reaches the modulus of rupture; undefined where the section has none. */
  findCracking(): CurvePoint | undefined {
    const { depthMm, tension } = this.model;
    const least = tension.crackingStrain / depthMm;
    const held = { depthMm, strain: -tension.crackingStrain };
    const curvature = balancedCurvature(
      this.model,
      held,
      { low: least, high: 10 * least },
      this.out,
      'uncracked',
    );
    if (Number.isNaN(curvature)) return undefined;
    return this.pointOf(curvature, curvature * depthMm - tension.crackingStrain, 'uncracked');
  }

  /** The uncracked state at a curvature up to cracking. */
  uncrackedAt(curvature: number): CurvePoint {
    const topStrain = bracketedRoot(
      (strain) => netForceN(this.model, 'uncracked', { curvature, topStrain: strain }, this.out),
      0,
      curvature * this.model.depthMm,
    );
    return this.pointOf(curvature, topStrain, 'uncracked');
  }

  private pointOf(curvature: number, topStrain: number, stage: Stage): CurvePoint {
    return {
      curvaturePerMm: curvature,
      momentNmm: momentNmm(this.model, curvature, topStrain, stage),
      axisMm: topStrain / curvature,
      topStrain,
      tensionStrain: curvature * this.model.deepestMm - topStrain,
    };
  }

  /**
   * Crushing or rupture, whichever comes first. In the state that has both at once, compression in excess means that the
   * true axis lies higher, so that the bar breaks first.
   */
  private expectedEnd(): { curvature: number; cause: UltimateCause } {
    const { model, out, crushed, broken } = this;
    const lever = broken.depthMm - crushed.depthMm;
    const high = (crushed.strain - broken.strain) / lever;
    const topStrain = crushed.strain + high * crushed.depthMm;
    if (netForceN(model, 'cracked', { curvature: high, topStrain }, out) > 0) {
      const low = -broken.strain / broken.depthMm;
      return { curvature: balancedCurvature(model, broken, { low, high }, out), cause: 'bar-rupture' };
    }
    const low = crushed.strain / lever;
    return { curvature: balancedCurvature(model, crushed, { low, high }, out), cause: this.crushingCause };
  }

  /** Points from rest to the end; a step in which the axis leaps, as where the cover spalls, is halved and halved again. */
  private walk(end: { curvature: number; cause: UltimateCause }) {
    const grid = new CurvatureGrid(this.model, end.curvature);
    const points: CurvePoint[] = [];
    const pending: number[] = [];
    let firstYield: CurvePoint | null = null;
    let { cause } = end;
    for (let next = 0; next < GRID_POINTS || pending.length > 0 || this.isShort(points, cause);) {
      const before = points[points.length - 1];
      const curvature =
        pending.pop() ?? (next < GRID_POINTS ? grid.at(next++) : BEYOND * before!.curvaturePerMm);
      const guess = before ? extrapolated(curvature, points) : curvature * grid.elasticAxisMm;
      let point = this.pointAt(curvature, guess);
      if (!before) {
        points.push(point);
        continue;
      }
      if (this.isLeap(point, guess) && curvature - before.curvaturePerMm > LEAST_STEP * end.curvature) {
        pending.push(curvature, 0.5 * (before.curvaturePerMm + curvature));
        continue;
      }
      const early = this.endWithin(before, point);
      if (early) ({ point, cause } = early);
      // the end lies behind the curvature already reached: the state before is the last
      if (point.curvaturePerMm <= before.curvaturePerMm) break;
      const found = this.crestsBetween(before, point);
      if (!firstYield && excess(point, this.yielded) <= 0) {
        firstYield = this.reaching(this.yielded, before, point);
        found.push(firstYield);
      }
      if (found.length > 0) {
        found.push(point);
        points.push(...inOrder(found));
      } else points.push(point);
      if (early) break;
    }
    return { points, firstYield, cause };
  }

  /** States between two others at which the moment may crest. */
  private crestsBetween(from: CurvePoint, to: CurvePoint): CurvePoint[] {
    const found: CurvePoint[] = [];
    for (const crest of this.crests)
      if (excess(from, crest) < 0 && excess(to, crest) > 0) found.push(this.reaching(crest, from, to));
    return found;
  }

  /**
   * The walk has come to the expected curvature on another branch: where a wide slab is lost, the state of the limiting
   * strain may lie behind a curvature that fell back. A beam bent further goes on to the most its branch can take.
   */
  private isShort(points: readonly CurvePoint[], cause: UltimateCause): boolean {
    const held = cause === 'bar-rupture' ? this.broken : this.crushed;
    return Math.abs(excess(points[points.length - 1]!, held)) > SHORT * Math.abs(held.strain);
  }

  private isLeap({ topStrain, tensionStrain }: CurvePoint, guess: number): boolean {
    const isNear = tensionStrain > NEAR_RUPTURE * this.model.steel.ruptureStrain;
    return Math.abs(topStrain - guess) > (isNear ? LEAP_NEAR_RUPTURE : LEAP) * topStrain;
  }

  /** An end before the expected one, where a softening law has more than one state at the held strain. */
  private endWithin(
    before: CurvePoint,
    point: CurvePoint,
  ): { point: CurvePoint; cause: UltimateCause } | undefined {
    if (excess(point, this.crushed) > PAST * this.crushed.strain)
      return { point: this.reaching(this.crushed, before, point), cause: this.crushingCause };
    if (excess(point, this.broken) < PAST * this.broken.strain)
      return { point: this.reaching(this.broken, before, point), cause: 'bar-rupture' };
    return undefined;
  }

  /** The state between two others at which a strain is reached. */
  private reaching(held: HeldStrain, from: CurvePoint, to: CurvePoint): CurvePoint {
    const bounds = { low: from.curvaturePerMm, high: to.curvaturePerMm };
    const curvature = balancedCurvature(this.model, held, bounds, this.out);
    if (Number.isNaN(curvature)) return this.crossing(from, to, (point) => excess(point, held));
    return this.pointOf(curvature, held.strain + curvature * held.depthMm, 'cracked');
  }

  /** The state between two others at which a measure of it changes sign. */
  private crossing(from: CurvePoint, to: CurvePoint, measure: (point: CurvePoint) => number): CurvePoint {
    const slope = slopeBetween(from, to);
    const guess = (curvature: number) => from.topStrain + slope * (curvature - from.curvaturePerMm);
    const root = bracketedRoot(
      (curvature) => measure(this.pointAt(curvature, guess(curvature))),
      from.curvaturePerMm,
      to.curvaturePerMm,
    );
    return Number.isNaN(root) ? to : this.pointAt(root, guess(root));
  }

  /** Ends the walk at the first loss of 20 % from the highest moment so far, and finds the peak between the points. */
  private cutAtDrop(walked: readonly CurvePoint[], cause: UltimateCause) {
    let top = 0;
    let peak: CurvePoint | undefined;
    for (let i = 1; i < walked.length; i++) {
      const point = walked[i]!;
      if (point.momentNmm > walked[top]!.momentNmm) {
        top = i;
        peak = undefined;
      }
      if (point.momentNmm > NEAR_DROP * walked[top]!.momentNmm) continue;
      peak ??= this.peakOf(walked.slice(0, i + 1), walked[top]!.momentNmm);
      const kept = KEPT_SHARE * peak.momentNmm;
      const low = point.momentNmm < kept ? point : this.troughAt(walked, i);
      if (low.momentNmm >= kept) continue;
      const from = walked[i - 1]!.curvaturePerMm > peak.curvaturePerMm ? walked[i - 1]! : peak;
      const drop = this.crossing(from, low, ({ momentNmm }) => momentNmm - kept);
      const points = walked.filter((p) => p.curvaturePerMm < drop.curvaturePerMm);
      return { points: withPeak([...points, drop], peak), peak, cause: 'moment-drop' as const };
    }
    peak ??= this.peakOf(walked, walked[top]!.momentNmm);
    return { points: withPeak(walked, peak), peak, cause };
  }

  /** The highest state near any point that stands out among its neighbours and comes close to the highest. */
  private peakOf(points: readonly CurvePoint[], highest: number): CurvePoint {
    let peak: CurvePoint | undefined;
    for (let i = 0; i < points.length; i++) {
      const { momentNmm } = points[i]!;
      if (momentNmm < NEAR_PEAK * highest) continue;
      if (momentNmm < (points[i - 1]?.momentNmm ?? 0) || momentNmm < (points[i + 1]?.momentNmm ?? 0))
        continue;
      const found = this.extremeNear(points, i, 1);
      if (!peak || found.momentNmm > peak.momentNmm) peak = found;
    }
    return peak!;
  }

  /** The lowest state near a point that lies below both its neighbours; the point itself elsewhere. */
  private troughAt(points: readonly CurvePoint[], i: number): CurvePoint {
    const { momentNmm } = points[i]!;
    const before = points[i - 1];
    const after = points[i + 1];
    if (!before || !after || before.momentNmm < momentNmm || after.momentNmm < momentNmm) return points[i]!;
    return this.extremeNear(points, i, -1);
  }

  /** The highest (1) or lowest (−1) state between the neighbours of a point, by parabolas through three states. */
  private extremeNear(points: readonly CurvePoint[], at: number, sign: 1 | -1): CurvePoint {
    let best = points[at]!;
    let left = points[at - 1];
    let right = points[at + 1];
    if (!left || !right) return best;
    for (let step = 0; step < MOST_PEAK_STEPS; step++) {
      const furthest = Math.max(
        Math.abs(best.momentNmm - left.momentNmm),
        Math.abs(best.momentNmm - right.momentNmm),
      );
      if (step >= PEAK_STEPS && furthest < CROWN_SHARE * best.momentNmm) break;
      const three: ThreeStates = [left, best, right];
      const at = crownOf(three);
      const point = this.pointAt(at, topStrainThrough(three, at));
      const isParabola = Math.abs(point.momentNmm - momentThrough(three, at)) < SAME_CROWN * point.momentNmm;
      const isLeft = at < best.curvaturePerMm;
      if (sign * (point.momentNmm - best.momentNmm) > 0) {
        if (isLeft) right = best;
        else left = best;
        best = point;
      } else if (isLeft) left = point;
      else right = point;
      if (isParabola) break;
    }
    return best;
  }
}
