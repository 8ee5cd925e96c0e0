import type { BarGroup, Face, SectionInput, Stirrup } from '../engine/section.ts';
import { SPACE_AXES, sectionAt, type SpaceAxis } from './space.ts';
import type { Space, SteelSet } from './problem.ts';

/** Closer than this share two typed values are one: ranges are sums of steps. */
const SAME_SHARE = 1e-9;
const isSame = (a: number, b: number) => Math.abs(a - b) <= SAME_SHARE * Math.max(Math.abs(a), Math.abs(b));

const groupKey = (bars: BarGroup) => bars.map(({ bar, count }) => `${count}-${bar}`).join('+');
const stirrupKey = (stirrup: Stirrup | null) =>
  stirrup === null
    ? 'none'
    : `${stirrup.legs}-${stirrup.bar}@${stirrup.spacingMm.toPrecision(9)}${stirrup.isDesigned === true ? ' designed' : ''}`;

const roundedPart = (_key: string, value: unknown): unknown =>
  typeof value === 'number' ? Number(value.toPrecision(9)) : value;

/** The same text for the same section, whichever space it is a part of. */
export const sectionKey = ({ stirrup, reinforcement, flange = null, ...size }: SectionInput): string =>
  JSON.stringify(
    [
      size.widthMm,
      size.depthMm,
      size.fcMPa,
      size.fyMPa,
      size.coverMm,
      stirrupKey(stirrup),
      reinforcement.kind === 'bars'
        ? [groupKey(reinforcement.tension), groupKey(reinforcement.compression)]
        : reinforcement.layers.map(({ depthMm, areaMm2, face }) => [depthMm, areaMm2, face]),
      flange,
    ],
    roundedPart,
  );

function steelPlace(sets: readonly SteelSet[], face: Face, { reinforcement }: SectionInput): number {
  if (reinforcement.kind === 'bars') {
    const key = groupKey(reinforcement[face]);
    return sets.findIndex((set) => set.kind === 'bars' && groupKey(set.bars) === key);
  }
  const areaMm2 = reinforcement.layers.find((layer) => layer.face === face)?.areaMm2 ?? 0;
  return sets.findIndex((set) =>
    set.kind === 'area' ? isSame(set.areaMm2, areaMm2) : areaMm2 === 0 && set.bars.length === 0,
  );
}

/** Place of a section's value on each axis; −1 where the axis does not have it. */
function placesOf(space: Space, section: SectionInput): Readonly<Record<SpaceAxis, number>> {
  const at = (values: readonly number[], value: number) => values.findIndex((one) => isSame(one, value));
  const stirrup = stirrupKey(section.stirrup);
  return {
    width: at(space.widthsMm, section.widthMm),
    cover: at(space.coversMm, section.coverMm),
    stirrups: space.stirrups.findIndex((one) => stirrupKey(one) === stirrup),
    tension: steelPlace(space.tension, 'tension', section),
    compression: steelPlace(space.compression, 'compression', section),
    fy: at(space.fyMPa, section.fyMPa),
    fc: at(space.fcMPa, section.fcMPa),
    depth: at(space.depthsMm, section.depthMm),
  };
}

/** A section's place in a space: its lowest index, or the axes that do not have its value. */
export type SectionPlace =
  | { readonly kind: 'inside'; readonly index: number }
  /** None named where its slab, or where its plain steel lies, is another. */
  | { readonly kind: 'outside'; readonly axes: readonly SpaceAxis[] };

/** The inverse of `sectionAt`, for a section of this space or of any other. */
export function placeOfSection(space: Space, section: SectionInput): SectionPlace {
  const places = placesOf(space, section);
  const axes = SPACE_AXES.filter((axis) => places[axis] === -1);
  if (axes.length > 0) return { kind: 'outside', axes };
  const lengths: Readonly<Record<SpaceAxis, number>> = {
    width: space.widthsMm.length,
    cover: space.coversMm.length,
    stirrups: space.stirrups.length,
    tension: space.tension.length,
    compression: space.compression.length,
    fy: space.fyMPa.length,
    fc: space.fcMPa.length,
    depth: space.depthsMm.length,
  };
  const index = SPACE_AXES.reduce((sum, axis) => sum * lengths[axis] + places[axis], 0);
  return sectionKey(sectionAt(space, index)) === sectionKey(section)
    ? { kind: 'inside', index }
    : { kind: 'outside', axes: [] };
}
