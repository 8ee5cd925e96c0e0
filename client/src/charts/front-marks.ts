import type { FrontPoint } from '#shared/sweep/result.ts';
import type { ChartColours, FrontChartInput } from './front-chart-input.ts';
import { mixColours } from './mix-colours.ts';

/** Beyond so many marks they are drawn smaller, so that neighbours can be told apart. */
const MANY_MARKS = 60;
const MARK_PX = { few: 9, many: 7 } as const;
/** A mark that tells a third measure by its size, px: the least one can still be clicked, the largest hides no other. */
const LEAST_SIZED_PX = 6;
const LARGEST_SIZED_PX = 17;
/** A tinted mark is a little larger, so that its tint is seen. */
const TINTED_PX = 11;
/** The strongest tint stops short of the outline's own ink. */
const STRONGEST_TINT = 0.9;

export const tintOf = (colours: ChartColours, share: number): string =>
  mixColours(colours.paper, colours.ink, share * STRONGEST_TINT);

export const sizeOf = (share: number): number => LEAST_SIZED_PX + share * (LARGEST_SIZED_PX - LEAST_SIZED_PX);

/** The front's marks: open diamonds, or tinted or sized by a third measure. One without a value stays as it is. */
export function frontMarks(
  { marks, markScale, colours }: FrontChartInput,
  place: (point: FrontPoint) => [number, number],
) {
  const bare = marks.length > MANY_MARKS ? MARK_PX.many : MARK_PX.few;
  return {
    symbolSize: bare,
    itemStyle: { color: colours.paper, borderColor: colours.ink, borderWidth: 1.3 },
    data: marks.map((point, k) => {
      const value = [...place(point), point.index];
      const share = markScale?.shares[k] ?? null;
      if (markScale === null || share === null) return { value };
      return markScale.style === 'tint'
        ? { value, symbolSize: TINTED_PX, itemStyle: { color: tintOf(colours, share) } }
        : { value, symbolSize: sizeOf(share) };
    }),
  };
}
