import { inArray, sql } from 'drizzle-orm';
import type { Database } from '../db/client.ts';
import { runViews } from '../db/schema/run-views.ts';
import type { Log } from '../log.ts';
import { changeView } from './change-view.ts';
import { VIEW_JOB_KEY_PREFIX } from './compute-view-job.ts';
import { WORKER_LOCK_CLASS } from './database-listener.ts';

const UNFINISHED = ['queued', 'running'] as const;

/**
 * After a process died: frees the jobs its workers held, so that another worker takes them at once, and gives up on
 * views whose job ended its process each time.
 */
export async function recoverJobs(
  db: Database,
  { ownWorkerIds, log }: { ownWorkerIds: readonly string[]; log: Log },
): Promise<void> {
  await unlockDeadWorkers(db, ownWorkerIds, log);
  await failViewsWithoutJob(db, log);
}

/** A worker whose lock can be taken has no process any more, see DatabaseListener. */
async function unlockDeadWorkers(db: Database, ownWorkerIds: readonly string[], log: Log): Promise<void> {
  await db.transaction(async (tx) => {
    const { rows } = await tx.execute<{ worker_id: string }>(sql`
      with holders as materialized (
        select distinct locked_by as worker_id from graphile_worker.jobs where locked_by is not null
      )
      select worker_id from holders
      where not worker_id = any(${sql.param([...ownWorkerIds])}::text[])
        and pg_try_advisory_xact_lock(${WORKER_LOCK_CLASS}, hashtext(worker_id))`);
    if (rows.length === 0) return;
    const dead = rows.map((row) => row.worker_id);
    await tx.execute(sql`select graphile_worker.force_unlock_workers(${sql.param(dead)}::text[])`);
    log.warn({ workers: dead }, 'Freed the jobs of workers that died');
  });
}

async function failViewsWithoutJob(db: Database, log: Log): Promise<void> {
  const lost = await db
    .select({ viewId: runViews.id, runId: runViews.runId })
    .from(runViews)
    .where(
      sql`${inArray(runViews.state, [...UNFINISHED])} and not exists (
        select from graphile_worker.jobs job
        where job.key = ${VIEW_JOB_KEY_PREFIX} || ${runViews.id}
          and (job.locked_at is not null or job.attempts < job.max_attempts)
      )`,
    );
  for (const { viewId, runId } of lost) {
    log.error({ viewId, runId }, 'Gave up on a view whose job was lost');
    await changeView(
      db,
      { runId, viewId, from: UNFINISHED },
      {
        state: 'failed',
        message: 'The computation stopped unexpectedly, also when it was tried again. Start a new run.',
        workerId: null,
        finishedAt: new Date(),
      },
    );
  }
}
