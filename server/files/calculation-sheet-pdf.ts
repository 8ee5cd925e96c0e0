import type { Paper } from '#shared/contract/endpoints.ts';
import { CURVE_SHEET } from '#shared/drawing/curve-plan.ts';
import { OWN_VALUE_TOLERANCE } from '#shared/sheet/own-value.ts';
import type { Sheet, SheetPart, Signature } from '#shared/sheet/sheet.ts';
import { textRuns } from '#shared/sheet/text-runs.ts';
import { drawCurvePlot } from './pdf-curve-plot.ts';
import { PdfFlow, type PdfBox } from './pdf-flow.ts';
import { breakSegments, lineHeightPt, writeLines, type RunStyle } from './pdf-runs.ts';
import { writeInputs, writeTitle } from './pdf-sheet-head.ts';
import { rowTable, workingTable, type OwnValues } from './pdf-sheet-tables.ts';
import { tableHeightPt, writeTable, type PdfTable } from './pdf-table.ts';

export interface SheetFile extends OwnValues {
  readonly sheet: Sheet;
  readonly paper: Paper;
  readonly writtenAt: Date;
  readonly footer: string;
  readonly isCompressed?: boolean;
}

/** A sheet that runs over is set again a little smaller, and no smaller than the last: that still reads on paper. */
const DENSITIES = [1, 0.94, 0.88] as const;
const MOST_PAGES = 4;

/** A calculation sheet as a PDF: the same words and digits as the page. The same sheet is the same bytes. */
export function calculationSheetPdf(file: SheetFile): Promise<Buffer> {
  let flow = writeSheet(file, DENSITIES[0]);
  for (const density of DENSITIES.slice(1)) if (flow.pageCount > MOST_PAGES) flow = writeSheet(file, density);
  return flow.finish();
}

function writeSheet(file: SheetFile, density: number): PdfFlow {
  const { sheet, paper, writtenAt, footer, isCompressed = true } = file;
  const flow = new PdfFlow(paper, { title: sheet.title, writtenAt, footer }, { isCompressed, density });
  writeTitle(flow, sheet);
  writeInputs(flow, sheet);
  for (const parts of paired(sheet.parts))
    if (parts.length === 2) writePair(flow, parts, file);
    else for (const part of parts) writePart(flow, part, file);
  writeWords(flow, sheet);
  writeFrozen(flow, sheet);
  writeSignatures(flow, sheet.signatures);
  return flow;
}

const BODY: RunStyle = { sizePt: 6.6 };
const SMALL: RunStyle = { sizePt: 6.3, colour: 'muted' };
const PARAGRAPH_GAP_PT = 1.2;

const linesOf = (flow: PdfFlow, text: string, style: RunStyle, widthPt: number) =>
  breakSegments(flow, [{ runs: textRuns(text, { isProse: true }), style }], widthPt);

const textHeightPt = (flow: PdfFlow, text: string, style: RunStyle, widthPt: number) =>
  linesOf(flow, text, style, widthPt).length * lineHeightPt(style.sizePt) + PARAGRAPH_GAP_PT;

function writeText(flow: PdfFlow, text: string, style: RunStyle): void {
  const lines = linesOf(flow, text, style, flow.widthPt);
  const height = lines.length * lineHeightPt(style.sizePt);
  flow.ensure(height);
  writeLines(flow, lines, { xPt: flow.leftPt, yPt: flow.yPt, widthPt: flow.widthPt }, style.sizePt);
  flow.yPt += height + PARAGRAPH_GAP_PT;
}

/** A heading and at least two lines of what it heads stay together. */
const HEADING_PT = 8.6;
const HEADING_ROOM_PT = HEADING_PT + 7.5;
const KEPT_WITH_HEADING_PT = 56;

function writeHeading(flow: PdfFlow, text: string): void {
  flow.ensure(KEPT_WITH_HEADING_PT);
  flow.yPt += 4;
  flow.write(text, flow.leftPt, flow.yPt + HEADING_PT, { font: 'bold', sizePt: HEADING_PT });
  flow.yPt += HEADING_ROOM_PT - 4;
}

/** Narrow tables stand side by side where both are there. */
const PAIRS: Readonly<Record<string, string>> = { 'second-opinion': 'twin' };

function paired(parts: readonly SheetPart[]): SheetPart[][] {
  const groups: SheetPart[][] = [];
  for (const part of parts) {
    const before = groups.at(-1);
    if (before?.length === 1 && PAIRS[before[0]!.id] === part.id) before.push(part);
    else groups.push([part]);
  }
  return groups;
}

type Own = SheetFile;

const tableOf = (part: SheetPart, own: Own): PdfTable =>
  part.kind === 'working' ? workingTable(part.lines, own) : rowTable(part.table, own);

const remarksOf = (part: SheetPart) => (part.kind === 'working' ? [] : part.table.remarks);

function writePart(flow: PdfFlow, part: SheetPart, own: Own): void {
  if (part.kind === 'curve') {
    writeCurve(flow, part, own);
    return;
  }
  writeHeading(flow, part.title);
  for (const remark of remarksOf(part)) writeText(flow, remark, SMALL);
  writeTable(flow, tableOf(part, own));
}

const PAIR_GAP_PT = 16;
const FIRST_OF_PAIR = 0.57;

function writePair(flow: PdfFlow, parts: readonly SheetPart[], own: Own): void {
  const room = flow.widthPt - PAIR_GAP_PT;
  const boxes: readonly PdfBox[] = [
    { leftPt: flow.leftPt, widthPt: room * FIRST_OF_PAIR },
    { leftPt: flow.leftPt + room * FIRST_OF_PAIR + PAIR_GAP_PT, widthPt: room * (1 - FIRST_OF_PAIR) },
  ];
  const heights = parts.map(
    (part, i) =>
      HEADING_ROOM_PT +
      remarksOf(part).reduce((sum, text) => sum + textHeightPt(flow, text, SMALL, boxes[i]!.widthPt), 0) +
      tableHeightPt(flow, tableOf(part, own), boxes[i]!.widthPt),
  );
  flow.ensure(Math.max(...heights));
  flow.beside(boxes, (i) => writePart(flow, parts[i]!, own));
}

const PLOT_SCALE = 0.55;
const PLOT_GAP_PT = 10;

/** The plot on the left, its marked points beside it, under the laws and definitions. */
function writeCurve(flow: PdfFlow, part: Extract<SheetPart, { kind: 'curve' }>, own: Own): void {
  const plotWidthPt = CURVE_SHEET.width * PLOT_SCALE;
  const leftPt = flow.leftPt + plotWidthPt + PLOT_GAP_PT;
  const besidePlot = { leftPt, widthPt: flow.leftPt + flow.widthPt - leftPt };
  const table = tableOf(part, own);
  const text = part.table.remarks.reduce((sum, t) => sum + textHeightPt(flow, t, SMALL, flow.widthPt), 0);
  const plotPt = CURVE_SHEET.height * PLOT_SCALE;
  flow.ensure(HEADING_ROOM_PT + text + Math.max(plotPt, tableHeightPt(flow, table, besidePlot.widthPt)));
  writeHeading(flow, part.title);
  for (const remark of part.table.remarks) writeText(flow, remark, SMALL);
  flow.beside([{ leftPt: flow.leftPt, widthPt: plotWidthPt }, besidePlot], (i) => {
    if (i === 1) writeTable(flow, table);
    else {
      drawCurvePlot(flow, part.plot, { xPt: flow.leftPt, yPt: flow.yPt, scale: PLOT_SCALE });
      flow.yPt += plotPt;
    }
  });
}

const WORDS_GAP_PT = 16;
const CONVENTIONS_SHARE = 0.6;

/** How the numbers are to be read, beside what is not checked and the caution. */
function writeWords(flow: PdfFlow, { conventions, notChecked, caution }: Sheet): void {
  const room = flow.widthPt - WORDS_GAP_PT;
  const [first, second] = [room * CONVENTIONS_SHARE, room * (1 - CONVENTIONS_SHARE)];
  const unchecked = `${notChecked.join('; ')}.`;
  const bold = { ...BODY, isBold: true };
  const heightOf = (texts: readonly (readonly [string, RunStyle])[], widthPt: number) =>
    texts.reduce((sum, [text, style]) => sum + textHeightPt(flow, text, style, widthPt), HEADING_ROOM_PT);
  const left = heightOf(
    conventions.map((text) => [text, BODY]),
    first,
  );
  const right =
    heightOf([[unchecked, BODY]], second) +
    heightOf(
      caution.map((text) => [text, bold]),
      second,
    );
  flow.ensure(Math.max(left, right));
  const boxes = [
    { leftPt: flow.leftPt, widthPt: first },
    { leftPt: flow.leftPt + first + WORDS_GAP_PT, widthPt: second },
  ];
  flow.beside(boxes, (i) => {
    writeHeading(flow, i === 0 ? 'Conventions' : 'Not checked');
    if (i === 0) for (const text of conventions) writeText(flow, text, BODY);
    else {
      writeText(flow, unchecked, BODY);
      writeHeading(flow, 'Caution');
      for (const text of caution) writeText(flow, text, bold);
    }
  });
}

const SIGNATURE_PT = 42;

/** Frozen versions stand on the page of the signatures. */
function writeFrozen(flow: PdfFlow, { frozen }: Sheet): void {
  flow.ensure(KEPT_WITH_HEADING_PT + SIGNATURE_PT);
  writeHeading(flow, 'Frozen with the pin');
  writeText(flow, frozen.map(({ label, value }) => `${label} ${value}`).join(' · '), BODY);
  writeText(
    flow,
    `An own value meets the sheet within ${100 * OWN_VALUE_TOLERANCE} % of it; the difference is (own − sheet)/sheet.`,
    SMALL,
  );
}

function writeSignatures(flow: PdfFlow, signatures: readonly Signature[]): void {
  flow.ensure(SIGNATURE_PT);
  const gap = 14;
  const widthPt = (flow.widthPt - gap * (signatures.length - 1)) / signatures.length;
  signatures.forEach(({ role, name, date }, i) => {
    const xPt = flow.leftPt + i * (widthPt + gap);
    const lineY = flow.yPt + 28;
    flow.write([name, date].filter((text) => text !== '').join(', '), xPt, lineY - 3, { sizePt: 7.2 });
    flow.doc
      .moveTo(xPt, lineY)
      .lineTo(xPt + widthPt, lineY)
      .lineWidth(0.6)
      .strokeColor('#1e2629')
      .stroke();
    flow.write(`${role}: name, signature, date`, xPt, lineY + 9, { sizePt: 6.2, colour: 'muted' });
  });
  flow.yPt += SIGNATURE_PT;
}
