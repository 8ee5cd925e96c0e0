import { findBar } from '../engine/bars.ts';
import { assertFlange } from '../engine/flange.ts';
import { InvalidSectionError } from '../engine/preconditions.ts';
import type { BarStandard, Layer, Reinforcement, SectionInput } from '../engine/section.ts';
import { axisLength, expandAxis } from './axis.ts';
import type { Space, SpaceDefinition, SteelSet, SteelSetsDefinition } from './problem.ts';

export const SPACE_AXES = [
  'width',
  'cover',
  'stirrups',
  'tension',
  'compression',
  'fy',
  'fc',
  'depth',
] as const;
/** The axes of a space, outermost first in the index. */
export type SpaceAxis = (typeof SPACE_AXES)[number];

/** Number of values on each axis, without expanding anything; NaN for a broken range. */
export function axisLengths(definition: SpaceDefinition): Record<SpaceAxis, number> {
  return {
    width: axisLength(definition.width),
    cover: axisLength(definition.cover),
    stirrups: definition.stirrups.length,
    tension: setCount(definition.tension),
    compression: setCount(definition.compression),
    fy: axisLength(definition.fy),
    fc: axisLength(definition.fc),
    depth: axisLength(definition.depth),
  };
}

/** Exact number of sections of a space; NaN for a broken range. */
export function spaceSize(definition: SpaceDefinition): number {
  return Object.values(axisLengths(definition)).reduce((product, length) => product * length, 1);
}

function setCount(sets: SteelSetsDefinition): number {
  if (sets.kind === 'areas') return sets.areasMm2.length;
  return (sets.none ? 1 : 0) + sets.sizes.length * sets.counts.length + (sets.mixed?.length ?? 0);
}

/**
 * Expands a definition into its axes.
 * @throws InvalidSectionError, with the path below the space, for an empty axis or an unknown bar.
 */
export function expandSpace(definition: SpaceDefinition, standard: BarStandard): Space {
  const axis = (name: 'width' | 'cover' | 'fy' | 'fc' | 'depth') =>
    below(name, () => expandAxis(definition[name]));
  const space = {
    widthsMm: axis('width'),
    coversMm: axis('cover'),
    stirrups: definition.stirrups,
    tension: expandSets('tension', definition.tension, standard),
    compression: expandSets('compression', definition.compression, standard),
    fyMPa: axis('fy'),
    fcMPa: axis('fc'),
    depthsMm: axis('depth'),
    flange: definition.flange ?? null,
    size: spaceSize(definition),
  };
  definition.stirrups.forEach((stirrup, i) => {
    if (stirrup && !findBar(standard, stirrup.bar))
      throw new InvalidSectionError(`Stirrup size ${stirrup.bar} is not in the bar list`, [
        'stirrups',
        i,
        'bar',
      ]);
  });
  if (space.flange)
    assertFlange(space.flange, {
      widestWebMm: Math.max(...space.widthsMm),
      leastDepthMm: Math.min(...space.depthsMm),
    });
  assertAreasInside(definition, Math.min(...space.widthsMm), Math.min(...space.depthsMm));
  if (
    space.tension.some((set) => set.kind === 'area') &&
    space.compression.some((set) => set.kind === 'bars' && set.bars.length > 0)
  )
    throw new InvalidSectionError('Steel given as areas cannot be mixed with bars', ['compression']);
  return space;
}

function below<T>(axis: SpaceAxis, make: () => T): T {
  try {
    return make();
  } catch (error) {
    if (error instanceof InvalidSectionError)
      throw new InvalidSectionError(error.message, [axis, ...error.path]);
    throw error;
  }
}

function expandSets(
  axis: 'tension' | 'compression',
  sets: SteelSetsDefinition,
  standard: BarStandard,
): readonly SteelSet[] {
  if (sets.kind === 'areas') {
    if (axis === 'tension' && sets.areasMm2.some((area) => !(area > 0)))
      throw new InvalidSectionError('Tension steel needs an area above zero', [axis, 'areasMm2']);
    return sets.areasMm2.map((areaMm2) => ({ kind: 'area', areaMm2, at: sets.at }));
  }
  if (axis === 'tension' && sets.none)
    throw new InvalidSectionError('A beam needs steel at the tension face', [axis, 'none']);
  sets.sizes.forEach((size, i) => {
    if (!findBar(standard, size))
      throw new InvalidSectionError(`Bar ${size} is not in the bar list`, [axis, 'sizes', i]);
  });
  const single = sets.sizes.flatMap((bar) => sets.counts.map((count) => [{ bar, count }]));
  const groups = [...(sets.none ? [[]] : []), ...single, ...(sets.mixed ?? [])];
  if (groups.length === 0)
    throw new InvalidSectionError('Choose at least one size and count', [axis, 'sizes']);
  return groups.map((bars) => ({ kind: 'bars', bars }));
}

function assertAreasInside(
  { tension, compression }: SpaceDefinition,
  leastWidthMm: number,
  leastDepthMm: number,
): void {
  const largest = [tension, compression].map((sets) =>
    sets.kind === 'areas' ? Math.max(...sets.areasMm2) : 0,
  );
  if (largest[0]! + largest[1]! >= leastWidthMm * leastDepthMm)
    throw new InvalidSectionError('The steel is more than the smallest section of the space', [
      'tension',
      'areasMm2',
    ]);
  for (const [axis, sets] of [
    ['tension', tension],
    ['compression', compression],
  ] as const) {
    if (sets.kind !== 'areas') continue;
    const offset = offsetAt(sets.at, leastDepthMm);
    if (!(offset > 0 && offset < leastDepthMm))
      throw new InvalidSectionError(
        `Steel ${offset} mm from the face lies outside a section ${leastDepthMm} mm deep`,
        [axis, 'at'],
      );
  }
}

/** Distance of a plain layer from its own face in a section of depth h, mm. */
function offsetAt(at: { offsetMm: number } | { shareOfDepth: number }, depthMm: number): number {
  return 'offsetMm' in at ? at.offsetMm : at.shareOfDepth * depthMm;
}

/**
 * The section of an index; a pure function, so that a result can be stored as a number and computed again anywhere.
 * @throws InvalidSectionError for an index outside 0 … size − 1.
 */
export function sectionAt(space: Space, index: number): SectionInput {
  if (!Number.isInteger(index) || index < 0 || index >= space.size)
    throw new InvalidSectionError(`Section ${index} is not in this space of ${space.size}`, ['index']);
  let rest = index;
  const pick = <T>(axis: readonly T[]): T => {
    const value = axis[rest % axis.length]!;
    rest = Math.floor(rest / axis.length);
    return value;
  };
  const depthMm = pick(space.depthsMm);
  const fcMPa = pick(space.fcMPa);
  const fyMPa = pick(space.fyMPa);
  const compression = pick(space.compression);
  const tension = pick(space.tension);
  const stirrup = pick(space.stirrups);
  const coverMm = pick(space.coversMm);
  const widthMm = pick(space.widthsMm);
  return {
    widthMm,
    depthMm,
    fcMPa,
    fyMPa,
    coverMm,
    stirrup,
    reinforcement: steelOf(tension, compression, depthMm),
    ...(space.flange && { flange: space.flange }),
  };
}

function steelOf(tension: SteelSet, compression: SteelSet, depthMm: number): Reinforcement {
  if (tension.kind === 'bars' && compression.kind === 'bars')
    return { kind: 'bars', tension: tension.bars, compression: compression.bars };
  const layers: Layer[] = [];
  if (compression.kind === 'area' && compression.areaMm2 > 0)
    layers.push({
      depthMm: offsetAt(compression.at, depthMm),
      areaMm2: compression.areaMm2,
      face: 'compression',
    });
  if (tension.kind === 'area')
    layers.push({
      depthMm: depthMm - offsetAt(tension.at, depthMm),
      areaMm2: tension.areaMm2,
      face: 'tension',
    });
  return { kind: 'layers', layers };
}
