import { CHECK_IDS } from '../engine/evaluation.ts';
import { MEASURE_IDS, type MeasureId } from '../engine/measures.ts';
import type { View } from './problem.ts';
import { signOf } from './tally.ts';

const CHECKS = CHECK_IDS.length;
const MEASURES = MEASURE_IDS.length;
const SIGNS = Float64Array.from(MEASURE_IDS, signOf);

/**
 * For every check and measure the best section that fails only that check: what "best without" needs in any view, so that
 * sections that miss by one check need not be kept. Place = check × MEASURES + measure; plain data that crosses threads.
 */
export interface NearMisses {
  /** −1 for none. */
  readonly indices: Float64Array;
  /** All measures of that section. */
  readonly rows: Float64Array;
}

export const noNearMisses = (): NearMisses => ({
  indices: new Float64Array(CHECKS * MEASURES).fill(-1),
  rows: new Float64Array(CHECKS * MEASURES * MEASURES),
});

const valueAt = ({ rows }: NearMisses, place: number): number =>
  SIGNS[place % MEASURES]! * rows[place * MEASURES + (place % MEASURES)]!;

const take = (to: NearMisses, place: number, index: number, row: ArrayLike<number>): void => {
  to.indices[place] = index;
  to.rows.set(row, place * MEASURES);
};

/** Gathers near misses as the hot loop finds them, by ascending index. */
export class NearMissBuilder {
  readonly found = noNearMisses();
  /** Oriented best of each place; NaN for none, which nothing compares with. */
  readonly #best = new Float64Array(CHECKS * MEASURES).fill(NaN);

  /** A section that fails exactly the check of this bit and has numbers. */
  offer(bit: number, index: number, measures: Float64Array): void {
    const best = this.#best;
    for (let i = 0, place = bit * MEASURES; i < MEASURES; i++, place++) {
      const value = SIGNS[i]! * measures[i]!;
      if (value >= best[place]! || value !== value) continue;
      best[place] = value;
      take(this.found, place, index, measures);
    }
  }
}

/** The best of both, the lower index among equals: associative, whatever the order. */
export function mergeNearMisses(a: NearMisses, b: NearMisses): NearMisses {
  const both = { indices: a.indices.slice(), rows: a.rows.slice() };
  b.indices.forEach((index, place) => {
    if (index === -1) return;
    const held = both.indices[place]!;
    const [mine, theirs] = [valueAt(both, place), valueAt(b, place)];
    if (held === -1 || theirs < mine || (theirs === mine && index < held))
      take(both, place, index, b.rows.subarray(place * MEASURES, (place + 1) * MEASURES));
  });
  return both;
}

/** The same sections by their numbers in another space. */
export const renumberNearMisses = (from: NearMisses, indexOf: (index: number) => number): NearMisses => ({
  indices: from.indices.map((index) => (index === -1 ? -1 : indexOf(index))),
  rows: from.rows,
});

/** For each check the best section by the leading measure. */
interface BestWithout {
  /** −1 for none. */
  readonly indices: Float64Array;
  readonly valueOf: (check: number, measure: MeasureId) => number;
}

/**
 * "Best without" in a view, in the measures' own signs. Null where the best by the leading measure lacks the other one: then
 * a section that was not kept may be the answer.
 */
export function bestWithout(from: NearMisses, { x, y }: View): BestWithout | null {
  const placeOf = (check: number) => check * MEASURES + MEASURE_IDS.indexOf(x);
  const valueOf = (check: number, measure: MeasureId) =>
    from.rows[placeOf(check) * MEASURES + MEASURE_IDS.indexOf(measure)]!;
  const indices = Float64Array.from(CHECK_IDS, (_, check) => from.indices[placeOf(check)]!);
  const isLacking = indices.some((index, check) => index !== -1 && Number.isNaN(valueOf(check, y)));
  return isLacking ? null : { indices, valueOf };
}
