import { useCallback, useMemo, type ReactNode } from 'react';
import type { Run, ViewProgress } from '#shared/contract/records.ts';
import type { MeasureId } from '#shared/engine/measures.ts';
import type { View } from '#shared/sweep/problem.ts';
import type { Point } from '#shared/sweep/result.ts';
import { FrontChart, type CloudSpot } from '#client/src/charts/front-chart.tsx';
import type { ChartPin, FrontPicture } from '#client/src/charts/front-chart-input.ts';
import { MeasureChoice } from '#client/src/charts/measure-choice.tsx';
import { formatNumber } from '#shared/print/format-quantity.ts';
import { sizeText, steelText } from '#shared/print/section-text.ts';
import { unavailableReason } from '#client/src/lib/measure-availability.ts';
import { measureLabel } from '#shared/print/measure-labels.ts';
import { BandSlider } from './band-slider.tsx';
import { boundsWords } from './proof-words.ts';
import type { ExploreKey } from '#shared/sweep/explore-axis.ts';
import { InThreeChoice } from './in-three-choice.tsx';
import { thirdMeasure } from './mark-scale.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import { chartAxis, measureText } from './measure-text.ts';
import { logPart, viewPart, windowPart, withMeasure } from './run-address.ts';
import type { SectionSource } from './section-source.ts';
import { ThirdChoice } from './third-choice.tsx';
import type { Explore } from './use-explore.ts';
import type { RunAddressControls } from './use-run-address.ts';
import { isUnderWay } from './view-progress.ts';

interface FrontPanelProps {
  readonly run: Run;
  readonly view: View;
  readonly progress: ViewProgress | null;
  readonly source: SectionSource;
  readonly reader: MeasureReader;
  readonly explore: Explore;
  readonly address: RunAddressControls;
  readonly keys: readonly ExploreKey[];
  readonly pins: readonly ChartPin[];
  /** The chosen section by the two measures of the view; null where it has no place on the chart. */
  readonly selected: Point | null;
  /** Stands in the chart's place when a whole run found nothing. */
  readonly whenEmpty: ReactNode;
  /** Told what the chart draws; the same function always. */
  readonly onDrawn: (picture: FrontPicture) => void;
}

/** The target belongs on the chart when the ductility is one of its axes. */
function targetOf(run: Run, view: View) {
  const value = run.definition.demand.ductilityTarget;
  if (value === null) return null;
  const label = `target μφ ${formatNumber(value, 2)}`;
  if (view.y === 'curvatureDuctility') return { axis: 'y', value, label } as const;
  return view.x === 'curvatureDuctility' ? ({ axis: 'x', value, label } as const) : null;
}

/** A section in a line or two, for the pointer and for screen readers. */
function useDescribe({ source, reader, view, explore }: FrontPanelProps) {
  const { listed: front } = explore.shown;
  return useCallback(
    (index: number) => {
      const { section, evaluation } = source.evaluatedAt(index);
      const { units, code } = reader;
      const values = [view.x, view.y, ...(view.z ? [view.z] : [])].map(
        (measure) =>
          `${measureLabel(measure, units, code).symbol} ${measureText(measure, evaluation.measures[measure], reader)}`,
      );
      const ties = front.find((point) => point.index === index)?.tieCount ?? 1;
      const tied = ties > 1 ? `\n${ties} sections with these values` : '';
      return `${sizeText(section, units)}, ${steelText(section, units)}\n${values.join(', ')}${tied}`;
    },
    [source, reader, view, front],
  );
}

function PairChoice({ run, view, reader, address }: FrontPanelProps) {
  const { units } = reader;
  const { space, demand } = run.definition;
  const reasonAgainst = (measure: MeasureId) =>
    unavailableReason(measure, { space, demand, basis: run.basis, units });
  const choice = (side: 'x' | 'y') => (
    <MeasureChoice
      side={side}
      value={view[side]}
      units={units}
      code={run.basis.ruleSet}
      reasonAgainst={reasonAgainst}
      onChange={(measure) => address.write(viewPart(withMeasure(view, side, measure)))}
    />
  );
  return (
    <>
      {choice('y')}
      <span className="text-muted">against</span>
      {choice('x')}
    </>
  );
}

function useChartProps(props: FrontPanelProps) {
  const { run, view, reader, address, explore } = props;
  const { isXLog, isYLog, write, select } = address;
  const x = useMemo(() => chartAxis(view.x, reader, isXLog), [view.x, reader, isXLog]);
  const y = useMemo(() => chartAxis(view.y, reader, isYLog), [view.y, reader, isYLog]);
  const target = useMemo(() => targetOf(run, view), [run, view]);
  const { pick } = explore;
  const onCloud = useCallback(
    (spot: CloudSpot) => void pick(spot).then((index) => index !== null && select(index)),
    [pick, select],
  );
  return {
    x,
    y,
    target,
    onCloud,
    describe: useDescribe(props),
    onWindow: useCallback((window: Parameters<typeof windowPart>[0]) => write(windowPart(window)), [write]),
    onLog: useCallback((isX: boolean, isY: boolean) => write(logPart(isX, isY)), [write]),
  };
}

/** The trade-off drawn: two measures to choose, the band, and the chart on which a click picks a real section. */
export function FrontPanel(props: FrontPanelProps) {
  const { progress, source, reader, explore, address, keys, pins } = props;
  const result = progress?.result ?? null;
  const { front, listed, inThree, band, isBandCut, cells, outline } = explore.shown;
  const chart = useChartProps(props);
  const { third: thirdKey, markStyle } = address;
  const third = useMemo(
    () => (thirdKey === null ? null : thirdMeasure(listed, { key: thirdKey, style: markStyle }, source)),
    [listed, thirdKey, markStyle, source],
  );
  const fitted = useMemo(
    () => ({
      cells: result?.density ?? [],
      front: [...(result?.front ?? []), ...(result?.frontInThree?.points ?? [])],
    }),
    [result?.density, result?.front, result?.frontInThree],
  );
  const isEmpty = result?.front.length === 0 && progress !== null && !isUnderWay(progress.state);

  return (
    <section aria-label="Trade-off" className="flex min-w-0 flex-col">
      <div className="flex flex-wrap items-baseline gap-x-3 gap-y-1 pb-1.5">
        <PairChoice {...props} />
        {result?.bounds !== undefined && (
          <span className="ml-auto text-sm text-muted">{boundsWords(result.bounds)}</span>
        )}
        {result?.bounds?.hasBand !== false && (
          <BandSlider
            share={address.bandShare}
            count={`${isBandCut ? 'over ' : ''}${band.length}`}
            onChange={(share) => address.write({ band: String(Math.round(share * 1000) / 10) })}
          />
        )}
      </div>
      {isEmpty ? (
        props.whenEmpty
      ) : (
        <div className="h-[clamp(21rem,50dvh,38rem)] xl:h-[clamp(20rem,calc(100dvh-36rem),38rem)]">
          {result === null ? (
            <div className="h-full animate-pulse border-b border-l border-rule" role="status">
              <span className="sr-only">The chart appears with the first results</span>
            </div>
          ) : (
            <FrontChart
              {...chart}
              cells={cells}
              front={front}
              marks={listed}
              outline={outline}
              band={band}
              bandShare={address.bandShare}
              markScale={third?.scale ?? null}
              pins={pins}
              fitted={fitted}
              selected={props.selected}
              window={address.window}
              onLayout={explore.onLayout}
              onDrawn={props.onDrawn}
              onSelect={address.select}
              isGrowing={progress !== null && isUnderWay(progress.state)}
              toolbar={
                <>
                  <ThirdChoice
                    value={thirdKey}
                    style={markStyle}
                    keys={keys}
                    third={third}
                    reader={reader}
                    onChange={(key, style) => address.write({ by: key, as: style === 'tint' ? null : style })}
                  />
                  <InThreeChoice
                    view={props.view}
                    third={thirdKey}
                    inThree={inThree}
                    isByBounds={props.run.method === 'bounds'}
                    reader={reader}
                    onChange={(isInThree) => address.write({ in: isInThree ? '3' : null })}
                  />
                </>
              }
            />
          )}
        </div>
      )}
    </section>
  );
}
