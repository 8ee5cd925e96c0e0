import { and, eq, isNotNull, sql } from 'drizzle-orm';
import type { RunState } from '#shared/contract/records.ts';
import type { RunMethod } from '#shared/sweep/run-method.ts';
import type { Database } from '../db/client.ts';
import { runViews } from '../db/schema/run-views.ts';
import { viewShards } from '../db/schema/view-shards.ts';
import { changeView, STOP_COUNTING } from './change-view.ts';
import { dequeueShards, enqueueMerge, enqueueShards, insertShards } from './compute-jobs.ts';
import { describePart } from './describe-result.ts';
import { notifyViewCancelled } from './run-notifications.ts';

const UNFINISHED: readonly RunState[] = ['queued', 'running'];

interface ViewOfRun {
  readonly runId: string;
  readonly viewId: string;
  readonly sectionCount: number;
  readonly method: RunMethod;
}

/**
 * Takes what waits out of the queue and tells who works on it to stop. What is done is kept; the view is cancelled once
 * nobody works on it, at once where nobody does.
 */
export async function cancelView(
  tx: Database,
  { runId, viewId, sectionCount, method }: ViewOfRun,
): Promise<void> {
  const target = { runId, viewId, from: UNFINISHED };
  const asked = await changeView(tx, target, { cancelRequestedAt: new Date() });
  if (asked === undefined) return;
  await dequeueShards(tx, viewId);
  if (await isHeld(tx, viewId)) {
    await notifyViewCancelled(tx, viewId);
    return;
  }
  if ((await countDone(tx, viewId)) > asked.merged) {
    await enqueueMerge(tx, viewId);
    return;
  }
  await changeView(tx, target, {
    ...STOP_COUNTING,
    state: 'cancelled',
    evaluated: sql`${runViews.merged}`,
    finishedAt: new Date(),
    message: describePart(asked.merged, { sectionCount, method }),
  });
}

/** Gives a view up, with what is done kept, and stops whoever else works on it. */
export async function failView(
  db: Database,
  { runId, viewId }: Pick<ViewOfRun, 'runId' | 'viewId'>,
  message: string,
): Promise<void> {
  await db.transaction(async (tx) => {
    const failed = await changeView(
      tx,
      { runId, viewId, from: UNFINISHED },
      {
        ...STOP_COUNTING,
        state: 'failed',
        evaluated: sql`${runViews.merged}`,
        message,
        finishedAt: new Date(),
      },
    );
    if (failed === undefined) return;
    await dequeueShards(tx, viewId);
    await notifyViewCancelled(tx, viewId);
  });
}

/** Takes a cancelled or failed view up again, from the shards it has. Answers whether it was one. */
export async function resumeView(
  tx: Database,
  { runId, viewId, sectionCount, method }: ViewOfRun,
): Promise<boolean> {
  const resumed = await changeView(
    tx,
    { runId, viewId, from: ['cancelled', 'failed'] },
    { state: 'queued', message: null, cancelRequestedAt: null, finishedAt: null, startedAt: null },
  );
  if (resumed === undefined) return false;
  if ((await tx.$count(viewShards, eq(viewShards.viewId, viewId))) === 0)
    await insertShards(tx, viewId, { from: 0, to: sectionCount, method });
  await enqueueShards(tx, viewId);
  if ((await countDone(tx, viewId)) === sectionCount) await enqueueMerge(tx, viewId);
  return true;
}

/** Whether a worker has one of its shards in work. */
export async function isHeld(tx: Database, viewId: string): Promise<boolean> {
  const held = and(eq(viewShards.viewId, viewId), isNotNull(viewShards.workerId));
  return (await tx.$count(viewShards, held)) > 0;
}

/** Sections of the shards that are done. */
async function countDone(tx: Database, viewId: string): Promise<number> {
  const [row] = await tx
    .select({ sections: sql<string>`coalesce(sum(${viewShards.toIndex} - ${viewShards.fromIndex}), 0)` })
    .from(viewShards)
    .where(and(eq(viewShards.viewId, viewId), isNotNull(viewShards.result)));
  return Number(row!.sections);
}
