import { getBar } from '../engine/bars.ts';
import { MEASURE_IDS, type MeasureId } from '../engine/measures.ts';
import type { Evaluation } from '../engine/evaluation.ts';
import type { BarStandard, SectionInput } from '../engine/section.ts';
import type { Space, SteelSet } from './problem.ts';

/** What a section was made from beside its width and depth, which are measures already. */
export const INPUT_KEYS = ['fc', 'tensionSteel', 'compressionSteel', 'fy', 'cover'] as const;
export type InputKey = (typeof INPUT_KEYS)[number];

/** Everything a range can be set on: the inputs and the measures. */
export type ExploreKey = InputKey | MeasureId;
export const EXPLORE_KEYS: readonly ExploreKey[] = [...INPUT_KEYS, ...MEASURE_IDS];

export const isInputKey = (key: ExploreKey): key is InputKey => INPUT_KEYS.some((one) => one === key);
export const isExploreKey = (text: string): text is ExploreKey => EXPLORE_KEYS.some((key) => key === text);

/** Area of one set of steel, mm². */
function areaOf(set: SteelSet, standard: BarStandard): number {
  if (set.kind === 'area') return set.areaMm2;
  return set.bars.reduce((sum, { bar, count }) => sum + getBar(standard, bar).areaMm2 * count, 0);
}

/** Value of every place of an input's axis, in the order of the space's index. */
export function inputValues(
  space: Space,
  standard: BarStandard,
): Readonly<Record<InputKey, readonly number[]>> {
  return {
    fc: space.fcMPa,
    fy: space.fyMPa,
    cover: space.coversMm,
    tensionSteel: space.tension.map((set) => areaOf(set, standard)),
    compressionSteel: space.compression.map((set) => areaOf(set, standard)),
  };
}

/** Place on an input's axis from a section's index; the order of the axes is the space's. */
export function inputPlace(space: Space, key: InputKey): (index: number) => number {
  const { depthsMm, fcMPa, fyMPa, compression, tension, stirrups, coversMm } = space;
  const strengths = depthsMm.length * fcMPa.length;
  const bars = strengths * fyMPa.length * compression.length;
  const inner: Readonly<Record<InputKey, number>> = {
    fc: depthsMm.length,
    fy: strengths,
    compressionSteel: strengths * fyMPa.length,
    tensionSteel: bars,
    cover: bars * tension.length * stirrups.length,
  };
  const length: Readonly<Record<InputKey, number>> = {
    fc: fcMPa.length,
    fy: fyMPa.length,
    compressionSteel: compression.length,
    tensionSteel: tension.length,
    cover: coversMm.length,
  };
  const [below, values] = [inner[key], length[key]];
  return (index) => Math.floor(index / below) % values;
}

/** A section of the space with what the engine makes of it. */
export interface JudgedSection {
  readonly section: SectionInput;
  readonly evaluation: Evaluation;
}

/** One value of an evaluated section; null where it has none. */
export function exploreValue({ section, evaluation }: JudgedSection, key: ExploreKey): number | null {
  if (!isInputKey(key)) return evaluation.measures[key];
  if (key === 'fc') return section.fcMPa;
  if (key === 'fy') return section.fyMPa;
  if (key === 'cover') return section.coverMm;
  return (key === 'tensionSteel' ? evaluation.geometry?.asMm2 : evaluation.geometry?.asPrimeMm2) ?? null;
}
