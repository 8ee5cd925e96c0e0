import { eq } from 'drizzle-orm';
import type { Router } from 'express';
import type { Person } from '#shared/contract/records.ts';
import { beams } from '../../db/schema/beams.ts';
import { sweeps } from '../../db/schema/sweeps.ts';
import type { Deps } from '../../deps.ts';
import { forbidden, notFound } from '../../errors.ts';
import { bind } from '../../http/bind.ts';
import { requireReadableProject, requireRole } from '../../http/project-access.ts';
import { createSavedView, deleteSavedView, updateSavedView } from './commands.ts';
import { SAVE_VIEWS } from './policy.ts';
import { listSavedViews, requireReadableView } from './queries.ts';

export function registerSavedViewRoutes(router: Router, deps: Deps): void {
  const { db } = deps;

  const requireChangeable = async (person: Person, id: string) => {
    const view = await requireReadableView(db, person, id);
    requireRole(person, SAVE_VIEWS, 'change saved views');
    if (!view.mayChange)
      throw forbidden(
        `${view.createdBy.name} made this view: only they, the project’s lead or an admin may change it`,
      );
    return view;
  };

  bind(router, deps, 'listSavedViews', async ({ person, params: { id } }) => {
    await requireReadableProject(db, person, { projectId: id, what: 'Project' });
    return listSavedViews(db, person, id);
  });

  bind(router, deps, 'createSavedView', async ({ person, params: { id }, body }) => {
    const [sweep] = await db
      .select({ projectId: beams.projectId })
      .from(sweeps)
      .innerJoin(beams, eq(beams.id, sweeps.beamId))
      .where(eq(sweeps.id, id));
    if (sweep === undefined) throw notFound('Sweep');
    await requireReadableProject(db, person, { projectId: sweep.projectId, what: 'Sweep' });
    requireRole(person, SAVE_VIEWS, 'save views');
    const created = await createSavedView(db, body, { sweepId: id, createdBy: person.id });
    return requireReadableView(db, person, created);
  });

  bind(router, deps, 'updateSavedView', async ({ person, params: { id }, body }) => {
    const { sweepId } = await requireChangeable(person, id);
    await updateSavedView(db, body, { id, sweepId });
    return requireReadableView(db, person, id);
  });

  bind(router, deps, 'deleteSavedView', async ({ person, params: { id } }) => {
    await requireChangeable(person, id);
    await deleteSavedView(db, id);
    return {};
  });
}
