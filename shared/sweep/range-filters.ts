import { exploreValue, isExploreKey, type ExploreKey, type JudgedSection } from './explore-axis.ts';

/** Both ends belong to the range; null leaves that side open. Stored (SI) units. */
export interface ValueRange {
  readonly low: number | null;
  readonly high: number | null;
}
export type RangeFilters = Partial<Readonly<Record<ExploreKey, ValueRange>>>;

/** An end that was typed as 24 in must hold a depth of 609.6 mm whatever the last digit. */
const SLACK = 1e-6;

export const lowestWithin = (range: ValueRange): number =>
  range.low === null ? -Infinity : range.low - Math.abs(range.low) * SLACK;
export const highestWithin = (range: ValueRange): number =>
  range.high === null ? Infinity : range.high + Math.abs(range.high) * SLACK;

/** A value that is not known lies in no range. */
const isWithinRange = (value: number | null, range: ValueRange): boolean =>
  value !== null && value >= lowestWithin(range) && value <= highestWithin(range);

export const filterEntries = (filters: RangeFilters): (readonly [ExploreKey, ValueRange])[] =>
  Object.entries(filters) as [ExploreKey, ValueRange][];

export const hasFilters = (filters: RangeFilters): boolean => filterEntries(filters).length > 0;

export const isWithinFilters = (section: JudgedSection, filters: RangeFilters): boolean =>
  filterEntries(filters).every(([key, range]) => isWithinRange(exploreValue(section, key), range));

/** The filters with one range set, or taken out where both its ends are open. */
export function withRange(filters: RangeFilters, key: ExploreKey, range: ValueRange): RangeFilters {
  const { [key]: _, ...rest } = filters;
  return range.low === null && range.high === null ? rest : { ...rest, [key]: range };
}

/** Seven figures tell any two values of an axis apart and keep the address short. */
const FIGURES = 7;
const endText = (value: number | null): string =>
  value === null ? '' : String(Number(value.toPrecision(FIGURES)));

function readEnd(text: string | undefined): number | null {
  if (text === undefined || text === '') return null;
  const value = Number(text);
  return Number.isFinite(value) ? value : null;
}

/** `500~700`, `~700`, `500~`. */
export const rangeText = ({ low, high }: ValueRange): string => `${endText(low)}~${endText(high)}`;

/** Null for what is no range, or one with its ends the wrong way round. */
export function readRange(text: string | null): ValueRange | null {
  if (text === null || !text.includes('~')) return null;
  const [low, high] = text.split('~').map(readEnd);
  if (low === undefined || high === undefined || (low === null && high === null)) return null;
  return low !== null && high !== null && low > high ? null : { low, high };
}

/** `depthMm:500~700;costPerM:~90`; null for no filter at all. */
export function filtersText(filters: RangeFilters): string | null {
  const parts = filterEntries(filters).map(([key, range]) => `${key}:${rangeText(range)}`);
  return parts.length === 0 ? null : parts.join(';');
}

export function readFilters(text: string | null): RangeFilters {
  const filters: Partial<Record<ExploreKey, ValueRange>> = {};
  for (const part of (text ?? '').split(';')) {
    const [key = '', rest = null] = part.split(':');
    const range = readRange(rest);
    if (isExploreKey(key) && range !== null) filters[key] = range;
  }
  return filters;
}
