import { eq, inArray, sql, type SQL } from 'drizzle-orm';
import type { RunningLoad } from '#shared/contract/operations.ts';
import type { RunningLimits } from '../config.ts';
import type { Database } from '../db/client.ts';
import { runViews } from '../db/schema/run-views.ts';
import { runs } from '../db/schema/runs.ts';
import { COUNTED_LEFT } from './counted-sections.ts';

/** Whose a view's sections are: whoever opened it, or started the run. */
const OWNER = sql`coalesce(${runViews.openedBy}, ${runs.startedBy})`;

/** Sections under way, of one person and of everybody, and how many may be. */
export async function readRunningLoad(
  db: Database,
  personId: string,
  limits: RunningLimits,
): Promise<RunningLoad> {
  const sumOf = (what: SQL) => sql<string>`coalesce(sum(${COUNTED_LEFT}) filter (where ${what}), 0)`;
  const [row] = await db
    .select({ own: sumOf(sql`${OWNER} = ${personId}`), office: sumOf(sql`true`) })
    .from(runViews)
    .innerJoin(runs, eq(runs.id, runViews.runId))
    .where(inArray(runViews.state, ['queued', 'running']));
  return {
    own: { sections: Number(row!.own), limit: limits.person },
    office: { sections: Number(row!.office), limit: limits.office },
  };
}
