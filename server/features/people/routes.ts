import { asc, isNull } from 'drizzle-orm';
import type { Router } from 'express';
import { people } from '../../db/schema/people.ts';
import type { Deps } from '../../deps.ts';
import { bind } from '../../http/bind.ts';
import { requireRole } from '../../http/project-access.ts';

export function registerPeopleRoutes(router: Router, deps: Deps): void {
  bind(router, deps, 'listPeople', ({ person }) => {
    // Who chooses members needs the list; a client's account has no business with the office's staff.
    requireRole(person, ['admin', 'engineer'], 'list everybody in the office');
    return deps.db
      .select({ id: people.id, name: people.name, email: people.email, role: people.role })
      .from(people)
      .where(isNull(people.disabledAt))
      .orderBy(asc(people.name), asc(people.id));
  });
}
