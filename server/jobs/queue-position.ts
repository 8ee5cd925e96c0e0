import { sql } from 'drizzle-orm';
import type { QueuePosition } from '#shared/contract/records.ts';
import type { Database } from '../db/client.ts';
import { BOUNDS_TASK, SHARD_TASK, SMALL_RUN_TASK } from './compute-jobs.ts';

/** Where the views of a run stand of which nothing is in work yet. */
export async function listQueuePositions(db: Database, runId: string): Promise<QueuePosition[]> {
  const { rows } = await db.execute<{ view_id: string; ahead: number; workers: number }>(sql`
    with waiting as (
      select split_part(key, ':', 2) as view_id, task_identifier, priority, run_at, id
      from graphile_worker.jobs
      where task_identifier in (${SMALL_RUN_TASK}, ${SHARD_TASK}, ${BOUNDS_TASK}) and locked_at is null
    ), first as (
      select distinct on (view_id) * from waiting order by view_id, priority, run_at, id
    )
    select first.view_id,
      (select count(distinct other.view_id)::int from waiting other
        where other.task_identifier = first.task_identifier and other.view_id <> first.view_id
          and (other.priority, other.run_at, other.id) < (first.priority, first.run_at, first.id)) as ahead,
      (select count(*)::int from worker_processes where ended_at is null) as workers
    from first
    join run_views on run_views.id::text = first.view_id
    where run_views.run_id = ${runId} and run_views.state = 'queued'`);
  return rows.map(({ view_id: viewId, ahead, workers }) => ({ viewId, ahead, workers }));
}
