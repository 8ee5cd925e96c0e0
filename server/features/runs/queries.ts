import { and, asc, eq, getTableColumns, gt, sql } from 'drizzle-orm';
import type { Person } from '#shared/contract/records.ts';
import type { Evaluation } from '#shared/engine/evaluation.ts';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { expandSpace, sectionAt } from '#shared/sweep/space.ts';
import type { Database } from '../../db/client.ts';
import { beams } from '../../db/schema/beams.ts';
import { runViews } from '../../db/schema/run-views.ts';
import { runs } from '../../db/schema/runs.ts';
import { sweeps } from '../../db/schema/sweeps.ts';
import { forbidden, notFound } from '../../errors.ts';
import { hideCosts } from '../../http/hide-costs.ts';
import { canSeeRates, requireReadableProject, type ProjectRow } from '../../http/project-access.ts';
import { canSeeView } from './policy.ts';

export type ViewRow = typeof runViews.$inferSelect;

export interface RunRecord {
  readonly run: typeof runs.$inferSelect;
  readonly sweep: { readonly id: string; readonly name: string };
  readonly beam: typeof beams.$inferSelect;
  readonly project: ProjectRow;
}

/** The run, where the person may read its project. */
export async function requireRun(db: Database, person: Person, runId: string): Promise<RunRecord> {
  const [found] = await db
    .select({
      run: runs,
      sweep: { id: sweeps.id, name: sweeps.name },
      beam: beams,
    })
    .from(runs)
    .innerJoin(sweeps, eq(sweeps.id, runs.sweepId))
    .innerJoin(beams, eq(beams.id, sweeps.beamId))
    .where(eq(runs.id, runId));
  if (found === undefined) throw notFound('Run');
  const project = await requireReadableProject(db, person, {
    projectId: found.beam.projectId,
    what: 'Run',
  });
  return { ...found, project };
}

/** All views of a run without their results, which can be large. */
export async function listViews(db: Database, runId: string): Promise<Omit<ViewRow, 'result'>[]> {
  const { result: _result, ...columns } = getTableColumns(runViews);
  return db.select(columns).from(runViews).where(eq(runViews.runId, runId)).orderBy(asc(runViews.createdAt));
}

export interface ChangedView {
  readonly view: ViewRow;
  /** Whether the result changed after the event too; null in `view` where it did not. */
  readonly isResultNew: boolean;
}

/** The views that changed after an event of the run, in the order they did. */
export async function listViewsChangedAfter(
  db: Database,
  runId: string,
  sequence: number,
): Promise<ChangedView[]> {
  const { result, ...columns } = getTableColumns(runViews);
  const isResultNew = gt(runViews.resultSequence, sequence);
  const rows = await db
    .select({
      ...columns,
      // Large, and most changes leave it alone: not read for nothing.
      result: sql<ViewRow['result']>`case when ${isResultNew} then ${result} end`,
    })
    .from(runViews)
    .where(and(eq(runViews.runId, runId), gt(runViews.sequence, sequence)))
    .orderBy(asc(runViews.sequence));
  return rows.map((view) => ({ view, isResultNew: view.resultSequence > sequence }));
}

export async function requireView(
  db: Database,
  person: Person,
  { runId, viewId }: { runId: string; viewId: string },
): Promise<ViewRow> {
  const [view] = await db
    .select()
    .from(runViews)
    .where(and(eq(runViews.id, viewId), eq(runViews.runId, runId)));
  if (view === undefined) throw notFound('View');
  if (!canSeeView(person, view)) throw forbidden(`Your role (${person.role}) may not see costs`);
  return view;
}

/** Any section of the run's space, computed anew from the frozen inputs. */
export function getSection(
  { run }: RunRecord,
  index: number,
  person: Person,
): { section: SectionInput; evaluation: Evaluation } {
  const { space: definition, demand, rules } = run.definition;
  const space = expandSpace(definition, run.basis.barStandard);
  if (index >= space.size) throw notFound(`Section ${index} of this run`);
  const section = sectionAt(space, index);
  const evaluation = evaluateSection(section, { basis: run.basis, demand, rules });
  return { section, evaluation: canSeeRates(person) ? evaluation : hideCosts(evaluation) };
}
