import { and, eq, isNull } from 'drizzle-orm';
import { finishResult } from '#shared/sweep/finish.ts';
import { chunkToBytes } from '../../compute/chunk-bytes.ts';
import type { SweptPart } from '../../compute/sweep-in-chunks.ts';
import type { Database } from '../../db/client.ts';
import { runs } from '../../db/schema/runs.ts';
import { viewShards } from '../../db/schema/view-shards.ts';
import { changeView, STOP_COUNTING } from '../change-view.ts';
import { enqueueMerge, enqueueShards } from '../compute-jobs.ts';
import { isHeld } from '../end-view.ts';
import { isShard, type ClaimedShard } from './claim-shard.ts';
import type { WorkContext } from './context.ts';
import { finishView } from './finish-view.ts';

interface ShardEnd {
  /** What is done of it; undefined for nothing. */
  readonly part: SweptPart | undefined;
  readonly tookMs: number;
  /** Whether the rest goes back into the queue; a cancelled one's waits to be resumed. */
  readonly isToGoOn: boolean;
}

/**
 * Writes what is done of a shard and gives the rest of it free as a shard of its own, so that nothing that was computed
 * is computed again. A run that is one shard is finished right here. Answers whether it was written, by nobody before.
 */
export async function endShard(
  { db }: Pick<WorkContext, 'db'>,
  shard: ClaimedShard,
  { part, tookMs, isToGoOn }: ShardEnd,
): Promise<boolean> {
  const { problem, view, viewId, from, to, sectionCount } = shard;
  if (part !== undefined && from === 0 && part.doneTo === sectionCount) {
    return finishView(db, shard, finishResult(problem, view, part.chunk));
  }
  return db.transaction(async (tx) => {
    const doneTo = part?.doneTo ?? from;
    const isWritten =
      part === undefined || doneTo === from
        ? await giveFree(tx, shard)
        : await writeResult(tx, shard, { part, tookMs });
    if (!isWritten) return false;
    if (doneTo > from && doneTo < to) {
      await tx.insert(viewShards).values({ viewId, fromIndex: doneTo, toIndex: to });
    }
    if (doneTo < to && isToGoOn) await putBack(tx, shard, doneTo);
    await enqueueMerge(tx, viewId);
    return true;
  });
}

async function giveFree(tx: Database, shard: ClaimedShard): Promise<boolean> {
  const { rowCount } = await tx
    .update(viewShards)
    .set({ workerId: null, evaluated: 0 })
    .where(and(isShard(shard), isNull(viewShards.result), eq(viewShards.workerId, shard.workerId)));
  return rowCount === 1;
}

/**
 * The first result is kept. A whole one is welcome from anybody, even from a worker that was given up for dead; only who
 * holds a shard may cut it.
 */
async function writeResult(
  tx: Database,
  shard: ClaimedShard,
  { part, tookMs }: { part: SweptPart; tookMs: number },
): Promise<boolean> {
  const { from, to, workerId } = shard;
  const { rowCount } = await tx
    .update(viewShards)
    .set({
      toIndex: part.doneTo,
      evaluated: part.doneTo - from,
      result: chunkToBytes(part.chunk),
      workerId: null,
      tookMs,
    })
    .where(
      and(
        isShard(shard),
        isNull(viewShards.result),
        eq(viewShards.toIndex, to),
        part.doneTo === to ? undefined : eq(viewShards.workerId, workerId),
      ),
    );
  return rowCount === 1;
}

/** The process stops: another, or this one's next start, takes the rest up again. */
async function putBack(tx: Database, { runId, viewId }: ClaimedShard, from: number): Promise<void> {
  await enqueueShards(tx, viewId, from);
  // Two shards put back at once would each see the other still held.
  await tx.select({ id: runs.id }).from(runs).where(eq(runs.id, runId)).for('update');
  if (!(await isHeld(tx, viewId)))
    await changeView(tx, { runId, viewId, from: ['running'] }, { ...STOP_COUNTING, state: 'queued' });
}
