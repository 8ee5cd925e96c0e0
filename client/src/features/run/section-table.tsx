import type { BoundsProof } from '#shared/sweep/result.ts';
import { useVirtualizer } from '@tanstack/react-virtual';
import { useEffect, useId, useMemo, useRef, type KeyboardEvent } from 'react';
import { sizeText } from '#shared/print/section-text.ts';
import { SegmentedControl } from '#client/src/ui/segmented-control.tsx';
import { ColumnChooser } from './column-chooser.tsx';
import type { ExploreKey } from '#shared/sweep/explore-axis.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import { allColumns, cellPrinter, shownColumns, type Column } from './row-columns.ts';
import { orderPart, type ListName } from './run-address.ts';
import { findRows, rowsOf, sortRows, type RowOrder, type SectionRow } from './section-rows.ts';
import type { SectionSource } from './section-source.ts';
import type { Shown } from './use-explore.ts';
import type { RunAddressControls } from './use-run-address.ts';

interface SectionTableProps {
  readonly shown: Shown;
  /** Of a run by bounds. */
  readonly bounds: BoundsProof | undefined;
  readonly keys: readonly ExploreKey[];
  readonly source: SectionSource;
  readonly reader: MeasureReader;
  readonly address: RunAddressControls;
  readonly selectedIndex: number | null;
}

const ROW_PX = 30;
const OVERSCAN = 8;

const STEP_OF_KEY: Readonly<Record<string, number>> = {
  ArrowDown: 1,
  ArrowUp: -1,
  PageDown: 10,
  PageUp: -10,
};

function orderOf(address: RunAddressControls, all: readonly Column[]): RowOrder | null {
  const column = all.find(({ key }) => key === address.order?.key);
  return column === undefined ? null : { key: column.key, isDescending: address.order!.isDescending };
}

/** Once up, once down, then as the front runs. */
function nextOrder(order: RowOrder | null, key: RowOrder['key']): RowOrder | null {
  if (order?.key !== key) return { key, isDescending: false };
  return order.isDescending ? null : { key, isDescending: true };
}

function Heads(props: {
  readonly columns: readonly Column[];
  readonly order: RowOrder | null;
  readonly onOrder: (order: RowOrder | null) => void;
}) {
  return (
    <thead className="sticky top-0 z-10 bg-paper shadow-[0_1px_0_var(--ink)]">
      <tr>
        {props.columns.map(({ key, head, unit, isText }) => {
          const order = props.order?.key === key ? props.order : null;
          const mark = order === null ? '' : order.isDescending ? ' ↓' : ' ↑';
          return (
            <th
              key={key}
              scope="col"
              className={isText ? undefined : 'figure'}
              aria-sort={order === null ? undefined : order.isDescending ? 'descending' : 'ascending'}
            >
              <button
                type="button"
                className="on-paper hover:text-ink hover:underline"
                onClick={() => props.onOrder(nextOrder(props.order, key))}
              >
                {head}
                {unit !== '' && <span className="block text-xs font-normal">{unit}</span>}
                <span aria-hidden="true">{mark}</span>
              </button>
            </th>
          );
        })}
      </tr>
    </thead>
  );
}

interface RowsProps {
  readonly rows: readonly SectionRow[];
  readonly columns: readonly Column[];
  readonly reader: MeasureReader;
  readonly label: string;
  readonly order: RowOrder | null;
  readonly selectedIndex: number | null;
  readonly onOrder: (order: RowOrder | null) => void;
  readonly onSelect: (index: number) => void;
}

/** Only the rows in sight are laid out; two empty ones hold the room of those above and below. */
function Rows(props: RowsProps) {
  const { rows, columns, reader, label, selectedIndex, onSelect } = props;
  const frame = useRef<HTMLDivElement>(null);
  const printers = useMemo(
    () => columns.map((column) => cellPrinter(column, rows, reader)),
    [columns, rows, reader],
  );
  // eslint-disable-next-line react-hooks/incompatible-library -- its functions are called here and passed nowhere
  const list = useVirtualizer({
    count: rows.length,
    getScrollElement: () => frame.current,
    estimateSize: () => ROW_PX,
    overscan: OVERSCAN,
  });
  const place = rows.findIndex((row) => row.index === selectedIndex);
  useEffect(() => {
    if (place >= 0) list.scrollToIndex(place, { align: 'auto' });
  }, [list, place]);
  const items = list.getVirtualItems();
  const above = items[0]?.start ?? 0;
  const below = list.getTotalSize() - (items.at(-1)?.end ?? 0);
  const stop = items.some((item) => item.index === place) ? place : (items[0]?.index ?? 0);

  const move = (event: KeyboardEvent) => {
    const step = STEP_OF_KEY[event.key];
    if (
      step === undefined ||
      !(event.target instanceof HTMLElement) ||
      event.target.dataset.row === undefined
    )
      return;
    event.preventDefault();
    const to = Math.min(Math.max(Number(event.target.dataset.row) + step, 0), rows.length - 1);
    onSelect(rows[to]!.index);
    list.scrollToIndex(to, { align: 'auto' });
    requestAnimationFrame(() => frame.current?.querySelector<HTMLElement>(`[data-row="${to}"]`)?.focus());
  };

  return (
    <div
      ref={frame}
      role="region"
      aria-label={label}
      tabIndex={0}
      className="relative max-h-[27rem] max-w-full overflow-auto"
      onKeyDown={move}
    >
      <table className="ledger [&_td]:py-1" aria-label={label} aria-rowcount={rows.length + 1}>
        <Heads columns={columns} order={props.order} onOrder={props.onOrder} />
        <tbody>
          {above > 0 && (
            <tr aria-hidden="true" style={{ height: above }}>
              <td colSpan={columns.length} />
            </tr>
          )}
          {items.map(({ index: at }) => {
            const row = rows[at];
            if (row === undefined) return null;
            const isChosen = at === place;
            return (
              <tr
                key={row.index}
                aria-rowindex={at + 2}
                aria-current={isChosen || undefined}
                style={{ height: ROW_PX }}
                className={`cursor-pointer hover:bg-concrete/40 ${isChosen ? 'bg-concrete shadow-[inset_3px_0_var(--steel)]' : ''}`}
                onClick={() => onSelect(row.index)}
              >
                {columns.map((column, k) => (
                  <td key={column.key} className={column.isText ? 'num whitespace-nowrap' : 'figure'}>
                    {k > 0 ? (
                      printers[k]!(row)
                    ) : (
                      <button
                        type="button"
                        data-row={at}
                        tabIndex={at === stop ? 0 : -1}
                        className={isChosen ? 'on-paper font-semibold' : 'on-paper underline decoration-rule'}
                        aria-label={`Look at ${sizeText(row.section, reader.units)}`}
                        onClick={() => onSelect(row.index)}
                      >
                        {printers[k]!(row)}
                      </button>
                    )}
                  </td>
                ))}
              </tr>
            );
          })}
          {below > 0 && (
            <tr aria-hidden="true" style={{ height: below }}>
              <td colSpan={columns.length} />
            </tr>
          )}
        </tbody>
      </table>
    </div>
  );
}

/** Why a run by bounds has no near-best band. */
const noBandWords = ({ isProven }: BoundsProof): string =>
  isProven
    ? 'By bounds no band is looked for where many sections share each value of the leading measure.'
    : 'By bounds the band is known once the search has ended.';

/** The numbers behind the chart, for those who would rather read them, and for screen readers. */
export function SectionTable(props: SectionTableProps) {
  const { shown, bounds, keys, source, reader, address, selectedIndex } = props;
  const { list, find: words, write, select } = address;
  const searchId = useId();
  const all = useMemo(() => allColumns(keys, reader, source.sectionAt(0)), [keys, reader, source]);
  const columns = useMemo(() => shownColumns(all, address.columns), [all, address.columns]);
  const order = orderOf(address, all);
  const { key: orderKey = null, isDescending = false } = order ?? {};
  const points = list === 'front' ? shown.listed : shown.band;
  const listed = useMemo(() => rowsOf(points, source), [points, source]);
  const rows = useMemo(
    () =>
      sortRows(
        findRows(listed, words, reader.units),
        orderKey === null ? null : { key: orderKey, isDescending },
      ),
    [listed, words, reader.units, orderKey, isDescending],
  );
  const lists: readonly { readonly value: ListName; readonly label: string }[] = [
    { value: 'front', label: `Front ${shown.listed.length}` },
    {
      value: 'band',
      label:
        bounds?.hasBand === false
          ? 'Near-best band: not found'
          : `Near-best band ${shown.isBandCut ? 'over ' : ''}${shown.band.length}`,
    },
  ];

  return (
    <section aria-label="Sections as a table">
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2 pb-2">
        <SegmentedControl
          legend="Sections listed"
          options={lists}
          value={list}
          onChange={(next) => write({ list: next === 'front' ? null : next })}
        />
        <span className="ml-auto flex items-center gap-2 text-sm text-muted print:hidden">
          <label htmlFor={searchId}>Find</label>
          <input
            id={searchId}
            type="search"
            value={words}
            placeholder={reader.units === 'us' ? '#8, 12 × 24' : '4-25, 300 × 600'}
            onChange={(event) => write({ find: event.target.value === '' ? null : event.target.value })}
            className="ruled num w-32 py-0.5 text-ink"
          />
        </span>
        <ColumnChooser
          all={all}
          shown={columns}
          onChange={(next) => write({ cols: next === null ? null : next.join(',') })}
        />
      </div>
      {rows.length > 0 ? (
        <Rows
          rows={rows}
          columns={columns}
          reader={reader}
          label={list === 'front' ? 'Sections on the front' : 'Sections in the near-best band'}
          order={order}
          selectedIndex={selectedIndex}
          onOrder={(next) => write(orderPart(next))}
          onSelect={select}
        />
      ) : (
        <p className="py-2 text-sm text-muted">
          {listed.length > 0
            ? 'No section listed has these bars or this size.'
            : list === 'band' && bounds?.hasBand === false
              ? noBandWords(bounds)
              : list === 'band' && address.bandShare === 0
                ? 'The band is 0 % wide: widen it above the chart.'
                : 'Nothing lies within the ranges set.'}
        </p>
      )}
    </section>
  );
}
