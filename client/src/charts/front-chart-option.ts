import type { EChartsCoreOption } from 'echarts/core';
import type { Point } from '#shared/sweep/result.ts';
import { bandTint, pinFlags, targetLine } from './front-chart-shapes.ts';
import { axisTitle, betterWords, type ChartAxis, type FrontChartInput } from './front-chart-input.ts';
import { frontSteps, type XY } from './front-steps.ts';
import { frontMarks } from './front-marks.ts';
import { fromPlot, plotTicks, shownAt, toPlot } from './plot-axis.ts';
import { TICKS_X, TICKS_Y } from './chart-limits.ts';
import type { AxisExtent } from './axis-extent.ts';

/** Layers of the drawing, from the back. */
const Z = {
  band: 2,
  target: 3,
  outline: 3,
  bandMarks: 4,
  steps: 5,
  marks: 6,
  pins: 7,
  selected: 8,
} as const;

const NUMBER_FONT = "'IBM Plex Mono', ui-monospace, monospace";
const WORD_FONT = "'Archivo Variable', Arial, sans-serif";

function axisOption(axis: ChartAxis, extent: AxisExtent, input: FrontChartInput, side: 'x' | 'y') {
  const { colours } = input;
  const isX = side === 'x';
  const customValues = plotTicks(extent, axis.isLog, isX ? TICKS_X : TICKS_Y);
  return {
    type: 'value',
    min: extent.min,
    max: extent.max,
    name: `${axisTitle(axis)}   ${betterWords(side, axis.direction)}`,
    nameLocation: isX ? 'middle' : 'end',
    nameGap: isX ? 30 : 14,
    nameTextStyle: {
      color: colours.ink,
      fontFamily: WORD_FONT,
      fontSize: 12,
      align: isX ? 'center' : 'left',
      padding: isX ? 0 : [0, 0, 0, 8 - input.frame.left],
    },
    axisLine: { show: isX, lineStyle: { color: colours.ink, width: 1 } },
    axisTick: { show: isX, lineStyle: { color: colours.ink }, customValues },
    axisLabel: {
      color: colours.muted,
      fontFamily: NUMBER_FONT,
      fontSize: 11,
      customValues,
      formatter: (place: number) => axis.formatTick(shownAt(axis, place)),
      hideOverlap: true,
    },
    splitLine: { show: !isX, lineStyle: { color: colours.rule, width: 1 } },
  };
}

const shown = (input: FrontChartInput, point: XY): [number, number] => [
  toPlot(input.x, point.x),
  toPlot(input.y, point.y),
];

/** The far corner of the plot in SI: the front's step line runs out to it on both sides. */
function worstCorner(input: FrontChartInput): XY {
  const { x, y, xExtent, yExtent } = input;
  return {
    x: fromPlot(x, x.direction === 'less' ? xExtent.max : xExtent.min),
    y: fromPlot(y, y.direction === 'less' ? yExtent.max : yExtent.min),
  };
}

function marks(input: FrontChartInput, points: readonly Point[], style: object) {
  return {
    type: 'scatter',
    clip: true,
    animation: false,
    data: points.map((point) => ({ value: [...shown(input, point), point.index] })),
    ...style,
  };
}

function steps(input: FrontChartInput, points: readonly Point[], style: object) {
  return {
    type: 'line',
    clip: true,
    silent: true,
    animation: false,
    symbol: 'none',
    data: frontSteps(points, worstCorner(input)).map((corner) => shown(input, corner)),
    ...style,
  };
}

function seriesOf(input: FrontChartInput) {
  const { colours, front, band, selected } = input;
  const inBand = input.bandShare > 0 ? band : [];
  return [
    { id: 'band-tint', z: Z.band, ...bandTint(input) },
    { id: 'target', z: Z.target, ...targetLine(input) },
    marks(input, inBand, {
      id: 'band',
      z: Z.bandMarks,
      symbol: 'circle',
      symbolSize: 3,
      itemStyle: { color: colours.near, opacity: 0.75 },
    }),
    steps(input, input.outline, {
      id: 'outline',
      z: Z.outline,
      lineStyle: { color: colours.muted, width: 1, type: [3, 3] },
    }),
    steps(input, front, { id: 'front-steps', z: Z.steps, lineStyle: { color: colours.ink, width: 1.4 } }),
    {
      id: 'front',
      z: Z.marks,
      type: 'scatter',
      clip: true,
      animation: false,
      symbol: 'diamond',
      ...frontMarks(input, (point) => shown(input, point)),
    },
    { id: 'pins', z: Z.pins, ...pinFlags(input) },
    marks(input, selected === null ? [] : [selected], {
      id: 'selected',
      z: Z.selected,
      symbol: 'diamond',
      symbolSize: 15,
      silent: true,
      itemStyle: { color: colours.steel, borderColor: colours.paper, borderWidth: 1.5 },
    }),
  ];
}

interface Hovered {
  readonly value?: readonly number[];
}

/** Text under the pointer: a section's own words. */
function hoverText(input: FrontChartInput, { value = [] }: Hovered): string {
  const index = value[2];
  return index === undefined ? '' : input.describe(index).replaceAll('\n', '<br>');
}

/** The front chart as plain data: the same input always draws the same picture. */
export function frontChartOption(input: FrontChartInput): EChartsCoreOption {
  const { frame, colours } = input;
  return {
    animation: false,
    backgroundColor: 'transparent',
    textStyle: { fontFamily: WORD_FONT },
    grid: {
      left: frame.left,
      right: frame.right,
      top: frame.top,
      bottom: frame.bottom,
      outerBoundsMode: 'none',
    },
    xAxis: axisOption(input.x, input.xExtent, input, 'x'),
    yAxis: axisOption(input.y, input.yExtent, input, 'y'),
    tooltip: {
      trigger: 'item',
      confine: true,
      transitionDuration: 0,
      backgroundColor: colours.paper,
      borderColor: colours.ink,
      borderWidth: 1,
      borderRadius: 0,
      padding: [6, 9],
      extraCssText: 'box-shadow:none',
      textStyle: { color: colours.ink, fontFamily: NUMBER_FONT, fontSize: 12 },
      formatter: (hovered: Hovered) => hoverText(input, hovered),
    },
    series: seriesOf(input),
  };
}
