import { setTimeout as delay } from 'node:timers/promises';
import { eq, sql } from 'drizzle-orm';
import { finishResult } from '#shared/sweep/finish.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import type { ViewResult } from '#shared/sweep/result.ts';
import type { RunMethod } from '#shared/sweep/run-method.ts';
import type { Database } from '../../db/client.ts';
import { isDatabaseAway } from '../../db/database-error.ts';
import { runViews } from '../../db/schema/run-views.ts';
import { runs } from '../../db/schema/runs.ts';
import { viewShards } from '../../db/schema/view-shards.ts';
import { changeView, STOP_COUNTING } from '../change-view.ts';
import { describePart, describeResult } from '../describe-result.ts';
import { failView } from '../end-view.ts';
import { FAILURE_MESSAGE, type WorkContext } from './context.ts';
import { finishView } from './finish-view.ts';
import type { MergedShards } from './merged-shards.ts';
import { evaluatedOf } from './shard-progress.ts';

type MergeContext = Pick<WorkContext, 'db' | 'log' | 'stopSignal'> & { readonly merged: MergedShards };

interface ViewToMerge {
  readonly runId: string;
  readonly viewId: string;
  readonly problem: SweepProblem;
  readonly view: View;
  readonly sectionCount: number;
  readonly method: RunMethod;
  readonly isCancelRequested: boolean;
  /** Sections that the stored result covers already. */
  readonly merged: number;
}

/**
 * Joins the shards of a view that are done: into its final result when that is all, into what is kept when it was
 * cancelled and nobody works on it any more, and otherwise into the front that is shown meanwhile.
 */
export async function mergeView(viewId: string, context: MergeContext): Promise<void> {
  const { db, merged, log } = context;
  const view = await findView(db, viewId);
  if (view === undefined) {
    merged.forget(viewId);
    return;
  }
  try {
    await mergeFound(view, context);
  } catch (error) {
    if (isDatabaseAway(error)) throw error;
    log.error({ err: error, viewId }, 'The shards of a view could not be joined');
    await failView(db, view, FAILURE_MESSAGE);
  }
}

async function mergeFound(view: ViewToMerge, { db, merged, stopSignal }: MergeContext): Promise<void> {
  const { viewId, problem } = view;
  // Its worker writes what it finds; there is nothing to join but, after a cancel, an end to write.
  if (view.method === 'bounds' && !view.isCancelRequested) return;
  if (!view.isCancelRequested && !(await isAllDone(db, viewId)))
    await delay(merged.pauseMs(viewId), undefined, { signal: stopSignal }).catch(() => undefined);
  const { chunk, shardCount } = await merged.bringUpToDate(db, viewId);
  const result = merged.timed(viewId, () => finishResult(problem, view.view, chunk));
  if (chunk.evaluated === view.sectionCount) {
    await finishView(db, view, result);
    merged.forget(viewId);
  } else if (view.isCancelRequested) await endCancelled(db, view, { result, shardCount });
  else await showPart(db, view, result);
}

/** The view, while it is under way. */
async function findView(db: Database, viewId: string): Promise<ViewToMerge | undefined> {
  const [found] = await db
    .select({
      runId: runs.id,
      definition: runs.definition,
      basis: runs.basis,
      sectionCount: runs.sectionCount,
      method: runs.method,
      view: { x: runViews.x, y: runViews.y, z: runViews.z },
      state: runViews.state,
      cancelRequestedAt: runViews.cancelRequestedAt,
      merged: runViews.merged,
    })
    .from(runViews)
    .innerJoin(runs, eq(runs.id, runViews.runId))
    .where(eq(runViews.id, viewId));
  if (found === undefined || !['queued', 'running'].includes(found.state)) return undefined;
  const { definition, basis, cancelRequestedAt, ...rest } = found;
  const { space, demand, rules } = definition;
  return {
    ...rest,
    viewId,
    problem: { space, demand, rules, basis },
    isCancelRequested: cancelRequestedAt !== null,
  };
}

async function isAllDone(db: Database, viewId: string): Promise<boolean> {
  const open = sql`${viewShards.viewId} = ${viewId} and ${viewShards.result} is null`;
  return (await db.$count(viewShards, open)) === 0;
}

async function showPart(db: Database, view: ViewToMerge, result: ViewResult): Promise<void> {
  const { runId, viewId } = view;
  await changeView(
    db,
    // Another process may have joined more of them meanwhile.
    { runId, viewId, from: ['queued', 'running'], when: sql`${runViews.merged} < ${result.evaluated}` },
    {
      ...describeResult(result),
      evaluated: sql`greatest(${result.evaluated}::bigint, ${evaluatedOf(viewId)})`,
    },
  );
}

/** Refused where a shard is still in work, or became done since: its end has the view looked at again. */
async function endCancelled(
  db: Database,
  { runId, viewId, sectionCount, method, merged }: ViewToMerge,
  { result, shardCount }: { result: ViewResult; shardCount: number },
): Promise<void> {
  const isSettled = sql`(
    select count(*) filter (where result is not null) = ${shardCount} and count(worker_id) = 0
    from view_shards where view_id = ${viewId})`;
  // A process that was killed may have shown more than it could keep.
  const isMore = result.evaluated >= merged;
  const evaluated = isMore ? result.evaluated : merged;
  await changeView(
    db,
    { runId, viewId, from: ['queued', 'running'], when: isSettled },
    {
      ...(isMore && result.evaluated > 0 ? describeResult(result) : { evaluated }),
      ...STOP_COUNTING,
      state: 'cancelled',
      finishedAt: new Date(),
      message: describePart(evaluated, { sectionCount, method }),
    },
  );
}
