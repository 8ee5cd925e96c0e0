import { CHECK_IDS } from '../engine/evaluation.ts';
import { DIRECTIONS, MEASURE_DIRECTION, MEASURE_IDS, type MeasureId } from '../engine/measures.ts';
import { BandBuilder } from './band.ts';
import type { ChunkResult } from './chunk.ts';
import { DensityBuilder } from './density.ts';
import { FrontInThreeBuilder } from './front-in-three.ts';
import { FrontBuilder } from './front.ts';
import type { Space, View } from './problem.ts';
import type { SectionKeeper } from './section-keeper.ts';

const CHECK_COUNT = CHECK_IDS.length;
const MEASURE_COUNT = MEASURE_IDS.length;

/** +1 where less is better, −1 where more is. */
export const signOf = (measure: MeasureId): 1 | -1 => (MEASURE_DIRECTION[measure] === DIRECTIONS[0] ? 1 : -1);
const SIGNS = Float64Array.from(MEASURE_IDS, signOf);

/** Everything the hot loop adds up for one range of indices. Only this file knows how a section's outcome is counted. */
export class Tally {
  private evaluated = 0;
  private feasible = 0;
  private readonly failed = new Float64Array(CHECK_COUNT);
  private readonly failedOnly = new Float64Array(CHECK_COUNT);
  private readonly failedFirst = new Float64Array(CHECK_COUNT);
  readonly widthFeasible: Float64Array;
  readonly widthEvaluated: Float64Array;
  readonly depthFeasible: Float64Array;
  readonly depthEvaluated: Float64Array;
  readonly fcFeasible: Float64Array;
  readonly fcEvaluated: Float64Array;
  private readonly xMeasure: number;
  private readonly yMeasure: number;
  private readonly withoutX = new Float64Array(CHECK_COUNT).fill(NaN);
  private readonly withoutY = new Float64Array(CHECK_COUNT).fill(NaN);
  private readonly withoutIndex = new Float64Array(CHECK_COUNT).fill(-1);
  private readonly bestValue = new Float64Array(MEASURE_COUNT).fill(NaN);
  private readonly bestIndex = new Float64Array(MEASURE_COUNT).fill(-1);
  private readonly front = new FrontBuilder();
  private readonly zMeasure: number;
  /** Null without a third measure. */
  private readonly frontInThree: FrontInThreeBuilder | null;
  private readonly band = new BandBuilder();
  private readonly density = new DensityBuilder();
  /** Told of each section that other views are ranked from; null where none are kept. */
  keeper: SectionKeeper | null = null;

  constructor(space: Space, view: View) {
    this.xMeasure = MEASURE_IDS.indexOf(view.x);
    this.yMeasure = MEASURE_IDS.indexOf(view.y);
    this.zMeasure = view.z ? MEASURE_IDS.indexOf(view.z) : 0;
    this.frontInThree = view.z ? new FrontInThreeBuilder() : null;
    this.widthFeasible = new Float64Array(space.widthsMm.length);
    this.widthEvaluated = new Float64Array(space.widthsMm.length);
    this.depthFeasible = new Float64Array(space.depthsMm.length);
    this.depthEvaluated = new Float64Array(space.depthsMm.length);
    this.fcFeasible = new Float64Array(space.fcMPa.length);
    this.fcEvaluated = new Float64Array(space.fcMPa.length);
  }

  /** So many sections, by the checks they fail: bit i is CHECK_IDS[i], none is feasible. */
  countMask(mask: number, count: number): void {
    this.evaluated += count;
    if (mask === 0) {
      this.feasible += count;
      return;
    }
    this.failedFirst[31 - Math.clz32(mask & -mask)]! += count;
    if ((mask & (mask - 1)) === 0) this.failedOnly[31 - Math.clz32(mask)]! += count;
    for (let rest = mask; rest !== 0; rest &= rest - 1) this.failed[31 - Math.clz32(rest & -rest)]! += count;
  }

  /** A section that meets every check. Indices arrive ascending, so the first of equal values has the lowest index. */
  addFeasible(index: number, measures: Float64Array): void {
    if (this.keeper !== null) this.keeper.addFeasible(index, measures);
    const { bestValue, bestIndex } = this;
    for (let i = 0; i < MEASURE_COUNT; i++) {
      const value = SIGNS[i]! * measures[i]!;
      if (value < bestValue[i]! || (bestIndex[i] === -1 && value === value)) {
        bestValue[i] = value;
        bestIndex[i] = index;
      }
    }
    const x = measures[this.xMeasure]!;
    const y = measures[this.yMeasure]!;
    const orientedX = SIGNS[this.xMeasure]! * x;
    const orientedY = SIGNS[this.yMeasure]! * y;
    this.front.add(orientedX, orientedY, index);
    if (this.frontInThree !== null)
      this.frontInThree.add(orientedX, orientedY, SIGNS[this.zMeasure]! * measures[this.zMeasure]!, index);
    if (y === y) this.band.add(index, orientedX, orientedY);
    if (x >= 0 && y >= 0) this.density.add(x, y);
  }

  /**
   * Whether a section that fails exactly the check of this bit would be the best without it, if the measure at `unknown`,
   * which costs much to find, turned out well.
   */
  wouldBeBestWithout(bit: number, measures: Float64Array, unknown: number): boolean {
    const { xMeasure, yMeasure } = this;
    const isYPossible = yMeasure === unknown || !Number.isNaN(measures[yMeasure]);
    if (xMeasure === unknown) return isYPossible;
    const x = SIGNS[xMeasure]! * measures[xMeasure]!;
    return isYPossible && (x < this.withoutX[bit]! || (this.withoutIndex[bit] === -1 && !Number.isNaN(x)));
  }

  /** A section that fails exactly the check of this bit and has numbers. */
  addFailingOnly(bit: number, index: number, measures: Float64Array): void {
    if (this.keeper !== null) this.keeper.addFailingOnly(bit, index, measures);
    const x = SIGNS[this.xMeasure]! * measures[this.xMeasure]!;
    const y = SIGNS[this.yMeasure]! * measures[this.yMeasure]!;
    if (y !== y) return;
    if (x < this.withoutX[bit]! || (this.withoutIndex[bit] === -1 && x === x)) {
      this.withoutX[bit] = x;
      this.withoutY[bit] = y;
      this.withoutIndex[bit] = index;
    }
  }

  /** Whether a section found so far beats (x, y), oriented. */
  isBeaten(x: number, y: number): boolean {
    return this.front.isBeaten(x, y);
  }

  /** Largest oriented x that a section of the near-best band can have, by those found so far. */
  get bandReach(): number {
    return this.band.reach;
  }

  finish(): ChunkResult {
    const { evaluated, feasible, failed, failedOnly, failedFirst } = this;
    const { widthFeasible, widthEvaluated, depthFeasible, depthEvaluated, fcFeasible, fcEvaluated } = this;
    const { withoutX, withoutY, withoutIndex, bestValue, bestIndex } = this;
    return {
      evaluated,
      feasible,
      failed,
      failedOnly,
      failedFirst,
      withoutX,
      withoutY,
      withoutIndex,
      bestValue,
      bestIndex,
      front: this.front.xs.map((x, i) => ({
        x,
        y: this.front.ys[i]!,
        ties: this.front.ties[i]!,
        tieCount: this.front.tieCounts[i]!,
      })),
      ...(this.frontInThree && { frontInThree: this.frontInThree.finish() }),
      band: this.band.finish(),
      density: this.density.finish(),
      widthFeasible,
      widthEvaluated,
      depthFeasible,
      depthEvaluated,
      fcFeasible,
      fcEvaluated,
    };
  }
}
