import type { Router } from 'express';
import type { Deps } from '../../deps.ts';
import { requireReadableBeam } from '../../http/beam-access.ts';
import { bind } from '../../http/bind.ts';
import { requireReadableProject, requireRole } from '../../http/project-access.ts';
import { createSweep, deleteSweep, updateSweep } from './commands.ts';
import { EDIT_SWEEPS } from './policy.ts';
import { getSweep, listSweeps, requireReadableSweep } from './queries.ts';

export function registerSweepRoutes(router: Router, deps: Deps): void {
  const { db } = deps;

  bind(router, deps, 'listSweeps', async ({ person, params: { id } }) => {
    await requireReadableProject(db, person, { projectId: id, what: 'Project' });
    return listSweeps(db, id);
  });

  bind(router, deps, 'getSweep', async ({ person, params: { id } }) => {
    await requireReadableSweep(db, person, id);
    return getSweep(db, id);
  });

  bind(router, deps, 'createSweep', async ({ person, params: { id }, body }) => {
    const { project } = await requireReadableBeam(db, person, id);
    requireRole(person, EDIT_SWEEPS, 'add sweeps');
    const standard = project.designBasis.barStandard;
    return getSweep(db, await createSweep(db, body, { beamId: id, creatorId: person.id, standard }));
  });

  bind(router, deps, 'updateSweep', async ({ person, params: { id }, body }) => {
    const { project } = await requireReadableSweep(db, person, id);
    requireRole(person, EDIT_SWEEPS, 'change sweeps');
    await updateSweep(db, body, { id, standard: project.designBasis.barStandard });
    return getSweep(db, id);
  });

  bind(router, deps, 'deleteSweep', async ({ person, params: { id } }) => {
    const { sweep } = await requireReadableSweep(db, person, id);
    requireRole(person, EDIT_SWEEPS, 'delete sweeps');
    await deleteSweep(db, sweep);
    return {};
  });
}
