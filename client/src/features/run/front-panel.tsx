import { useCallback, useId, useMemo, type ReactNode } from 'react';
import type { Run, ViewProgress } from '#shared/contract/records.ts';
import type { MeasureId } from '#shared/engine/measures.ts';
import type { View } from '#shared/sweep/problem.ts';
import { FrontChart } from '#client/src/charts/front-chart.tsx';
import type { ChartPin } from '#client/src/charts/front-chart-input.ts';
import { formatNumber } from '#shared/print/format-quantity.ts';
import { measureLabel } from '#client/src/lib/measure-labels.ts';
import { unavailableReason } from '#client/src/lib/measure-availability.ts';
import { sizeText, steelText } from '#shared/print/section-text.ts';
import { bandWithin } from './band-within.ts';
import { MeasureChoice } from '#client/src/charts/measure-choice.tsx';
import { chartAxis, measureText, type MeasureReader } from './measure-text.ts';
import { WIDEST_BAND_SHARE, withMeasure } from './run-address.ts';
import type { SectionSource } from './section-source.ts';
import { isUnderWay } from './view-progress.ts';

interface FrontPanelProps {
  readonly run: Run;
  readonly view: View;
  readonly progress: ViewProgress | null;
  readonly source: SectionSource;
  readonly reader: MeasureReader;
  readonly pins: readonly ChartPin[];
  readonly bandShare: number;
  readonly selectedIndex: number | null;
  /** Stands in the chart's place when a whole run found nothing. */
  readonly whenEmpty: ReactNode;
  readonly onView: (view: View) => void;
  readonly onBandShare: (share: number) => void;
  readonly onSelect: (index: number) => void;
}

const NONE = [] as const;

/** The target belongs on the chart when the ductility is one of its axes. */
function targetOf(run: Run, view: View) {
  const value = run.definition.demand.ductilityTarget;
  if (value === null) return null;
  const label = `target μφ ${formatNumber(value, 2)}`;
  if (view.y === 'curvatureDuctility') return { axis: 'y', value, label } as const;
  return view.x === 'curvatureDuctility' ? ({ axis: 'x', value, label } as const) : null;
}

function BandSlider({
  share,
  count,
  onChange,
}: {
  share: number;
  count: string;
  onChange: (share: number) => void;
}) {
  const id = useId();
  return (
    <span className="ml-auto flex items-center gap-2 text-sm text-muted">
      <label htmlFor={id}>Near-best band</label>
      <input
        id={id}
        type="range"
        min={0}
        max={WIDEST_BAND_SHARE * 100}
        step={0.5}
        value={share * 100}
        aria-valuetext={`${share * 100} %, ${count}`}
        onChange={(event) => onChange(Number(event.target.value) / 100)}
        className="w-24 accent-[var(--near-mark)]"
      />
      <span className="num w-28 whitespace-nowrap">
        {formatNumber(share * 100, 3, true)} %, {count}
      </span>
    </span>
  );
}

/** The trade-off drawn: two measures to choose, the band, and the chart on which a click picks a real section. */
export function FrontPanel(props: FrontPanelProps) {
  const { run, view, progress, source, reader, pins, bandShare, selectedIndex, onSelect } = props;
  const { units } = reader;
  const result = progress?.result ?? null;
  const x = useMemo(() => chartAxis(view.x, reader), [view.x, reader]);
  const y = useMemo(() => chartAxis(view.y, reader), [view.y, reader]);
  const target = useMemo(() => targetOf(run, view), [run, view]);
  const band = useMemo(() => (result === null ? NONE : bandWithin(result, bandShare)), [result, bandShare]);

  const reasonAgainst = useCallback(
    (measure: MeasureId) =>
      unavailableReason(measure, {
        space: run.definition.space,
        demand: run.definition.demand,
        basis: run.basis,
        units,
      }),
    [run, units],
  );
  const describe = useCallback(
    (index: number) => {
      const { section, evaluation } = source.evaluatedAt(index);
      const values = [view.x, view.y].map(
        (measure) =>
          `${measureLabel(measure, units).symbol} ${measureText(measure, evaluation.measures[measure], reader)}`,
      );
      const ties = result?.front.find((point) => point.index === index)?.tieCount ?? 1;
      const tied = ties > 1 ? `\n${ties} sections with these two values` : '';
      return `${sizeText(section, units)}, ${steelText(section, units)}\n${values.join(', ')}${tied}`;
    },
    [source, reader, units, view, result],
  );
  const isEmpty = result?.front.length === 0 && progress !== null && !isUnderWay(progress.state);
  const isCut = result?.isBandCut === true && band.length === result.band.length;

  return (
    <section aria-label="Trade-off" className="flex min-w-0 flex-col">
      <div className="flex flex-wrap items-baseline gap-x-3 gap-y-1 pb-1">
        <MeasureChoice
          side="y"
          value={view.y}
          units={units}
          reasonAgainst={reasonAgainst}
          onChange={(measure) => props.onView(withMeasure(view, 'y', measure))}
        />
        <span className="text-muted">against</span>
        <MeasureChoice
          side="x"
          value={view.x}
          units={units}
          reasonAgainst={reasonAgainst}
          onChange={(measure) => props.onView(withMeasure(view, 'x', measure))}
        />
        <BandSlider
          share={bandShare}
          count={`${isCut ? 'over ' : ''}${band.length}`}
          onChange={props.onBandShare}
        />
      </div>
      {isEmpty ? (
        props.whenEmpty
      ) : (
        <div className="h-[clamp(19rem,46dvh,34rem)]">
          {result === null ? (
            <div className="h-full animate-pulse border-b border-l border-rule" role="status">
              <span className="sr-only">The chart appears with the first results</span>
            </div>
          ) : (
            <FrontChart
              x={x}
              y={y}
              cells={result.density}
              front={result.front}
              band={band}
              bandShare={bandShare}
              pins={pins}
              target={target}
              describe={describe}
              selectedIndex={selectedIndex}
              onSelect={onSelect}
              isGrowing={progress !== null && isUnderWay(progress.state)}
            />
          )}
        </div>
      )}
    </section>
  );
}
