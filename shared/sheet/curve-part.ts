import type { UnitSystem } from '../contract/design-basis.ts';
import type { MomentLevel } from '../drawing/curve-plan.ts';
import type { CurveMark, CurveReport, LawText } from '../engine/curve-report.ts';
import { formatQuantity } from '../print/format-quantity.ts';
import { quantitiesInText } from '../print/quantities-in-text.ts';
import type { DisplayKind } from '../print/units.ts';
import { figuresOf } from './figures.ts';
import type { Numbering } from './numbering.ts';
import { residualText } from './residual-text.ts';
import type { SheetPart, SheetRow } from './sheet.ts';
import { unitColumn, wordColumn } from './table-column.ts';

/** What a part is written with: whose numbers it shows decides whether a checker's own can be kept against them. */
export interface StudyWriting {
  readonly units: UnitSystem;
  readonly numbering: Numbering;
  readonly isFrozen: boolean;
}

/** The full curve: its laws, the plot, and the marked points with what each is. */
export function curvePart(
  curve: CurveReport | null,
  { levels, axis }: { readonly levels: readonly MomentLevel[]; readonly axis: string },
  { units, numbering, isFrozen }: StudyWriting,
): SheetPart | null {
  if (!curve) return null;
  const print = (value: number | null, kind: DisplayKind) =>
    formatQuantity(value, kind, units, { hideUnit: true, digits: figuresOf(kind) });
  const strain = (value: number | null) => formatQuantity(value, 'strain', units, { digits: 3 });
  const rowOf = (mark: CurveMark, i: number): SheetRow => ({
    id: `curve-${mark.id}`,
    number: numbering.next(),
    value: isFrozen ? mark.curvaturePerMm : null,
    kind: 'curvature',
    cells: [
      `${i + 1} ${mark.label}`,
      print(mark.curvaturePerMm, 'curvature'),
      print(mark.momentNmm, 'moment'),
      print(mark.axisMm, 'length'),
      strain(mark.topStrain),
      strain(mark.tensionStrain),
    ],
  });
  return {
    id: 'curve',
    title: 'Full moment–curvature',
    kind: 'curve',
    plot: {
      curves: [{ label: '', points: curve.points, marks: curve.marks, corner: cornerOf(curve) }],
      levels,
      units,
    },
    table: {
      columns: [
        wordColumn('Point'),
        unitColumn('φ', 'curvature', units),
        unitColumn('M', 'moment', units),
        unitColumn(axis, 'length', units),
        unitColumn('εc', 'strain', units),
        unitColumn('εt', 'strain', units),
      ],
      rows: curve.marks.map(rowOf),
      remarks: curveRemarks(curve).map((text) => quantitiesInText(text, units)),
      comparedColumn: 'φ',
    },
  };
}

const cornerOf = ({ bilinear }: CurveReport) =>
  bilinear && { curvaturePerMm: bilinear.yieldCurvaturePerMm, momentNmm: bilinear.momentNmm };

function curveRemarks(curve: CurveReport): string[] {
  const { concrete, core, steel, marks, confinementNote, failsAtCracking, equilibriumResidual } = curve;
  return [
    lawText(core === null ? 'Concrete' : 'Cover', concrete),
    ...(core === null ? [] : [lawText('Core', core)]),
    lawText('Steel', steel),
    `Points: ${marks.map(({ label, definition }, i) => `${i + 1} ${label}, ${definition}`).join('; ')}.`,
    `Concrete is ${confinementNote}. εc is the strain of the compression face, shortening positive; εt that of the outermost tension layer. Equilibrium at the points leaves ${residualText(equilibriumResidual)} of the compression.`,
    ...(failsAtCracking
      ? ['The first crack takes more than the cracked section can carry: it fails as it cracks.']
      : []),
  ];
}

const lawText = (what: string, { name, formula, source }: LawText) =>
  `${what}: ${name}, ${formula} (${source}).`;
