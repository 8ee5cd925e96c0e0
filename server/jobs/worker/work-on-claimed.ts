import { isDatabaseAway } from '../../db/database-error.ts';
import { failView } from '../end-view.ts';
import { claimShard, type ClaimedShard, type ShardKey } from './claim-shard.ts';
import { FAILURE_MESSAGE, type WorkContext } from './context.ts';
import { endShard } from './end-shard.ts';
import { StopSwitch } from './stop-switch.ts';

export type ClaimedWork = (
  shard: ClaimedShard,
  stopSwitch: StopSwitch,
  context: WorkContext,
) => Promise<void>;

/**
 * Claims a shard and does the work on it, if it is still to be done. Work that fails while the process stops goes back into
 * the queue; any other failure ends the view, with what is said of it in the log.
 */
export async function workOnClaimed(
  key: ShardKey & { readonly workerId: string },
  context: WorkContext,
  { work, failure }: { readonly work: ClaimedWork; readonly failure: string },
): Promise<void> {
  const shard = await claimShard(context.db, key);
  if (shard === undefined) return;
  const stopSwitch = new StopSwitch(shard.viewId, context);
  try {
    await work(shard, stopSwitch, context);
  } catch (error) {
    // The queue hands it out again once there is a database.
    if (isDatabaseAway(error)) throw error;
    if (context.stopSignal.aborted) {
      await endShard(context, shard, { part: undefined, tookMs: 0, isToGoOn: true });
      return;
    }
    context.tally.addFailure();
    context.log.error({ err: error, viewId: shard.viewId, from: shard.from }, failure);
    await failView(context.db, shard, FAILURE_MESSAGE);
    await endShard(context, shard, { part: undefined, tookMs: 0, isToGoOn: false });
  } finally {
    stopSwitch.release();
  }
}
