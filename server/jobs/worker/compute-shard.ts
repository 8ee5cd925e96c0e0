import type { SweptPart } from '../../compute/sweep-in-chunks.ts';
import { isDatabaseAway } from '../../db/database-error.ts';
import { failView } from '../end-view.ts';
import { keepSections } from '../kept-sections.ts';
import { claimShard, type ClaimedShard, type ShardKey } from './claim-shard.ts';
import { FAILURE_MESSAGE, type WorkContext } from './context.ts';
import { endShard } from './end-shard.ts';
import { ShardProgress } from './shard-progress.ts';
import { StopSwitch } from './stop-switch.ts';
import { persistently } from './persistently.ts';
import { workOnShard } from './work-on-shard.ts';

/**
 * Computes one shard of a view from the run's frozen inputs. May run again, also while another worker is still at it:
 * what it computes is named by its key, and the first result is the one that is kept.
 */
export async function computeShard(
  key: ShardKey & { readonly workerId: string },
  context: WorkContext,
): Promise<void> {
  const shard = await claimShard(context.db, key);
  if (shard === undefined) return;
  const stopSwitch = new StopSwitch(shard.viewId, context);
  try {
    await computeClaimed(shard, stopSwitch, context);
  } catch (error) {
    // The queue hands the shard out again once there is a database.
    if (isDatabaseAway(error)) throw error;
    if (context.stopSignal.aborted) {
      await endShard(context, shard, { part: undefined, tookMs: 0, isToGoOn: true });
      return;
    }
    context.tally.addFailure();
    context.log.error(
      { err: error, viewId: shard.viewId, from: shard.from },
      'A shard could not be computed',
    );
    await failView(context.db, shard, FAILURE_MESSAGE);
    await endShard(context, shard, { part: undefined, tookMs: 0, isToGoOn: false });
  } finally {
    stopSwitch.release();
  }
}

async function computeClaimed(
  shard: ClaimedShard,
  stopSwitch: StopSwitch,
  context: WorkContext,
): Promise<void> {
  const startedAt = performance.now();
  const progress = new ShardProgress(context, shard, stopSwitch);
  const onProgress = (grown: SweptPart) => progress.offer(grown);
  const part = await workOnShard({ shard, cancelFlag: stopSwitch.flag, onProgress }, context);
  await progress.settle();
  const tookMs = performance.now() - startedAt;
  const end = { part, tookMs, isToGoOn: !stopSwitch.isCancelled };
  const isWritten = await persistently(() => endShard(context, shard, end));
  if (part.doneTo === shard.to) context.tally.addShard(tookMs);
  if (isWritten) await keepFor(shard, part, context);
}

/** After the result, which people wait for; nothing is lost but time where it cannot be written. */
async function keepFor(shard: ClaimedShard, part: SweptPart, { db, log }: WorkContext): Promise<void> {
  const { kept, chunk, doneTo } = part;
  if (kept === null || doneTo === shard.from) return;
  try {
    await keepSections(db, { runId: shard.runId, range: { from: shard.from, to: doneTo }, chunk, kept });
  } catch (error) {
    log.warn({ err: error, runId: shard.runId }, 'Sections could not be kept for other views');
  }
}
