import { and, eq, isNull, sql, type SQL } from 'drizzle-orm';
import { viewOf, type SweepProblem, type View } from '#shared/sweep/problem.ts';
import type { Database } from '../../db/client.ts';
import { runViews } from '../../db/schema/run-views.ts';
import { runs } from '../../db/schema/runs.ts';
import { viewShards } from '../../db/schema/view-shards.ts';
import { changeView, COUNT_FROM_NOW } from '../change-view.ts';
import { enqueueMerge } from '../compute-jobs.ts';
import type { SectionRange } from '../plan-shards.ts';

export interface ShardKey {
  readonly viewId: string;
  readonly from: number;
}

export interface ClaimedShard extends ShardKey, SectionRange {
  readonly runId: string;
  /** The queue's worker that holds it. */
  readonly workerId: string;
  readonly problem: SweepProblem;
  readonly view: View;
  /** The view the run was started with: what that finds is kept for the others. */
  readonly ownView: View;
  readonly sectionCount: number;
}

export const isShard = ({ viewId, from }: ShardKey): SQL | undefined =>
  and(eq(viewShards.viewId, viewId), eq(viewShards.fromIndex, from));

/** Takes the shard for one worker. Undefined where there is nothing left to do. */
export async function claimShard(
  db: Database,
  { viewId, from, workerId }: ShardKey & { readonly workerId: string },
): Promise<ClaimedShard | undefined> {
  const found = await findShard(db, { viewId, from });
  if (found === undefined || !['queued', 'running'].includes(found.view.state)) return undefined;
  const { run, view, shard } = found;
  if (shard.isDone || view.cancelRequestedAt !== null) {
    // Delivered twice, or its worker died before it could obey: whoever joins the shards sees what is left to do.
    await leaveShard(db, { viewId, from });
    return undefined;
  }
  const isClaimed = await db.transaction(async (tx) => {
    const [claimed] = await tx
      .update(viewShards)
      .set({ workerId, evaluated: 0 })
      .where(and(isShard({ viewId, from }), isNull(viewShards.result), eq(viewShards.toIndex, shard.to)))
      .returning({ from: viewShards.fromIndex });
    if (claimed === undefined) return false;
    const target = { runId: run.id, viewId, from: ['queued'] } as const;
    if (view.state === 'queued')
      await changeView(tx, target, { ...COUNT_FROM_NOW, state: 'running', startedAt: new Date() });
    return true;
  });
  if (!isClaimed) return undefined;
  const { space, demand, rules } = run.definition;
  return {
    runId: run.id,
    viewId,
    workerId,
    from,
    to: shard.to,
    problem: { space, demand, rules, basis: run.basis },
    view: viewOf(view),
    ownView: run.definition.view,
    sectionCount: run.sectionCount,
  };
}

async function findShard(db: Database, key: ShardKey) {
  const [found] = await db
    .select({
      run: { id: runs.id, definition: runs.definition, basis: runs.basis, sectionCount: runs.sectionCount },
      view: {
        x: runViews.x,
        y: runViews.y,
        z: runViews.z,
        state: runViews.state,
        cancelRequestedAt: runViews.cancelRequestedAt,
      },
      shard: { to: viewShards.toIndex, isDone: sql<boolean>`${viewShards.result} is not null` },
    })
    .from(viewShards)
    .innerJoin(runViews, eq(runViews.id, viewShards.viewId))
    .innerJoin(runs, eq(runs.id, runViews.runId))
    .where(isShard(key));
  return found;
}

/** Nobody holds it any more; its view is looked at by whoever joins the shards. */
async function leaveShard(db: Database, key: ShardKey): Promise<void> {
  await db.transaction(async (tx) => {
    await tx
      .update(viewShards)
      .set({ workerId: null, evaluated: 0 })
      .where(and(isShard(key), isNull(viewShards.result)));
    await enqueueMerge(tx, key.viewId);
  });
}
