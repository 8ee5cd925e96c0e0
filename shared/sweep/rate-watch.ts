import { MEASURE_IDS } from '../engine/measures.ts';
import type { Rates } from '../engine/section.ts';
import { amountsOfRow, pricingsOf, rowDigits, type AmountTables } from './amount-tables.ts';
import { BAND_SHARE } from './band.ts';
import { writeAmounts, type RowAmounts } from './kernel-amounts.ts';
import type { View } from './problem.ts';
import type { BuiltSteel } from './frame-builder.ts';
import { isSolved, type RankWitness } from './rank-frames.ts';
import { signOf } from './tally.ts';

/** Oriented measures of a view: less is better. */
interface OrientedPlace {
  readonly x: number;
  readonly y: number;
}

/** The best section at some rates: there, and at the rates that are ranked by. */
export interface RateWinner {
  readonly index: number;
  readonly own: OrientedPlace;
  readonly asked: OrientedPlace;
}

/**
 * Watches a ranking for who would come first at other rates, and for the leading values near the best, of which a band of
 * any width up to the widest is counted.
 */
export class RateWatch implements RankWitness {
  winner: RateWinner | null = null;
  count = 0;
  readonly #tables: AmountTables;
  readonly #pricings: ReturnType<typeof pricingsOf>;
  readonly #xAt: number;
  readonly #yAt: number;
  readonly #xSign: number;
  readonly #ySign: number;
  /** Whether each measure of the view is no amount, and so the same at any rates. */
  readonly #isXSolved: boolean;
  readonly #isYSolved: boolean;
  readonly #measures = new Float64Array(MEASURE_IDS.length);
  #amounts: RowAmounts | null = null;
  #near: Float64Array<ArrayBuffer>;
  #best = Infinity;
  #leadingX = Infinity;

  /** `rates`: the other ones; `most`: sections to come. */
  constructor(tables: AmountTables, { x, y }: View, { rates, most }: { rates: Rates | null; most: number }) {
    this.#tables = tables;
    this.#isXSolved = isSolved(x);
    this.#isYSolved = isSolved(y);
    this.#pricings = pricingsOf(tables, rates);
    this.#xAt = MEASURE_IDS.indexOf(x);
    this.#yAt = MEASURE_IDS.indexOf(y);
    this.#xSign = signOf(x);
    this.#ySign = signOf(y);
    this.#near = new Float64Array(most);
  }

  beginRow(rowNumber: number): void {
    const digits = rowDigits(this.#tables.space, rowNumber);
    this.#amounts = amountsOfRow(this.#tables, digits, this.#pricings[digits.fcAt]!);
  }

  see(index: number, depthMm: number, steel: BuiltSteel, asked: Float64Array): void {
    const x = this.#xSign * asked[this.#xAt]!;
    const y = this.#ySign * asked[this.#yAt]!;
    if (y !== y) return;
    this.#near[this.count++] = x;
    if (x < this.#best) this.#best = x;
    const measures = this.#measures;
    writeAmounts(this.#amounts!, depthMm, steel, measures);
    const ownX = this.#xSign * (this.#isXSolved ? asked : measures)[this.#xAt]!;
    if (!(ownX <= this.#leadingX)) return;
    const own = { x: ownX, y: this.#ySign * (this.#isYSolved ? asked : measures)[this.#yAt]! };
    if (own.y !== own.y || !isAhead(own, index, this.winner)) return;
    this.#leadingX = ownX;
    this.winner = { index, own, asked: { x, y } };
  }

  /** Oriented leading values within the widest band of the best. */
  near(): Float64Array<ArrayBuffer> {
    const limit = this.#best + BAND_SHARE * Math.abs(this.#best);
    return this.#near.subarray(0, this.count).filter((x) => x <= limit);
  }
}

/** Whether a section comes before the one that leads: by x, then y, then its number. */
export function isAhead(place: OrientedPlace, index: number, leader: RateWinner | null): boolean {
  if (leader === null) return true;
  const { own } = leader;
  if (place.x !== own.x) return place.x < own.x;
  return place.y < own.y || (place.y === own.y && index < leader.index);
}
