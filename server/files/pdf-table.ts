import { textRuns, type TextRun } from '#shared/sheet/text-runs.ts';
import type { PdfColour, PdfFlow } from './pdf-flow.ts';
import {
  breakSegments,
  lineHeightPt,
  writeLines,
  type RunLine,
  type RunStyle,
  type Segment,
} from './pdf-runs.ts';

export interface PdfColumn {
  readonly label: string;
  /** Share of the width; all of a table's are scaled to fill it. */
  readonly share: number;
  readonly isFigure: boolean;
}

/** A piece of a cell; a formula's letters are symbols throughout, a sentence's only where marked. */
export interface PdfText {
  readonly text: string | readonly TextRun[];
  readonly isFormula?: boolean;
  readonly isBold?: boolean;
  readonly isSmall?: boolean;
  readonly colour?: PdfColour;
}

/** A cell is paragraphs, one below the other; what follows in a paragraph is set behind it. */
export interface PdfParagraph extends PdfText {
  readonly tail?: PdfText;
}
type PdfCell = readonly PdfParagraph[];

export interface PdfTable {
  readonly columns: readonly PdfColumn[];
  readonly rows: readonly (readonly PdfCell[])[];
}

const SIZE_PT = 7;
const SMALL_PT = 6.1;
const HEAD_PT = 6.1;
const PADDING_PT = 1.25;
const GUTTER_PT = 6;
const AFTER_PT = 3;

interface Laid {
  readonly lines: readonly RunLine[];
  readonly sizePt: number;
}

/** A table of wrapped cells; its head is repeated on each page, and no row is split. */
export function writeTable(flow: PdfFlow, { columns, rows }: PdfTable): void {
  const widths = columnWidths(flow.widthPt, columns);
  const first = rows[0] === undefined ? 0 : heightOf(layRow(flow, rows[0], widths));
  const head = layHead(flow, columns, widths);
  flow.ensure(heightOf(head) + first);
  writeHead(flow, head, columns, widths);
  for (const row of rows) {
    const laid = layRow(flow, row, widths);
    const height = heightOf(laid);
    if (flow.ensure(height)) writeHead(flow, head, columns, widths);
    writeRow(flow, laid, columns, widths);
    flow.yPt += height;
    flow.rule(flow.yPt);
  }
  flow.yPt += AFTER_PT;
}

/** What a table takes on one page at a width. */
export function tableHeightPt(flow: PdfFlow, { columns, rows }: PdfTable, widthPt: number): number {
  const widths = columnWidths(widthPt, columns);
  const headPt = heightOf(layHead(flow, columns, widths));
  return rows.reduce((sum, row) => sum + heightOf(layRow(flow, row, widths)), headPt + AFTER_PT);
}

function columnWidths(widthPt: number, columns: readonly PdfColumn[]): number[] {
  const total = columns.reduce((sum, { share }) => sum + share, 0);
  const room = widthPt - GUTTER_PT * (columns.length - 1);
  return columns.map(({ share }) => (room * share) / total);
}

const layRow = (flow: PdfFlow, row: readonly PdfCell[], widths: readonly number[]): Laid[][] =>
  row.map((cell, i) =>
    cell
      .filter(({ text, tail }) => text.length > 0 || (tail?.text.length ?? 0) > 0)
      .map((paragraph) => {
        const segments = [paragraph, ...(paragraph.tail ? [paragraph.tail] : [])]
          .filter(({ text }) => text.length > 0)
          .map(segmentOf);
        return { lines: breakSegments(flow, segments, widths[i]!), sizePt: segments[0]!.style.sizePt };
      }),
  );

function segmentOf({ text, isFormula = false, isBold = false, isSmall = false, colour }: PdfText): Segment {
  const style: RunStyle = { sizePt: isSmall ? SMALL_PT : SIZE_PT, isBold, ...(colour ? { colour } : {}) };
  return { runs: typeof text === 'string' ? textRuns(text, { isProse: !isFormula }) : text, style };
}

const cellHeight = (cell: readonly Laid[]) =>
  cell.reduce((sum, { lines, sizePt }) => sum + lines.length * lineHeightPt(sizePt), 0);

const heightOf = (row: readonly Laid[][]) => Math.max(...row.map(cellHeight)) + 2 * PADDING_PT;

function writeRow(
  flow: PdfFlow,
  row: readonly Laid[][],
  columns: readonly PdfColumn[],
  widths: readonly number[],
): void {
  let xPt = flow.leftPt;
  row.forEach((cell, i) => {
    let yPt = flow.yPt + PADDING_PT;
    const isRight = columns[i]!.isFigure;
    for (const { lines, sizePt } of cell) {
      writeLines(flow, lines, { xPt, yPt, widthPt: widths[i]!, isRight }, sizePt);
      yPt += lines.length * lineHeightPt(sizePt);
    }
    xPt += widths[i]! + GUTTER_PT;
  });
}

const layHead = (flow: PdfFlow, columns: readonly PdfColumn[], widths: readonly number[]): Laid[][] =>
  columns.map(({ label }, i) => {
    const style = { sizePt: HEAD_PT, colour: 'muted' } as const;
    const lines = breakSegments(flow, [{ runs: textRuns(label, { isProse: true }), style }], widths[i]!);
    return [{ lines, sizePt: HEAD_PT }];
  });

function writeHead(
  flow: PdfFlow,
  head: readonly Laid[][],
  columns: readonly PdfColumn[],
  widths: readonly number[],
): void {
  writeRow(flow, head, columns, widths);
  flow.yPt += heightOf(head);
  flow.rule(flow.yPt, { colour: 'ink', weightPt: 0.6 });
}
