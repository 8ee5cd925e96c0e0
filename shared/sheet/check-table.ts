import type { UnitSystem } from '../contract/design-basis.ts';
import type { Snapshot } from '../contract/records.ts';
import type { CheckResult } from '../engine/evaluation.ts';
import { checkLabel } from '../print/check-labels.ts';
import { formatNumber, formatQuantity } from '../print/format-quantity.ts';
import { quantitiesInText } from '../print/quantities-in-text.ts';
import { figuresOf } from './figures.ts';
import type { Numbering } from './numbering.ts';
import type { SheetPart } from './sheet.ts';

/** Every check as the engine judged it: demand, capacity, their ratio against 1, the clause. */
export function checkTable(snapshot: Snapshot, units: UnitSystem, numbering: Numbering): SheetPart {
  const print = (value: number | null, { kind }: CheckResult) =>
    formatQuantity(value, kind, units, { digits: figuresOf(kind) });
  return {
    id: 'checks',
    title: 'Checks',
    kind: 'table',
    table: {
      columns: [
        { label: 'Check', isFigure: false },
        { label: 'Demand', isFigure: true },
        { label: 'Capacity', isFigure: true },
        { label: 'Ratio', isFigure: true },
        { label: 'Result', isFigure: false },
        { label: 'Clause', isFigure: false },
      ],
      rows: snapshot.evaluation.checks.map((check) => ({
        id: `check-${check.id}`,
        number: numbering.next(),
        value: check.ratio,
        kind: 'ratio',
        cells: [
          `${checkLabel(check.id).name} ${checkLabel(check.id).symbol}`.trim(),
          print(check.demand, check),
          print(check.capacity, check),
          check.ratio === null ? '' : ratioText(check.ratio),
          check.passes ? 'meets' : 'fails',
          check.clause,
        ],
        passes: check.passes,
        note: quantitiesInText(check.reason, units),
      })),
      remarks: [
        'A ratio of 1.000 or less meets the check: demand over capacity, turned so that more is worse.',
      ],
      comparedColumn: 'Ratio',
    },
  };
}

/** Three decimals, and never `1.000` for a ratio that is past its limit. */
function ratioText(ratio: number): string {
  if (ratio > 99) return '> 99';
  if (ratio > 1 && ratio < 1.0005) return formatNumber(ratio, 7);
  return ratio.toFixed(3);
}
