import type { ExploreKey } from '../sweep/explore-axis.ts';
import type { ValueRange } from '../sweep/range-filters.ts';
import { bareText, exploreLabel } from './explore-label.ts';
import type { MeasureReader } from './measure-reader.ts';

/** A range as one reads it: `h 20–28 in`, `Steel ≤ 18 lb/ft`. */
export function rangeWords(key: ExploreKey, { low, high }: ValueRange, reader: MeasureReader): string {
  const { symbol, unit } = exploreLabel(key, reader);
  const print = (value: number | null) => bareText(key, value, reader.units);
  const tail = unit === '' ? '' : ` ${unit}`;
  if (low === null) return `${symbol} ≤ ${print(high)}${tail}`;
  if (high === null) return `${symbol} ≥ ${print(low)}${tail}`;
  return `${symbol} ${print(low)}–${print(high)}${tail}`;
}
