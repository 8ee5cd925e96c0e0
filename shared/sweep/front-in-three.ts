import { DominatedGrid, lesser } from './dominated-grid.ts';
import { MAX_TIES_KEPT, type Signs } from './front.ts';
import type { ResultInThree } from './result.ts';

/**
 * The longest front that is held, some 6 MB; an office's sweep has hundreds, or some thousands with the strength as one of
 * the three. A part with more is given up whole, and the result says so: a sample of it would look like a front and be none.
 */
export const MOST_HELD_IN_THREE = 2 ** 17;

/**
 * A front of three measures as columns, oriented (less is better), ordered by x, then y, then z. Ties and duplicates as in
 * FrontBuilder: points equal in all three are one place, with the count of all and the lowest indices by name.
 */
export interface FrontInThree {
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly z: Float64Array;
  readonly tieCounts: Float64Array;
  /** The ties kept by name, place after place; those of place i end before `tieEnds[i]`. */
  readonly ties: Float64Array;
  readonly tieEnds: Uint32Array;
  /** Given up, and so without points. */
  readonly isTooLong: boolean;
}

const withoutPoints = (isTooLong: boolean): FrontInThree => ({
  x: new Float64Array(0),
  y: new Float64Array(0),
  z: new Float64Array(0),
  tieCounts: new Float64Array(0),
  ties: new Float64Array(0),
  tieEnds: new Uint32Array(0),
  isTooLong,
});

/** Points gathered before they are judged; more where the front itself is longer, so that each is sorted few times. */
const LEAST_GATHERED = 2 ** 9;

/**
 * Exact front in three measures, one point at a time: points that a grid over the front cannot show to be beaten are
 * gathered, and joined to it whenever they outnumber it.
 */
export class FrontInThreeBuilder {
  private front: FrontInThree = withoutPoints(false);
  private grid: DominatedGrid | null = null;
  private gathered = columnsOf(LEAST_GATHERED);
  private count = 0;

  /** Offers a section; one with NaN in any measure is never on the front. */
  add(x: number, y: number, z: number, index: number): void {
    if (this.grid !== null && this.grid.isBeaten(x, y, z)) return;
    if (x !== x || y !== y || z !== z || this.front.isTooLong) return;
    const { gathered } = this;
    const at = this.count++;
    gathered.x[at] = x;
    gathered.y[at] = y;
    gathered.z[at] = z;
    gathered.ties[at] = index;
    if (this.count === gathered.x.length) this.judge();
  }

  private judge(): void {
    this.front = joinFronts(this.front, inOrder(this.gathered, this.count));
    this.grid = new DominatedGrid(this.front);
    this.count = 0;
    const wanted = Math.max(LEAST_GATHERED, this.front.x.length);
    if (wanted > this.gathered.x.length) this.gathered = columnsOf(wanted);
  }

  finish(): FrontInThree {
    if (this.count > 0) this.judge();
    return this.front;
  }
}

type Columns = Omit<FrontInThree, 'isTooLong'>;

/** Room for so many single points. */
function columnsOf(count: number, tieCount = count): Columns {
  return {
    x: new Float64Array(count),
    y: new Float64Array(count),
    z: new Float64Array(count),
    tieCounts: new Float64Array(count),
    ties: new Float64Array(tieCount),
    tieEnds: new Uint32Array(count),
  };
}

/** Below 0 where the point at a comes before the one at b: by x, then y, then z. */
function compare({ x, y, z }: Columns, a: number, b: number): number {
  const [xa, xb] = [x[a]!, x[b]!];
  if (xa !== xb) return xa < xb ? -1 : 1;
  const [ya, yb] = [y[a]!, y[b]!];
  if (ya !== yb) return ya < yb ? -1 : 1;
  const [za, zb] = [z[a]!, z[b]!];
  return za === zb ? 0 : za < zb ? -1 : 1;
}

/** The first so many single points as a list in order; not a front yet, since they may beat each other. */
function inOrder(points: Columns, count: number): FrontInThree {
  const order = Uint32Array.from({ length: count }, (_, i) => i).sort((a, b) => compare(points, a, b));
  const take = (column: Float64Array) => Float64Array.from(order, (i) => column[i]!);
  return {
    x: take(points.x),
    y: take(points.y),
    z: take(points.z),
    tieCounts: new Float64Array(count).fill(1),
    ties: take(points.ties),
    tieEnds: order.map((_, i) => i + 1),
    isTooLong: false,
  };
}

/**
 * The non-dominated points of two lists in order, O(n log n): by x, then y, then z, each is beaten exactly where one before
 * it has y and z no larger, and the least z of the y so far stands in a tree of prefix minima. (Kung, Luccio and Preparata,
 * "On finding the maxima of a set of vectors", J. ACM 22, 1975; the tree is Fenwick's, 1994.)
 */
export function joinFronts(first: FrontInThree, second: FrontInThree): FrontInThree {
  if (first.isTooLong || second.isTooLong) return withoutPoints(true);
  const all = behind(first, second);
  const order = mergedOrder(all, first.x.length);
  const ranks = ranksOf(all.y);
  const least = new PrefixLeast(ranks.count);
  const kept = new Kept();
  for (const i of order) {
    const z = all.z[i]!;
    if (kept.addTie(all, i)) continue;
    const rank = ranks.of[i]!;
    if (least.upTo(rank) <= z) continue;
    least.lower(rank, z);
    kept.add(all, i);
  }
  return kept.finish();
}

/** A chart shows no more, and a result of more weighs above a megabyte with each event of its progress. */
export const MOST_SHOWN_IN_THREE = 10_000;

/** The front in the measures' own signs. Longer ones are shown from the best x on, never thinned out. */
export function resultInThree(front: FrontInThree, signs: Signs & { readonly z: 1 | -1 }): ResultInThree {
  const count = front.x.length;
  const points = Array.from({ length: Math.min(count, MOST_SHOWN_IN_THREE) }, (_, i) => {
    const ties = [...front.ties.subarray(i === 0 ? 0 : front.tieEnds[i - 1]!, front.tieEnds[i])];
    return {
      index: ties[0]!,
      x: signs.x * front.x[i]!,
      y: signs.y * front.y[i]!,
      z: signs.z * front.z[i]!,
      tieCount: front.tieCounts[i]!,
      ties,
    };
  });
  return { count: front.isTooLong ? null : count, points };
}

/** One list behind the other. */
function behind(first: Columns, second: Columns): Columns {
  const [count, tieCount] = [first.x.length, first.ties.length];
  const all = columnsOf(count + second.x.length, tieCount + second.ties.length);
  for (const column of ['x', 'y', 'z', 'tieCounts', 'tieEnds'] as const) {
    all[column].set(first[column]);
    all[column].set(second[column], count);
  }
  all.ties.set(first.ties);
  all.ties.set(second.ties, tieCount);
  for (let i = count; i < all.tieEnds.length; i++) all.tieEnds[i]! += tieCount;
  return all;
}

/** Places in order, where those before `end` are in order and so are the others. */
function mergedOrder(all: Columns, end: number): Uint32Array {
  const order = new Uint32Array(all.x.length);
  for (let at = 0, i = 0, j = end; at < order.length; at++)
    order[at] = i < end && (j === order.length || compare(all, i, j) <= 0) ? i++ : j++;
  return order;
}

/** Rank of each value among the distinct ones, from 0. */
function ranksOf(values: Float64Array): { readonly of: Uint32Array; readonly count: number } {
  const distinct = values.toSorted();
  let count = 0;
  for (const value of distinct) if (count === 0 || value !== distinct[count - 1]) distinct[count++] = value;
  const of = Uint32Array.from(values, (value) => {
    let low = 0;
    let high = count;
    while (low < high) {
      const mid = (low + high) >>> 1;
      if (distinct[mid]! < value) low = mid + 1;
      else high = mid;
    }
    return low;
  });
  return { of, count };
}

/** Least value at or below a place, in log n steps; NaN where there is none. */
class PrefixLeast {
  private readonly least: Float64Array;

  constructor(count: number) {
    this.least = new Float64Array(count + 1).fill(NaN);
  }

  upTo(place: number): number {
    let found = NaN;
    for (let at = place + 1; at > 0; at &= at - 1) found = lesser(found, this.least[at]!);
    return found;
  }

  lower(place: number, value: number): void {
    const { least } = this;
    for (let at = place + 1; at < least.length; at += at & -at) least[at] = lesser(least[at]!, value);
  }
}

/** Points that stay, in their order; equal ones come one after the other. */
class Kept {
  private readonly x: number[] = [];
  private readonly y: number[] = [];
  private readonly z: number[] = [];
  private readonly tieCounts: number[] = [];
  private readonly ties: number[] = [];
  private readonly tieEnds: number[] = [];
  private lastTies = 0;

  /** Adds to the last point what equals it; answers whether it did. */
  addTie(all: Columns, i: number): boolean {
    const last = this.x.length - 1;
    if (last < 0 || this.x[last] !== all.x[i] || this.y[last] !== all.y[i] || this.z[last] !== all.z[i])
      return false;
    this.tieCounts[last]! += all.tieCounts[i]!;
    this.name(all, i);
    return true;
  }

  add(all: Columns, i: number): void {
    this.x.push(all.x[i]!);
    this.y.push(all.y[i]!);
    this.z.push(all.z[i]!);
    this.tieCounts.push(all.tieCounts[i]!);
    this.tieEnds.push(0);
    this.lastTies = this.ties.length;
    this.name(all, i);
  }

  /** Keeps the lowest indices, ascending. */
  private name(all: Columns, i: number): void {
    const { ties, lastTies } = this;
    for (let at = i === 0 ? 0 : all.tieEnds[i - 1]!; at < all.tieEnds[i]!; at++) {
      const index = all.ties[at]!;
      if (ties.length - lastTies === MAX_TIES_KEPT) {
        if (index > ties[ties.length - 1]!) break;
        ties.pop();
      }
      let place = ties.length;
      while (place > lastTies && ties[place - 1]! > index) place--;
      ties.splice(place, 0, index);
    }
    this.tieEnds[this.tieEnds.length - 1] = ties.length;
  }

  finish(): FrontInThree {
    if (this.x.length > MOST_HELD_IN_THREE) return withoutPoints(true);
    return {
      x: Float64Array.from(this.x),
      y: Float64Array.from(this.y),
      z: Float64Array.from(this.z),
      tieCounts: Float64Array.from(this.tieCounts),
      ties: Float64Array.from(this.ties),
      tieEnds: Uint32Array.from(this.tieEnds),
      isTooLong: false,
    };
  }
}
