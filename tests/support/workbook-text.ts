import { unzipSync, strFromU8 } from 'fflate';

export interface WorkbookCell {
  readonly value: string | number | null;
  /** Without the sign of equality; null where the cell holds a plain value. */
  readonly formula: string | null;
}

/** Cells by their name, as `B7`. */
export type SheetCells = ReadonlyMap<string, WorkbookCell>;

const unescape = (text: string): string =>
  text
    .replaceAll('&lt;', '<')
    .replaceAll('&gt;', '>')
    .replaceAll('&quot;', '"')
    .replaceAll('&apos;', "'")
    .replaceAll('&amp;', '&');
const textIn = (xml: string): string =>
  [...xml.matchAll(/<t(?:\s[^>]*)?>([^<]*)<\/t>/g)].map(([, text]) => unescape(text!)).join('');

/** Reads a workbook by unzipping it and looking at its XML: nothing of the library that wrote it. Sheets by name, in order. */
export function readWorkbook(bytes: Uint8Array): ReadonlyMap<string, SheetCells> {
  const files = Object.fromEntries(
    Object.entries(unzipSync(bytes)).map(([name, file]) => [name, strFromU8(file)]),
  );
  const shared = [...(files['xl/sharedStrings.xml'] ?? '').matchAll(/<si>(.*?)<\/si>/gs)].map(([, si]) =>
    textIn(si!),
  );
  const names = [...files['xl/workbook.xml']!.matchAll(/<sheet [^>]*name="([^"]*)"/g)].map(([, name]) =>
    unescape(name!),
  );
  return new Map(
    names.map((name, i) => [name, readSheet(files[`xl/worksheets/sheet${i + 1}.xml`]!, shared)]),
  );
}

function readSheet(xml: string, shared: readonly string[]): SheetCells {
  const cells = new Map<string, WorkbookCell>();
  for (const [, attributes, body = ''] of xml.matchAll(/<c ([^>]*?)(?:\/>|>(.*?)<\/c>)/gs)) {
    const name = /r="([A-Z]+\d+)"/.exec(attributes!)![1]!;
    const type = /t="(\w+)"/.exec(attributes!)?.[1] ?? 'n';
    const raw = /<v>([^<]*)<\/v>/.exec(body)?.[1];
    const formula = /<f>([^<]*)<\/f>/.exec(body)?.[1];
    const value =
      type === 'inlineStr'
        ? textIn(body)
        : raw === undefined || raw === ''
          ? null
          : type === 's'
            ? shared[Number(raw)]!
            : type === 'n'
              ? Number(raw)
              : unescape(raw);
    cells.set(name, { value, formula: formula === undefined ? null : unescape(formula) });
  }
  return cells;
}

const columnOf = (name: string): number =>
  [...name.replace(/\d/g, '')].reduce((all, letter) => all * 26 + letter.charCodeAt(0) - 64, 0) - 1;

/** A sheet as rows of values, blank cells as null. */
export function rowsOf(cells: SheetCells): (string | number | null)[][] {
  const rows: (string | number | null)[][] = [];
  for (const [name, { value }] of cells) {
    const row = (rows[Number(name.replace(/\D/g, '')) - 1] ??= []);
    row[columnOf(name)] = value;
  }
  return Array.from(rows, (row = []) => Array.from(row, (value = null) => value));
}
