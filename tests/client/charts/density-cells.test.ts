import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { DensityCell } from '#shared/sweep/result.ts';
import { displayCells } from '#client/src/charts/density-cells.ts';

/** Cells as a result has them: neighbours share their bound, and later ones are wider than earlier ones. */
const cellAt = (column: number, row: number, count: number): DensityCell => ({
  x0: 1.03 ** column,
  x1: 1.03 ** (column + 1),
  y0: 1.03 ** row,
  y1: 1.03 ** (row + 1),
  count,
});

const grids = fc
  .uniqueArray(fc.record({ column: fc.nat(60), row: fc.nat(60), count: fc.integer({ min: 1, max: 1e6 }) }), {
    selector: ({ column, row }) => `${column} ${row}`,
    maxLength: 200,
  })
  .map((cells) => cells.map(({ column, row, count }) => cellAt(column, row, count)));
const scales = fc.record({
  xPxPerUnit: fc.double({ min: 1, max: 500, noNaN: true }),
  yPxPerUnit: fc.double({ min: 1, max: 500, noNaN: true }),
});

const total = (cells: readonly DensityCell[]) => cells.reduce((sum, cell) => sum + cell.count, 0);

describe('cells joined for the screen', () => {
  it('count every section exactly once', () => {
    fc.assert(
      fc.property(grids, scales, (cells, scale) => {
        expect(total(displayCells(cells, scale))).toBe(total(cells));
      }),
    );
  });

  it('hold each source cell whole', () => {
    fc.assert(
      fc.property(grids, scales, (cells, scale) => {
        const joined = displayCells(cells, scale);
        for (const cell of cells) {
          const holders = joined.filter(
            (one) => one.x0 <= cell.x0 && one.x1 >= cell.x1 && one.y0 <= cell.y0 && one.y1 >= cell.y1,
          );
          expect(holders).toHaveLength(1);
        }
      }),
    );
  });

  it('never join across a gap where there is no section', () => {
    const joined = displayCells([cellAt(0, 0, 1), cellAt(10, 0, 1)], { xPxPerUnit: 1, yPxPerUnit: 1 });
    expect(joined).toHaveLength(2);
  });

  it('leave cells alone that are large enough on screen', () => {
    const cells = [cellAt(0, 0, 3), cellAt(1, 0, 4)];
    expect(displayCells(cells, { xPxPerUnit: 5000, yPxPerUnit: 5000 })).toEqual(cells);
  });

  it('are none for no cells', () => {
    expect(displayCells([], { xPxPerUnit: 1, yPxPerUnit: 1 })).toEqual([]);
  });
});
