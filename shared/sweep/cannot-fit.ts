import { isWithinLength } from '../engine/limits.ts';
import { isAboveTension, isPlain, leastDepthMm, placementAt, prepareSweep } from './prepared-sweep.ts';
import type { SweepProblem } from './problem.ts';

/**
 * Exact number of sections whose bars cannot be placed, without evaluating any: one arrangement per width, cover, stirrup
 * and set, then a comparison per pair of sets and depth.
 * @throws InvalidSectionError for an empty axis or an unknown bar.
 */
export function countCannotFit(problem: SweepProblem): number {
  const prepared = prepareSweep(problem, { x: 'steelKgPerM', y: 'depthMm' });
  const { space } = prepared;
  const combinations = space.widthsMm.length * space.coversMm.length * space.stirrups.length;
  const perPair = space.fyMPa.length * space.fcMPa.length;
  let count = 0;
  for (let i = 0; i < combinations; i++) {
    const placement = placementAt(prepared, i);
    for (const t of placement.tension)
      for (const c of placement.compression) {
        const least = leastDepthMm(placement, t, c);
        const placed = space.depthsMm.filter(
          (h) => isWithinLength(least, h) && (!isPlain(t) || isAboveTension(t, c, h)),
        );
        count += (space.depthsMm.length - placed.length) * perPair;
      }
  }
  return count;
}
