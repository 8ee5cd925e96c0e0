import { once } from 'node:events';
import { get, type IncomingMessage } from 'node:http';
import type { AddressInfo } from 'node:net';
import { eq, gt } from 'drizzle-orm';
import { describe, expect, it } from 'vitest';
import { startPasswords } from '#server/compute/passwords.ts';
import { people } from '#server/db/schema/people.ts';
import { session } from '#server/db/schema/session.ts';
import { createPerson, PASSWORD } from '../support/factories.ts';
import { openBrowser, signedIn, signInAs } from '../support/signed-in.ts';
import { useTestService } from '../support/test-service.ts';

const service = useTestService();

const cookieOf = (headers: Record<string, unknown>) => String(headers['set-cookie']);
const sessionIdOf = (headers: Record<string, unknown>) =>
  /fairweight\.sid=([^;]+)/.exec(cookieOf(headers))?.[1];

async function attempt(credentials: object, app = service.app) {
  const { agent, csrfToken } = await openBrowser(app);
  return agent.post('/api/session').set('x-csrf-token', csrfToken).send(credentials);
}

describe('signing in', () => {
  it('answers with the person and lets them in, whatever the case of the e-mail', async () => {
    const person = await createPerson(service.deps, { role: 'checker', email: 'Ada.Cole@office.example' });
    const { agent, csrfToken } = await openBrowser(service.app);
    const answer = await agent
      .post('/api/session')
      .set('x-csrf-token', csrfToken)
      .send({ email: ' ada.cole@OFFICE.example', password: PASSWORD });
    expect(answer.status).toBe(200);
    expect(answer.body.person).toEqual(person);
    const later = await agent.get('/api/session').expect(200);
    expect(later.body.person).toEqual(person);
    await agent.get('/api/projects').expect(200);
  });

  it('refuses a wrong password, an unknown e-mail and a shut account in the same words', async () => {
    const person = await createPerson(service.deps, { role: 'engineer' });
    const shut = await createPerson(service.deps, { role: 'engineer' });
    await service.deps.db.update(people).set({ disabledAt: new Date() }).where(eq(people.id, shut.id));
    const answers = await Promise.all([
      attempt({ email: person.email, password: 'not it' }),
      attempt({ email: 'nobody@office.example', password: PASSWORD }),
      attempt({ email: shut.email, password: PASSWORD }),
    ]);
    for (const { status, body } of answers) {
      expect(status).toBe(401);
      expect(body.error).toMatchObject({
        code: 'wrong-credentials',
        message: 'The e-mail and the password do not belong together',
      });
    }
  });

  it('spends as much work on an unknown e-mail as on a wrong password', async () => {
    // At the cost of production a guess takes hundreds of milliseconds; skipping it would show plainly.
    const passwords = await startPasswords(10);
    try {
      const known = await passwords.hash(PASSWORD);
      const time = async (hash: string | undefined) => {
        const startedAt = performance.now();
        expect(await passwords.verify('not it', hash)).toBe(false);
        return performance.now() - startedAt;
      };
      // The least of five each: whatever else the machine does only ever adds.
      const wrongs: number[] = [];
      const unknowns: number[] = [];
      for (let i = 0; i < 5; i++) {
        wrongs.push(await time(known));
        unknowns.push(await time(undefined));
      }
      const [wrong, unknown] = [Math.min(...wrongs), Math.min(...unknowns)];
      expect(unknown).toBeGreaterThan(wrong / 2);
    } finally {
      await passwords.close();
    }
  });

  it('takes nobody’s password with more behind it, though bcrypt looks no further', async () => {
    const passwords = await startPasswords(4);
    try {
      const longest = 'é'.repeat(36);
      const hash = await passwords.hash(longest);
      expect(await passwords.verify(longest, hash)).toBe(true);
      expect(await passwords.verify(`${longest}!`, hash)).toBe(false);
      await expect(passwords.hash(`${longest}!`)).rejects.toThrow('at most 72 bytes');
    } finally {
      await passwords.close();
    }
  });

  it('names every field that is missing', async () => {
    const { status, body } = await attempt({});
    expect(status).toBe(400);
    expect(body.error.issues).toEqual([
      { path: ['email'], message: 'E-mail is missing' },
      { path: ['password'], message: 'Password is missing' },
    ]);
  });

  it('stops a guesser after ten wrong passwords for one e-mail, and nobody else', async () => {
    const app = service.buildWith({});
    const [person, other] = [
      await createPerson(service.deps, { role: 'viewer' }),
      await createPerson(service.deps, { role: 'viewer' }),
    ];
    for (let i = 0; i < 10; i++) {
      expect((await attempt({ email: person.email, password: 'guess' }, app)).status).toBe(401);
    }
    const refused = await attempt({ email: person.email.toUpperCase(), password: PASSWORD }, app);
    expect(refused.status).toBe(429);
    expect(refused.body.error.code).toBe('too-many-requests');
    expect((await attempt({ email: other.email, password: PASSWORD }, app)).status).toBe(200);
  });

  it('never counts a right password against anybody', async () => {
    const person = await createPerson(service.deps, { role: 'viewer' });
    for (let i = 0; i < 15; i++) await signInAs(service.app, person);
  });

  it('limits how often one address may call at all', async () => {
    const app = service.buildWith({ apiRequestsPerMinute: 3 });
    const { agent } = await openBrowser(app);
    await agent.get('/api/session').expect(200);
    await agent.get('/api/session').expect(200);
    const { status, body } = await agent.get('/api/session');
    expect(status).toBe(429);
    expect(body.error.code).toBe('too-many-requests');
  });
});

describe('this machine', () => {
  it('counts as one address, from whichever of its own it calls', async () => {
    const server = service.buildWith({ apiRequestsPerMinute: 3 }).listen(0, '127.0.0.1');
    await once(server, 'listening');
    const { port } = server.address() as AddressInfo;
    const callFrom = async (localAddress: string) => {
      const options = { host: '127.0.0.1', port, path: '/api/openapi.json', localAddress, agent: false };
      const [answer] = (await once(get(options), 'response')) as [IncomingMessage];
      answer.resume();
      return answer.statusCode;
    };
    const statuses: unknown[] = [];
    for (let i = 1; i <= 4; i++) statuses.push(await callFrom(`127.0.${i}.1`));
    server.close();
    expect(statuses).toEqual([200, 200, 200, 429]);
  });
});

describe('the session', () => {
  it('gets a new id and a new CSRF token on sign-in, and the old id is worth nothing', async () => {
    const person = await createPerson(service.deps, { role: 'engineer' });
    const { agent, csrfToken } = await openBrowser(service.app);
    const planted = sessionIdOf((await agent.get('/api/session')).headers);
    const answer = await agent
      .post('/api/session')
      .set('x-csrf-token', csrfToken)
      .send({ email: person.email, password: PASSWORD })
      .expect(200);
    expect(planted).toBeDefined();
    expect(sessionIdOf(answer.headers)).toBeDefined();
    expect(sessionIdOf(answer.headers)).not.toBe(planted);
    expect(answer.body.csrfToken).not.toBe(csrfToken);
    const replay = await openBrowser(service.app);
    const stolen = await replay.agent.get('/api/session').set('cookie', `fairweight.sid=${planted}`);
    expect(stolen.body.person).toBeNull();
  });

  it('is kept from scripts and from other sites', async () => {
    const { headers } = await (await openBrowser(service.app)).agent.get('/api/session');
    expect(cookieOf(headers)).toMatch(/HttpOnly/);
    expect(cookieOf(headers)).toMatch(/SameSite=Lax/);
  });

  it('lasts longer with use, which is written down once a minute at most: answers wait for that', async () => {
    const { db } = service.deps;
    const someone = await signedIn(service, 'engineer');
    const HOUR_MS = 3_600_000;
    const endInAnHour = () => db.update(session).set({ expire: new Date(Date.now() + HOUR_MS) });
    const countPutOff = () => db.$count(session, gt(session.expire, new Date(Date.now() + 11 * HOUR_MS)));
    await endInAnHour();
    await someone.get('/session').expect(200);
    expect(await countPutOff()).toBe(1);
    await endInAnHour();
    await someone.get('/session').expect(200);
    expect(await countPutOff()).toBe(0);
  });

  it('ends with signing out', async () => {
    const someone = await signedIn(service, 'engineer');
    const { body } = await someone.delete('/session').expect(200);
    expect(body.person).toBeNull();
    await someone.get('/projects').expect(401);
  });

  it('that ran out is said with 401 before anything about the form, on every method', async () => {
    const someone = await signedIn(service, 'engineer');
    await service.deps.db.update(session).set({ expire: new Date(Date.now() - 1000) });
    for (const answer of [await someone.get('/projects'), await someone.post('/projects', { name: '' })]) {
      expect(answer.status).toBe(401);
      expect(answer.body.error.code).toBe('unauthenticated');
    }
  });

  it('follows a changed role and a shut account at once', async () => {
    const someone = await signedIn(service, 'engineer');
    const change = (values: Partial<typeof people.$inferInsert>) =>
      service.deps.db.update(people).set(values).where(eq(people.id, someone.person.id));
    await someone.get('/people').expect(200);
    await change({ role: 'viewer' });
    await someone.get('/people').expect(403);
    await change({ disabledAt: new Date() });
    await someone.get('/projects').expect(401);
  });
});

describe('CSRF protection', () => {
  it('refuses a write without the token and one with another session’s token', async () => {
    const someone = await signedIn(service, 'engineer');
    const other = await signedIn(service, 'engineer');
    const attempts = [
      await someone.agent.post('/api/projects').send({}),
      await someone.agent.post('/api/projects').set('x-csrf-token', '').send({}),
      await someone.agent.post('/api/projects').set('x-csrf-token', other.csrfToken).send({}),
    ];
    for (const { status, body } of attempts) {
      expect(status).toBe(403);
      expect(body.error.code).toBe('csrf');
    }
  });

  it('covers signing in as well', async () => {
    const { agent } = await openBrowser(service.app);
    const { status, body } = await agent.post('/api/session').send({ email: 'a@b.example', password: 'x' });
    expect([status, body.error.code]).toEqual([403, 'csrf']);
  });
});
