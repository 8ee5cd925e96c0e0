import type { Request, Router } from 'express';
import { endpoints } from '#shared/contract/endpoints.ts';
import type { Person, Session } from '#shared/contract/records.ts';
import type { Deps } from '../../deps.ts';
import { wrongCredentials } from '../../errors.ts';
import { bind } from '../../http/bind.ts';
import { csrfTokenOf } from '../../http/csrf.ts';
import { limitSignIn } from '../../http/rate-limit.ts';
import { findPersonByPassword } from './queries.ts';

const present = (req: Request, person: Person | undefined): Session => ({
  person: person ?? null,
  csrfToken: csrfTokenOf(req),
});

/** A new id whenever somebody comes or goes: an id planted before is worth nothing after. */
const renewSession = (req: Request): Promise<void> =>
  new Promise((resolve, reject) => {
    req.session.regenerate((error: unknown) =>
      error === undefined || error === null
        ? resolve()
        : reject(error instanceof Error ? error : new Error('The session could not be renewed')),
    );
  });

export function registerSessionRoutes(router: Router, deps: Deps): void {
  bind(router, deps, 'getSession', ({ req, person }) => Promise.resolve(present(req, person)));

  router.post(endpoints.signIn.path, ...limitSignIn());
  bind(router, deps, 'signIn', async ({ req, body }) => {
    const person = await findPersonByPassword(deps, body);
    if (person === undefined) throw wrongCredentials();
    await renewSession(req);
    req.session.personId = person.id;
    return present(req, person);
  });

  bind(router, deps, 'signOut', async ({ req }) => {
    await renewSession(req);
    return present(req, undefined);
  });
}
