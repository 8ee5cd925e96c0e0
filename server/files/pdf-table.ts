import { textRuns, type TextRun } from '#shared/sheet/text-runs.ts';
import type { PdfColour, PdfFlow } from './pdf-flow.ts';
import { breakRuns, lineHeightPt, writeLines, type RunLine, type RunStyle } from './pdf-runs.ts';

export interface PdfColumn {
  readonly label: string;
  /** Share of the width; all of a table's are scaled to fill it. */
  readonly share: number;
  readonly isFigure: boolean;
}

/** A cell is paragraphs, one below the other; a formula's letters are symbols throughout, a sentence's only where marked. */
export interface PdfParagraph {
  readonly text: string | readonly TextRun[];
  readonly isFormula?: boolean;
  readonly isBold?: boolean;
  readonly isSmall?: boolean;
  readonly colour?: PdfColour;
}
type PdfCell = readonly PdfParagraph[];

export interface PdfTable {
  readonly columns: readonly PdfColumn[];
  readonly rows: readonly (readonly PdfCell[])[];
}

const SIZE_PT = 7.2;
const SMALL_PT = 6.2;
const HEAD_PT = 6.2;
const PADDING_PT = 1.6;
const GUTTER_PT = 7;

interface Laid {
  readonly lines: readonly RunLine[];
  readonly style: RunStyle;
}

/** A table of wrapped cells; its head is repeated on each page, and no row is split. */
export function writeTable(flow: PdfFlow, { columns, rows }: PdfTable): void {
  const widths = columnWidths(flow, columns);
  const first = rows[0] === undefined ? 0 : heightOf(layRow(flow, rows[0], widths));
  flow.ensure(headHeight + first);
  writeHead(flow, columns, widths);
  for (const row of rows) {
    const laid = layRow(flow, row, widths);
    const height = heightOf(laid);
    if (flow.ensure(height)) writeHead(flow, columns, widths);
    writeRow(flow, laid, columns, widths);
    flow.yPt += height;
    flow.rule(flow.yPt);
  }
  flow.yPt += 4;
}

const headHeight = lineHeightPt(HEAD_PT) + 2 * PADDING_PT;

function columnWidths(flow: PdfFlow, columns: readonly PdfColumn[]): number[] {
  const total = columns.reduce((sum, { share }) => sum + share, 0);
  const room = flow.widthPt - GUTTER_PT * (columns.length - 1);
  return columns.map(({ share }) => (room * share) / total);
}

function layRow(flow: PdfFlow, row: readonly PdfCell[], widths: readonly number[]): Laid[][] {
  return row.map((cell, i) =>
    cell
      .filter(({ text }) => text.length > 0)
      .map(({ text, isFormula = false, isBold = false, isSmall = false, colour }) => {
        const style = { sizePt: isSmall ? SMALL_PT : SIZE_PT, isBold, ...(colour ? { colour } : {}) };
        const runs = typeof text === 'string' ? textRuns(text, { isProse: !isFormula }) : text;
        return { lines: breakRuns(flow, runs, widths[i]!, style), style };
      }),
  );
}

const cellHeight = (cell: readonly Laid[]) =>
  cell.reduce((sum, { lines, style }) => sum + lines.length * lineHeightPt(style.sizePt), 0);

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
    for (const { lines, style } of cell) {
      writeLines(flow, lines, { xPt, yPt, widthPt: widths[i]!, isRight }, style);
      yPt += lines.length * lineHeightPt(style.sizePt);
    }
    xPt += widths[i]! + GUTTER_PT;
  });
}

function writeHead(flow: PdfFlow, columns: readonly PdfColumn[], widths: readonly number[]): void {
  const style = { sizePt: HEAD_PT, colour: 'muted' } as const;
  const head = columns.map(({ label }): Laid[] => [
    { lines: breakRuns(flow, textRuns(label, { isProse: true }), Infinity, style), style },
  ]);
  writeRow(flow, head, columns, widths);
  flow.yPt += headHeight;
  flow.rule(flow.yPt, { colour: 'ink', weightPt: 0.6 });
}
