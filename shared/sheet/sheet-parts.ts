import type { UnitSystem } from '../contract/design-basis.ts';
import type { Snapshot } from '../contract/records.ts';
import type { MomentLevel } from '../drawing/curve-plan.ts';
import { codeSymbols } from '../print/code-symbols.ts';
import { checkTable } from './check-table.ts';
import { curvePart } from './curve-part.ts';
import { ductilityTable } from './ductility-table.ts';
import { hingePart } from './hinge-part.ts';
import { layerTable } from './layer-table.ts';
import { Numbering } from './numbering.ts';
import { opinionTable } from './opinion-table.ts';
import { quantityTable } from './quantity-table.ts';
import { scatterTable } from './scatter-table.ts';
import type { NumberedLine, SheetPart } from './sheet.ts';
import { frozenStudies, type SheetStudies } from './sheet-studies.ts';
import { twinTable } from './twin-table.ts';
import { workingPart } from './working-parts.ts';

interface PartsWriting {
  readonly units: UnitSystem;
  readonly numbering: Numbering;
  readonly studies: SheetStudies;
}

/** The numbered parts of a sheet, from materials to quantities, in the order a checker works. */
export function sheetParts(snapshot: Snapshot, { units, numbering, studies }: PartsWriting): SheetPart[] {
  const { working, ruleSet } = snapshot.evaluation;
  const symbols = codeSymbols(ruleSet.id);
  const steps = (id: string, title: string, topics: Parameters<typeof workingPart>[1]): SheetPart => ({
    id,
    title,
    kind: 'working',
    lines: workingPart(working, topics, { units, numbering }),
  });
  const writing = { units, numbering, isFrozen: studies.isFrozen };
  const { curve = null, secondOpinion = null, twin = null, scatter = null } = studies.made ?? {};
  const parts = [
    steps('materials', 'Materials', ['materials']),
    steps('ultimate', 'Section at ultimate: axis and block', ['ultimate']),
    layerTable(snapshot, units, numbering),
    steps('residual', 'Equilibrium and strength', ['residual', 'strength']),
    steps('limits', 'Limits, spacing and shear', ['limits']),
    steps('elastic', 'Elastic section', ['elastic']),
    steps('ductility', 'Curvatures and ductility', ['ductility']),
    steps('more', 'Further working', 'rest'),
    curvePart(curve, { levels: levelsOf(snapshot), axis: symbols.axis }, writing),
    ductilityTable(curve, symbols, writing),
    hingePart(curve, writing),
    opinionTable(secondOpinion, writing),
    twinTable(twin, symbols, writing),
    scatter && scatterTable(scatter, symbols, writing),
    checkTable(snapshot, units, numbering),
    quantityTable(snapshot, units, numbering),
  ];
  return parts.filter(
    (part): part is SheetPart => part !== null && (part.kind !== 'working' || part.lines.length > 0),
  );
}

/** What the curve is held against, drawn over it. */
const levelsOf = ({ demand: { muNmm }, basis }: Snapshot): MomentLevel[] =>
  muNmm === null ? [] : [{ label: codeSymbols(basis.ruleSet).moment, momentNmm: muNmm }];

/** Lines as they are written for somebody who does not read the units. */
const plainParts = (snapshot: Snapshot): SheetPart[] =>
  sheetParts(snapshot, { units: 'si', numbering: new Numbering(), studies: frozenStudies(snapshot) });

export type NamedLine = NumberedLine & { readonly name: string };

/** Every line of the frozen numbers with a name to call it by. */
export const namedLines = (snapshot: Snapshot): NamedLine[] =>
  plainParts(snapshot).flatMap((part): readonly NamedLine[] =>
    part.kind === 'working'
      ? part.lines.map((line) => ({ ...line, name: line.symbol }))
      : part.table.rows.map((row) => ({ ...row, name: `${part.title}: ${row.cells[0]}` })),
  );

/** The sheet's numbers by line, in stored units: what an own value can be given for. The units of reading do not matter. */
export const comparableValues = (snapshot: Snapshot): ReadonlyMap<string, number> =>
  new Map(namedLines(snapshot).flatMap(({ id, value }) => (value === null ? [] : [[id, value] as const])));
