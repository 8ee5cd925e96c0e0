import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { toDisplay, toStored } from '#shared/print/units.ts';
import type { DisplayKind } from '#shared/print/units.ts';
import { SPREAD_BINS, type Spread } from './cut.ts';
import { exploreValue, type ExploreKey } from '#shared/sweep/explore-axis.ts';
import type { ValueRange } from '#shared/sweep/range-filters.ts';
import type { EvaluatedSection } from './section-source.ts';

/** Ends of one axis of the ranges, stored units, and what its handles snap to (null: to three figures). */
export interface RangeScale {
  readonly low: number;
  readonly high: number;
  readonly snap: readonly number[] | null;
}

/** 0 at the low end, 1 at the high one; an axis of one value has all of it in the middle. */
export function shareOn({ low, high }: Pick<RangeScale, 'low' | 'high'>, value: number): number {
  return high > low ? (value - low) / (high - low) : 0.5;
}

const FIGURES = 3;

function nearest(values: readonly number[], to: number): number {
  return values.reduce(
    (best, value) => (Math.abs(value - to) < Math.abs(best - to) ? value : best),
    values[0]!,
  );
}

/** The value at a share of an axis as a hand would set it: one of the axis' own, or a number of three figures. */
export function valueAt(scale: RangeScale, share: number, kind: DisplayKind, units: UnitSystem): number {
  const value = scale.low + Math.min(1, Math.max(0, share)) * (scale.high - scale.low);
  if (scale.snap !== null && scale.snap.length > 0) return nearest(scale.snap, value);
  return toStored(Number(toDisplay(value, kind, units).toPrecision(FIGURES)), kind, units);
}

/** One press of an arrow key moves a handle by this share of its axis. */
const KEY_STEP = 0.02;

/** The value a handle goes to by a number of steps: the next of the axis' own values, or a fiftieth of the axis. */
export function steppedValue(
  scale: RangeScale,
  { from, steps }: { readonly from: number; readonly steps: number },
  kind: DisplayKind,
  units: UnitSystem,
): number {
  if (scale.snap === null) return valueAt(scale, shareOn(scale, from) + steps * KEY_STEP, kind, units);
  const inside = scale.snap.filter((value) => value >= scale.low && value <= scale.high);
  const at = inside.indexOf(nearest(inside, from));
  return inside[Math.min(inside.length - 1, Math.max(0, at + steps))] ?? from;
}

/** A range with one end moved: an end at or beyond the axis' own is open, and the ends never pass each other. */
export function movedRange(
  range: ValueRange,
  end: 'low' | 'high',
  value: number,
  { low, high }: Pick<RangeScale, 'low' | 'high'>,
): ValueRange {
  if (end === 'low') {
    const held = range.high === null ? value : Math.min(value, range.high);
    return { ...range, low: held <= low ? null : held };
  }
  const held = range.low === null ? value : Math.max(value, range.low);
  return { ...range, high: held >= high ? null : held };
}

/** The spread of the sections listed by name, for a run whose sections are not at hand. */
export function listedSpread(rows: readonly EvaluatedSection[], key: ExploreKey): Spread | null {
  const values = rows.map((row) => exploreValue(row, key)).filter((value) => value !== null);
  if (values.length === 0) return null;
  const [low, high] = [Math.min(...values), Math.max(...values)];
  const all = new Array<number>(SPREAD_BINS).fill(0);
  for (const value of values)
    all[Math.min(SPREAD_BINS - 1, Math.floor(shareOn({ low, high }, value) * SPREAD_BINS))]!++;
  return { low, high, all, within: all };
}
