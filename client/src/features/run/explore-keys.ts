import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Run } from '#shared/contract/records.ts';
import { MEASURE_IDS, type MeasureId } from '#shared/engine/measures.ts';
import type { Space } from '#shared/sweep/problem.ts';
import { unavailableReason } from '#client/src/lib/measure-availability.ts';
import { INPUT_KEYS, inputValues, type ExploreKey } from '#shared/sweep/explore-axis.ts';

/** In the order a section is read: what it is made of, then what it comes to. */
const ORDER: readonly ExploreKey[] = [
  'widthMm',
  'depthMm',
  'fc',
  'tensionSteel',
  'compressionSteel',
  'steelKgPerM',
  'costPerM',
  'curvatureDuctility',
  'designStrengthNmm',
  'utilisation',
];

/** What the sections of a run differ in and this reader may see: an axis of one value tells nothing. */
export function exploreKeys(
  run: Pick<Run, 'definition' | 'basis'>,
  space: Space,
  units: UnitSystem,
): readonly ExploreKey[] {
  const { definition, basis } = run;
  const setting = { space: definition.space, demand: definition.demand, basis, units };
  const lengths: Partial<Record<MeasureId, number>> = {
    widthMm: space.widthsMm.length,
    depthMm: space.depthsMm.length,
  };
  const values = inputValues(space, basis.barStandard);
  const known = new Set<ExploreKey>([
    ...INPUT_KEYS.filter((key) => new Set(values[key]).size > 1),
    ...MEASURE_IDS.filter(
      (measure) => unavailableReason(measure, setting) === null && (lengths[measure] ?? 2) > 1,
    ),
  ]);
  return [...ORDER.filter((key) => known.has(key)), ...[...known].filter((key) => !ORDER.includes(key))];
}

/** Axes that are drawn until others are chosen: more would stand too close to be told apart. */
export const usualAxes = (keys: readonly ExploreKey[]): readonly ExploreKey[] =>
  keys.filter((key) => ORDER.includes(key));

/** Values a range's end may snap to; null for what a section comes to, which may be anything. */
export function snapValues(key: ExploreKey, space: Space, run: Pick<Run, 'basis'>): readonly number[] | null {
  if (key === 'widthMm') return space.widthsMm;
  if (key === 'depthMm') return space.depthsMm;
  const input = INPUT_KEYS.find((one) => one === key);
  if (input === undefined) return null;
  const values = inputValues(space, run.basis.barStandard)[input];
  return [...new Set(values)].sort((a, b) => a - b);
}
