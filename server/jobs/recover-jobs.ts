import { and, eq, inArray, isNotNull, isNull, ne, notInArray, sql } from 'drizzle-orm';
import { ENGINE_VERSION } from '#shared/engine/version.ts';
import type { Database } from '../db/client.ts';
import { runViews } from '../db/schema/run-views.ts';
import { runs } from '../db/schema/runs.ts';
import { viewShards } from '../db/schema/view-shards.ts';
import { workerProcesses } from '../db/schema/worker-processes.ts';
import type { Log } from '../log.ts';
import { enqueueMerge, enqueueShards, mergeKeyOf, shardKeyOf } from './compute-jobs.ts';
import { PROCESS_LOCK_CLASS } from './database-listener.ts';
import { failView } from './end-view.ts';

/** Four heartbeats missed: its machine is gone, or so busy that another does its work sooner. */
const HEARTBEAT_LIMIT = '4 seconds';
/** A job may be locked a moment before the name of its worker is written down. */
const NAMING_LIMIT = '3 seconds';
const KEPT_FOR = '1 day';

/**
 * After a process died: frees the jobs and shards it held, so that another worker takes them at once. Then sees to it
 * that every view under way has somebody, or a job, that brings it further, and gives up those that cannot be.
 */
export async function recoverJobs(
  db: Database,
  { ownProcessId, log }: { ownProcessId: string; log: Log },
): Promise<void> {
  await markLost(db, ownProcessId, log);
  await freeWhatDeadWorkersHeld(db, log);
  await enqueueWhatHasNoJob(db);
  await mergeWhatWaits(db);
  await failWhatNobodyCanCompute(db, log);
}

async function markLost(db: Database, ownProcessId: string, log: Log): Promise<void> {
  // In two steps: a lock is tried for those only that live by all other signs.
  const { rows } = await db.execute<{ id: string; host: string }>(sql`
    with living as materialized (
      select id, heartbeat_at from worker_processes where ended_at is null and id <> ${ownProcessId}
    )
    update worker_processes set ended_at = clock_timestamp(), "end" = 'lost', sections_per_second = 0
    from living
    where worker_processes.id = living.id
      and (living.heartbeat_at < clock_timestamp() - ${HEARTBEAT_LIMIT}::interval
        or pg_try_advisory_xact_lock(${PROCESS_LOCK_CLASS}, hashtext(living.id::text)))
    returning worker_processes.id, worker_processes.host`);
  for (const lost of rows) log.warn(lost, 'A worker is lost');
  await db
    .delete(workerProcesses)
    .where(sql`${workerProcesses.endedAt} < clock_timestamp() - ${KEPT_FOR}::interval`);
}

/** Names under which processes that live lock their jobs. */
const LIVING_WORKERS = sql`(select unnest(queue_worker_ids) from worker_processes where ended_at is null)`;

async function freeWhatDeadWorkersHeld(db: Database, log: Log): Promise<void> {
  await db.transaction(async (tx) => {
    const { rows } = await tx.execute<{ worker_id: string }>(sql`
      select distinct locked_by as worker_id from graphile_worker.jobs
      where locked_by is not null and locked_by not in ${LIVING_WORKERS}
        and (locked_at < clock_timestamp() - ${NAMING_LIMIT}::interval
          or locked_by in (select unnest(queue_worker_ids) from worker_processes))`);
    const dead = rows.map((row) => row.worker_id);
    if (dead.length > 0) {
      await tx.execute(sql`select graphile_worker.force_unlock_workers(${sql.param(dead)}::text[])`);
      log.warn({ workers: dead }, 'Freed the jobs of workers that died');
    }
    await tx
      .update(viewShards)
      .set({ workerId: null, evaluated: 0 })
      .where(
        and(
          isNotNull(viewShards.workerId),
          sql`not exists (select from graphile_worker.jobs job where job.locked_by = ${viewShards.workerId})`,
          sql`${viewShards.workerId} not in ${LIVING_WORKERS}`,
        ),
      );
  });
}

const UNDER_WAY = inArray(runViews.state, ['queued', 'running']);
/** Views of which all is done, or that were cancelled, whose last worker died before it could say so. */
async function mergeWhatWaits(db: Database): Promise<void> {
  const waiting = await db
    .select({ viewId: runViews.id })
    .from(runViews)
    .where(
      and(
        UNDER_WAY,
        sql`not exists (select from graphile_worker.jobs job where job.key = ${mergeKeyOf(sql`${runViews.id}`)})`,
        sql`exists (select from view_shards where view_id = ${runViews.id})`,
        sql`(
          not exists (select from view_shards where view_id = ${runViews.id} and result is null)
          or (${isNotNull(runViews.cancelRequestedAt)}
            and not exists (select from view_shards where view_id = ${runViews.id} and worker_id is not null))
        )`,
      ),
    );
  for (const { viewId } of waiting) await enqueueMerge(db, viewId);
}

const JOB_OF_SHARD = sql`select from graphile_worker.jobs job
  where job.key = ${shardKeyOf(sql`shard.view_id`, sql`shard.from_index`)}`;

/**
 * Shards that nobody has in work and no job is for: where two workers had one, one of them given up for dead, the end of
 * the first took the job away from the second, which died.
 */
async function enqueueWhatHasNoJob(db: Database): Promise<void> {
  const { rows } = await db.execute<{ view_id: string; from_index: string }>(sql`
    select shard.view_id, shard.from_index from view_shards shard
    join run_views on run_views.id = shard.view_id
    where ${UNDER_WAY} and run_views.cancel_requested_at is null
      and shard.result is null and shard.worker_id is null and not exists (${JOB_OF_SHARD})`);
  for (const shard of rows) await enqueueShards(db, shard.view_id, Number(shard.from_index));
}

/** Views with a shard that was tried as often as it may be. */
async function failWhatNobodyCanCompute(db: Database, log: Log): Promise<void> {
  const lost = await db
    .select({ viewId: runViews.id, runId: runViews.runId })
    .from(runViews)
    .where(
      and(
        UNDER_WAY,
        isNull(runViews.cancelRequestedAt),
        sql`(
          not exists (select from view_shards where view_id = ${runViews.id})
          or exists (
            select from view_shards shard where shard.view_id = ${runViews.id} and shard.result is null
              and exists (${JOB_OF_SHARD} and job.locked_at is null and job.attempts >= job.max_attempts)
          )
        )`,
      ),
    );
  for (const { viewId, runId } of lost) {
    log.error({ viewId, runId }, 'Gave up on a view whose job was lost');
    await failView(
      db,
      { runId, viewId },
      'The computation stopped unexpectedly, also when it was tried again. Resume the run, or start a new one.',
    );
  }
  await failRunsOfOtherEngines(db, log);
}

/** Runs begun by an engine that no worker has any more, and that is not ours either. */
async function failRunsOfOtherEngines(db: Database, log: Log): Promise<void> {
  const living = db
    .select({ version: workerProcesses.engineVersion })
    .from(workerProcesses)
    .where(isNull(workerProcesses.endedAt));
  const stranded = await db
    .select({ viewId: runViews.id, runId: runViews.runId, version: runs.engineVersion })
    .from(runViews)
    .innerJoin(runs, eq(runs.id, runViews.runId))
    .where(and(UNDER_WAY, ne(runs.engineVersion, ENGINE_VERSION), notInArray(runs.engineVersion, living)));
  for (const { viewId, runId, version } of stranded) {
    log.error({ viewId, runId, version }, 'Gave up on a view that no worker has the engine for');
    await failView(
      db,
      { runId, viewId },
      `The run was started with engine ${version}, which no worker has any more. Start a new one.`,
    );
  }
}
