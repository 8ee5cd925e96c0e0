import type { CodeSymbols } from '../engine/rules/code-symbols.ts';
import type { TwinComparison, TwinValues } from '../engine/twin.ts';
import { formatNumber, formatQuantity } from '../print/format-quantity.ts';
import type { DisplayKind } from '../print/units.ts';
import type { StudyWriting } from './curve-part.ts';
import { figuresOf } from './figures.ts';
import type { SheetPart, SheetRow } from './sheet.ts';
import { figureColumn, wordColumn } from './table-column.ts';

type Compared = readonly [id: string, symbol: string, key: keyof TwinValues, kind: DisplayKind];

const comparedOf = ({ axis, nominalMoment, designMoment }: CodeSymbols): readonly Compared[] => [
  ['c', axis, 'neutralAxisMm', 'length'],
  ['strain', 'εt', 'tensionStrain', 'strain'],
  ['mn', nominalMoment, 'nominalMomentNmm', 'moment'],
  ...(designMoment === nominalMoment
    ? []
    : ([['phi-mn', designMoment, 'designMomentNmm', 'moment']] as const)),
  ['phi-y', 'φy', 'curvatureYieldPerMm', 'curvature'],
  ['phi-u', 'φu', 'curvatureUltimatePerMm', 'curvature'],
  ['mu-phi', 'μφ', 'curvatureDuctility', 'ratio'],
  ['mu-phi-curve', 'μφ of the full curve', 'curveDuctility', 'ratio'],
];

/** The section beside itself without compression steel. */
export function twinTable(
  comparison: TwinComparison | null,
  symbols: CodeSymbols,
  { units, numbering, isFrozen }: StudyWriting,
): SheetPart | null {
  if (!comparison) return null;
  const { section, twin, definition, twinIs } = comparison;
  const rowOf = ([id, symbol, key, kind]: Compared): SheetRow => {
    const [own, other] = [section[key], twin[key]];
    const print = (value: number | null, hideUnit = false) =>
      formatQuantity(value, kind, units, { digits: figuresOf(kind), hideUnit });
    return {
      id: `twin-${id}`,
      number: numbering.next(),
      value: isFrozen ? other : null,
      kind,
      cells: [
        symbol,
        print(own),
        print(other, true),
        own === null || other === null || other === 0 ? '' : formatNumber(own / other, 4),
      ],
    };
  };
  const steel = (value: number) => formatQuantity(value, 'area', units, { digits: 4 });
  return {
    id: 'twin',
    title: 'Beside its singly reinforced twin',
    kind: 'table',
    table: {
      columns: [
        wordColumn('Quantity'),
        figureColumn(`With ${symbols.compressionSteel}`),
        figureColumn('Without'),
        figureColumn('Ratio'),
      ],
      rows: comparedOf(symbols)
        .filter(([, , key]) => section[key] !== null || twin[key] !== null)
        .map(rowOf),
      remarks: [
        `${twinIs.charAt(0).toUpperCase()}${twinIs.slice(1)}; As ${steel(section.asMm2)}, ${symbols.compressionSteel} ${steel(section.asPrimeMm2)}. ${definition}.`,
      ],
      comparedColumn: 'Without',
    },
  };
}
