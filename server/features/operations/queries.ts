import { and, asc, desc, eq, inArray, isNotNull, isNull, sql } from 'drizzle-orm';
import type { RunningShard, ViewFailure, ViewUnderWay } from '#shared/contract/operations.ts';
import type { Database } from '../../db/client.ts';
import { beams } from '../../db/schema/beams.ts';
import { people } from '../../db/schema/people.ts';
import { runViews } from '../../db/schema/run-views.ts';
import { runs } from '../../db/schema/runs.ts';
import { sweeps } from '../../db/schema/sweeps.ts';
import { viewShards } from '../../db/schema/view-shards.ts';
import { workerProcesses } from '../../db/schema/worker-processes.ts';

const FAILURES_SHOWN = 20;

const RUN_OF_PROJECT = {
  runId: runs.id,
  projectId: beams.projectId,
  beamMark: beams.mark,
  sweepName: sweeps.name,
  runNumber: runs.number,
  viewId: runViews.id,
};

export async function listRunningShards(db: Database): Promise<RunningShard[]> {
  const heldMs = sql<number | null>`(
    select (extract(epoch from clock_timestamp() - min(job.locked_at)) * 1000)::float8
    from graphile_worker.jobs job where job.locked_by = ${viewShards.workerId})`;
  return db
    .select({
      ...RUN_OF_PROJECT,
      from: viewShards.fromIndex,
      to: viewShards.toIndex,
      evaluated: viewShards.evaluated,
      processId: workerProcesses.id,
      heldMs,
    })
    .from(viewShards)
    .innerJoin(runViews, eq(runViews.id, viewShards.viewId))
    .innerJoin(runs, eq(runs.id, runViews.runId))
    .innerJoin(sweeps, eq(sweeps.id, runs.sweepId))
    .innerJoin(beams, eq(beams.id, sweeps.beamId))
    .leftJoin(
      workerProcesses,
      and(
        isNull(workerProcesses.endedAt),
        sql`${viewShards.workerId} = any(${workerProcesses.queueWorkerIds})`,
      ),
    )
    .where(isNotNull(viewShards.workerId))
    .orderBy(asc(runs.createdAt), asc(viewShards.fromIndex));
}

export async function listViewsUnderWay(db: Database): Promise<ViewUnderWay[]> {
  const shardsOf = (what: string) =>
    sql<number>`(select count(${sql.raw(what)})::int from view_shards where view_id = ${runViews.id})`;
  const rows = await db
    .select({
      ...RUN_OF_PROJECT,
      startedBy: people.name,
      state: runViews.state,
      isCancelling: sql<boolean>`${runViews.cancelRequestedAt} is not null`,
      method: runs.method,
      sectionCount: runs.sectionCount,
      evaluated: runViews.evaluated,
      provenUnnecessary: sql<number>`coalesce((${runViews.search} ->> 'provenUnnecessary')::float8, 0)`,
      elapsedMs: runViews.elapsedMs,
      shards: shardsOf('*'),
      shardsDone: shardsOf('result'),
    })
    .from(runViews)
    .innerJoin(runs, eq(runs.id, runViews.runId))
    .innerJoin(people, eq(people.id, sql`coalesce(${runViews.openedBy}, ${runs.startedBy})`))
    .innerJoin(sweeps, eq(sweeps.id, runs.sweepId))
    .innerJoin(beams, eq(beams.id, sweeps.beamId))
    .where(inArray(runViews.state, ['queued', 'running']))
    .orderBy(asc(runViews.createdAt));
  return rows.map((row) => ({ ...row, state: row.state === 'queued' ? 'queued' : 'running' }));
}

export async function listFailures(db: Database): Promise<ViewFailure[]> {
  const rows = await db
    .select({ ...RUN_OF_PROJECT, failedAt: runViews.finishedAt, message: runViews.message })
    .from(runViews)
    .innerJoin(runs, eq(runs.id, runViews.runId))
    .innerJoin(sweeps, eq(sweeps.id, runs.sweepId))
    .innerJoin(beams, eq(beams.id, sweeps.beamId))
    .where(and(eq(runViews.state, 'failed'), sql`${runViews.finishedAt} > now() - interval '7 days'`))
    .orderBy(desc(runViews.finishedAt))
    .limit(FAILURES_SHOWN);
  return rows.map(({ failedAt, message, ...row }) => ({
    ...row,
    failedAt: failedAt!.toISOString(),
    message: message ?? '',
  }));
}
