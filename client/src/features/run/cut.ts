import { MEASURE_DIRECTION } from '#shared/engine/measures.ts';
import { BandBuilder, MAX_BAND_KEPT } from '#shared/sweep/band.ts';
import { FrontBuilder } from '#shared/sweep/front.ts';
import { FrontInThreeBuilder, resultInThree } from '#shared/sweep/front-in-three.ts';
import type { View } from '#shared/sweep/problem.ts';
import type { DensityCell, EdgeAxis, FrontPoint, Point, ResultInThree } from '#shared/sweep/result.ts';
import { signOf } from '#shared/sweep/tally.ts';
import type { ExploreKey } from '#shared/sweep/explore-axis.ts';
import type { FeasibleColumns } from './feasible-columns.ts';
import {
  filterEntries,
  hasFilters,
  highestWithin,
  lowestWithin,
  type RangeFilters,
} from '#shared/sweep/range-filters.ts';

/** One side of what the chart shows, stored (SI) units. */
export interface WindowSide {
  readonly low: number;
  readonly high: number;
  readonly isLog: boolean;
  /** Cells along it. */
  readonly cells: number;
}

export interface CutQuery {
  readonly view: View;
  readonly filters: RangeFilters;
  /** Null until the chart has been laid out. */
  readonly window: { readonly x: WindowSide; readonly y: WindowSide } | null;
  readonly keys: readonly ExploreKey[];
}

/** How many sections have which value of one key: of all that meet every check, and of those within the ranges. */
export interface Spread {
  readonly low: number;
  readonly high: number;
  readonly all: readonly number[];
  readonly within: readonly number[];
}

/** What lies within the ranges, seen through two measures: exact, from every section that meets every check. */
export interface Cut {
  readonly count: number;
  readonly front: readonly FrontPoint[];
  /** Of a view in three measures where ranges are set; without any the run's own is the same. */
  readonly inThree: ResultInThree | null;
  readonly band: readonly Point[];
  readonly isBandCut: boolean;
  readonly density: readonly DensityCell[] | null;
  readonly spreads: Partial<Readonly<Record<ExploreKey, Spread>>>;
  /** Sections within the ranges at each value of the axes of the space, in the axes' order. */
  readonly axisCounts: Readonly<Record<EdgeAxis, readonly number[]>>;
}

/** Bars of a spread: as many as stand side by side on an axis of some two hundred pixels. */
export const SPREAD_BINS = 32;

/** 1 for each section within all ranges. */
function within(columns: FeasibleColumns, filters: RangeFilters): Uint8Array {
  const kept = new Uint8Array(columns.count).fill(1);
  for (const [key, range] of filterEntries(filters)) {
    const values = columns.column(key);
    const low = lowestWithin(range);
    const high = highestWithin(range);
    for (let i = 0; i < kept.length; i++) if (!(values[i]! >= low && values[i]! <= high)) kept[i] = 0;
  }
  return kept;
}

function frontOf(columns: FeasibleColumns, view: View, kept: Uint8Array) {
  const [xs, ys] = [columns.measure(view.x), columns.measure(view.y)];
  const sx = MEASURE_DIRECTION[view.x] === 'less' ? 1 : -1;
  const sy = MEASURE_DIRECTION[view.y] === 'less' ? 1 : -1;
  const { index } = columns;
  const front = new FrontBuilder();
  const band = new BandBuilder();
  for (let i = 0; i < kept.length; i++) {
    if (kept[i] === 0) continue;
    front.add(sx * xs[i]!, sy * ys[i]!, index[i]!);
    if (ys[i] === ys[i]) band.add(index[i]!, sx * xs[i]!, sy * ys[i]!);
  }
  const near = band.finish();
  return {
    front: front.xs.map((x, i) => ({
      index: front.ties[i]![0]!,
      x: sx * x,
      y: sy * front.ys[i]!,
      tieCount: front.tieCounts[i]!,
      ties: front.ties[i]!,
    })),
    band: near
      .slice(0, MAX_BAND_KEPT)
      .map((point) => ({ index: point.index, x: sx * point.x, y: sy * point.y })),
    isBandCut: near.length > MAX_BAND_KEPT,
  };
}

function inThreeOf(columns: FeasibleColumns, { x, y, z }: View, kept: Uint8Array): ResultInThree | null {
  if (!z) return null;
  const [xs, ys, zs] = [columns.measure(x), columns.measure(y), columns.measure(z)];
  const signs = { x: signOf(x), y: signOf(y), z: signOf(z) };
  const front = new FrontInThreeBuilder();
  for (let i = 0; i < kept.length; i++)
    if (kept[i] === 1) front.add(signs.x * xs[i]!, signs.y * ys[i]!, signs.z * zs[i]!, columns.index[i]!);
  return resultInThree(front.finish(), signs);
}

/** Cells of one side. The last one holds its upper end too: a window fitted to the values ends on one of them. */
const scaleOf = (side: WindowSide) => {
  const place = side.isLog ? Math.log : (value: number) => value;
  const value = side.isLog ? Math.exp : (at: number) => at;
  const from = place(side.low);
  const step = (place(side.high) - from) / side.cells;
  const last = side.cells - 1;
  return {
    /** Outside 0 … cells − 1 where the value is not shown. */
    cellOf: (one: number) => {
      const cell = Math.floor((place(one) - from) / step);
      return cell > last && one <= side.high ? last : cell;
    },
    boundAt: (cell: number) => value(from + cell * step),
  };
};

/** Sections counted by cells of the shown part: however far one enlarges it, each is counted and none twice. */
function densityOf(columns: FeasibleColumns, query: CutQuery, kept: Uint8Array): DensityCell[] | null {
  if (query.window === null) return null;
  const { x, y } = query.window;
  const [xs, ys] = [columns.measure(query.view.x), columns.measure(query.view.y)];
  const [sx, sy] = [scaleOf(x), scaleOf(y)];
  const counts = new Uint32Array(x.cells * y.cells);
  for (let i = 0; i < kept.length; i++) {
    if (kept[i] === 0) continue;
    const column = sx.cellOf(xs[i]!);
    const row = sy.cellOf(ys[i]!);
    if (column >= 0 && column < x.cells && row >= 0 && row < y.cells) counts[column * y.cells + row]!++;
  }
  const cells: DensityCell[] = [];
  counts.forEach((count, at) => {
    if (count === 0) return;
    const column = Math.floor(at / y.cells);
    const row = at % y.cells;
    cells.push({
      x0: sx.boundAt(column),
      x1: sx.boundAt(column + 1),
      y0: sy.boundAt(row),
      y1: sy.boundAt(row + 1),
      count,
    });
  });
  return cells;
}

function countByAxis({ space, index }: FeasibleColumns, kept: Uint8Array): Cut['axisCounts'] {
  const [depths, strengths, widths] = [space.depthsMm.length, space.fcMPa.length, space.widthsMm.length];
  const perWidth = space.size / widths;
  const counts = {
    depth: new Array<number>(depths).fill(0),
    fc: new Array<number>(strengths).fill(0),
    width: new Array<number>(widths).fill(0),
  };
  for (let i = 0; i < kept.length; i++) {
    if (kept[i] === 0) continue;
    const at = index[i]!;
    counts.depth[at % depths]!++;
    counts.fc[Math.floor(at / depths) % strengths]!++;
    counts.width[Math.floor(at / perWidth)]!++;
  }
  return counts;
}

function spreadOf(values: Float64Array, kept: Uint8Array): Spread {
  let [low, high] = [Infinity, -Infinity];
  for (const value of values) {
    if (value < low) low = value;
    if (value > high) high = value;
  }
  const all = new Array<number>(SPREAD_BINS).fill(0);
  const inside = new Array<number>(SPREAD_BINS).fill(0);
  const perUnit = high > low ? SPREAD_BINS / (high - low) : 0;
  for (let i = 0; i < kept.length; i++) {
    const value = values[i]!;
    if (value !== value) continue;
    const bin = Math.min(SPREAD_BINS - 1, Math.floor((value - low) * perUnit));
    all[bin]!++;
    if (kept[i] === 1) inside[bin]!++;
  }
  return { low, high, all, within: inside };
}

export function cutColumns(columns: FeasibleColumns, query: CutQuery): Cut {
  const kept = within(columns, query.filters);
  return {
    count: kept.reduce((sum, one) => sum + one, 0),
    ...frontOf(columns, query.view, kept),
    inThree: hasFilters(query.filters) ? inThreeOf(columns, query.view, kept) : null,
    density: densityOf(columns, query, kept),
    axisCounts: countByAxis(columns, kept),
    spreads: Object.fromEntries(query.keys.map((key) => [key, spreadOf(columns.column(key), kept)])),
  };
}

/** Where someone pointed, with how much of each measure one pixel is (of its decimal logarithm on a logarithmic axis). */
export interface PickQuery {
  readonly view: View;
  readonly filters: RangeFilters;
  readonly at: { readonly x: number; readonly y: number };
  readonly perPx: { readonly x: number; readonly y: number };
  readonly isLog: { readonly x: boolean; readonly y: boolean };
  readonly reachPx: number;
}

/** The section drawn nearest to a place, the lowest index among equals; null where none is within reach. */
export function nearestSection(columns: FeasibleColumns, query: PickQuery): number | null {
  const { view, filters, at, perPx, isLog } = query;
  const kept = within(columns, filters);
  const [xs, ys] = [columns.measure(view.x), columns.measure(view.y)];
  const away = (value: number, from: number, isLogarithmic: boolean): number =>
    isLogarithmic ? Math.log10(value) - Math.log10(from) : value - from;
  let nearest: number | null = null;
  let least = query.reachPx;
  for (let i = 0; i < kept.length; i++) {
    if (kept[i] === 0) continue;
    const px = Math.hypot(away(xs[i]!, at.x, isLog.x) / perPx.x, away(ys[i]!, at.y, isLog.y) / perPx.y);
    if (px < least) {
      least = px;
      nearest = columns.index[i]!;
    }
  }
  return nearest;
}
