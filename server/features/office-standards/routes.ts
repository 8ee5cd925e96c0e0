import type { Router } from 'express';
import type { OfficeStandard } from '#shared/contract/office-standard.ts';
import type { Deps } from '../../deps.ts';
import { notFound } from '../../errors.ts';
import { bind } from '../../http/bind.ts';
import { requireRole } from '../../http/project-access.ts';
import { createOfficeStandard, deleteOfficeStandard, updateOfficeStandard } from './commands.ts';
import { EDIT_OFFICE_STANDARDS, READ_OFFICE_STANDARDS } from './policy.ts';
import { listOfficeStandards } from './queries.ts';

export function registerOfficeStandardRoutes(router: Router, deps: Deps): void {
  const { db } = deps;

  const getStandard = async (id: string): Promise<OfficeStandard> => {
    const found = (await listOfficeStandards(db)).find((standard) => standard.id === id);
    if (found === undefined) throw notFound('Office standard');
    return found;
  };

  bind(router, deps, 'listOfficeStandards', async ({ person }) => {
    requireRole(person, READ_OFFICE_STANDARDS, 'see the standards of the office');
    return listOfficeStandards(db);
  });

  bind(router, deps, 'createOfficeStandard', async ({ person, body }) => {
    requireRole(person, EDIT_OFFICE_STANDARDS, 'set the standards of the office');
    return getStandard(await createOfficeStandard(db, body, person.id));
  });

  bind(router, deps, 'updateOfficeStandard', async ({ person, params: { id }, body }) => {
    requireRole(person, EDIT_OFFICE_STANDARDS, 'set the standards of the office');
    await updateOfficeStandard(db, body, { id, by: person.id });
    return getStandard(id);
  });

  bind(router, deps, 'deleteOfficeStandard', async ({ person, params: { id } }) => {
    requireRole(person, EDIT_OFFICE_STANDARDS, 'set the standards of the office');
    await deleteOfficeStandard(db, id);
    return {};
  });
}
