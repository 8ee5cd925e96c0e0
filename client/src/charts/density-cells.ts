import type { DensityCell } from '#shared/sweep/result.ts';

/** Pixels a cell should measure at least: finer ones read as noise and cost drawing time. */
const LEAST_CELL_PX = 9;

export interface PlotScale {
  /** Pixels per unit of the measure (SI), along x and y. */
  readonly xPxPerUnit: number;
  readonly yPxPerUnit: number;
}

interface Pitch {
  readonly origin: number;
  readonly size: number;
}

/** A whole number of source cells, so that no source cell is ever split between two on screen. */
function pitch(lows: readonly number[], spans: readonly number[], pxPerUnit: number): Pitch {
  const unit = Math.min(...spans.filter((span) => span > 0));
  const origin = Math.min(...lows);
  if (!Number.isFinite(unit) || !(pxPerUnit > 0)) return { origin, size: 1 };
  return { origin, size: unit * Math.max(1, Math.ceil(LEAST_CELL_PX / (unit * pxPerUnit))) };
}

/**
 * Joins neighbouring cells of the result's density grid until each measures a few pixels. Every section counted in the
 * source is counted once here: cells are joined whole, by their centres.
 */
export function displayCells(cells: readonly DensityCell[], scale: PlotScale): DensityCell[] {
  if (cells.length === 0) return [];
  const x = pitch(
    cells.map((cell) => cell.x0),
    cells.map((cell) => cell.x1 - cell.x0),
    Math.abs(scale.xPxPerUnit),
  );
  const y = pitch(
    cells.map((cell) => cell.y0),
    cells.map((cell) => cell.y1 - cell.y0),
    Math.abs(scale.yPxPerUnit),
  );
  const joined = new Map<string, DensityCell>();
  for (const cell of cells) {
    const column = Math.floor(((cell.x0 + cell.x1) / 2 - x.origin) / x.size);
    const row = Math.floor(((cell.y0 + cell.y1) / 2 - y.origin) / y.size);
    const key = `${column} ${row}`;
    const x0 = x.origin + column * x.size;
    const y0 = y.origin + row * y.size;
    const count = (joined.get(key)?.count ?? 0) + cell.count;
    joined.set(key, { x0, x1: x0 + x.size, y0, y1: y0 + y.size, count });
  }
  return [...joined.values()];
}
