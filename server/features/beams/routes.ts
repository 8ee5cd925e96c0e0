import type { Router } from 'express';
import type { Deps } from '../../deps.ts';
import { requireReadableBeam } from '../../http/beam-access.ts';
import { bind } from '../../http/bind.ts';
import { requireReadableProject, requireRole } from '../../http/project-access.ts';
import { createBeam, deleteBeam, updateBeam } from './commands.ts';
import { EDIT_BEAMS } from './policy.ts';
import { getBeam, listBeams } from './queries.ts';

export function registerBeamRoutes(router: Router, deps: Deps): void {
  const { db } = deps;

  bind(router, deps, 'listBeams', async ({ person, params: { id } }) => {
    await requireReadableProject(db, person, { projectId: id, what: 'Project' });
    return listBeams(db, id);
  });

  bind(router, deps, 'createBeam', async ({ person, params: { id }, body }) => {
    await requireReadableProject(db, person, { projectId: id, what: 'Project' });
    requireRole(person, EDIT_BEAMS, 'add beams');
    return getBeam(db, await createBeam(db, id, body));
  });

  bind(router, deps, 'updateBeam', async ({ person, params: { id }, body }) => {
    await requireReadableBeam(db, person, id);
    requireRole(person, EDIT_BEAMS, 'change beams');
    await updateBeam(db, id, body);
    return getBeam(db, id);
  });

  bind(router, deps, 'deleteBeam', async ({ person, params: { id } }) => {
    const { beam } = await requireReadableBeam(db, person, id);
    requireRole(person, EDIT_BEAMS, 'delete beams');
    await deleteBeam(db, beam);
    return {};
  });
}
