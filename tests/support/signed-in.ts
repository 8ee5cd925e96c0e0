import { randomUUID } from 'node:crypto';
import type { Express } from 'express';
import request, { type Agent, type Test } from 'supertest';
import type { Person, Role } from '#shared/contract/records.ts';
import { createPerson, PASSWORD } from './factories.ts';
import type { TestService } from './test-service.ts';

type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';

/** Somebody with a session: every call carries the cookie and the CSRF token, as the client's calls do. */
export class SignedIn {
  readonly person: Person;
  readonly agent: Agent;
  readonly csrfToken: string;
  /** For calls that do not go through the agent. */
  readonly cookie: string;

  constructor(init: Pick<SignedIn, 'person' | 'agent' | 'csrfToken' | 'cookie'>) {
    this.person = init.person;
    this.agent = init.agent;
    this.csrfToken = init.csrfToken;
    this.cookie = init.cookie;
  }

  call(method: Method, path: string): Test {
    return this.agent[method](`/api${path}`).set('x-csrf-token', this.csrfToken);
  }

  get = (path: string): Test => this.call('get', path);
  post = (path: string, body: object = {}): Test => this.call('post', path).send(body);
  put = (path: string, body: object): Test => this.call('put', path).send(body);
  patch = (path: string, body: object): Test => this.call('patch', path).send(body);
  delete = (path: string): Test => this.call('delete', path);
}

/** The service itself, or the address it listens on. */
type Front = Express | string;

/** A browser that has asked for its session, signed in or not. */
export async function openBrowser(app: Front): Promise<{ agent: Agent; csrfToken: string }> {
  const agent = request.agent(app);
  const { body } = await agent.get('/api/session').expect(200);
  return { agent, csrfToken: body.csrfToken };
}

export async function signInAs(
  app: Front,
  { email, password = PASSWORD }: { email: string; password?: string },
): Promise<SignedIn> {
  const { agent, csrfToken } = await openBrowser(app);
  const answer = await agent
    .post('/api/session')
    .set('x-csrf-token', csrfToken)
    .send({ email, password })
    .expect(200);
  const cookie = [answer.get('set-cookie') ?? []]
    .flat()
    .map((line) => line.split(';')[0])
    .join('; ');
  return new SignedIn({ person: answer.body.person, agent, csrfToken: answer.body.csrfToken, cookie });
}

/** A new person of that role, signed in through the front door. */
export async function signedIn({ app, deps }: TestService, role: Role): Promise<SignedIn> {
  return signInAs(app, await createPerson(deps, { role, email: `${role}-${randomUUID()}@office.example` }));
}
