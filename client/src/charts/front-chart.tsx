import { useMemo, useState, type KeyboardEvent } from 'react';
import { nextExtent, type AxisExtent } from './axis-extent.ts';
import { Chart } from './chart.tsx';
import { frontChartOption } from './front-chart-option.ts';
import { chartLimits } from './chart-limits.ts';
import type { FrontChartInput, PlotFrame } from './front-chart-input.ts';
import { nearestMark } from './nearest-mark.ts';
import { useChartColours } from './use-chart-colours.ts';
import { useElementSize, type ElementSize } from './use-element-size.ts';

export interface FrontChartProps extends Omit<
  FrontChartInput,
  'xExtent' | 'yExtent' | 'frame' | 'colours' | 'selected'
> {
  readonly selectedIndex: number | null;
  readonly onSelect: (index: number) => void;
  /** While it is, the axes stay as they are as long as everything fits on them. */
  readonly isGrowing: boolean;
}

/** Below this the labels of the y axis take too much of the width. */
const NARROW_PX = 480;

const frameOf = ({ width, height }: ElementSize): PlotFrame => ({
  width,
  height,
  left: width < NARROW_PX ? 38 : 52,
  right: width < NARROW_PX ? 10 : 18,
  top: 30,
  bottom: 46,
});

interface KeptExtents {
  readonly key: string;
  readonly x: AxisExtent;
  readonly y: AxisExtent;
}

/** Extents that change only when the view does, or when what is drawn no longer suits them. */
function useExtents(props: FrontChartProps): KeptExtents {
  const [kept, setKept] = useState<KeptExtents | null>(null);
  const wanted = useMemo(
    () =>
      chartLimits(props.x, props.y, {
        cells: props.cells,
        front: props.front,
        pins: props.pins,
        target: props.target,
      }),
    [props.x, props.y, props.cells, props.front, props.pins, props.target],
  );
  const key = `${props.x.title} ${props.x.unit} ${props.y.title} ${props.y.unit}`;
  const previous = props.isGrowing && kept?.key === key ? kept : null;
  const x = nextExtent(previous?.x ?? null, wanted.x);
  const y = nextExtent(previous?.y ?? null, wanted.y);
  if (kept?.key === key && kept.x === x && kept.y === y) return kept;
  const next = { key, x, y };
  setKept(next);
  return next;
}

const STEP_OF_KEY: Readonly<Record<string, number>> = {
  ArrowRight: 1,
  ArrowDown: 1,
  ArrowLeft: -1,
  ArrowUp: -1,
  PageDown: 10,
  PageUp: -10,
  Home: -Infinity,
  End: Infinity,
};

/** The front over its density cloud. It is moved along like a slider: the arrow keys pick the next real section. */
export function FrontChart(props: FrontChartProps) {
  const { front, band, pins, selectedIndex, onSelect, describe } = props;
  const [ref, size] = useElementSize<HTMLDivElement>();
  const colours = useChartColours();
  const extents = useExtents(props);
  const frame = useMemo(() => (size === null ? null : frameOf(size)), [size]);

  const place = front.findIndex((point) => point.ties.includes(selectedIndex ?? -1));
  const chosen = [front[place], ...band, ...pins].find(
    (point) => point !== undefined && (point === front[place] || point.index === selectedIndex),
  );
  const { cells, bandShare, target, x, y } = props;
  const option = useMemo(() => {
    if (frame === null) return null;
    const selected = chosen ?? null;
    const input = { x, y, cells, front, band, bandShare, pins, target, describe, selected };
    return frontChartOption({ ...input, xExtent: extents.x, yExtent: extents.y, frame, colours });
  }, [x, y, cells, front, band, bandShare, pins, target, describe, chosen, extents, frame, colours]);

  const pick = (xPx: number, yPx: number) => {
    if (frame === null) return;
    const marks = [...pins, ...front, ...(bandShare > 0 ? band : [])].map((point) => ({
      index: point.index,
      x: point.x * x.perSi,
      y: point.y * y.perSi,
    }));
    const plot = { frame, xExtent: extents.x, yExtent: extents.y };
    const mark = nearestMark(marks, { xPx, yPx }, plot);
    if (mark !== undefined) onSelect(mark.index);
  };

  const move = (event: KeyboardEvent) => {
    const step = STEP_OF_KEY[event.key];
    if (step === undefined || front.length === 0) return;
    event.preventDefault();
    const from = place === -1 ? (step > 0 ? -1 : front.length) : place;
    const to = Math.min(Math.max(from + step, 0), front.length - 1);
    onSelect(front[to]!.index);
  };

  return (
    <div
      ref={ref}
      role="slider"
      tabIndex={front.length > 0 ? 0 : -1}
      aria-label={`Section along the front, ${y.title} against ${x.title}`}
      aria-valuemin={front.length > 0 ? 1 : 0}
      aria-valuemax={front.length}
      aria-valuenow={Math.max(place + 1, front.length > 0 ? 1 : 0)}
      aria-valuetext={selectedIndex === null ? 'none selected' : describe(selectedIndex)}
      onKeyDown={move}
      className="h-full w-full"
    >
      {option !== null && <Chart option={option} onPoint={pick} />}
    </div>
  );
}
