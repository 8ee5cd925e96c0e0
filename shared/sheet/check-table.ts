import type { UnitSystem } from '../contract/design-basis.ts';
import type { Snapshot } from '../contract/records.ts';
import type { CheckResult } from '../engine/evaluation.ts';
import { checkLabel } from '../print/check-labels.ts';
import { formatQuantity } from '../print/format-quantity.ts';
import { quantitiesInText } from '../print/quantities-in-text.ts';
import { figuresOf } from './figures.ts';
import type { Numbering } from './numbering.ts';
import { ratioText } from './ratio-text.ts';
import type { SheetPart } from './sheet.ts';
import { figureColumn, verdictColumn, wordColumn } from './table-column.ts';

/** Every check as the engine judged it: demand, capacity, their ratio against 1, the clause. */
export function checkTable(snapshot: Snapshot, units: UnitSystem, numbering: Numbering): SheetPart {
  const print = (value: number | null, { kind }: CheckResult) =>
    formatQuantity(value, kind, units, { digits: figuresOf(kind) });
  const label = ({ id }: CheckResult) => checkLabel(id, snapshot.evaluation.ruleSet.id);
  return {
    id: 'checks',
    title: 'Checks',
    kind: 'table',
    table: {
      columns: [
        wordColumn('Check'),
        figureColumn('Demand'),
        figureColumn('Capacity'),
        figureColumn('Ratio'),
        verdictColumn('Result'),
        wordColumn('Clause'),
      ],
      rows: snapshot.evaluation.checks.map((check) => ({
        id: `check-${check.id}`,
        number: numbering.next(),
        value: check.ratio,
        kind: 'ratio',
        cells: [
          `${label(check).name} ${label(check).symbol}`.trim(),
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
