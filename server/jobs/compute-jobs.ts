import { sql, type SQL } from 'drizzle-orm';
import { z } from 'zod';
import { idSchema } from '#shared/contract/numbers.ts';
import { ENGINE_VERSION } from '#shared/engine/version.ts';
import type { RunMethod } from '#shared/sweep/run-method.ts';
import type { Database } from '../db/client.ts';
import { viewShards } from '../db/schema/view-shards.ts';
import { cutView } from './cut-view.ts';
import type { SectionRange } from './plan-shards.ts';

/**
 * The queue's tasks. The engine's version is part of the name: a run is computed by the engine it was started with, so a
 * worker of another version never takes a piece of it.
 */
const taskName = (name: string) => `${name} ${ENGINE_VERSION}`;
/** A run that is one shard. */
export const SMALL_RUN_TASK = taskName('small-run');
/** One of several shards. */
export const SHARD_TASK = taskName('shard');
/** A whole space searched by bounds, which is never cut. */
export const BOUNDS_TASK = taskName('bounds');
export const MERGE_TASK = taskName('merge');

export const shardPayloadSchema = z.object({ viewId: idSchema, from: z.number().int().min(0) });
export const mergePayloadSchema = z.object({ viewId: idSchema });

/** A shard that ends its process each time (out of memory, say) is not tried for ever; one whose workers are killed is. */
const MAX_ATTEMPTS = 8;
/** The queue's priorities are 16 bits. */
const LAST_PRIORITY = 32_767;

/** Keys of jobs: at most one waits for each shard, and one merge for each view. */
export const shardKeyOf = (viewId: SQL | string, from: SQL | number): SQL =>
  sql`'shard:' || ${viewId}::text || ':' || ${from}::text`;
export const mergeKeyOf = (viewId: SQL | string): SQL => sql`'merge:' || ${viewId}::text`;

/** Cuts a new view's sections into shards, within the caller's transaction; a search by bounds is one piece of work. */
export async function insertShards(
  tx: Database,
  viewId: string,
  { method, ...range }: SectionRange & { readonly method: RunMethod },
): Promise<void> {
  const shards = method === 'bounds' ? [range] : await cutView(tx, viewId, range);
  await tx
    .insert(viewShards)
    .values(shards.map(({ from, to }) => ({ viewId, fromIndex: from, toIndex: to })));
}

/**
 * Puts what is not done of a view in the queue within the caller's transaction, so that there is never a shard without
 * its job; only the shard that begins at `from` where that is given. A shard's priority is its place in its run: whoever has had least goes first, so a new run overtakes the rest of
 * a huge one, and two of a size take turns.
 */
export async function enqueueShards(tx: Database, viewId: string, from?: number): Promise<void> {
  await tx.execute(sql`
    with shard as (
      select from_index, result is null as is_open, count(*) over () as shards,
        row_number() over (order by from_index) - 1 as place
      from view_shards where view_id = ${viewId}
    )
    select graphile_worker.add_jobs(array_agg(row(
      case when (select method from runs join run_views on run_views.run_id = runs.id where run_views.id = ${viewId}) = 'bounds'
        then ${BOUNDS_TASK} when shards = 1 then ${SMALL_RUN_TASK} else ${SHARD_TASK} end,
      json_build_object('viewId', ${viewId}::text, 'from', from_index),
      null,
      null,
      ${MAX_ATTEMPTS},
      ${shardKeyOf(viewId, sql`from_index`)},
      least(place, ${LAST_PRIORITY}),
      null
    )::graphile_worker.job_spec))
    from shard where is_open ${from === undefined ? sql`` : sql`and from_index = ${from}`}
    having count(*) > 0`);
}

/** Takes a view's waiting shards out of the queue; those being worked on are left to their workers. */
export async function dequeueShards(tx: Database, viewId: string): Promise<void> {
  await tx.execute(sql`
    select graphile_worker.remove_job(key) from graphile_worker.jobs
    where key in (select ${shardKeyOf(viewId, sql`from_index`)} from view_shards where view_id = ${viewId})
      and locked_at is null`);
}

/** Has the shards of a view that are done joined. Ahead of all shards: it is what people wait for. */
export async function enqueueMerge(tx: Database, viewId: string): Promise<void> {
  await tx.execute(sql`
    select graphile_worker.add_job(
      ${MERGE_TASK},
      json_build_object('viewId', ${viewId}::text),
      job_key => ${mergeKeyOf(viewId)},
      max_attempts => ${MAX_ATTEMPTS},
      priority => -1
    )`);
}
