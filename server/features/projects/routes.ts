import type { Router } from 'express';
import type { Person, Project, Role } from '#shared/contract/records.ts';
import type { Deps } from '../../deps.ts';
import { notFound } from '../../errors.ts';
import { bind } from '../../http/bind.ts';
import { requireReadableProject, requireRole } from '../../http/project-access.ts';
import { createProject, renameProject, setDesignBasis, setMembers, setPriceBook } from './commands.ts';
import { CREATE_PROJECT, EDIT_PRICE_BOOK, EDIT_PROJECT, SET_MEMBERS } from './policy.ts';
import { listProjects } from './queries.ts';

export function registerProjectRoutes(router: Router, deps: Deps): void {
  const { db } = deps;

  const getProject = async (person: Person, id: string): Promise<Project> => {
    const [project] = await listProjects(db, person, id);
    if (project === undefined) throw notFound('Project');
    return project;
  };

  const requireEditable = async (
    person: Person,
    { id, roles, deed }: { id: string; roles: readonly Role[]; deed: string },
  ): Promise<void> => {
    await requireReadableProject(db, person, { projectId: id, what: 'Project' });
    requireRole(person, roles, deed);
  };

  bind(router, deps, 'listProjects', ({ person }) => listProjects(db, person));
  bind(router, deps, 'getProject', ({ person, params }) => getProject(person, params.id));

  bind(router, deps, 'createProject', async ({ person, body }) => {
    requireRole(person, CREATE_PROJECT, 'create projects');
    return getProject(person, await createProject(db, body, person));
  });

  bind(router, deps, 'updateProject', async ({ person, params: { id }, body }) => {
    await requireEditable(person, { id, roles: EDIT_PROJECT, deed: 'rename the project' });
    await renameProject(db, id, body);
    return getProject(person, id);
  });

  bind(router, deps, 'setDesignBasis', async ({ person, params: { id }, body }) => {
    await requireEditable(person, { id, roles: EDIT_PROJECT, deed: 'change the design basis' });
    await setDesignBasis(db, id, body);
    return getProject(person, id);
  });

  bind(router, deps, 'setPriceBook', async ({ person, params: { id }, body }) => {
    await requireEditable(person, { id, roles: EDIT_PRICE_BOOK, deed: 'change the price book' });
    await setPriceBook(db, id, body);
    return getProject(person, id);
  });

  bind(router, deps, 'setMembers', async ({ person, params: { id }, body }) => {
    await requireEditable(person, { id, roles: SET_MEMBERS, deed: 'choose the members' });
    await setMembers(db, { projectId: id, personIds: body.personIds, actor: person });
    return getProject(person, id);
  });
}
