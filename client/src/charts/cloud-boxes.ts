import type { DensityCell } from '#shared/sweep/result.ts';
import type { AxisExtent } from './axis-extent.ts';
import { displayCells } from './density-cells.ts';
import type { ChartAxis, PlotFrame } from './front-chart-input.ts';
import { toPlot } from './plot-axis.ts';

export interface CloudInput {
  readonly x: ChartAxis;
  readonly y: ChartAxis;
  readonly xExtent: AxisExtent;
  readonly yExtent: AxisExtent;
  readonly frame: PlotFrame;
  readonly cells: readonly DensityCell[];
}

/** A cell of the cloud on screen, CSS pixels from the chart's left top corner. */
export interface CloudBox {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
  readonly opacity: number;
  /** Sections that meet every check in it. */
  readonly count: number;
}

/** Faintest and strongest ink of a cell; the scale between is logarithmic, so one lonely section still shows. */
const FAINT = 0.13;
const STRONG = 0.62;
/** Neighbours are told apart by a hairline; a cell is never less than this. */
const GAP_PX = 0.6;
const LEAST_PX = 2;

/** Cells in the axis' own places: on a logarithmic axis they are as wide as their logarithms are apart. */
function placedCells({ x, y, cells }: CloudInput): DensityCell[] {
  return cells
    .map(({ x0, x1, y0, y1, count }) => ({
      x0: toPlot(x, x0),
      x1: toPlot(x, x1),
      y0: toPlot(y, y0),
      y1: toPlot(y, y1),
      count,
    }))
    .filter(({ x0, y0 }) => Number.isFinite(x0) && Number.isFinite(y0));
}

/** Sections per unit of area: cells differ in size, so their counts alone would not compare. */
const thickness = (cell: DensityCell): number => cell.count / ((cell.x1 - cell.x0) * (cell.y1 - cell.y0));

/** The cloud as boxes to paint, joined until each measures a few pixels; their ink tells how many sections lie there. */
export function cloudBoxes(input: CloudInput): CloudBox[] {
  const { frame, xExtent, yExtent } = input;
  const xPx = (frame.width - frame.left - frame.right) / (xExtent.max - xExtent.min);
  const yPx = (frame.height - frame.top - frame.bottom) / (yExtent.max - yExtent.min);
  const cells = displayCells(placedCells(input), { xPxPerUnit: xPx, yPxPerUnit: yPx });
  const thick = cells.map(thickness);
  const least = thick.reduce((a, b) => Math.min(a, b), Infinity);
  const range = Math.log(thick.reduce((a, b) => Math.max(a, b), 0) / least) || 1;
  return cells.map((cell, at) => ({
    x: frame.left + (cell.x0 - xExtent.min) * xPx,
    y: frame.top + (yExtent.max - cell.y1) * yPx,
    width: Math.max(LEAST_PX, (cell.x1 - cell.x0) * xPx - GAP_PX),
    height: Math.max(LEAST_PX, (cell.y1 - cell.y0) * yPx - GAP_PX),
    opacity: FAINT + (STRONG - FAINT) * (Math.log(thick[at]! / least) / range),
    count: cell.count,
  }));
}

/** The box under a spot. */
export const boxAt = (boxes: readonly CloudBox[], xPx: number, yPx: number): CloudBox | undefined =>
  boxes.find(
    ({ x, y, width, height }) =>
      xPx >= x && xPx <= x + width + GAP_PX && yPx >= y && yPx <= y + height + GAP_PX,
  );
