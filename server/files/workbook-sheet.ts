import type { Cell, CellStyle, CellValue, WriteSheet } from 'hucre';
import { plainCell, type PlainCell } from './plain-cell.ts';

/** Looks of a cell; `input` is what a reader may type over. */
const CELL_STYLES = {
  plain: {},
  title: { font: { bold: true, size: 14 } },
  head: {
    font: { bold: true },
    alignment: { wrapText: true, vertical: 'bottom' },
    border: { bottom: { style: 'thin', color: { rgb: '1E2629' } } },
  },
  input: { fill: { type: 'pattern', pattern: 'solid', fgColor: { rgb: 'F3E9D2' } } },
  total: { font: { bold: true }, border: { top: { style: 'thin', color: { rgb: '1E2629' } } } },
  note: { font: { color: { rgb: '5D666A' } } },
} as const satisfies Record<string, CellStyle>;
export type CellLook = keyof typeof CELL_STYLES;

export interface CellDress {
  readonly look?: CellLook;
  readonly numberFormat?: string;
}

/** A formula with what it comes to now: shown where nothing recalculates, as in a preview. */
export interface Formula {
  readonly formula: string;
  readonly result: number | string | null;
}

/** A cell that a formula can name, with the number it holds; null where it is blank. */
export interface NamedCell {
  /** `$C$7` */
  readonly at: string;
  readonly value: number | null;
}

const letters = (column: number): string =>
  (column < 26 ? '' : letters(Math.floor(column / 26) - 1)) + String.fromCharCode(65 + (column % 26));

/** One sheet of a workbook, filled cell by cell. */
export class WorkbookSheet {
  readonly name: string;
  /** The next row to be written, from 0. */
  row = 0;
  private readonly widths: readonly number[];
  private readonly cells = new Map<string, Partial<Cell>>();

  constructor(name: string, widths: readonly number[]) {
    this.name = name;
    this.widths = widths;
  }

  put(
    column: number,
    value: PlainCell | Formula,
    { look = 'plain', numberFormat }: CellDress = {},
  ): NamedCell {
    const style: CellStyle = {
      ...CELL_STYLES[look],
      ...(numberFormat === undefined ? {} : { numFmt: numberFormat }),
    };
    const isFormula = typeof value === 'object' && value !== null;
    const result: CellValue = isFormula ? (value.result ?? '') : plainCell(value);
    this.cells.set(
      `${this.row},${column}`,
      isFormula
        ? { value: result, type: 'formula', formula: value.formula, formulaResult: result, style }
        : { value: result, style },
    );
    const at = `$${letters(column)}$${this.row + 1}`;
    return { at, value: typeof result === 'number' ? result : null };
  }

  /** Puts cells side by side and goes on to the next row. */
  line(values: readonly (PlainCell | Formula)[], dress: CellDress = {}): void {
    values.forEach((value, column) => this.put(column, value, dress));
    this.row++;
  }

  finish(): WriteSheet {
    return {
      name: this.name,
      columns: this.widths.map((width) => ({ width })),
      rows: Array.from({ length: this.row }, () => []),
      cells: this.cells,
      pageSetup: { orientation: 'landscape', fitToPage: true, fitToWidth: 1, fitToHeight: 0 },
    };
  }
}
