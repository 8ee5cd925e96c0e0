import { asc, eq, sql, type SQL } from 'drizzle-orm';
import type { Person } from '#shared/contract/records.ts';
import type { SavedView } from '#shared/contract/saved-view.ts';
import type { Database } from '../../db/client.ts';
import { beams } from '../../db/schema/beams.ts';
import { people } from '../../db/schema/people.ts';
import { projects } from '../../db/schema/projects.ts';
import { runs } from '../../db/schema/runs.ts';
import { savedViews } from '../../db/schema/saved-views.ts';
import { sweeps } from '../../db/schema/sweeps.ts';
import { notFound } from '../../errors.ts';
import { canSeeRates, requireReadableProject } from '../../http/project-access.ts';
import { mayChangeView, tellsRates } from './policy.ts';

async function findSavedViews(
  db: Database,
  person: Person,
  condition: SQL,
): Promise<(SavedView & { projectId: string })[]> {
  const rows = await db
    .select({
      view: savedViews,
      runNumber: runs.number,
      maker: people.name,
      projectId: projects.id,
      ledBy: projects.createdBy,
    })
    .from(savedViews)
    .innerJoin(runs, eq(runs.id, savedViews.runId))
    .innerJoin(people, eq(people.id, savedViews.createdBy))
    .innerJoin(sweeps, eq(sweeps.id, savedViews.sweepId))
    .innerJoin(beams, eq(beams.id, sweeps.beamId))
    .innerJoin(projects, eq(projects.id, beams.projectId))
    .where(condition)
    .orderBy(asc(sql`lower(${savedViews.name})`), asc(savedViews.id));
  return rows.map(({ view, runNumber, maker, projectId, ledBy }) => ({
    projectId,
    id: view.id,
    sweepId: view.sweepId,
    runId: view.runId,
    runNumber,
    name: view.name,
    address: view.address,
    createdBy: { id: view.createdBy, name: maker },
    createdAt: view.createdAt.toISOString(),
    mayChange: mayChangeView(person, { madeBy: view.createdBy, ledBy }),
  }));
}

const withoutProject = ({ projectId: _project, ...view }: SavedView & { projectId: string }): SavedView =>
  view;

/** The views of all sweeps of a project, by name. */
export async function listSavedViews(db: Database, person: Person, projectId: string): Promise<SavedView[]> {
  const found = await findSavedViews(db, person, eq(projects.id, projectId));
  return found.filter(({ address }) => canSeeRates(person) || !tellsRates(address)).map(withoutProject);
}

/** The view of that id, where the person may read its project. */
export async function requireReadableView(db: Database, person: Person, id: string): Promise<SavedView> {
  const [found] = await findSavedViews(db, person, eq(savedViews.id, id));
  if (found === undefined) throw notFound('Saved view');
  await requireReadableProject(db, person, { projectId: found.projectId, what: 'Saved view' });
  return withoutProject(found);
}
