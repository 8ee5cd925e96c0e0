import { bestOf } from './band.ts';
import type { ChunkResult } from './chunk.ts';
import { addDensities } from './density.ts';
import { joinFronts } from './front-in-three.ts';
import { FrontBuilder } from './front.ts';

/**
 * The result of two disjoint sets of sections together. Associative, commutative, `emptyChunk()` neutral: the same whatever
 * the threads, chunks and order of arrival. Both come from the same problem and view.
 */
export function mergeChunks(a: ChunkResult, b: ChunkResult): ChunkResult {
  const without = chooseEach(
    { value: a.withoutX, index: a.withoutIndex },
    { value: b.withoutX, index: b.withoutIndex },
  );
  const best = chooseEach(
    { value: a.bestValue, index: a.bestIndex },
    { value: b.bestValue, index: b.bestIndex },
  );
  const pick = (left: Float64Array, right: Float64Array, isRight: Uint8Array) =>
    left.map((value, i) => (isRight[i] ? right[i]! : value));
  return {
    evaluated: a.evaluated + b.evaluated,
    feasible: a.feasible + b.feasible,
    failed: add(a.failed, b.failed),
    failedOnly: add(a.failedOnly, b.failedOnly),
    failedFirst: add(a.failedFirst, b.failedFirst),
    withoutX: pick(a.withoutX, b.withoutX, without),
    withoutY: pick(a.withoutY, b.withoutY, without),
    withoutIndex: pick(a.withoutIndex, b.withoutIndex, without),
    bestValue: pick(a.bestValue, b.bestValue, best),
    bestIndex: pick(a.bestIndex, b.bestIndex, best),
    front: mergeFronts(a, b),
    ...mergeInThree(a, b),
    band: bestOf([...a.band, ...b.band]),
    density: addDensities(a.density, b.density),
    widthFeasible: add(a.widthFeasible, b.widthFeasible),
    widthEvaluated: add(a.widthEvaluated, b.widthEvaluated),
    depthFeasible: add(a.depthFeasible, b.depthFeasible),
    depthEvaluated: add(a.depthEvaluated, b.depthEvaluated),
    fcFeasible: add(a.fcFeasible, b.fcFeasible),
    fcEvaluated: add(a.fcEvaluated, b.fcEvaluated),
  };
}

/** Sum by place; the empty chunk's columns have no places yet. */
function add(a: Float64Array, b: Float64Array): Float64Array {
  if (a.length === 0) return b;
  if (b.length === 0) return a;
  return a.map((value, i) => value + b[i]!);
}

interface Choice {
  readonly value: Float64Array;
  readonly index: Float64Array;
}

/** 1 where the right one is better: smaller value, then lower index. */
function chooseEach(left: Choice, right: Choice): Uint8Array {
  return Uint8Array.from(left.value, (value, i) => {
    if (right.index[i] === -1) return 0;
    if (left.index[i] === -1) return 1;
    const other = right.value[i]!;
    return other < value || (other === value && right.index[i]! < left.index[i]!) ? 1 : 0;
  });
}

function mergeFronts(a: ChunkResult, b: ChunkResult): ChunkResult['front'] {
  const builder = new FrontBuilder();
  for (const { x, y, ties, tieCount } of [...a.front, ...b.front]) builder.addAll(x, y, ties, tieCount);
  return builder.xs.map((x, i) => ({
    x,
    y: builder.ys[i]!,
    ties: builder.ties[i]!,
    tieCount: builder.tieCounts[i]!,
  }));
}

/** Nothing without a third measure; the empty chunk has none either way. */
function mergeInThree({ frontInThree: a }: ChunkResult, { frontInThree: b }: ChunkResult) {
  const frontInThree = a === undefined || b === undefined ? (a ?? b) : joinFronts(a, b);
  return frontInThree && { frontInThree };
}
