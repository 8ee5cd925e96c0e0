import type { DensityCell } from '#shared/sweep/result.ts';

/** Pixels a cell should measure at least: finer ones read as noise and cost drawing time. */
export const CELL_PX = 11;
/** A cell laid out at just that width may come out a little less. */
const ROUNDING_PX = 0.01;
/** Neighbouring cells share their bound up to rounding: a gap below this share of a cell is none. */
const TOUCHING = 1e-6;

export interface PlotScale {
  /** Pixels per unit of the axis as it is laid out, along x and y. */
  readonly xPxPerUnit: number;
  readonly yPxPerUnit: number;
}

interface Stretch {
  readonly low: number;
  readonly high: number;
}

/**
 * Joins touching stretches, in order, until each is wide enough on screen. The grid of a result has cells of unequal
 * width, so whole cells are joined rather than laid on a new grid: no cell is ever split and none leaves a gap.
 */
function joinStretches(stretches: Iterable<Stretch>, pxPerUnit: number): ReadonlyMap<number, Stretch> {
  const byLow = new Map<number, Stretch>();
  for (const stretch of stretches) byLow.set(stretch.low, stretch);
  const ordered = [...byLow.values()].sort((a, b) => a.low - b.low);
  const joined = new Map<number, Stretch>();
  let group: Stretch[] = [];
  const close = () => {
    const first = group[0];
    const last = group.at(-1);
    if (first === undefined || last === undefined) return;
    const whole = { low: first.low, high: last.high };
    for (const member of group) joined.set(member.low, whole);
    group = [];
  };
  for (const stretch of ordered) {
    const last = group.at(-1);
    const isApart = last !== undefined && stretch.low - last.high > TOUCHING * (stretch.high - stretch.low);
    if (isApart) close();
    group.push(stretch);
    if ((stretch.high - group[0]!.low) * pxPerUnit >= CELL_PX - ROUNDING_PX) close();
  }
  close();
  return joined;
}

/**
 * Joins neighbouring cells of the result's density grid until each measures a few pixels. Every section counted in the
 * source is counted once here.
 */
export function displayCells(cells: readonly DensityCell[], scale: PlotScale): DensityCell[] {
  const columns = joinStretches(
    cells.map((cell) => ({ low: cell.x0, high: cell.x1 })),
    Math.abs(scale.xPxPerUnit),
  );
  const rows = joinStretches(
    cells.map((cell) => ({ low: cell.y0, high: cell.y1 })),
    Math.abs(scale.yPxPerUnit),
  );
  // By column and then by row: this runs at every frame of an enlargement, and a key made of both cost a third of it.
  const byColumn = new Map<Stretch, Map<Stretch, number>>();
  for (const cell of cells) {
    const column = columns.get(cell.x0)!;
    const row = rows.get(cell.y0)!;
    let counts = byColumn.get(column);
    if (counts === undefined) {
      counts = new Map<Stretch, number>();
      byColumn.set(column, counts);
    }
    counts.set(row, (counts.get(row) ?? 0) + cell.count);
  }
  return [...byColumn].flatMap(([column, counts]) =>
    [...counts].map(([row, count]) => ({
      x0: column.low,
      x1: column.high,
      y0: row.low,
      y1: row.high,
      count,
    })),
  );
}
