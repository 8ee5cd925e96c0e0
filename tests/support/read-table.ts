import { parse } from 'csv-parse/sync';

export type TableRow = Readonly<Record<string, string>>;

/** What stands above the table, and its rows by their heads. */
export function readTable(lines: readonly (readonly (string | number | null)[])[]): {
  head: TableRow;
  rows: TableRow[];
} {
  const texts = lines.map((line) => line.map((cell) => (cell === null ? '' : String(cell))));
  const gap = texts.findIndex((line) => line.every((cell) => cell === ''));
  const [heads = [], ...rows] = texts.slice(gap + 1);
  return {
    head: Object.fromEntries(texts.slice(0, gap)) as TableRow,
    rows: rows.map((row) => Object.fromEntries(heads.map((head, i) => [head, row[i] ?? '']))),
  };
}

export const parseCsv = (bytes: Uint8Array): string[][] =>
  parse(Buffer.from(bytes), {
    bom: true,
    relax_column_count: true,
    record_delimiter: '\r\n',
    skip_empty_lines: false,
  });
