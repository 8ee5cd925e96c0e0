import { MEASURE_DIRECTION } from '../engine/measures.ts';
import type { Point, ViewResult } from './result.ts';

/** Rounding of the last digit must not drop a section that lies on the edge of the band. */
const SLACK = 1e-9;

/** Sections whose leading measure is within `share` of the best, best first. */
export function bandWithin(
  result: Pick<ViewResult, 'band' | 'front' | 'view'>,
  share: number,
): readonly Point[] {
  const best = result.front[0];
  if (best === undefined || share === 0) return [];
  const room = Math.abs(best.x) * (share + SLACK);
  const isLess = MEASURE_DIRECTION[result.view.x] === 'less';
  return result.band.filter((point) => (isLess ? point.x - best.x : best.x - point.x) <= room);
}
