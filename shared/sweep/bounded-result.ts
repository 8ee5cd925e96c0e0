import { MAX_BAND_KEPT, type BandPoint } from './band.ts';
import { frontOf, hasBand, type SearchState } from './bounded-search.ts';
import type { ChunkResult } from './chunk.ts';
import { edgeShares } from './finish.ts';
import { fingerprint } from './hash.ts';
import { viewOf, type SweepProblem, type View } from './problem.ts';
import type { ViewResult } from './result.ts';
import { expandSpace } from './space.ts';
import { signOf } from './tally.ts';

/** What a search by bounds came to, or had when it was stopped. */
interface BoundedOutcome {
  readonly state: SearchState;
  /** Oriented. */
  readonly found: ChunkResult['front'];
  /** Near-best sections, oriented, one more than is shown: of a search that ended. */
  readonly near: readonly BandPoint[];
  /** Whether nothing is left to look at. */
  readonly isProven: boolean;
}

/**
 * Turns a search by bounds into the result that is stored and shown. What would have to be counted over every section is
 * null or empty: it is not known. The best of the two measures are the ends of the front. The hash is that of the front:
 * how much had to be evaluated for it differs with the threads.
 */
export function boundedResult(
  problem: SweepProblem,
  view: View,
  { state, found, near, isProven }: BoundedOutcome,
): ViewResult {
  const space = expandSpace(problem.space, problem.basis.barStandard);
  const front = frontOf(found, view);
  const band = isProven ? near : [];
  const [x, y] = [signOf(view.x), signOf(view.y)];
  const [first, last] = [front[0], front.at(-1)];
  const hashed = { view: viewOf(view), sectionCount: space.size, isProven, front };
  const { evaluated, provenUnnecessary, boxesClosed: boxes } = state;
  return {
    view: hashed.view,
    sectionCount: space.size,
    evaluated,
    feasible: null,
    cannotFit: null,
    failures: [],
    front,
    band: band.slice(0, MAX_BAND_KEPT).map((p) => ({ index: p.index, x: x * p.x, y: y * p.y })),
    isBandCut: band.length > MAX_BAND_KEPT,
    best:
      isProven && first !== undefined && last !== undefined
        ? [
            { measure: view.x, index: first.index, value: first.x },
            { measure: view.y, index: last.index, value: last.y },
          ]
        : [],
    density: [],
    axisCounts: null,
    edges: edgeShares(space, front),
    bounds: { provenUnnecessary, boxes, isProven, hasBand: isProven && hasBand(view) },
    hash: fingerprint(JSON.stringify(hashed)),
  };
}
