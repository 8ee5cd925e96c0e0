import type { MarkScale, MarkStyle } from '#client/src/charts/front-chart-input.ts';
import type { FrontPoint, FrontPointInThree } from '#shared/sweep/result.ts';
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

/** The marks' own least and most of a third measure, and where each mark lies between; null where none has a value. */
export function thirdMeasure(
  marks: readonly (FrontPoint | FrontPointInThree)[],
  { key, style }: { readonly key: ExploreKey; readonly style: MarkStyle },
  source: SectionSource,
): ThirdMeasure | null {
  // A mark of the front in three measures brings its value: thousands need not be evaluated anew.
  const values = marks.map((mark) =>
    'z' in mark ? mark.z : exploreValue(source.evaluatedAt(mark.index), key),
  );
  const known = values.filter((value) => value !== null);
  if (known.length === 0) return null;
  const low = known.reduce((a, b) => Math.min(a, b));
  const high = known.reduce((a, b) => Math.max(a, b));
  const shares = values.map((value) => {
    if (value === null) return null;
    return high > low ? (value - low) / (high - low) : ALIKE;
  });
  return { key, low, high, scale: { style, shares } };
}
