import type { SweptPart } from '../../compute/sweep-in-chunks.ts';
import { keepSections } from '../kept-sections.ts';
import type { ClaimedShard, ShardKey } from './claim-shard.ts';
import type { WorkContext } from './context.ts';
import { endShard } from './end-shard.ts';
import { ShardProgress } from './shard-progress.ts';
import type { StopSwitch } from './stop-switch.ts';
import { persistently } from './persistently.ts';
import { workOnClaimed } from './work-on-claimed.ts';
import { workOnShard } from './work-on-shard.ts';

/**
 * Computes one shard of a view from the run's frozen inputs. May run again, also while another worker is still at it:
 * what it computes is named by its key, and the first result is the one that is kept.
 */
export const computeShard = (
  key: ShardKey & { readonly workerId: string },
  context: WorkContext,
): Promise<void> =>
  workOnClaimed(key, context, { work: computeClaimed, failure: 'A shard could not be computed' });

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
