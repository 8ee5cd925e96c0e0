import type { Request, Response, Router } from 'express';
import {
  endpoints,
  type BodyOf,
  type EndpointName,
  type ParamsOf,
  type ResponseOf,
} from '#shared/contract/endpoints.ts';
import type { Person } from '#shared/contract/records.ts';
import type { Deps } from '../deps.ts';
import { requireCsrfToken } from './csrf.ts';
import { findSignedInPerson, requireSignedInPerson } from './signed-in-person.ts';
import { requireValidBody, requireValidParams } from './validate.ts';

type PersonOf<N extends EndpointName> = (typeof endpoints)[N]['isPublic'] extends true
  ? Person | undefined
  : Person;

export interface BoundRequest<N extends EndpointName> {
  readonly person: PersonOf<N>;
  readonly params: ParamsOf<N>;
  readonly body: BodyOf<N>;
  readonly deps: Deps;
  readonly req: Request;
}

/** Answers are often frozen records of the engine, whose lists are read-only. */
type Immutable<T> = T extends object ? { readonly [K in keyof T]: Immutable<T[K]> } : T;

export type Handler<N extends EndpointName> = (request: BoundRequest<N>) => Promise<Immutable<ResponseOf<N>>>;

/**
 * Puts a handler on the path its endpoint has in the contract. Each goes through the same steps in the same order:
 * (rate limit and session, in app.ts) → signed in → CSRF → params → body → handler → JSON. That a session has ended
 * is said before anything else, so that a client can ask to sign in and keep what was typed.
 */
export function bind<N extends EndpointName>(router: Router, deps: Deps, name: N, handler: Handler<N>): void {
  const endpoint = endpoints[name];
  router[endpoint.method](endpoint.path, async (req: Request, res: Response) => {
    const person = endpoint.isPublic
      ? await findSignedInPerson(deps.db, req)
      : await requireSignedInPerson(deps.db, req);
    if (endpoint.method !== 'get') requireCsrfToken(req);
    const params = requireValidParams(endpoint.params, req.params);
    const body = endpoint.body === null ? undefined : requireValidBody(endpoint.body, req.body ?? {});
    const request = { person, params, body, deps, req } as BoundRequest<N>;
    const answer = await handler(request);
    if (!deps.config.isProduction) assertAnswerKeepsContract(name, answer);
    res.json(answer);
  });
}

/** Answers come from our own presenters; in development and tests they are held to the contract. */
function assertAnswerKeepsContract(name: EndpointName, answer: unknown): void {
  const parsed = endpoints[name].response.safeParse(answer);
  if (!parsed.success) throw new Error(`The answer of ${name} breaks the contract`, { cause: parsed.error });
}
