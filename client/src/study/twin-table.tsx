import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { CodeSymbols } from '#shared/engine/rules/code-symbols.ts';
import type { TwinComparison, TwinValues } from '#shared/engine/twin.ts';
import { formatNumber, formatQuantity } from '#shared/print/format-quantity.ts';
import { unitLabel, type DisplayKind } from '#shared/print/units.ts';
import { TableFrame } from '#client/src/ui/table-frame.tsx';

interface TwinTableProps {
  readonly comparison: TwinComparison;
  readonly units: UnitSystem;
  readonly symbols: CodeSymbols;
  /** `top` or `bottom`: where the compression bars lie. */
  readonly compressionFace: 'top' | 'bottom';
}

interface TwinRow {
  readonly symbol: string;
  readonly name: string;
  readonly kind: DisplayKind;
  readonly of: (values: TwinValues) => number | null;
}

/** Design strength stands apart where a reduction makes it another number than that of the internal forces. */
const rowsOf = (s: CodeSymbols): readonly TwinRow[] => [
  { symbol: 'As', name: 'tension steel', kind: 'area', of: (v) => v.asMm2 },
  { symbol: s.compressionSteel, name: 'compression steel', kind: 'area', of: (v) => v.asPrimeMm2 },
  { symbol: s.axis, name: 'neutral axis', kind: 'length', of: (v) => v.neutralAxisMm },
  { symbol: 'εt', name: 'tension strain', kind: 'strain', of: (v) => v.tensionStrain },
  ...(s.nominalMoment === s.designMoment
    ? []
    : [
        {
          symbol: s.nominalMoment,
          name: 'nominal strength',
          kind: 'moment',
          of: (v) => v.nominalMomentNmm,
        } satisfies TwinRow,
      ]),
  { symbol: s.designMoment, name: 'design strength', kind: 'moment', of: (v) => v.designMomentNmm },
  { symbol: 'φy', name: 'yield curvature', kind: 'curvature', of: (v) => v.curvatureYieldPerMm },
  { symbol: 'φu', name: 'ultimate curvature', kind: 'curvature', of: (v) => v.curvatureUltimatePerMm },
  { symbol: 'μφ', name: 'closed form', kind: 'ratio', of: (v) => v.curvatureDuctility },
];
const CURVE_ROW: TwinRow = {
  symbol: 'μφ',
  name: 'full curve, the project’s measure',
  kind: 'ratio',
  of: (v) => v.curveDuctility,
};

/** `+12 %`, of the section against its twin; nothing where there is none to compare with. */
function changeText(own: number | null, twin: number | null): string {
  if (own === null || twin === null || twin === 0) return '';
  const percent = (own / twin - 1) * 100;
  const text = formatNumber(Math.abs(percent) < 0.05 ? 0 : percent, Math.abs(percent) < 10 ? 2 : 3, true);
  return `${percent >= 0.05 ? '+' : text === '0' ? '±' : ''}${text} %`;
}

/** The section beside the same without its compression steel: what that steel does, and what it does not. */
export function TwinTable({ comparison, units, symbols, compressionFace }: TwinTableProps) {
  const { section, twin, measure } = comparison;
  const rows = measure === 'closed' ? rowsOf(symbols) : [...rowsOf(symbols), CURVE_ROW];
  const print = (value: number | null, kind: DisplayKind) =>
    formatQuantity(value, kind, units, { hideUnit: true, digits: 4 });
  return (
    <div className="grid gap-2">
      <TableFrame label="Beside its singly reinforced twin">
        <thead>
          <tr>
            <th scope="col">
              <span className="sr-only">Quantity</span>
            </th>
            <th scope="col" className="figure">
              This section
            </th>
            <th scope="col" className="figure">
              No {compressionFace} bars
            </th>
            <th scope="col" className="figure">
              Change
            </th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={`${row.symbol} ${row.name}`}>
              <th scope="row" className="font-normal">
                <span className="font-medium">{row.symbol}</span>{' '}
                <span className="text-2xs text-muted">
                  {[row.name, unitLabel(row.kind, units)].filter((part) => part !== '').join(', ')}
                </span>
              </th>
              <td className="figure">{print(row.of(section), row.kind)}</td>
              <td className="figure">{print(row.of(twin), row.kind)}</td>
              <td className="figure text-muted">{changeText(row.of(section), row.of(twin))}</td>
            </tr>
          ))}
        </tbody>
      </TableFrame>
      <p className="text-xs text-muted">
        The twin is {comparison.twinIs}. {comparison.definition}.
      </p>
    </div>
  );
}
