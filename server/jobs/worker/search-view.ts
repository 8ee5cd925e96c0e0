import { and, eq, isNull } from 'drizzle-orm';
import { boundedResult } from '#shared/sweep/bounded-result.ts';
import type { BoundsReply } from '../../compute/bounds-protocol.ts';
import { searchByBounds } from '../../compute/search-by-bounds.ts';
import { viewShards } from '../../db/schema/view-shards.ts';
import { changeView, STOP_COUNTING } from '../change-view.ts';
import { describePart, describeSearch } from '../describe-result.ts';
import { isShard, type ClaimedShard, type ShardKey } from './claim-shard.ts';
import type { WorkContext } from './context.ts';
import { endShard } from './end-shard.ts';
import { finishView } from './finish-view.ts';
import { persistently } from './persistently.ts';
import { readKnownFront, type KnownFront } from './known-front.ts';
import { SearchProgress } from './search-progress.ts';
import type { StopSwitch } from './stop-switch.ts';
import { workOnClaimed } from './work-on-claimed.ts';

/**
 * Searches the space of a view by bounds, from the run's frozen inputs. A search that was broken off begins again, but what
 * it had found spares the new one most of the way.
 */
export const searchView = (
  key: ShardKey & { readonly workerId: string },
  context: WorkContext,
): Promise<void> =>
  workOnClaimed(key, context, { work: searchClaimed, failure: 'A space could not be searched' });

async function searchClaimed(
  shard: ClaimedShard,
  stopSwitch: StopSwitch,
  context: WorkContext,
): Promise<void> {
  const { problem, view, viewId } = shard;
  const startedAt = performance.now();
  const known = await readKnownFront(context.db, viewId);
  const progress = new SearchProgress(context, shard, { stopSwitch, known });
  const reply = await searchByBounds({
    desk: context.boundsDesk,
    problem,
    view,
    known: known.front,
    cancelFlag: stopSwitch.flag,
    onProgress: (report) => progress.offer(report),
  });
  await progress.settle();
  const tookMs = performance.now() - startedAt;
  if (reply.isDone) {
    const result = boundedResult(problem, view, { ...reply, isProven: true });
    await persistently(() => finishView(context.db, shard, result, reply.state));
    context.tally.addShard(tookMs);
  } else if (stopSwitch.isCancelled) await persistently(() => endCancelled(shard, context, { reply, known }));
  else await persistently(() => endShard(context, shard, { part: undefined, tookMs, isToGoOn: true }));
}

/** What is found so far is kept, said to be no more than that; the search waits to be resumed. */
async function endCancelled(
  shard: ClaimedShard,
  { db }: Pick<WorkContext, 'db'>,
  { reply, known }: { readonly reply: BoundsReply; readonly known: KnownFront },
): Promise<void> {
  const { runId, viewId, problem, view, sectionCount, workerId } = shard;
  const result = boundedResult(problem, view, {
    state: reply.state,
    found: known.joinedWith(reply.found),
    near: [],
    isProven: false,
  });
  await db.transaction(async (tx) => {
    const { rowCount } = await tx
      .update(viewShards)
      .set({ workerId: null, evaluated: 0 })
      .where(and(isShard(shard), isNull(viewShards.result), eq(viewShards.workerId, workerId)));
    if (rowCount !== 1) return;
    await changeView(
      tx,
      { runId, viewId, from: ['queued', 'running'] },
      {
        ...describeSearch(result, reply.state),
        ...STOP_COUNTING,
        state: 'cancelled',
        finishedAt: new Date(),
        message: describePart(result.evaluated, { sectionCount, method: 'bounds' }),
      },
    );
  });
}
