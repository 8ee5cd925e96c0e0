import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { fieldText } from '#shared/print/format-quantity.ts';
import { parseNumber } from './parse-number.ts';
import { toStored, type DisplayKind } from '#shared/print/units.ts';

/** Values read from a line of text, or what is wrong with it. */
export type ListReading =
  | { readonly kind: 'values'; readonly values: readonly number[] }
  | { readonly kind: 'unreadable'; readonly problem: string };

/** A comma always parts two values here: `300,350,400` is three widths, not one number with thousands. */
const SEPARATOR = /[\s,;]+/;
const COUNT_RANGE = /^(\d{1,3})\s*[-–—]\s*(\d{1,3})$/;
const MOST_COUNTS = 60;

const pieces = (text: string): string[] => text.split(SEPARATOR).filter((piece) => piece !== '');

/** Reads `12, 14, 16`; the values are returned in SI, ascending, each once. */
export function parseValueList(text: string, kind: DisplayKind, units: UnitSystem): ListReading {
  const values = new Set<number>();
  for (const piece of pieces(text)) {
    const parsed = parseNumber(piece);
    if (parsed.kind === 'unreadable') return { kind: 'unreadable', problem: parsed.problem };
    if (parsed.kind === 'number') values.add(toStored(parsed.value, kind, units));
  }
  return { kind: 'values', values: [...values].sort((a, b) => a - b) };
}

/** Reads numbers of bars: `2–8`, `2, 4, 6`, or both. */
export function parseCounts(text: string): ListReading {
  const counts = new Set<number>();
  for (const piece of pieces(text.replaceAll(/\s*[-–—]\s*/g, '–'))) {
    const range = COUNT_RANGE.exec(piece);
    const [from, to] = range ? [Number(range[1]), Number(range[2])] : [Number(piece), Number(piece)];
    if (!Number.isInteger(from) || !Number.isInteger(to))
      return { kind: 'unreadable', problem: `“${piece}” is not a number of bars: write 2–8 or 2, 4, 6` };
    if (from > to) return { kind: 'unreadable', problem: `${piece}: the end is below the start` };
    if (to - from > MOST_COUNTS)
      return { kind: 'unreadable', problem: `${piece}: at most ${MOST_COUNTS} counts` };
    for (let count = from; count <= to; count += 1) counts.add(count);
  }
  return { kind: 'values', values: [...counts].sort((a, b) => a - b) };
}

export const valueListText = (values: readonly number[], kind: DisplayKind, units: UnitSystem): string =>
  values.map((value) => fieldText(value, kind, units)).join(', ');
