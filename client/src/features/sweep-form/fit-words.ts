import { countsText } from '#client/src/lib/counts-text.ts';
import type { WidthFit } from './fit-preview.ts';

const LAYERS = ['one layer', 'two layers', 'three layers', 'four layers'] as const;

/** `2–4 in one layer, 5, 6 in two; 7, 8 do not fit`. */
export function fitWords({ byLayers, tooMany }: WidthFit): string {
  const placed = byLayers
    .flatMap((counts, k) => (counts.length === 0 ? [] : [`${countsText(counts)} in ${LAYERS[k]}`]))
    .join(', ');
  if (tooMany.length === 0) return placed;
  const refused = `${countsText(tooMany)} ${tooMany.length === 1 ? 'does' : 'do'} not fit`;
  return placed === '' ? refused : `${placed}; ${refused}`;
}
