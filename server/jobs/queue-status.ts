import { sql } from 'drizzle-orm';
import { QUEUE_KINDS, type QueueKind, type WorkerProcess } from '#shared/contract/operations.ts';
import type { Database } from '../db/client.ts';

/** Jobs of each kind, of whichever engine. */
export async function readQueue(db: Database): Promise<QueueKind[]> {
  const { rows } = await db.execute<{
    kind: string;
    waiting: number;
    running: number;
    failed: number;
    oldest_ms: number | null;
  }>(sql`
    with job as (
      select split_part(task_identifier, ' ', 1) as kind, locked_at is not null as is_running,
        locked_at is null and attempts >= max_attempts as is_failed, run_at
      from graphile_worker.jobs
    )
    select kind,
      count(*) filter (where not is_running and not is_failed)::int as waiting,
      count(*) filter (where is_running)::int as running,
      count(*) filter (where is_failed)::int as failed,
      (extract(epoch from clock_timestamp() - min(run_at) filter (where not is_running and not is_failed))
        * 1000)::float8 as oldest_ms
    from job group by kind`);
  return QUEUE_KINDS.map((kind) => {
    const row = rows.find((one) => one.kind === kind);
    return {
      kind,
      waiting: row?.waiting ?? 0,
      running: row?.running ?? 0,
      failed: row?.failed ?? 0,
      // A job that is tried again lies in the future.
      oldestWaitingMs: row?.oldest_ms == null ? null : Math.max(0, row.oldest_ms),
    };
  });
}

/** Processes that take jobs, and those that did within the last hours; the living first. */
export async function listWorkers(db: Database): Promise<WorkerProcess[]> {
  const { rows } = await db.execute<{
    id: string;
    kind: WorkerProcess['kind'];
    host: string;
    pid: number;
    threads: number;
    engine_version: string;
    started_at: string;
    silent_ms: number;
    end: WorkerProcess['end'];
    ended_at: string | null;
    sections_done: string;
    shards_done: number;
    shards_failed: number;
    sections_per_second: number;
  }>(sql`
    select id, kind, host, pid, threads, engine_version, started_at, "end", ended_at, sections_done, shards_done,
      shards_failed, sections_per_second,
      greatest(0, extract(epoch from clock_timestamp() - heartbeat_at) * 1000)::float8 as silent_ms
    from worker_processes
    order by ended_at desc nulls first, started_at, id`);
  return rows.map((row) => ({
    id: row.id,
    kind: row.kind,
    host: row.host,
    pid: row.pid,
    threads: row.threads,
    engineVersion: row.engine_version,
    startedAt: new Date(row.started_at).toISOString(),
    silentMs: row.silent_ms,
    end: row.end,
    endedAt: row.ended_at === null ? null : new Date(row.ended_at).toISOString(),
    sectionsDone: Number(row.sections_done),
    shardsDone: row.shards_done,
    shardsFailed: row.shards_failed,
    sectionsPerSecond: row.sections_per_second,
  }));
}
