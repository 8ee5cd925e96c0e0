import type { MeasureId } from '#shared/engine/measures.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import type { EvaluatedSection } from './section-source.ts';

/** A section as a row of the table behind the chart. */
export interface SectionRow extends EvaluatedSection {
  readonly tieCount: number;
}

export const ROW_KEYS = [
  'width',
  'depth',
  'fc',
  'tension',
  'compression',
  'steelKgPerM',
  'costPerM',
  'curvatureDuctility',
  'designStrengthNmm',
  'utilisation',
  'ties',
] as const;
export type RowKey = (typeof ROW_KEYS)[number];

export interface RowOrder {
  readonly key: RowKey;
  readonly isDescending: boolean;
}

const areaOf = ({ evaluation }: SectionRow, face: 'tension' | 'compression'): number =>
  (face === 'tension' ? evaluation.geometry?.asMm2 : evaluation.geometry?.asPrimeMm2) ?? 0;

const INPUT_OF: Partial<Record<RowKey, (section: SectionInput) => number>> = {
  width: (section) => section.widthMm,
  depth: (section) => section.depthMm,
  fc: (section) => section.fcMPa,
};

/** What a row is ordered by; bars go by their area. Null where the value is not known. */
function valueOf(row: SectionRow, key: RowKey): number | null {
  const ofInput = INPUT_OF[key];
  if (ofInput !== undefined) return ofInput(row.section);
  if (key === 'tension' || key === 'compression') return areaOf(row, key);
  if (key === 'ties') return row.tieCount;
  return row.evaluation.measures[key as MeasureId];
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
