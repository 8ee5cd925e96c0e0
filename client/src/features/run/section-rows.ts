import type { Point } from '#shared/sweep/result.ts';
import { barsText, sizeText } from '#shared/print/section-text.ts';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { exploreValue, type ExploreKey } from '#shared/sweep/explore-axis.ts';
import type { EvaluatedSection, SectionSource } from './section-source.ts';

/** A section as a row of the table behind the chart. */
export interface SectionRow extends EvaluatedSection {
  readonly tieCount: number;
}

/** What a column shows: the two faces' bars, their layers, exact ties, or any value a range can be set on. */
export type RowKey = 'tension' | 'compression' | 'ties' | ExploreKey;

export interface RowOrder {
  readonly key: RowKey;
  readonly isDescending: boolean;
}

/** What a row is ordered by; bars go by their area. Null where the value is not known. */
function valueOf(row: SectionRow, key: RowKey): number | null {
  if (key === 'ties') return row.tieCount;
  if (key === 'tension') return exploreValue(row, 'tensionSteel');
  return exploreValue(row, key === 'compression' ? 'compressionSteel' : key);
}

/** Rows in order; equal ones stay as they were, unknown values always come last. */
export function sortRows(rows: readonly SectionRow[], order: RowOrder | null): readonly SectionRow[] {
  if (order === null) return rows;
  const sign = order.isDescending ? -1 : 1;
  return rows.toSorted((a, b) => {
    const [u, v] = [valueOf(a, order.key), valueOf(b, order.key)];
    if (u === null || v === null) return Number(u === null) - Number(v === null);
    return sign * (u - v);
  });
}

export function rowsOf(
  points: readonly (Point & { readonly tieCount?: number })[],
  source: SectionSource,
): readonly SectionRow[] {
  return points.map((point) => ({ ...source.evaluatedAt(point.index), tieCount: point.tieCount ?? 1 }));
}

/** What a row is found by: its size and bars as they are printed. */
function rowText({ section }: SectionRow, units: UnitSystem): string {
  const { reinforcement } = section;
  const bars =
    reinforcement.kind === 'bars'
      ? [barsText(reinforcement.tension), barsText(reinforcement.compression)]
      : [];
  return [sizeText(section, units), ...bars].join(' ').toLowerCase().replaceAll('×', 'x');
}

/** Rows in whose size or bars every word occurs: `#8`, `12 x 24`, `4-#9 none`. */
export function findRows(
  rows: readonly SectionRow[],
  words: string,
  units: UnitSystem,
): readonly SectionRow[] {
  const wanted = words
    .toLowerCase()
    .replaceAll('×', 'x')
    .replaceAll(/\s*x\s*/g, ' x ')
    .split(',')
    .map((word) => word.trim())
    .filter(Boolean);
  if (wanted.length === 0) return rows;
  return rows.filter((row) => {
    const text = rowText(row, units);
    return wanted.every((word) => text.includes(word));
  });
}
