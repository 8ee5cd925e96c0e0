import type { SheetValue } from '#shared/contract/records.ts';
import { ownValueTexts } from '#shared/sheet/own-value.ts';
import type { NumberedLine, Sheet, SheetRow, SheetTable, WorkingLine } from '#shared/sheet/sheet.ts';
import { symbolAndAmount } from '#shared/sheet/text-runs.ts';
import type { PdfColumn, PdfParagraph, PdfTable } from './pdf-table.ts';

/** What cells of a checker's own values are filled from. */
export interface OwnValues {
  readonly sheet: Pick<Sheet, 'units'>;
  /** Own values of whoever checked it. */
  readonly ownValues: readonly SheetValue[];
}

const OWN_COLUMN = { label: 'Own value', share: 14, isFigure: true } as const;

/** What the checker got, or an empty line to write on. */
function ownCell({ sheet, ownValues }: OwnValues, line: NumberedLine): PdfParagraph[] {
  return ownValueTexts(ownValues, line, sheet.units).flatMap(({ amount, difference, meets, word }) => [
    { text: amount },
    {
      text: unbroken(`${meets ? '✓' : '≠'} ${word} ${difference}`.trim()),
      isSmall: true,
      colour: meets ? ('meets' as const) : ('fails' as const),
    },
  ]);
}

/** Steps of the working: formula, numbers put in, result, room for the checker's own, clause. */
export const workingTable = (lines: readonly WorkingLine[], own: OwnValues): PdfTable => ({
  columns: [
    { label: 'No.', share: 3.2, isFigure: true },
    { label: 'Formula', share: 44, isFigure: false },
    { label: 'Numbers put in', share: 36, isFigure: false },
    { label: 'Result', share: 14, isFigure: true },
    OWN_COLUMN,
    { label: 'Clause', share: 19, isFigure: false },
  ],
  rows: lines.map((line) => [
    [{ text: `${line.number}`, colour: 'muted' }],
    [
      {
        text: [line.symbol, line.relation, line.expression].join(' ').replace(' :', ':'),
        isFormula: true,
        tail: { text: line.remark === '' ? '' : `\u00a0 ${line.remark}`, isSmall: true, colour: 'muted' },
      },
    ],
    [{ text: inputRuns(line) }],
    [{ text: unbroken(line.result), isBold: true }],
    ownCell(own, line),
    [{ text: line.clause, isSmall: true }],
  ]),
});

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
  From: 48,
  Amount: 14,
  Check: 23,
  Demand: 12,
  Capacity: 12,
  Ratio: 8,
  Result: 11,
  Verdict: 12,
  Clause: 25,
  Point: 17,
  Convention: 62,
  Value: 24,
  Sheet: 18,
  Strips: 10,
  Difference: 12,
  Quantity: 12,
  'With A′s': 18,
  'With As2': 18,
  Without: 12,
  Change: 34,
  Governs: 26,
  Line: 40,
};
const FIGURE_SHARE = 10;
const NOTE: PdfColumn = { label: 'Remark', share: 40, isFigure: false };
/** From so many notes on they have a column of their own. */
const MANY_NOTES = 4;

/** Layers, checks, quantities: one row each, with room for the checker's own of the column that is compared. */
export function rowTable({ columns, rows, comparedColumn }: SheetTable, own: OwnValues): PdfTable {
  const hasNotes = rows.filter(({ note = '' }) => note !== '').length >= MANY_NOTES;
  const ownLabel = comparedColumn === null ? null : `Own ${comparedColumn}`;
  return {
    columns: [
      { label: 'No.', share: 3.5, isFigure: true },
      ...columns.map(({ label, isFigure }) => ({ label, isFigure, share: SHARE[label] ?? FIGURE_SHARE })),
      ...(hasNotes ? [NOTE] : []),
      ...(ownLabel === null ? [] : [{ ...OWN_COLUMN, label: ownLabel }]),
    ],
    rows: rows.map((row) => [
      [{ text: `${row.number}`, colour: 'muted' as const }],
      ...row.cells.map((text, i) =>
        cellOf(row, text, { column: columns[i]!, isNoted: i === 0 && !hasNotes }),
      ),
      ...(hasNotes ? [[noteOf(row)]] : []),
      ...(ownLabel === null ? [] : [ownCell(own, row)]),
    ]),
  };
}

const noteOf = ({ note = '' }: SheetRow): PdfParagraph => ({ text: note, isSmall: true, colour: 'muted' });

function cellOf(
  row: SheetRow,
  text: string,
  { column, isNoted }: { readonly column: SheetTable['columns'][number]; readonly isNoted: boolean },
): PdfParagraph[] {
  if (column.isVerdict === true && row.passes !== undefined)
    return [
      {
        text: unbroken(`${row.passes ? '✓' : '✕'} ${text}`),
        isBold: true,
        colour: row.passes ? 'meets' : 'fails',
      },
    ];
  const paragraph: PdfParagraph = {
    text: column.isFigure ? unbroken(text) : text,
    isBold: row.isStrong === true,
  };
  return isNoted ? [paragraph, noteOf(row)] : [paragraph];
}
