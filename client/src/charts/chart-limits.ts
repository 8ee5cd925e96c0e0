import { fitExtent, type AxisExtent } from './axis-extent.ts';
import type { ChartAxis, ChartPin } from './front-chart-input.ts';
import { toPlot } from './plot-axis.ts';
import type { DensityCell, FrontPoint } from '#shared/sweep/result.ts';

/**
 * Share of the feasible cloud the axes always show beside the whole front. The last tenth is a thin tail of sections
 * far from any trade-off; showing it would press the front into a corner.
 */
const CLOUD_SHOWN = 0.9;

/** Ticks an axis is divided into, about. */
export const TICKS_X = 7;
export const TICKS_Y = 6;

/** Room beyond the outermost values of a logarithmic axis, as a share of it and at least, decades. */
const AIR = 0.04;
const LEAST_AIR_DECADES = 0.01;

interface Shown {
  readonly cells: readonly DensityCell[];
  readonly front: readonly FrontPoint[];
  readonly pins: readonly ChartPin[];
  readonly target: { readonly axis: 'x' | 'y'; readonly value: number } | null;
}

interface Side {
  readonly key: 'x' | 'y';
  readonly low: (cell: DensityCell) => number;
  readonly high: (cell: DensityCell) => number;
}

const SIDES: readonly Side[] = [
  { key: 'x', low: (cell) => cell.x0, high: (cell) => cell.x1 },
  { key: 'y', low: (cell) => cell.y0, high: (cell) => cell.y1 },
];

/** The value with at most `share` of all sections beyond it, going from the better end to the worse. */
function cloudEnd(cells: readonly DensityCell[], side: Side, direction: 'less' | 'more'): number {
  const ordered = cells.toSorted((a, b) =>
    direction === 'less' ? side.low(a) - side.low(b) : side.high(b) - side.high(a),
  );
  const total = ordered.reduce((sum, cell) => sum + cell.count, 0);
  let seen = 0;
  for (const cell of ordered) {
    seen += cell.count;
    if (seen >= total * CLOUD_SHOWN) return direction === 'less' ? side.high(cell) : side.low(cell);
  }
  return direction === 'less' ? -Infinity : Infinity;
}

function extentAlong(side: Side, axis: ChartAxis, shown: Shown): AxisExtent {
  const { front, pins, target, cells } = shown;
  const points = [...front, ...pins].map((point) => point[side.key]);
  const marks = target?.axis === side.key ? [...points, target.value] : points;
  const end = cells.length > 0 ? [cloudEnd(cells, side, axis.direction)] : [];
  const all = [...marks, ...end].map((value) => toPlot(axis, value)).filter(Number.isFinite);
  const [low, high] = [Math.min(...all), Math.max(...all)];
  if (!axis.isLog) return fitExtent(low, high, side.key === 'x' ? TICKS_X : TICKS_Y);
  if (all.length === 0) return { min: 0, max: 1, step: 0 };
  const air = Math.max((high - low) * AIR, LEAST_AIR_DECADES);
  return { min: low - air, max: high + air, step: 0 };
}

/** Both axes of the front chart: the whole front, the pins, the target, and nearly all of the cloud. */
export function chartLimits(
  x: ChartAxis,
  y: ChartAxis,
  shown: Shown,
): { readonly x: AxisExtent; readonly y: AxisExtent } {
  return { x: extentAlong(SIDES[0]!, x, shown), y: extentAlong(SIDES[1]!, y, shown) };
}
