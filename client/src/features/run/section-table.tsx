import { useMemo, useState } from 'react';
import type { Point, FrontPoint } from '#shared/sweep/result.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { measureLabel } from '#client/src/lib/measure-labels.ts';
import { barsText, sizeText } from '#shared/print/section-text.ts';
import { toDisplay, unitLabel } from '#shared/print/units.ts';
import { Button } from '#client/src/ui/button.tsx';
import { SegmentedControl } from '#client/src/ui/segmented-control.tsx';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { columnDecimals } from './column-decimals.ts';
import type { MeasureReader } from './measure-text.ts';
import { sortRows, type RowKey, type RowOrder, type SectionRow } from './section-rows.ts';
import type { SectionSource } from './section-source.ts';

interface SectionTableProps {
  readonly front: readonly FrontPoint[];
  readonly band: readonly Point[];
  readonly isBandCut: boolean;
  readonly source: SectionSource;
  readonly reader: MeasureReader;
  readonly selectedIndex: number | null;
  readonly onSelect: (index: number) => void;
}

/** More rows than a screen or two are laid out only when asked for. */
const ROWS_AT_FIRST = 16;

interface Column {
  readonly key: RowKey;
  readonly head: string;
  readonly unit: string;
  readonly isText?: boolean;
  readonly cell: (row: SectionRow) => string;
}

function steelCell(row: SectionRow, face: 'tension' | 'compression', reader: MeasureReader): string {
  const { reinforcement } = row.section;
  if (reinforcement.kind === 'bars') return barsText(reinforcement[face]);
  const geometry = row.evaluation.geometry;
  return formatQuantity(face === 'tension' ? geometry?.asMm2 : geometry?.asPrimeMm2, 'area', reader.units);
}

const MEASURES = [
  'steelKgPerM',
  'costPerM',
  'curvatureDuctility',
  'designStrengthNmm',
  'utilisation',
] as const;

function measureColumn(
  measure: (typeof MEASURES)[number],
  reader: MeasureReader,
  rows: readonly SectionRow[],
): Column {
  const { units, currency } = reader;
  const label = measureLabel(measure, units);
  const shown = ({ evaluation }: SectionRow) => {
    const value = evaluation.measures[measure];
    return value === null ? null : toDisplay(value, label.kind, units);
  };
  const decimals = columnDecimals(rows.map(shown));
  return {
    key: measure,
    head: label.symbol,
    unit: label.kind === 'money-per-length' ? `${currency ?? ''}${label.unit}` : label.unit,
    cell: (row) =>
      shown(row)?.toLocaleString('en-US', {
        minimumFractionDigits: decimals,
        maximumFractionDigits: decimals,
      }) ?? '',
  };
}

function columnsFor(reader: MeasureReader, rows: readonly SectionRow[]): Column[] {
  const { units } = reader;
  const input = (key: 'width' | 'depth' | 'fc', head: string, kind: 'length' | 'stress'): Column => ({
    key,
    head,
    unit: unitLabel(kind, units),
    cell: ({ section }) =>
      formatQuantity(
        key === 'width' ? section.widthMm : key === 'depth' ? section.depthMm : section.fcMPa,
        kind,
        units,
        { hideUnit: true },
      ),
  });
  return [
    input('width', 'b', 'length'),
    input('depth', 'h', 'length'),
    input('fc', 'f′c', 'stress'),
    {
      key: 'tension',
      head: 'Bottom',
      unit: '',
      isText: true,
      cell: (row) => steelCell(row, 'tension', reader),
    },
    {
      key: 'compression',
      head: 'Top',
      unit: '',
      isText: true,
      cell: (row) => steelCell(row, 'compression', reader),
    },
    // Without rates, or for a reader who may not see them, a column of blanks would say nothing.
    ...MEASURES.filter((measure) => measure !== 'costPerM' || reader.currency !== null).map((measure) =>
      measureColumn(measure, reader, rows),
    ),
    { key: 'ties', head: 'Ties', unit: '', cell: (row) => (row.tieCount > 1 ? String(row.tieCount) : '') },
  ];
}

function useRows(
  props: SectionTableProps,
  list: 'front' | 'band',
  order: RowOrder | null,
): readonly SectionRow[] {
  const { front, band, source } = props;
  return useMemo(() => {
    const ties = new Map(front.map((point) => [point.index, point.tieCount]));
    const points = list === 'front' ? front : band;
    const rows = points.map((point) => ({
      ...source.evaluatedAt(point.index),
      tieCount: ties.get(point.index) ?? 1,
    }));
    return sortRows(rows, order);
  }, [front, band, source, list, order]);
}

/** The numbers behind the chart, for those who would rather read them, and for screen readers. */
export function SectionTable(props: SectionTableProps) {
  const { front, band, isBandCut, reader, selectedIndex, onSelect } = props;
  const [list, setList] = useState<'front' | 'band'>('front');
  const [order, setOrder] = useState<RowOrder | null>(null);
  const [isLong, setLong] = useState(false);
  const rows = useRows(props, list, order);
  const columns = useMemo(() => columnsFor(reader, rows), [reader, rows]);
  const shown = isLong ? rows : rows.slice(0, ROWS_AT_FIRST);

  const orderBy = (key: RowKey) =>
    setOrder((now) => {
      if (now?.key !== key) return { key, isDescending: false };
      return now.isDescending ? null : { key, isDescending: true };
    });
  const lists = [
    { value: 'front', label: `Front ${front.length}` },
    { value: 'band', label: `Near-best band ${isBandCut ? 'over ' : ''}${band.length}` },
  ] as const;

  return (
    <section aria-label="Sections as a table">
      <div className="flex flex-wrap items-baseline justify-between gap-3 pb-2">
        <h2 className="text-xs font-semibold text-muted">As a table</h2>
        <SegmentedControl legend="Sections listed" options={lists} value={list} onChange={setList} />
      </div>
      <TableFrame label={list === 'front' ? 'Sections on the front' : 'Sections in the near-best band'}>
        <thead>
          <tr>
            {columns.map((column) => {
              const isOrdered = order?.key === column.key;
              const mark = !isOrdered ? '' : order.isDescending ? ' ↓' : ' ↑';
              return (
                <th
                  key={column.key}
                  scope="col"
                  className={column.isText ? undefined : 'figure'}
                  aria-sort={isOrdered ? (order.isDescending ? 'descending' : 'ascending') : undefined}
                >
                  <button
                    type="button"
                    className="hover:text-ink hover:underline"
                    onClick={() => orderBy(column.key)}
                  >
                    {column.head}
                    {column.unit !== '' && <span className="block text-xs font-normal">{column.unit}</span>}
                    <span aria-hidden="true">{mark}</span>
                  </button>
                </th>
              );
            })}
          </tr>
        </thead>
        <tbody>
          {shown.map((row) => {
            const isChosen = row.index === selectedIndex;
            return (
              <tr
                key={row.index}
                aria-current={isChosen || undefined}
                className={`cursor-pointer hover:bg-concrete/40 ${isChosen ? 'bg-concrete shadow-[inset_3px_0_var(--steel)]' : ''}`}
                onClick={() => onSelect(row.index)}
              >
                {columns.map((column, k) => (
                  <td key={column.key} className={column.isText ? 'num whitespace-nowrap' : 'figure'}>
                    {k === 0 ? (
                      <button
                        type="button"
                        className={isChosen ? 'font-semibold' : 'underline decoration-rule'}
                        aria-label={`Look at ${sizeText(row.section, reader.units)}`}
                        onClick={() => onSelect(row.index)}
                      >
                        {column.cell(row)}
                      </button>
                    ) : (
                      column.cell(row)
                    )}
                  </td>
                ))}
              </tr>
            );
          })}
        </tbody>
      </TableFrame>
      {rows.length > shown.length && (
        <Button look="text" className="mt-2 text-sm" onClick={() => setLong(true)}>
          Show all {rows.length}
        </Button>
      )}
      {list === 'band' && band.length === 0 && (
        <p className="py-2 text-sm text-muted">The band is 0 % wide: widen it above the chart.</p>
      )}
    </section>
  );
}
