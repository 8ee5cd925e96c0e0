import type { CurveReport } from '../engine/curve-report.ts';
import type { CodeSymbols } from '../engine/rules/code-symbols.ts';
import type { DuctilityByConvention } from '../engine/ductility-conventions.ts';
import { formatQuantity } from '../print/format-quantity.ts';
import type { StudyWriting } from './curve-part.ts';
import type { SheetPart, SheetRow } from './sheet.ts';
import { figureColumn, unitColumn, wordColumn } from './table-column.ts';

/** Conventions of the closed form differ by what their label says; the rest of them is one sentence over the table. */
const CLOSED = 'closed-';

/** μφ under every convention, with the one held against the target marked. */
export function ductilityTable(
  curve: CurveReport | null,
  { axis, epsilonCu }: CodeSymbols,
  { units, numbering, isFrozen }: StudyWriting,
): SheetPart | null {
  if (!curve) return null;
  const curvature = (value: number | null) =>
    formatQuantity(value, 'curvature', units, { hideUnit: true, digits: 4 });
  const rowOf = (by: DuctilityByConvention): SheetRow => ({
    id: `ductility-${by.id}`,
    number: numbering.next(),
    value: isFrozen ? by.value : null,
    kind: 'ratio',
    cells: [
      `${by.label}${by.isMeasure ? ': held against the target' : ''}`,
      curvature(by.curvatureYieldPerMm),
      curvature(by.curvatureUltimatePerMm),
      by.value === null ? 'no yield' : formatQuantity(by.value, 'ratio', units, { digits: 4 }),
    ],
    note: by.id.startsWith(CLOSED) ? '' : by.definition,
    isStrong: by.isMeasure,
  });
  return {
    id: 'ductility-by-convention',
    title: 'Ductility under each convention',
    kind: 'table',
    table: {
      columns: [
        wordColumn('Convention'),
        unitColumn('φy', 'curvature', units),
        unitColumn('φu', 'curvature', units),
        figureColumn('μφ'),
      ],
      rows: curve.ductility.map(rowOf),
      remarks: [
        `μφ = φu/φy depends on what is called yield and ultimate, so it never stands without its convention. Closed form: φy = εy/(dt − kd), or with d at the centroid, of the cracked elastic section; φu = ${epsilonCu}/${axis} of the block.`,
      ],
      comparedColumn: 'μφ',
    },
  };
}
