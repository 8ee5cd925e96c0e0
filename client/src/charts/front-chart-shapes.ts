import type { CustomSeriesOption } from 'echarts/charts';
import type { FrontChartInput } from './front-chart-input.ts';
import { toPlot } from './plot-axis.ts';

type RenderItem = NonNullable<CustomSeriesOption['renderItem']>;
type RenderApi = Parameters<RenderItem>[1];

interface Box {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** Rectangle on screen between two corners given in axis values. */
function boxBetween(api: RenderApi, from: readonly number[], to: readonly number[]): Box {
  const [ax = 0, ay = 0] = api.coord([...from]);
  const [bx = 0, by = 0] = api.coord([...to]);
  return { x: Math.min(ax, bx), y: Math.min(ay, by), width: Math.abs(bx - ax), height: Math.abs(by - ay) };
}

/** Everything whose leading measure lies within the band of the best, as a tint across the plot. */
export function bandTint(input: FrontChartInput): CustomSeriesOption {
  const { x, yExtent, front, bandShare, colours } = input;
  const best = front[0];
  const away = x.direction === 'less' ? 1 + bandShare : 1 - bandShare;
  const data =
    best === undefined || bandShare === 0
      ? []
      : [[toPlot(x, best.x), yExtent.min, toPlot(x, best.x * away), yExtent.max]];
  return {
    type: 'custom',
    clip: true,
    silent: true,
    animation: false,
    encode: { x: [0, 2], y: [1, 3] },
    data,
    renderItem: (_params, api) => ({
      type: 'rect',
      shape: boxBetween(
        api,
        [Number(api.value(0)), Number(api.value(1))],
        [Number(api.value(2)), Number(api.value(3))],
      ),
      style: { fill: colours.near, opacity: 0.16 },
    }),
  };
}

/** The target as a dotted line with its words at the far end. */
export function targetLine(input: FrontChartInput): CustomSeriesOption {
  const { target, xExtent, yExtent, colours } = input;
  const isAlongX = target?.axis === 'y';
  const value = toPlot(isAlongX ? input.y : input.x, target?.value ?? 1);
  const ends = isAlongX ? [xExtent.min, value, xExtent.max, value] : [value, yExtent.min, value, yExtent.max];
  return {
    type: 'custom',
    clip: true,
    silent: true,
    animation: false,
    encode: { x: [0, 2], y: [1, 3] },
    data: target === null ? [] : [ends],
    renderItem: (_params, api) => {
      const [x1 = 0, y1 = 0] = api.coord([Number(api.value(0)), Number(api.value(1))]);
      const [x2 = 0, y2 = 0] = api.coord([Number(api.value(2)), Number(api.value(3))]);
      return {
        type: 'group',
        children: [
          { type: 'line', shape: { x1, y1, x2, y2 }, style: { stroke: colours.ink, lineDash: [2, 4] } },
          {
            type: 'text',
            x: x2 - 6,
            y: isAlongX ? y2 - 5 : y2 + 4,
            style: {
              text: target?.label ?? '',
              fill: colours.ink,
              align: 'right',
              verticalAlign: isAlongX ? 'bottom' : 'top',
              font: "11px 'IBM Plex Mono', monospace",
            },
          },
        ],
      };
    },
  };
}

const POLE_PX = 34;
const FLAG_HEIGHT_PX = 15;

/** Pinned sections: a pole on the mark and a swallow-tailed flag with the candidate's letter. */
export function pinFlags(input: FrontChartInput): CustomSeriesOption {
  const { pins, colours, x, y, frame } = input;
  return {
    type: 'custom',
    clip: false,
    animation: false,
    encode: { x: 0, y: 1 },
    data: pins.map((pin) => [toPlot(x, pin.x), toPlot(y, pin.y), pin.index]),
    renderItem: (params, api) => {
      const label = pins[params.dataIndex]?.label ?? '';
      const [px = 0, py = 0] = api.coord([Number(api.value(0)), Number(api.value(1))]);
      const isInside = px >= frame.left && px <= frame.width - frame.right && py >= frame.top - 1;
      if (!isInside || py > frame.height - frame.bottom) return { type: 'group', children: [] };
      const top = Math.max(frame.top, py - POLE_PX);
      const width = 15 + label.length * 7;
      const tail = px - width;
      return {
        type: 'group',
        children: [
          {
            type: 'line',
            shape: { x1: px, y1: py, x2: px, y2: top },
            style: { stroke: colours.ink, lineWidth: 1.2 },
          },
          {
            type: 'polygon',
            shape: {
              points: [
                [px, top],
                [tail, top],
                [tail + 5, top + FLAG_HEIGHT_PX / 2],
                [tail, top + FLAG_HEIGHT_PX],
                [px, top + FLAG_HEIGHT_PX],
              ],
            },
            style: { fill: colours.ink },
          },
          {
            type: 'text',
            x: px - width / 2 + 2,
            y: top + FLAG_HEIGHT_PX / 2,
            style: {
              text: label,
              fill: colours.paper,
              align: 'center',
              verticalAlign: 'middle',
              font: "600 11px 'IBM Plex Mono', monospace",
            },
          },
        ],
      };
    },
  };
}
