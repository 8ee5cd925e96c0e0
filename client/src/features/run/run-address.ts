import { readRates, type AskedRates } from './asked-rates.ts';
import { MEASURE_IDS, type MeasureId } from '#shared/engine/measures.ts';
import type { View } from '#shared/sweep/problem.ts';
import type { ChartWindow } from '#client/src/charts/chart-window.ts';
import { MARK_STYLES, type MarkStyle } from '#client/src/charts/front-chart-input.ts';
import { isExploreKey, type ExploreKey } from '#shared/sweep/explore-axis.ts';
import {
  filtersText,
  rangeText,
  readFilters,
  readRange,
  type RangeFilters,
} from '#shared/sweep/range-filters.ts';

/** What lies below the strip. */
export const PANELS = ['table', 'ranges', 'why'] as const;
export type Panel = (typeof PANELS)[number];

export const LISTS = ['front', 'band'] as const;
export type ListName = (typeof LISTS)[number];

/** A column the table is ordered by, in the table's own keys. */
export interface TableOrder {
  readonly key: string;
  readonly isDescending: boolean;
}

/** What the address of a run says beside the run itself: everything one would send to a colleague. */
export interface RunAddress {
  readonly view: View;
  /** Index of the chosen section; null for the best one. */
  readonly index: number | null;
  /** Near-best band as a share, 0 … 0.1. */
  readonly bandShare: number;
  /** Rates the sections are ranked at; null for the run's own. */
  readonly rates: AskedRates | null;
  /** A third measure, told by the marks of the front. */
  readonly third: ExploreKey | null;
  /** Whether the front in three measures is asked for, the third one with the two of the axes. */
  readonly isInThree: boolean;
  readonly markStyle: MarkStyle;
  readonly isXLog: boolean;
  readonly isYLog: boolean;
  readonly window: ChartWindow | null;
  readonly filters: RangeFilters;
  readonly panel: Panel;
  readonly list: ListName;
  readonly order: TableOrder | null;
  /** Columns of the table; null for the usual ones. */
  readonly columns: readonly string[] | null;
  /** Bars or size the table's rows are searched for. */
  readonly find: string;
  /** Axes of the ranges; null for the usual ones. */
  readonly axes: readonly ExploreKey[] | null;
}

const LONGEST_FIND = 60;
const FIRST_BAND_SHARE = 0.05;
export const WIDEST_BAND_SHARE = 0.1;

const isMeasure = (text: string | null): text is MeasureId => MEASURE_IDS.some((id) => id === text);
const oneOf = <T extends string>(known: readonly T[], text: string | null): T =>
  known.find((one) => one === text) ?? known[0]!;

function readBand(text: string | null): number {
  const percent = text === null || text === '' ? Number.NaN : Number(text);
  if (!Number.isFinite(percent)) return FIRST_BAND_SHARE;
  return Math.min(Math.max(percent / 100, 0), WIDEST_BAND_SHARE);
}

function readWindow(params: URLSearchParams): ChartWindow | null {
  const [x, y] = [readRange(params.get('zx')), readRange(params.get('zy'))];
  if (x === null || y === null) return null;
  const { low: left, high: right } = x;
  const { low: bottom, high: top } = y;
  if (left === null || right === null || bottom === null || top === null) return null;
  return left < right && bottom < top
    ? { x: { low: left, high: right }, y: { low: bottom, high: top } }
    : null;
}

function readOrder(text: string | null): TableOrder | null {
  if (text === null || !/^-?\w+$/.test(text)) return null;
  return text.startsWith('-')
    ? { key: text.slice(1), isDescending: true }
    : { key: text, isDescending: false };
}

const readList = (text: string | null): readonly string[] | null =>
  text === null ? null : text.split(',').filter((word) => /^\w+$/.test(word));

/** Reads an address that anyone may have typed or cut short: what makes no sense is as if it were not there. */
export function readRunAddress(params: URLSearchParams, first: View): RunAddress {
  const x = params.get('x');
  const y = params.get('y');
  const isView = isMeasure(x) && isMeasure(y) && x !== y;
  const index = params.get('i');
  const third = params.get('by');
  const log = params.get('log') ?? '';
  return {
    view: isView ? { x, y } : first,
    index: index !== null && /^\d{1,12}$/.test(index) ? Number(index) : null,
    bandShare: readBand(params.get('band')),
    rates: readRates(params.get('rates')),
    third: third !== null && isExploreKey(third) ? third : null,
    isInThree: params.get('in') === '3',
    markStyle: oneOf(MARK_STYLES, params.get('as')),
    isXLog: log.includes('x'),
    isYLog: log.includes('y'),
    window: readWindow(params),
    filters: readFilters(params.get('f')),
    panel: oneOf(PANELS, params.get('show')),
    list: oneOf(LISTS, params.get('list')),
    order: readOrder(params.get('sort')),
    columns: readList(params.get('cols')),
    find: (params.get('find') ?? '').slice(0, LONGEST_FIND),
    axes: readList(params.get('axes'))?.filter(isExploreKey) ?? null,
  };
}

/** Parts of an address to write; null takes one out. */
export type AddressPart = Readonly<Record<string, string | null>>;

/** Another pair of measures has other numbers along its axes: the enlarged part goes, ranges stay. */
export const viewPart = (view: View): AddressPart => ({
  x: view.x,
  y: view.y,
  zx: null,
  zy: null,
  log: null,
});

export const windowPart = (window: ChartWindow | null): AddressPart => ({
  zx: window === null ? null : rangeText(window.x),
  zy: window === null ? null : rangeText(window.y),
});

/** A logarithmic axis is another axis: the enlarged part would not be what one looked at. */
export const logPart = (isXLog: boolean, isYLog: boolean): AddressPart => ({
  log: isXLog || isYLog ? `${isXLog ? 'x' : ''}${isYLog ? 'y' : ''}` : null,
  zx: null,
  zy: null,
});

export const filtersPart = (filters: RangeFilters): AddressPart => ({ f: filtersText(filters) });

export const orderPart = (order: TableOrder | null): AddressPart => ({
  sort: order === null ? null : `${order.isDescending ? '-' : ''}${order.key}`,
});

/** The next pair when one side is chosen: choosing the other side's measure swaps the two. */
export function withMeasure(view: View, side: 'x' | 'y', measure: MeasureId): View {
  const other = side === 'x' ? view.y : view.x;
  const kept = measure === other ? view[side] : other;
  return side === 'x' ? { x: measure, y: kept } : { x: kept, y: measure };
}

/** The view an address asks for: in three measures where its third is one of them and no axis shows it already. */
export function askedView({ view: { x, y }, third, isInThree }: RunAddress): View {
  const isThird = isInThree && isMeasure(third) && third !== x && third !== y;
  return isThird ? { x, y, z: third } : { x, y };
}
