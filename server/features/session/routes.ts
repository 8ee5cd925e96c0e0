import type { Request, Router } from 'express';
import { endpoints } from '#shared/contract/endpoints.ts';
import type { Person, Session } from '#shared/contract/records.ts';
import type { Deps } from '../../deps.ts';
import { wrongCredentials } from '../../errors.ts';
import { bind } from '../../http/bind.ts';
import { csrfTokenOf } from '../../http/csrf.ts';
import { limitSignIn } from '../../http/rate-limit.ts';
import { findPersonByPassword } from './queries.ts';

/** `regenerate` and `save` call back with an error or with nothing. */
const settled = (start: (done: (error?: unknown) => void) => void): Promise<void> =>
  new Promise((resolve, reject) => {
    start((error) => {
      if (error === undefined || error === null) resolve();
      else reject(error instanceof Error ? error : new Error('The session could not be written'));
    });
  });

/** A new id whenever somebody comes or goes: an id planted before is worth nothing after. */
const renewSession = (req: Request) => settled((done) => req.session.regenerate(done));

/**
 * A new session is saved before it is answered: left to the end of the response, a failure to write would go unsaid.
 * One that is not new has its token, and is not written again: it may have been ended meanwhile, and would come back.
 */
async function answer(req: Request, person: Person | undefined): Promise<Session> {
  const isNew = req.session.csrfToken === undefined;
  const csrfToken = csrfTokenOf(req);
  if (isNew) await settled((done) => req.session.save(done));
  return { person: person ?? null, csrfToken };
}

export function registerSessionRoutes(router: Router, deps: Deps): void {
  bind(router, deps, 'getSession', ({ req, person }) => answer(req, person));

  router.post(endpoints.signIn.path, ...limitSignIn());
  bind(router, deps, 'signIn', async ({ req, body }) => {
    const person = await findPersonByPassword(deps, body);
    if (person === undefined) throw wrongCredentials();
    await renewSession(req);
    req.session.personId = person.id;
    return answer(req, person);
  });

  bind(router, deps, 'signOut', async ({ req }) => {
    await renewSession(req);
    return answer(req, undefined);
  });
}
