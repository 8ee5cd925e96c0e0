import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import type { DesignBasis } from '#shared/engine/section.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import type { View } from '#shared/sweep/problem.ts';
import type { ViewResult } from '#shared/sweep/result.ts';
import { spaceSize } from '#shared/sweep/space.ts';
import type { ComputePool } from '../compute/pool.ts';
import { createCancelFlag, sweepInChunks } from '../compute/sweep-in-chunks.ts';

export interface ComputedView {
  readonly view: View;
  readonly result: ViewResult;
  readonly elapsedMs: number;
}

/** Computes the views of a run on the pool, as the queue does. */
export async function computeViews(
  pool: ComputePool,
  { definition, basis }: { definition: SweepDefinition; basis: DesignBasis },
  views: readonly View[],
): Promise<ComputedView[]> {
  const { space, demand, rules } = definition;
  const problem = { space, demand, rules, basis };
  const computed: ComputedView[] = [];
  for (const view of views) {
    const startedAt = performance.now();
    const { chunk } = await sweepInChunks({
      pool,
      key: JSON.stringify([problem, view]),
      problem,
      view,
      to: spaceSize(space),
      cancelFlag: createCancelFlag(),
    });
    const result = finishResult(problem, view, chunk);
    computed.push({ view, result, elapsedMs: performance.now() - startedAt });
  }
  return computed;
}
