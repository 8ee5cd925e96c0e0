import { eq } from 'drizzle-orm';
import type { SearchProgress } from '#shared/contract/records.ts';
import type { ViewResult } from '#shared/sweep/result.ts';
import type { Database } from '../../db/client.ts';
import { viewShards } from '../../db/schema/view-shards.ts';
import { changeView, STOP_COUNTING } from '../change-view.ts';
import { dequeueShards } from '../compute-jobs.ts';
import { describeResult, describeSearch } from '../describe-result.ts';

/** Writes the result of the whole space, once; its shards have served and go. Answers whether it was. */
export async function finishView(
  db: Database,
  { runId, viewId }: { readonly runId: string; readonly viewId: string },
  result: ViewResult,
  search?: SearchProgress,
): Promise<boolean> {
  return db.transaction(async (tx) => {
    const finished = await changeView(
      tx,
      { runId, viewId, from: ['queued', 'running'] },
      {
        ...(search === undefined ? describeResult(result) : describeSearch(result, search)),
        ...STOP_COUNTING,
        state: 'finished',
        hash: result.hash,
        message: null,
        finishedAt: new Date(),
      },
    );
    if (finished === undefined) return false;
    await dequeueShards(tx, viewId);
    await tx.delete(viewShards).where(eq(viewShards.viewId, viewId));
    return true;
  });
}
