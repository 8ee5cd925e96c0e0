import { eq } from 'drizzle-orm';
import { isSameView } from '#shared/sweep/problem.ts';
import type { Database } from '../db/client.ts';
import { runViews } from '../db/schema/run-views.ts';
import { runs } from '../db/schema/runs.ts';
import { takenSections } from '../db/schema/taken-sections.ts';
import { isKeptWhole } from './kept-sections.ts';
import { planShards, type SectionRange } from './plan-shards.ts';

/**
 * Cuts a view's sections into shards. Of a run that takes some over from another, the own view has those last, as one
 * shard; any other view is one shard where what the run kept is ranked instead of the space swept.
 */
export async function cutView(tx: Database, viewId: string, range: SectionRange): Promise<SectionRange[]> {
  const [found] = await tx
    .select({
      runId: runs.id,
      definition: runs.definition,
      view: { x: runViews.x, y: runViews.y, z: runViews.z },
      taken: takenSections.sections,
    })
    .from(runViews)
    .innerJoin(runs, eq(runs.id, runViews.runId))
    .leftJoin(takenSections, eq(takenSections.runId, runs.id))
    .where(eq(runViews.id, viewId));
  if (found === undefined) return planShards(range);
  const { runId, definition, view, taken } = found;
  if (!isSameView(view, definition.view)) return (await isKeptWhole(tx, runId)) ? [range] : planShards(range);
  if (taken === null) return planShards(range);
  const added = range.to - taken;
  return [...planShards({ from: range.from, to: added }), { from: added, to: range.to }];
}
