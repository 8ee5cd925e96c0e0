import type { Paper } from '#shared/contract/endpoints.ts';
import type { SheetValue } from '#shared/contract/records.ts';
import { LARGE_SHEET } from '#shared/drawing/large-plan.ts';
import { OWN_VALUE_TOLERANCE, ownValueTexts } from '#shared/sheet/own-value.ts';
import type {
  KeyText,
  NumberedLine,
  Sheet,
  SheetPart,
  SheetTable,
  Signature,
  WorkingLine,
} from '#shared/sheet/sheet.ts';
import { symbolAndAmount, textRuns } from '#shared/sheet/text-runs.ts';
import { PdfFlow } from './pdf-flow.ts';
import { breakRuns, lineHeightPt, writeLines, type RunStyle } from './pdf-runs.ts';
import { drawSection } from './pdf-section-drawing.ts';
import { writeTable, type PdfParagraph, type PdfTable } from './pdf-table.ts';

export interface SheetFile {
  readonly sheet: Sheet;
  /** Own values of whoever checked it. */
  readonly ownValues: readonly SheetValue[];
  readonly paper: Paper;
  readonly writtenAt: Date;
  readonly footer: string;
  readonly isCompressed?: boolean;
}

/** A calculation sheet as a PDF: the same words and digits as the page. The same sheet is the same bytes. */
export function calculationSheetPdf(file: SheetFile): Promise<Buffer> {
  const { sheet, paper, writtenAt, footer, isCompressed = true } = file;
  const flow = new PdfFlow(paper, { title: sheet.title, writtenAt, footer }, isCompressed);
  writeTitle(flow, sheet);
  writeInputs(flow, sheet);
  for (const part of sheet.parts) writePart(flow, part, file);
  writeHeading(flow, 'Conventions');
  for (const text of sheet.conventions) writeText(flow, text, BODY);
  writeHeading(flow, 'Not checked');
  writeText(flow, `${sheet.notChecked.join('; ')}.`, BODY);
  writeHeading(flow, 'Caution');
  for (const text of sheet.caution) writeText(flow, text, { ...BODY, isBold: true });
  writeFrozen(flow, sheet);
  writeSignatures(flow, sheet.signatures);
  return flow.finish();
}

const BODY: RunStyle = { sizePt: 7.2 };

function writeText(flow: PdfFlow, text: string, style: RunStyle): void {
  const lines = breakRuns(flow, textRuns(text, { isProse: true }), flow.widthPt, style);
  const height = lines.length * lineHeightPt(style.sizePt);
  flow.ensure(height);
  writeLines(flow, lines, { xPt: flow.leftPt, yPt: flow.yPt, widthPt: flow.widthPt }, style);
  flow.yPt += height + 1.5;
}

/** A heading and at least two lines of what it heads stay together. */
const HEADING_PT = 9;
const KEPT_WITH_HEADING_PT = 60;

function writeHeading(flow: PdfFlow, text: string): void {
  flow.ensure(KEPT_WITH_HEADING_PT);
  flow.yPt += 5;
  flow.write(text, flow.leftPt, flow.yPt + HEADING_PT, { font: 'bold', sizePt: HEADING_PT });
  flow.yPt += HEADING_PT + 5;
}

function writeTitle(flow: PdfFlow, { title, subtitle, verdict }: Sheet): void {
  flow.write(title, flow.leftPt, flow.yPt + 13, { font: 'bold', sizePt: 13 });
  flow.write(subtitle, flow.leftPt, flow.yPt + 25, { sizePt: 8, colour: 'muted' });
  const mark = verdict.meets ? '✓' : '✕';
  flow.write(`${mark} ${verdict.text}`, flow.leftPt, flow.yPt + 38, {
    font: 'bold',
    sizePt: 8.5,
    colour: verdict.meets ? 'meets' : 'fails',
  });
  flow.yPt += 44;
  flow.rule(flow.yPt, { colour: 'ink', weightPt: 0.8 });
  flow.yPt += 6;
}

const DRAWING_SCALE = 0.66;

/** The drawing on the left, what went into the numbers on the right. */
function writeInputs(flow: PdfFlow, { drawing, inputs, units }: Sheet): void {
  const top = flow.yPt;
  drawSection(flow, { ...drawing, units }, { xPt: flow.leftPt - 8, yPt: top, scale: DRAWING_SCALE });
  const xPt = flow.leftPt + LARGE_SHEET.width * DRAWING_SCALE + 4;
  const widthPt = flow.leftPt + flow.widthPt - xPt;
  let yPt = top;
  for (const group of inputs) {
    flow.write(group.title, xPt, yPt + 8, { font: 'bold', sizePt: 7.6 });
    yPt = writeKeys(flow, group.items, { xPt, yPt: yPt + 11, widthPt }) + 3;
  }
  flow.yPt = Math.max(yPt, top + LARGE_SHEET.height * DRAWING_SCALE) + 2;
}

interface KeyBox {
  readonly xPt: number;
  readonly yPt: number;
  readonly widthPt: number;
}

/** Names on the left, values against the right edge. Answers where it ended. */
function writeKeys(flow: PdfFlow, items: readonly KeyText[], box: KeyBox): number {
  const style = { sizePt: 6.8 };
  let { yPt } = box;
  for (const { label, value } of items) {
    const name = breakRuns(flow, textRuns(label, { isProse: true }), box.widthPt * 0.4, style);
    const text = breakRuns(flow, textRuns(value, { isProse: true }), box.widthPt * 0.62, style);
    writeLines(flow, name, { ...box, yPt }, { ...style, colour: 'muted' });
    writeLines(flow, text, { ...box, yPt, isRight: true }, style);
    yPt += Math.max(name.length, text.length) * lineHeightPt(style.sizePt);
  }
  return yPt;
}

function writePart(flow: PdfFlow, part: SheetPart, file: SheetFile): void {
  writeHeading(flow, part.title);
  if (part.kind === 'working') {
    writeTable(flow, workingTable(part, file));
    return;
  }
  for (const remark of part.table.remarks) writeText(flow, remark, { sizePt: 6.6, colour: 'muted' });
  writeTable(flow, rowTable(part.table, file));
}

const OWN_COLUMN = { label: 'Own value', share: 10, isFigure: true } as const;

/** What the checker got, or an empty line to write on. */
function ownCell({ sheet, ownValues }: SheetFile, line: NumberedLine): PdfParagraph[] {
  return ownValueTexts(ownValues, line, sheet.units).flatMap(({ amount, difference, meets, word }) => [
    { text: amount },
    {
      text: `${meets ? '✓' : '≠'} ${word} ${difference}`.trim(),
      isSmall: true,
      colour: meets ? ('meets' as const) : ('fails' as const),
    },
  ]);
}

function workingTable(part: Extract<SheetPart, { kind: 'working' }>, file: SheetFile): PdfTable {
  return {
    columns: [
      { label: 'No.', share: 3.5, isFigure: true },
      { label: 'Formula', share: 40, isFigure: false },
      { label: 'Numbers put in', share: 35, isFigure: false },
      { label: 'Result', share: 15, isFigure: true },
      OWN_COLUMN,
      { label: 'Clause', share: 14, isFigure: false },
    ],
    rows: part.lines.map((line) => [
      [{ text: `${line.number}`, colour: 'muted' }],
      [
        { text: [line.symbol, line.relation, line.expression].join(' ').replace(' :', ':'), isFormula: true },
        { text: line.remark, isSmall: true, colour: 'muted' },
      ],
      [{ text: inputRuns(line) }],
      [{ text: unbroken(line.result), isBold: true }],
      ownCell(file, line),
      [{ text: line.clause, isSmall: true }],
    ]),
  };
}

/** A number and its unit stay on one line. */
const unbroken = (text: string) => text.replaceAll(' ', '\u00a0');

const COMMA = { text: ', ', isSymbol: false, isSub: false } as const;

const inputRuns = ({ inputs }: WorkingLine) =>
  inputs.flatMap(({ symbol, text }, i) => [...(i > 0 ? [COMMA] : []), ...symbolAndAmount(symbol, text)]);

/** Columns by their names where words need more room than figures do. */
const SHARE: Readonly<Record<string, number>> = {
  i: 3,
  Face: 11,
  Item: 22,
  From: 44,
  Amount: 14,
  Check: 38,
  Demand: 11,
  Capacity: 12,
  Result: 8,
  Clause: 20,
};
const FIGURE_SHARE = 9;

function rowTable(table: SheetTable, file: SheetFile): PdfTable {
  return {
    columns: [
      { label: 'No.', share: 4, isFigure: true },
      ...table.columns.map(({ label, isFigure }) => ({
        label,
        isFigure,
        share: SHARE[label] ?? FIGURE_SHARE,
      })),
      {
        ...OWN_COLUMN,
        label: `Own ${table.comparedColumn}`,
      },
    ],
    rows: table.rows.map((row) => [
      [{ text: `${row.number}`, colour: 'muted' as const }],
      ...row.cells.map((text, i) =>
        cellOf(row, text, { isFirst: i === 0, isFigure: table.columns[i]!.isFigure }),
      ),
      ownCell(file, row),
    ]),
  };
}

function cellOf(
  row: SheetTable['rows'][number],
  text: string,
  { isFirst, isFigure }: { readonly isFirst: boolean; readonly isFigure: boolean },
): PdfParagraph[] {
  const isVerdict = row.passes !== undefined && (text === 'meets' || text === 'fails');
  if (isVerdict)
    return [
      { text: `${row.passes ? '✓' : '✕'} ${text}`, isBold: true, colour: row.passes ? 'meets' : 'fails' },
    ];
  const note = isFirst ? (row.note ?? '') : '';
  return [{ text: isFigure ? unbroken(text) : text }, { text: note, isSmall: true, colour: 'muted' }];
}

function writeFrozen(flow: PdfFlow, { frozen }: Sheet): void {
  writeHeading(flow, 'Frozen with the pin');
  writeText(flow, frozen.map(({ label, value }) => `${label} ${value}`).join(' · '), BODY);
  writeText(
    flow,
    `An own value meets the sheet within ${100 * OWN_VALUE_TOLERANCE} % of it; the difference is (own − sheet)/sheet.`,
    { sizePt: 6.6, colour: 'muted' },
  );
}

const SIGNATURE_PT = 46;

function writeSignatures(flow: PdfFlow, signatures: readonly Signature[]): void {
  flow.ensure(SIGNATURE_PT);
  const gap = 14;
  const widthPt = (flow.widthPt - gap * (signatures.length - 1)) / signatures.length;
  signatures.forEach(({ role, name, date }, i) => {
    const xPt = flow.leftPt + i * (widthPt + gap);
    const lineY = flow.yPt + 30;
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
