import type { MarkScale, MarkStyle } from '#client/src/charts/front-chart-input.ts';
import type { FrontPoint } from '#shared/sweep/result.ts';
import { exploreValue, type ExploreKey } from '#shared/sweep/explore-axis.ts';
import type { SectionSource } from './section-source.ts';

export interface ThirdMeasure {
  readonly key: ExploreKey;
  readonly low: number;
  readonly high: number;
  readonly scale: MarkScale;
}

/** All marks alike: neither least nor most. */
const ALIKE = 0.5;

/** The front's own least and most of a third measure, and where each mark lies between; null where none has a value. */
export function thirdMeasure(
  front: readonly FrontPoint[],
  { key, style }: { readonly key: ExploreKey; readonly style: MarkStyle },
  source: SectionSource,
): ThirdMeasure | null {
  const values = front.map((point) => exploreValue(source.evaluatedAt(point.index), key));
  const known = values.filter((value) => value !== null);
  if (known.length === 0) return null;
  const [low, high] = [Math.min(...known), Math.max(...known)];
  const shares = values.map((value) => {
    if (value === null) return null;
    return high > low ? (value - low) / (high - low) : ALIKE;
  });
  return { key, low, high, scale: { style, shares } };
}
