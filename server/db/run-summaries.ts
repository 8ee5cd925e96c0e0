import { and, desc, eq, isNull, sql, type SQL } from 'drizzle-orm';
import type { RunSummary } from '#shared/contract/records.ts';
import type { Database } from './client.ts';
import { people } from './schema/people.ts';
import { runViews } from './schema/run-views.ts';
import { runs } from './schema/runs.ts';

/**
 * Runs with the figures of the view they were started with, newest first. Shared by the lists of sweeps and the pages
 * of runs, which may not look into each other.
 */
export async function listRunSummaries(db: Database, condition: SQL): Promise<RunSummary[]> {
  const rows = await db
    .select({
      id: runs.id,
      sweepId: runs.sweepId,
      number: runs.number,
      state: runs.state,
      method: runs.method,
      sectionCount: runs.sectionCount,
      engineVersion: runs.engineVersion,
      createdAt: runs.createdAt,
      startedBy: { id: people.id, name: people.name },
      evaluated: runViews.evaluated,
      feasible: runViews.feasible,
      frontCount: runViews.frontCount,
      hash: runViews.hash,
      elapsedMs: runViews.elapsedMs,
    })
    .from(runs)
    .innerJoin(people, eq(people.id, runs.startedBy))
    .leftJoin(
      runViews,
      and(
        eq(runViews.runId, runs.id),
        eq(runViews.x, sql`${runs.definition} -> 'view' ->> 'x'`),
        eq(runViews.y, sql`${runs.definition} -> 'view' ->> 'y'`),
        isNull(runViews.z),
      ),
    )
    .where(condition)
    .orderBy(desc(runs.createdAt), desc(runs.number));
  return rows.map(({ createdAt, evaluated, feasible, frontCount, ...row }) => ({
    ...row,
    evaluated: evaluated ?? 0,
    feasible: row.method === 'bounds' ? null : (feasible ?? 0),
    frontCount: frontCount ?? 0,
    createdAt: createdAt.toISOString(),
  }));
}
