import {
  useEffect,
  useMemo,
  useRef,
  useState,
  type KeyboardEvent,
  type PointerEvent,
  type ReactNode,
} from 'react';
import type { DensityCell } from '#shared/sweep/result.ts';
import { nextExtent } from './axis-extent.ts';
import { Chart } from './chart.tsx';
import { ChartControls, ZOOM_STEP } from './chart-controls.tsx';
import { chartLimits } from './chart-limits.ts';
import { movedExtents, windowOf, zoomedExtents, type ChartWindow, type Extents } from './chart-window.ts';
import { boxAt, cloudBoxes } from './cloud-boxes.ts';
import { CloudLayer } from './cloud-layer.tsx';
import { CELL_PX } from './density-cells.ts';
import type { ChartAxis, FrontChartInput, FrontPicture, PlotFrame } from './front-chart-input.ts';
import { frontChartOption } from './front-chart-option.ts';
import { nearestMark, REACH_PX } from './nearest-mark.ts';
import { fromPlot, toPlot } from './plot-axis.ts';
import { useChartColours } from './use-chart-colours.ts';
import { useChartGestures } from './use-chart-gestures.ts';
import { useChartWindow } from './use-chart-window.ts';
import { useElementSize, type ElementSize } from './use-element-size.ts';

/** What is laid out on screen: the shown part and how many cells it is divided into each way. */
export interface ChartLayout extends ChartWindow {
  readonly cells: { readonly x: number; readonly y: number };
}

/** A spot of the cloud someone pointed at, stored units, with what one pixel is along each axis as laid out. */
export interface CloudSpot {
  readonly at: { readonly x: number; readonly y: number };
  readonly perPx: { readonly x: number; readonly y: number };
  readonly reachPx: number;
}

export interface FrontChartProps extends Omit<
  FrontChartInput,
  'xExtent' | 'yExtent' | 'frame' | 'colours' | 'selected'
> {
  readonly cells: readonly DensityCell[];
  /** What the axes are fitted to: the whole result, whatever ranges are set. */
  readonly fitted: { readonly cells: readonly DensityCell[]; readonly front: FrontChartInput['front'] };
  readonly selected: FrontChartInput['selected'];
  readonly window: ChartWindow | null;
  readonly onWindow: (window: ChartWindow | null) => void;
  readonly onLayout: (layout: ChartLayout) => void;
  readonly onSelect: (index: number) => void;
  /** A click on the cloud, away from every mark. */
  readonly onCloud: (spot: CloudSpot) => void;
  readonly onLog: (isXLog: boolean, isYLog: boolean) => void;
  /** Stands above the drawing, before what the chart itself offers. */
  readonly toolbar: ReactNode;
  /** Told what is drawn, for whoever wants it as a picture. */
  readonly onDrawn?: ((picture: FrontPicture) => void) | undefined;
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

interface KeptExtents extends Extents {
  readonly key: string;
}

const axisKey = ({ title, unit, isLog }: ChartAxis) => `${title} ${unit} ${isLog}`;

/** Extents of the whole, which change only when the view does, or when what is drawn no longer suits them. */
function useWholeExtents({ x, y, fitted, pins, target, isGrowing }: FrontChartProps): Extents {
  const [kept, setKept] = useState<KeptExtents | null>(null);
  const wanted = useMemo(
    () => chartLimits(x, y, { cells: fitted.cells, front: fitted.front, pins, target }),
    [x, y, fitted, pins, target],
  );
  const key = `${axisKey(x)} ${axisKey(y)}`;
  const previous = isGrowing && kept?.key === key ? kept : null;
  const next = {
    key,
    x: nextExtent(previous?.x ?? null, wanted.x),
    y: nextExtent(previous?.y ?? null, wanted.y),
  };
  if (kept?.key === key && kept.x === next.x && kept.y === next.y) return kept;
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

/** With Shift the arrows move what is shown, by a tenth of it. */
const SHIFT_OF_KEY: Readonly<Record<string, { readonly x: number; readonly y: number }>> = {
  ArrowRight: { x: 0.1, y: 0 },
  ArrowLeft: { x: -0.1, y: 0 },
  ArrowUp: { x: 0, y: 0.1 },
  ArrowDown: { x: 0, y: -0.1 },
};

const ZOOM_OF_KEY: Readonly<Record<string, number>> = { '+': ZOOM_STEP, '=': ZOOM_STEP, '-': 1 / ZOOM_STEP };

/** While a hand moves what is shown the cloud is carried along; it is counted anew once the hand rests. */
const RESTED_MS = 140;

/** Tells the page what part is on screen, and in how many cells its cloud may be counted. */
function useLayoutReport(props: FrontChartProps, extents: Extents, frame: PlotFrame | null): void {
  const { x, y, onLayout } = props;
  const isFirst = useRef(true);
  useEffect(() => {
    if (frame === null) return;
    const cells = {
      x: Math.max(1, Math.floor((frame.width - frame.left - frame.right) / CELL_PX)),
      y: Math.max(1, Math.floor((frame.height - frame.top - frame.bottom) / CELL_PX)),
    };
    const report = () => onLayout({ ...windowOf(extents, { x, y }), cells });
    const timer = setTimeout(report, isFirst.current ? 0 : RESTED_MS);
    isFirst.current = false;
    return () => clearTimeout(timer);
  }, [extents, frame, x, y, onLayout]);
}

/** The front over its density cloud. It is moved along like a slider: the arrow keys pick the next real section. */
export function FrontChart(props: FrontChartProps) {
  const { front, marks, band, pins, selected, onSelect, describe, cells, bandShare, target, x, y } = props;
  const { outline, markScale } = props;
  const [ref, size] = useElementSize<HTMLDivElement>();
  const colours = useChartColours();
  const whole = useWholeExtents(props);
  const { extents, show, change, isWhole } = useChartWindow(props, whole);
  const frame = useMemo(() => (size === null ? null : frameOf(size)), [size]);
  const { handlers, box } = useChartGestures(ref, frame, change);
  useLayoutReport(props, extents, frame);

  const place = marks.findIndex((point) => point.ties.includes(selected?.index ?? -1));
  const input = useMemo(
    () => ({
      ...{ x, y, front, marks, outline, markScale, band, bandShare, pins, target, describe, selected },
      ...{ xExtent: extents.x, yExtent: extents.y },
    }),
    [x, y, front, marks, outline, markScale, band, bandShare, pins, target, describe, selected, extents],
  );
  const option = useMemo(
    () => (frame === null ? null : frontChartOption({ ...input, frame, colours })),
    [input, frame, colours],
  );
  const { onDrawn } = props;
  useEffect(() => onDrawn?.({ ...input, cells }), [onDrawn, input, cells]);

  const boxes = useMemo(
    () => (frame === null ? [] : cloudBoxes({ x, y, cells, frame, xExtent: extents.x, yExtent: extents.y })),
    [x, y, cells, frame, extents],
  );
  const [hovered, setHovered] = useState<number | null>(null);
  const hover = ({ nativeEvent: { offsetX, offsetY } }: PointerEvent) =>
    setHovered(boxAt(boxes, offsetX, offsetY)?.count ?? null);

  const pick = (xPx: number, yPx: number) => {
    if (frame === null) return;
    const places = [...pins, ...marks, ...(bandShare > 0 ? band : [])].map((point) => ({
      index: point.index,
      x: toPlot(x, point.x),
      y: toPlot(y, point.y),
    }));
    const mark = nearestMark(places, { xPx, yPx }, { frame, xExtent: extents.x, yExtent: extents.y });
    if (mark !== undefined) return onSelect(mark.index);
    const perPx = {
      x: (extents.x.max - extents.x.min) / (frame.width - frame.left - frame.right),
      y: (extents.y.max - extents.y.min) / (frame.height - frame.top - frame.bottom),
    };
    const at = {
      x: fromPlot(x, extents.x.min + (xPx - frame.left) * perPx.x),
      y: fromPlot(y, extents.y.max - (yPx - frame.top) * perPx.y),
    };
    props.onCloud({ at, perPx, reachPx: REACH_PX });
  };

  const move = (event: KeyboardEvent) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const zoom = ZOOM_OF_KEY[event.key];
    const shift = event.shiftKey ? SHIFT_OF_KEY[event.key] : undefined;
    const step = STEP_OF_KEY[event.key];
    if (zoom !== undefined) change((now) => zoomedExtents(now, zoom));
    else if (event.key === '0') show(null);
    else if (shift !== undefined) change((now) => movedExtents(now, shift));
    else if (step !== undefined && marks.length > 0) {
      const from = place === -1 ? (step > 0 ? -1 : marks.length) : place;
      onSelect(marks[Math.min(Math.max(from + step, 0), marks.length - 1)]!.index);
    } else return;
    event.preventDefault();
  };

  return (
    <div className="flex h-full flex-col">
      <div className="flex flex-wrap items-center gap-x-4 gap-y-1 pb-1">
        {props.toolbar}
        <ChartControls
          isXLog={x.isLog}
          isYLog={y.isLog}
          isWhole={isWhole}
          onLog={props.onLog}
          onZoom={change}
          onWhole={() => show(null)}
        />
      </div>
      <div className="relative min-h-0 w-full flex-1">
        {frame !== null && <CloudLayer boxes={boxes} frame={frame} colour={colours.meets} />}
        {hovered !== null && (
          <p
            aria-hidden="true"
            className="num pointer-events-none absolute top-1.5 right-4 z-10 text-xs text-muted"
          >
            {hovered.toLocaleString('en-US')} {hovered === 1 ? 'section' : 'sections'} here
          </p>
        )}
        <div
          ref={ref}
          role="slider"
          tabIndex={marks.length > 0 ? 0 : -1}
          aria-label={`Section along the front, ${y.title} against ${x.title}`}
          aria-valuemin={marks.length > 0 ? 1 : 0}
          aria-valuemax={marks.length}
          aria-valuenow={Math.max(place + 1, marks.length > 0 ? 1 : 0)}
          aria-valuetext={selected === null ? 'none selected' : describe(selected.index)}
          onKeyDown={move}
          onDoubleClick={() => show(null)}
          {...handlers}
          onPointerMove={(event) => {
            handlers.onPointerMove(event);
            hover(event);
          }}
          onPointerLeave={() => setHovered(null)}
          className="absolute inset-0 select-none"
        >
          {option !== null && <Chart option={option} onPoint={pick} />}
          {box !== null && (
            <div
              aria-hidden="true"
              className="pointer-events-none absolute border border-ink bg-concrete/40"
              style={{
                left: Math.min(box.from.xPx, box.to.xPx),
                top: Math.min(box.from.yPx, box.to.yPx),
                width: Math.abs(box.to.xPx - box.from.xPx),
                height: Math.abs(box.to.yPx - box.from.yPx),
              }}
            />
          )}
        </div>
      </div>
    </div>
  );
}
