import { useMemo } from 'react';
import type { Run } from '#shared/contract/records.ts';
import { exploreValue, type ExploreKey } from '#shared/sweep/explore-axis.ts';
import { exploreLabel, exploreTitle } from '#shared/print/explore-label.ts';
import { snapValues } from './explore-keys.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import { useElementSize } from '#client/src/charts/use-element-size.ts';
import { AXIS_HEAD_PX, AXIS_PAD_PX, AXIS_PX, RangeAxis } from './range-axis.tsx';
import { withRange } from '#shared/sweep/range-filters.ts';
import { listedSpread, shareOn, type RangeScale } from './range-scale.ts';
import { rowsOf } from './section-rows.ts';
import type { EvaluatedSection, SectionSource } from './section-source.ts';
import type { Spread } from './cut.ts';
import type { Explore } from './use-explore.ts';
import type { RunAddressControls } from './use-run-address.ts';

interface RangesPanelProps {
  readonly run: Run;
  readonly explore: Explore;
  readonly keys: readonly ExploreKey[];
  readonly axes: readonly ExploreKey[];
  readonly source: SectionSource;
  readonly reader: MeasureReader;
  readonly address: RunAddressControls;
  readonly selected: EvaluatedSection | null;
}

interface DrawnAxis {
  readonly key: ExploreKey;
  readonly spread: Spread;
  readonly scale: RangeScale;
}

/** An axis takes its part of the width there is, within these. */
const NARROWEST_PX = 68;
const WIDEST_PX = 124;

/** A section as a line from axis to axis; broken where it has no value. */
function linePath(row: EvaluatedSection, axes: readonly DrawnAxis[], columnPx: number): string {
  let isPenUp = true;
  return axes
    .map(({ key, scale }, k) => {
      const value = exploreValue(row, key);
      if (value === null) {
        isPenUp = true;
        return '';
      }
      const y = AXIS_HEAD_PX + AXIS_PAD_PX + (1 - shareOn(scale, value)) * AXIS_PX;
      const command = isPenUp ? 'M' : 'L';
      isPenUp = false;
      return `${command}${((k + 0.5) * columnPx).toFixed(1)} ${y.toFixed(1)}`;
    })
    .join('');
}

function Lines(props: {
  readonly axes: readonly DrawnAxis[];
  readonly columnPx: number;
  readonly front: readonly EvaluatedSection[];
  readonly band: readonly EvaluatedSection[];
  readonly selected: EvaluatedSection | null;
}) {
  const { axes, columnPx, front, band, selected } = props;
  const path = (rows: readonly EvaluatedSection[]) =>
    rows.map((row) => linePath(row, axes, columnPx)).join('');
  const height = AXIS_HEAD_PX + AXIS_PX + 2 * AXIS_PAD_PX;
  return (
    <svg
      aria-hidden="true"
      className="pointer-events-none absolute top-0 left-0 fill-none"
      width={axes.length * columnPx}
      height={height}
    >
      <path d={path(band)} className="stroke-near-mark" opacity={0.3} />
      <path d={path(front)} className="stroke-ink" opacity={0.45} />
      {selected !== null && (
        <path
          d={linePath(selected, axes, columnPx)}
          className="stroke-steel"
          strokeWidth={2}
          strokeLinejoin="round"
        />
      )}
    </svg>
  );
}

function useAxes({ run, explore, axes, source }: RangesPanelProps): readonly DrawnAxis[] {
  const { spreads, shown, state } = explore;
  return useMemo(() => {
    const listed =
      state === 'stored-only'
        ? rowsOf(
            [...shown.outline, ...shown.front, ...shown.band].map((point) => ({ ...point, tieCount: 1 })),
            source,
          )
        : [];
    return axes.flatMap((key) => {
      const spread = spreads[key] ?? listedSpread(listed, key);
      if (spread === null || !(spread.high >= spread.low)) return [];
      const scale = { low: spread.low, high: spread.high, snap: snapValues(key, source.space, run) };
      return [{ key, spread, scale }];
    });
  }, [axes, spreads, shown, state, source, run]);
}

function AxisChoice({ keys, axes, reader, address }: RangesPanelProps) {
  return (
    <details className="relative text-sm print:hidden">
      <summary className="px-1 py-0.5 underline decoration-concrete-edge hover:decoration-current">
        Axes
      </summary>
      <div className="absolute right-0 z-20 mt-1 grid w-60 gap-0.5 border border-ink bg-sheet p-3">
        {keys.map((key) => (
          <label key={key} className="flex min-h-6 items-center gap-2">
            <input
              type="checkbox"
              className="size-4 accent-steel-solid"
              checked={axes.includes(key)}
              onChange={() => {
                const next = keys.filter((one) => (one === key ? !axes.includes(one) : axes.includes(one)));
                address.write({ axes: next.length === 0 ? null : next.join(',') });
              }}
            />
            {exploreTitle(exploreLabel(key, reader))}
          </label>
        ))}
      </div>
    </details>
  );
}

/** What a section is made of and comes to, side by side: each line a section, each bracket an end of a range. */
export function RangesPanel(props: RangesPanelProps) {
  const { explore, source, reader, selected } = props;
  const { filters, setFilters, shown, state } = explore;
  const axes = useAxes(props);
  const [frame, size] = useElementSize<HTMLElement>();
  const columnPx = Math.min(WIDEST_PX, Math.max(NARROWEST_PX, Math.floor((size?.width ?? 0) / axes.length)));
  const front = useMemo(() => rowsOf(shown.front, source), [shown.front, source]);
  const band = useMemo(() => rowsOf(shown.band, source), [shown.band, source]);
  return (
    <section ref={frame} aria-label="Ranges">
      <div className="flex flex-wrap items-baseline gap-x-4 gap-y-1 pb-2">
        <p className="max-w-prose text-sm text-muted">
          Lines are sections of the front, ochre ones near the best; an arrow says which way is better. Drag a
          bracket or type an end, and every view keeps to what lies between.
          {state === 'stored-only' &&
            ' This run is too large to be held here whole: the ranges act on the sections listed, not on the cloud.'}
        </p>
        <span className="ml-auto">
          <AxisChoice {...props} />
        </span>
      </div>
      {axes.length === 0 ? (
        <div className="h-[26rem] animate-pulse bg-concrete/30" role="status">
          <span className="sr-only">The sections are being gathered</span>
        </div>
      ) : (
        <div className="overflow-x-auto pb-1" role="region" aria-label="Axes of the ranges" tabIndex={0}>
          <div className="relative flex" style={{ width: axes.length * columnPx }}>
            <Lines axes={axes} columnPx={columnPx} front={front} band={band} selected={selected} />
            {axes.map(({ key, spread, scale }) => (
              <RangeAxis
                key={key}
                axis={key}
                columnPx={columnPx}
                spread={spread}
                scale={scale}
                range={filters[key] ?? { low: null, high: null }}
                selected={selected === null ? null : exploreValue(selected, key)}
                reader={reader}
                onRange={(range, isSettled) => setFilters(withRange(filters, key, range), isSettled)}
              />
            ))}
          </div>
        </div>
      )}
    </section>
  );
}
