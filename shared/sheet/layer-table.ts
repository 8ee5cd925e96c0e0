import type { UnitSystem } from '../contract/design-basis.ts';
import type { Snapshot } from '../contract/records.ts';
import type { LayerState } from '../engine/evaluation.ts';
import { codeSymbols } from '../print/code-symbols.ts';
import { formatQuantity } from '../print/format-quantity.ts';
import type { DisplayKind } from '../print/units.ts';
import { figuresOf } from './figures.ts';
import type { Numbering } from './numbering.ts';
import type { SheetPart } from './sheet.ts';
import { figureColumn, unitColumn, wordColumn } from './table-column.ts';

/** Strain, stress and force of every layer at ultimate, with each force's moment about the compression face. */
export function layerTable(snapshot: Snapshot, units: UnitSystem, numbering: Numbering): SheetPart | null {
  const { flexure } = snapshot.evaluation;
  if (flexure === null) return null;
  const symbols = codeSymbols(snapshot.evaluation.ruleSet.id);
  const print = (value: number, kind: DisplayKind) =>
    formatQuantity(value, kind, units, { hideUnit: true, digits: figuresOf(kind) });
  const cellsOf = (layer: LayerState, i: number) => [
    `${i + 1}`,
    layer.face,
    print(layer.depthMm, 'length'),
    print(layer.areaMm2, 'area'),
    print(layer.strain, 'strain'),
    print(layer.stressMPa, 'stress'),
    layer.yields ? 'yields' : 'elastic',
    layer.displacedConcreteDeducted ? 'deducted' : '–',
    print(layer.forceN, 'force'),
    print(layer.forceN * layer.depthMm, 'moment'),
  ];
  return {
    id: 'layers',
    title: 'Layers at ultimate',
    kind: 'table',
    table: {
      columns: [
        figureColumn('i'),
        wordColumn('Face'),
        unitColumn('d', 'length', units),
        unitColumn('A', 'area', units),
        figureColumn('ε'),
        unitColumn('fs', 'stress', units),
        wordColumn('Steel'),
        wordColumn('Displaced'),
        unitColumn('T', 'force', units),
        unitColumn('T d', 'moment', units),
      ],
      rows: flexure.layers.map((layer, i) => ({
        id: `force-${i + 1}`,
        number: numbering.next(),
        value: layer.forceN,
        kind: 'force',
        cells: cellsOf(layer, i),
      })),
      remarks: [
        `ε = ${symbols.epsilonCu} (d − ${symbols.axis})/${symbols.axis}; fs = Es ε, within ±${symbols.fyDesign}; T = A fs, or A (fs + ${symbols.blockStress}) where the concrete a bar displaces is deducted. Tension is positive.`,
      ],
      comparedColumn: 'T',
    },
  };
}
