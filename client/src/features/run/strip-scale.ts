import type { SectionInput } from '#shared/engine/section.ts';

/** Room beside the widest section, and what the words below need at least, CSS pixels. */
const AIR_PX = 26;
const WORDS_PX = 96;

export interface StripScale {
  readonly pxPerMm: number;
  readonly cellPx: number;
}

/** One scale for all: the deepest section fills the height, the widest sets the pitch. */
export function stripScale(sections: readonly SectionInput[], heightPx: number): StripScale {
  const deepest = Math.max(1, ...sections.map((section) => section.depthMm));
  const widest = Math.max(1, ...sections.map((section) => section.widthMm));
  const pxPerMm = heightPx / deepest;
  return { pxPerMm, cellPx: Math.ceil(Math.max(WORDS_PX, widest * pxPerMm + AIR_PX)) };
}
