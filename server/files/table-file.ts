import { createWriteStream } from 'node:fs';
import { Writable } from 'node:stream';
import { writeCsvStream } from 'hucre/csv';
import { writeXlsxStream } from 'hucre/xlsx';
import type { TableFormat } from '#shared/contract/endpoints/file-endpoints.ts';
import { plainCell, type PlainCell } from './plain-cell.ts';

/** One line of what stands above a table: what it says, and of what. */
export type HeadLine = readonly [label: string, value: PlainCell];

export interface TableColumn<Row> {
  /** With its unit: `h, in`. */
  readonly head: string;
  /** Characters. */
  readonly width: number;
  /** How a spreadsheet shows its numbers; the cell holds every figure. */
  readonly numberFormat?: string;
  readonly cell: (row: Row) => PlainCell;
}

export interface Table<Row> {
  readonly name: string;
  readonly head: readonly HeadLine[];
  readonly columns: readonly TableColumn<Row>[];
  readonly rows: Iterable<Row>;
}

function* linesOf<Row>({ head, columns, rows }: Table<Row>): Generator<PlainCell[]> {
  for (const line of head) yield line.map(plainCell);
  yield [];
  yield columns.map((column) => plainCell(column.head));
  for (const row of rows) yield columns.map((column) => plainCell(column.cell(row)));
}

/**
 * A table as bytes, made as they are read, so that memory does not grow with the rows. CSV as RFC 4180 has it, in UTF-8
 * with a byte order mark: without one Excel reads f′c, mm² and × in the machine's code page, and readers of UTF-8 skip it.
 */
function tableStream<Row>(table: Table<Row>, format: TableFormat): ReadableStream<Uint8Array> {
  if (format === 'csv') return writeCsvStream(linesOf(table), { bom: true, lineSeparator: '\r\n' });
  return writeXlsxStream(linesOf(table), {
    name: table.name,
    columns: table.columns.map(({ width, numberFormat }) => ({
      width,
      ...(numberFormat === undefined ? {} : { numFmt: numberFormat }),
    })),
  });
}

export const writeTableFile = <Row>(table: Table<Row>, format: TableFormat, path: string): Promise<void> =>
  tableStream(table, format).pipeTo(Writable.toWeb(createWriteStream(path)) as WritableStream<Uint8Array>);
