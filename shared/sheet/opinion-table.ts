import type { OpinionLine, SecondOpinion } from '../engine/second-opinion.ts';
import { formatNumber, formatQuantity } from '../print/format-quantity.ts';
import type { StudyWriting } from './curve-part.ts';
import type { SheetPart, SheetRow } from './sheet.ts';
import { figureColumn, verdictColumn, wordColumn } from './table-column.ts';

/** Closed strength and the marks of the curve once more by strips, with every difference. */
export function opinionTable(
  opinion: SecondOpinion | null,
  { units, numbering, isFrozen }: StudyWriting,
): SheetPart | null {
  if (!opinion) return null;
  const rowOf = (line: OpinionLine): SheetRow => {
    const print = (value: number | null, hideUnit = false) =>
      value === null ? 'none' : formatQuantity(value, line.kind, units, { digits: 5, hideUnit });
    return {
      id: `opinion-${line.id}`,
      number: numbering.next(),
      value: isFrozen ? line.strips : null,
      kind: line.kind,
      cells: [
        line.label,
        print(line.value),
        print(line.strips, true),
        line.difference === null ? '' : percentText(line.difference),
        line.agrees ? 'agrees' : 'differs',
      ],
      passes: line.agrees,
      note: line.reason ?? '',
    };
  };
  return {
    id: 'second-opinion',
    title: 'Second algorithm',
    kind: 'table',
    table: {
      columns: [
        wordColumn('Value'),
        figureColumn('Sheet'),
        figureColumn('Strips'),
        figureColumn('Difference'),
        verdictColumn('Verdict'),
      ],
      rows: opinion.lines.map(rowOf),
      remarks: [
        `${capital(opinion.method)}; ${opinion.strips} strips for the curve. Agreement: ${allowedText(opinion)}.`,
      ],
      comparedColumn: 'Strips',
    },
  };
}

/** `moment within 0.5 %, curvature within 2 %`, as it was held to when it was worked out. */
const allowedText = ({ lines }: SecondOpinion): string =>
  [...new Map(lines.map(({ kind, tolerance }) => [kind, tolerance]))]
    .map(([kind, tolerance]) => `${kind} within ${formatNumber(100 * tolerance, 2, true)} %`)
    .join(', ');

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

/** Three decimals: agreement is usually far finer than what is allowed. */
function percentText(share: number): string {
  const digits = Math.abs(100 * share).toFixed(3);
  const sign = Number(digits) === 0 ? '±' : share < 0 ? '−' : '+';
  return `${sign}${digits} %`;
}
