import { CHECK_IDS } from '../engine/evaluation.ts';
import { MEASURE_IDS } from '../engine/measures.ts';
import { MAX_BAND_KEPT } from './band.ts';
import type { ChunkResult } from './chunk.ts';
import { densityCells } from './density.ts';
import { fingerprint } from './hash.ts';
import { resultInThree } from './front-in-three.ts';
import { viewOf, type Space, type SweepProblem, type View } from './problem.ts';
import { EDGE_AXES, type EdgeAxis, type EdgeShare, type FrontPoint, type ViewResult } from './result.ts';
import { expandSpace } from './space.ts';
import { signOf } from './tally.ts';

/** Turns merged chunks, of the whole space or a part, into the result that is stored and shown. */
export function finishResult(problem: SweepProblem, view: View, chunk: ChunkResult): ViewResult {
  const space = expandSpace(problem.space, problem.basis.barStandard);
  const x = signOf(view.x);
  const y = signOf(view.y);
  const front = chunk.front.map((point) => ({
    index: point.ties[0]!,
    x: x * point.x,
    y: y * point.y,
    tieCount: point.tieCount,
    ties: point.ties,
  }));
  const withoutHash: Omit<ViewResult, 'hash'> = {
    view: viewOf(view),
    sectionCount: space.size,
    evaluated: chunk.evaluated,
    feasible: chunk.feasible,
    cannotFit: chunk.failed[CHECK_IDS.indexOf('bar-fit')]!,
    failures: CHECK_IDS.map((check, i) => ({
      check,
      failed: chunk.failed[i]!,
      failedOnlyThis: chunk.failedOnly[i]!,
      bestWithout:
        chunk.withoutIndex[i] === -1
          ? null
          : { index: chunk.withoutIndex[i]!, x: x * chunk.withoutX[i]!, y: y * chunk.withoutY[i]! },
    })),
    front,
    ...(chunk.frontInThree &&
      view.z && { frontInThree: resultInThree(chunk.frontInThree, { x, y, z: signOf(view.z) }) }),
    band: chunk.band.slice(0, MAX_BAND_KEPT).map((p) => ({ index: p.index, x: x * p.x, y: y * p.y })),
    isBandCut: chunk.band.length > MAX_BAND_KEPT,
    best: MEASURE_IDS.flatMap((measure, i) =>
      chunk.bestIndex[i] === -1
        ? []
        : [{ measure, index: chunk.bestIndex[i]!, value: signOf(measure) * chunk.bestValue[i]! }],
    ),
    density: densityCells(chunk.density),
    axisCounts: {
      width: axisCounts(space.widthsMm, chunk.widthFeasible, chunk.widthEvaluated),
      depth: axisCounts(space.depthsMm, chunk.depthFeasible, chunk.depthEvaluated),
      fc: axisCounts(space.fcMPa, chunk.fcFeasible, chunk.fcEvaluated),
    },
    edges: edgeShares(space, front),
  };
  return {
    ...withoutHash,
    // Counted later than the rest: left out of the hash, so that the same result keeps the one it had.
    failures: withoutHash.failures.map((of, i) => ({ ...of, failedFirst: chunk.failedFirst[i]! })),
    hash: fingerprint(JSON.stringify(withoutHash)),
  };
}

function axisCounts(values: readonly number[], feasible: Float64Array, evaluated: Float64Array) {
  return values.map((value, i) => ({ value, feasible: feasible[i] ?? 0, evaluated: evaluated[i] ?? 0 }));
}

/** A vertex sits on an end only if all its ties do; with more ties than are kept by name nothing can be said. */
function isAllAt(point: FrontPoint, placeOf: (index: number) => number, edge: number): boolean {
  return point.tieCount === point.ties.length && point.ties.every((index) => placeOf(index) === edge);
}

/** Share of the front's vertices at each end of an axis with more than one value; ends with none are left out. */
export function edgeShares(space: Space, front: readonly FrontPoint[]): EdgeShare[] {
  if (front.length === 0) return [];
  const lengths = { depth: space.depthsMm.length, fc: space.fcMPa.length, width: space.widthsMm.length };
  const perWidth = space.size / lengths.width;
  const placeOf: Record<EdgeAxis, (index: number) => number> = {
    depth: (index) => index % lengths.depth,
    fc: (index) => Math.floor(index / lengths.depth) % lengths.fc,
    width: (index) => Math.floor(index / perWidth),
  };
  return EDGE_AXES.filter((axis) => lengths[axis] > 1).flatMap((axis) =>
    (['low', 'high'] as const).flatMap((end) => {
      const edge = end === 'low' ? 0 : lengths[axis] - 1;
      const share = front.filter((point) => isAllAt(point, placeOf[axis], edge)).length / front.length;
      return share > 0 ? [{ axis, end, share }] : [];
    }),
  );
}
