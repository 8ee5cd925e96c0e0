import type { SectionInput } from '#shared/engine/section.ts';

/** Room beside the widest section, and what the words below need at least, CSS pixels. */
const AIR_PX = 26;
const WORDS_PX = 96;
/** A slab makes a drawing wide: then all are drawn smaller, so that a few still stand side by side. */
const WIDEST_PX = 180;

export interface StripScale {
  readonly pxPerMm: number;
  readonly cellPx: number;
}

/**
 * One scale for all: the deepest section fills the height, the widest sets the pitch. `overhangMm` is what the slab adds to
 * the width of the web.
 */
export function stripScale(sections: readonly SectionInput[], heightPx: number, overhangMm = 0): StripScale {
  const deepest = Math.max(1, ...sections.map((section) => section.depthMm));
  const widest = Math.max(1, ...sections.map((section) => section.widthMm)) + overhangMm;
  const pxPerMm = Math.min(heightPx / deepest, WIDEST_PX / widest);
  return { pxPerMm, cellPx: Math.ceil(Math.max(WORDS_PX, widest * pxPerMm + AIR_PX)) };
}
