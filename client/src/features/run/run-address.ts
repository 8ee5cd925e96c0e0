import { MEASURE_IDS, type MeasureId } from '#shared/engine/measures.ts';
import type { View } from '#shared/sweep/problem.ts';

/** What the address of a run says beside the run itself. */
export interface RunAddress {
  readonly view: View;
  /** Index of the chosen section; null for the best one. */
  readonly index: number | null;
  /** Near-best band as a share, 0 … 0.1. */
  readonly bandShare: number;
}

const FIRST_BAND_SHARE = 0.05;
export const WIDEST_BAND_SHARE = 0.1;

const isMeasure = (text: string | null): text is MeasureId => MEASURE_IDS.some((id) => id === text);

function readBand(text: string | null): number {
  const percent = text === null || text === '' ? Number.NaN : Number(text);
  if (!Number.isFinite(percent)) return FIRST_BAND_SHARE;
  return Math.min(Math.max(percent / 100, 0), WIDEST_BAND_SHARE);
}

/** Reads an address that anyone may have typed or cut short: what makes no sense is as if it were not there. */
export function readRunAddress(params: URLSearchParams, first: View): RunAddress {
  const x = params.get('x');
  const y = params.get('y');
  const isView = isMeasure(x) && isMeasure(y) && x !== y;
  const index = params.get('i');
  return {
    view: isView ? { x, y } : first,
    index: index !== null && /^\d{1,12}$/.test(index) ? Number(index) : null,
    bandShare: readBand(params.get('band')),
  };
}

/** The next pair when one side is chosen: choosing the other side's measure swaps the two. */
export function withMeasure(view: View, side: 'x' | 'y', measure: MeasureId): View {
  const other = side === 'x' ? view.y : view.x;
  const kept = measure === other ? view[side] : other;
  return side === 'x' ? { x: measure, y: kept } : { x: kept, y: measure };
}
