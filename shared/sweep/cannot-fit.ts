import { depthNeededMm } from '../engine/arrangement.ts';
import { isWithinLength } from '../engine/limits.ts';
import { placementAt, prepareSweep } from './prepared-sweep.ts';
import type { SweepProblem } from './problem.ts';

/**
 * Exact number of sections whose bars cannot be placed, without evaluating any: one arrangement per width, cover, stirrup
 * and set, then a comparison per pair of sets and depth.
 * @throws InvalidSectionError for an empty axis or an unknown bar.
 */
export function countCannotFit(problem: SweepProblem): number {
  const prepared = prepareSweep(problem, { x: 'steelKgPerM', y: 'depthMm' });
  const { space, ruleSet } = prepared;
  if (space.tension.some((set) => set.kind === 'area')) return 0;
  const combinations = space.widthsMm.length * space.coversMm.length * space.stirrups.length;
  const perPair = space.fyMPa.length * space.fcMPa.length;
  const depths = space.depthsMm.toSorted((a, b) => a - b);
  let count = 0;
  for (let i = 0; i < combinations; i++) {
    const { tension, compression } = placementAt(prepared, i);
    for (const t of tension)
      for (const c of compression) {
        if (!t.fits || !c.fits) {
          count += depths.length * perPair;
          continue;
        }
        const needed = depthNeededMm(t, c, ruleSet);
        let tooShallow = 0;
        while (tooShallow < depths.length && !isWithinLength(needed, depths[tooShallow]!)) tooShallow++;
        count += tooShallow * perPair;
      }
  }
  return count;
}
