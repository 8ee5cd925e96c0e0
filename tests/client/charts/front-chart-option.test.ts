import { describe, expect, it } from 'vitest';
import type { FrontChartInput } from '#client/src/charts/front-chart-input.ts';
import { axisTitle, betterWords } from '#client/src/charts/front-chart-input.ts';
import { frontChartOption } from '#client/src/charts/front-chart-option.ts';

const COLOURS = {
  paper: '#fff',
  ink: '#000',
  muted: '#666',
  rule: '#ddd',
  steel: '#a00',
  meets: '#0a0',
  near: '#aa0',
};

const input: FrontChartInput = {
  x: {
    title: 'Steel',
    unit: 'lb/ft',
    direction: 'less',
    perSi: 0.5,
    isLog: false,
    formatTick: (v) => `${v}`,
  },
  y: {
    title: 'Curvature ductility μφ',
    unit: '',
    direction: 'more',
    perSi: 1,
    isLog: false,
    formatTick: (v) => `${v}`,
  },
  xExtent: { min: 5, max: 25, step: 5 },
  yExtent: { min: 0, max: 15, step: 5 },
  frame: { width: 700, height: 400, left: 50, right: 20, top: 30, bottom: 40 },
  front: [
    { index: 4, x: 20, y: 6, tieCount: 2, ties: [4, 9] },
    { index: 5, x: 30, y: 9, tieCount: 1, ties: [5] },
  ],
  marks: [
    { index: 4, x: 20, y: 6, tieCount: 2, ties: [4, 9] },
    { index: 5, x: 30, y: 9, tieCount: 1, ties: [5] },
  ],
  outline: [],
  markScale: null,
  band: [
    { index: 4, x: 20, y: 6 },
    { index: 6, x: 20.5, y: 5 },
  ],
  bandShare: 0.05,
  pins: [{ label: 'A', index: 5, x: 30, y: 9 }],
  selected: { index: 4, x: 20, y: 6 },
  target: { axis: 'y', value: 6, label: 'target μφ 6' },
  colours: COLOURS,
  describe: (index) => `section ${index}\nits values`,
};

interface DrawnSeries {
  readonly id: string;
  readonly data: readonly unknown[];
}
const seriesOf = (changed: Partial<FrontChartInput> = {}): ReadonlyMap<string, DrawnSeries> =>
  new Map(
    (frontChartOption({ ...input, ...changed }).series as DrawnSeries[]).map((series) => [series.id, series]),
  );

describe('the front chart', () => {
  it('prints every mark in the unit of its axis, with the index to pick it by', () => {
    expect(seriesOf().get('front')!.data).toEqual([{ value: [10, 6, 4] }, { value: [15, 9, 5] }]);
  });

  it('lays everything by its logarithm along an axis that is one, and prints the values themselves', () => {
    const x = { ...input.x, isLog: true };
    const xExtent = { min: 0, max: 2, step: 0 };
    const option = frontChartOption({ ...input, x, xExtent });
    const drawn = new Map((option.series as DrawnSeries[]).map((series) => [series.id, series]));
    expect(drawn.get('front')!.data[0]).toEqual({ value: [1, 6, 4] });
    const { axisLabel } = option.xAxis as {
      axisLabel: { customValues: number[]; formatter: (place: number) => string };
    };
    expect(axisLabel.customValues.map((place) => Number(axisLabel.formatter(place)))).toEqual(
      [1, 2, 5, 10, 20, 50, 100].map((value) => expect.closeTo(value, 9)),
    );
  });

  it('tells a third measure by tint or by size, and leaves a mark without a value as it is', () => {
    const marksWith = (style: 'tint' | 'size') =>
      seriesOf({ markScale: { style, shares: [1, null] } }).get('front')!.data as {
        symbolSize?: number;
        itemStyle?: { color: string };
      }[];
    const [tinted, bare] = marksWith('tint');
    expect(tinted!.itemStyle!.color).not.toBe(COLOURS.paper);
    expect(bare).toEqual({ value: [15, 9, 5] });
    const small = seriesOf({ markScale: { style: 'size', shares: [0, 1] } }).get('front')!.data as {
      symbolSize: number;
    }[];
    expect(small[1]!.symbolSize).toBeGreaterThan(2 * small[0]!.symbolSize);
  });

  it('draws the front without ranges faintly behind, where ranges are set', () => {
    expect(seriesOf().get('outline')!.data).toEqual([]);
    expect(seriesOf({ outline: [{ index: 1, x: 20, y: 9 }] }).get('outline')!.data).toHaveLength(3);
  });

  it('tints the band from the best to the band’s edge over the whole height', () => {
    expect(seriesOf().get('band-tint')!.data).toEqual([[10, 0, 10.5, 15]]);
  });

  it('tints towards less where more is better', () => {
    const x = { ...input.x, direction: 'more' } as const;
    expect(seriesOf({ x }).get('band-tint')!.data).toEqual([[10, 0, 9.5, 15]]);
  });

  it('shows neither tint nor band marks for a band of no width', () => {
    const series = seriesOf({ bandShare: 0 });
    expect(series.get('band-tint')!.data).toEqual([]);
    expect(series.get('band')!.data).toEqual([]);
  });

  it('draws the target across the axis it belongs to, and none where it is not asked', () => {
    expect(seriesOf().get('target')!.data).toEqual([[5, 6, 25, 6]]);
    const alongX = seriesOf({ target: { axis: 'x', value: 20, label: '' } });
    expect(alongX.get('target')!.data).toEqual([[10, 0, 10, 15]]);
    expect(seriesOf({ target: null }).get('target')!.data).toEqual([]);
  });

  it('runs the step line from the worst y up the best mark and out to the worst x', () => {
    expect(seriesOf().get('front-steps')!.data).toEqual([
      [10, 0],
      [10, 6],
      [15, 6],
      [15, 9],
      [25, 9],
    ]);
  });

  it('draws an empty run without a mark', () => {
    const series = seriesOf({ front: [], marks: [], band: [], pins: [], selected: null });
    for (const id of ['front', 'front-steps', 'band', 'band-tint', 'pins', 'selected'])
      expect(series.get(id)!.data).toEqual([]);
  });

  it('marks the front in three measures beside the line of the front in two', () => {
    const third = { index: 7, x: 24, y: 4, z: 600, tieCount: 1, ties: [7] };
    const series = seriesOf({ marks: [input.marks[0]!, third, input.marks[1]!] });
    expect(series.get('front')!.data).toHaveLength(3);
    expect(series.get('front')!.data[1]).toEqual({ value: [12, 4, 7] });
    expect(series.get('front-steps')!.data).toEqual(seriesOf().get('front-steps')!.data);
  });

  it('reads a section out in its own words', () => {
    const { formatter } = frontChartOption(input).tooltip as { formatter: (hovered: object) => string };
    expect(formatter({ value: [10, 6, 4] })).toBe('section 4<br>its values');
  });

  it('says on each axis which way is better', () => {
    expect(axisTitle(input.x)).toBe('Steel, lb/ft');
    expect(axisTitle(input.y)).toBe('Curvature ductility μφ');
    expect(betterWords('x', 'less')).toBe('← less is better');
    expect(betterWords('y', 'more')).toBe('↑ more is better');
  });
});
