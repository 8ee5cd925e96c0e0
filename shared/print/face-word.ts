import type { Face, SectionInput } from '../engine/section.ts';

/** With the slab at its tension face a beam hogs: its tension bars are at the top. */
export const isHogging = ({ flange }: Pick<SectionInput, 'flange'>): boolean => flange?.face === 'tension';

/** Where the bars of a face lie in the beam as it is built. */
export const faceWord = (face: Face, section: Pick<SectionInput, 'flange'>): 'bottom' | 'top' =>
  (face === 'tension') === isHogging(section) ? 'top' : 'bottom';
