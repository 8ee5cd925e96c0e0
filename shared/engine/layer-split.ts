import type { Bar } from './bars.ts';

/** Bars of one size in a group, sizes sorted from large to small. */
export interface SizedCount {
  readonly bar: Bar;
  readonly count: number;
}

/** One layer's bars from left to right. */
export type LayerBars = readonly Bar[];

/**
 * Splits a group into layers from the face inwards, as full as possible nearest the face.
 *
 * A layer has at least two bars, is symmetrical about the middle, and stands in line over the layer below it: over an
 * even layer only even ones fit, over an odd layer any that is not longer. Large bars go nearest the face and outermost.
 * @returns undefined when no such split exists within `maxLayers` layers of at most `fits` bars.
 */
export function splitIntoLayers(
  group: readonly SizedCount[],
  maxLayers: number,
  fits: (layer: LayerBars) => boolean,
): readonly LayerBars[] | undefined {
  const bars = group.flatMap(({ bar, count }) => Array.from({ length: count }, () => bar));
  return splitFrom(bars, maxLayers, { largest: bars.length, isEvenOnly: false }, fits);
}

function splitFrom(
  bars: readonly Bar[],
  layersLeft: number,
  limit: { largest: number; isEvenOnly: boolean },
  fits: (layer: LayerBars) => boolean,
): readonly LayerBars[] | undefined {
  if (bars.length === 0) return [];
  if (layersLeft === 0) return undefined;
  for (let size = Math.min(limit.largest, bars.length); size >= 2; size--) {
    if (bars.length > size * layersLeft) return undefined;
    if (limit.isEvenOnly && size % 2 === 1) continue;
    const layer = symmetrical(bars.slice(0, size));
    if (!layer || !fits(layer)) continue;
    const above = splitFrom(
      bars.slice(size),
      layersLeft - 1,
      { largest: size, isEvenOnly: size % 2 === 0 },
      fits,
    );
    if (above) return [layer, ...above];
  }
  return undefined;
}

/** The bars (large to small) as a mirror-symmetrical row with the large ones outermost, or undefined. */
function symmetrical(bars: readonly Bar[]): LayerBars | undefined {
  const left: Bar[] = [];
  let middle: Bar | undefined;
  for (let i = 0; i < bars.length;) {
    const bar = bars[i]!;
    if (bars[i + 1]?.designation === bar.designation) {
      left.push(bar);
      i += 2;
    } else {
      if (middle) return undefined;
      middle = bar;
      i += 1;
    }
  }
  return [...left, ...(middle ? [middle] : []), ...left.toReversed()];
}
