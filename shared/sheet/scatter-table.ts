import type { UnitSystem } from '../contract/design-basis.ts';
import type { CheckId } from '../engine/evaluation.ts';
import type { CodeSymbols } from '../engine/rules/code-symbols.ts';
import type { Scatter, ScatterOutcome, ScatterVariant } from '../engine/scatter.ts';
import { checkLabel } from '../print/check-labels.ts';
import { formatNumber, formatQuantity } from '../print/format-quantity.ts';
import type { StudyWriting } from './curve-part.ts';
import { ratioText } from './ratio-text.ts';
import type { SheetPart, SheetRow } from './sheet.ts';
import { figureColumn, unitColumn, verdictColumn, wordColumn } from './table-column.ts';

/** Whether the section still meets its checks where execution strays from the drawing. */
export function scatterTable(
  scatter: Scatter,
  symbols: CodeSymbols,
  { units, numbering, isFrozen }: StudyWriting,
): SheetPart {
  const rowOf = (id: string, name: string, outcome: ScatterOutcome | null, note: string): SheetRow => ({
    id: `scatter-${id}`,
    number: numbering.next(),
    value: isFrozen ? (outcome?.governing?.ratio ?? null) : null,
    kind: 'ratio',
    cells: [name, ...outcomeCells(outcome, units)],
    ...(outcome === null ? {} : { passes: outcome.meetsListedChecks }),
    note,
  });
  return {
    id: 'scatter',
    title: 'Scatter in execution',
    kind: 'table',
    table: {
      columns: [
        wordColumn('Change'),
        unitColumn(symbols.designMoment, 'moment', units),
        figureColumn('μφ'),
        wordColumn('Governs'),
        figureColumn('Ratio'),
        verdictColumn('Result'),
      ],
      rows: [
        rowOf('as-drawn', 'No change', scatter.asDrawn, ''),
        ...scatter.variants.map((variant) =>
          rowOf(
            `${variant.id}${variant.id === 'bar-oversize' ? `-${variant.to}` : ''}`,
            changeText(variant, symbols.fc, units),
            variant.outcome,
            noteOf(variant),
          ),
        ),
      ],
      remarks: [
        `One change at a time, everything else as drawn (common practice, no source for the amounts): the bars of both faces move with the cover; ${symbols.fc} stands for the concrete as it came; bars are fitted with their deformations. ${
          scatter.holds
            ? 'The section meets its listed checks in every case.'
            : 'The section does not meet its listed checks in every case.'
        }`,
      ],
      comparedColumn: 'Ratio',
    },
  };
}

function noteOf({ outcome, newlyFailing, note }: ScatterVariant): string {
  if (outcome === null) return note;
  return newlyFailing.length === 0 ? '' : `fails ${newlyFailing.map(checkName).join(', ')}`;
}

const checkName = (id: CheckId) => checkLabel(id).name.toLowerCase();

const outcomeCells = (outcome: ScatterOutcome | null, units: UnitSystem): string[] =>
  outcome === null
    ? ['', '', '', '', 'not possible']
    : [
        formatQuantity(outcome.designMomentNmm, 'moment', units, { digits: 5, hideUnit: true }),
        outcome.curvatureDuctility === null ? '' : formatNumber(outcome.curvatureDuctility, 4),
        outcome.governing === null ? '' : checkLabel(outcome.governing.id).name,
        outcome.governing === null ? '' : ratioText(outcome.governing.ratio),
        outcome.meetsListedChecks ? 'meets' : 'fails',
      ];

function changeText({ id, from, to }: ScatterVariant, fc: string, units: UnitSystem): string {
  if (id === 'bar-oversize') return `Bars ${formatNumber(to, 3)} of their size over the deformations`;
  const isCover = id === 'cover-less' || id === 'cover-more';
  const kind = isCover ? 'length' : 'stress';
  const print = (value: number, hideUnit = false) => formatQuantity(value, kind, units, { hideUnit });
  return `${isCover ? 'Cover' : fc} ${print(from, true)} → ${print(to)}`;
}
