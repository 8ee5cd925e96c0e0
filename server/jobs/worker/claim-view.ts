import { eq } from 'drizzle-orm';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import type { Database } from '../../db/client.ts';
import { runViews } from '../../db/schema/run-views.ts';
import { runs } from '../../db/schema/runs.ts';
import { changeView } from '../change-view.ts';

export interface ClaimedView {
  readonly runId: string;
  readonly problem: SweepProblem;
  readonly view: View;
  readonly sectionCount: number;
  /** What an earlier worker had done and written; it is begun anew all the same. */
  readonly evaluated: number;
  readonly isCancelRequested: boolean;
}

/** Takes the view for one worker. Undefined where there is nothing left to do. */
export async function claimView(
  db: Database,
  { viewId, workerId }: { viewId: string; workerId: string },
): Promise<ClaimedView | undefined> {
  const [run] = await db
    .select({
      id: runs.id,
      definition: runs.definition,
      basis: runs.basis,
      sectionCount: runs.sectionCount,
    })
    .from(runViews)
    .innerJoin(runs, eq(runs.id, runViews.runId))
    .where(eq(runViews.id, viewId));
  if (run === undefined) return undefined;
  const view = await changeView(
    db,
    { runId: run.id, viewId, from: ['queued', 'running'] },
    { state: 'running', workerId, startedAt: new Date() },
  );
  if (view === undefined) return undefined;
  const { space, demand, rules } = run.definition;
  return {
    runId: run.id,
    problem: { space, demand, rules, basis: run.basis },
    view: { x: view.x, y: view.y },
    sectionCount: run.sectionCount,
    evaluated: view.evaluated,
    isCancelRequested: view.cancelRequestedAt !== null,
  };
}
