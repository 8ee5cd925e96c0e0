import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { call } from '#client/src/lib/api.ts';
import { ApiError } from '#client/src/lib/api-error.ts';
import { signInGate } from '#client/src/lib/sign-in-gate.ts';

interface Seen {
  readonly method: string;
  readonly url: string;
  readonly token: string | null;
  readonly body: unknown;
}

type Answer = (request: Seen) => Response;

const json = (status: number, body: unknown) => Response.json(body, { status });
const refusal = (status: number, code: string, message = 'No.') =>
  json(status, { error: { code, message, issues: [], requestId: 'r-1' } });
const session = (csrfToken: string) => json(200, { person: null, csrfToken });

/** The far side of the wire: answers by path, remembers what it was asked. */
function service(answer: Answer): Seen[] {
  const seen: Seen[] = [];
  vi.stubGlobal('fetch', (url: string, init: RequestInit) => {
    const request: Seen = {
      method: init.method!,
      url,
      token: new Headers(init.headers).get('x-csrf-token'),
      body: typeof init.body === 'string' ? JSON.parse(init.body) : null,
    };
    seen.push(request);
    return Promise.resolve(answer(request));
  });
  return seen;
}

const comment = () => call('commentOnCandidate', { params: { id: 'c1' }, body: { text: 'Kept' } });

beforeEach(async () => {
  service(() => session('first'));
  await call('getSession', {});
});

afterEach(() => {
  signInGate.settle(false);
  vi.unstubAllGlobals();
});

describe('calling the service', () => {
  it('fills the path, sends the token with writes and none with reads', async () => {
    const seen = service(() => json(200, {}));
    await call('getRun', { params: { id: 'a/b' } });
    await comment();
    expect(seen[0]).toMatchObject({ method: 'GET', url: '/api/runs/a%2Fb', token: null });
    expect(seen[1]).toMatchObject({
      method: 'POST',
      url: '/api/candidates/c1/comments',
      token: 'first',
      body: { text: 'Kept' },
    });
  });

  it('asks for a new token once when the old one is refused, and repeats the write', async () => {
    const seen = service(({ url, token }) =>
      url === '/api/session'
        ? session('second')
        : token === 'second'
          ? json(200, { id: 'c1' })
          : refusal(403, 'csrf'),
    );
    await expect(comment()).resolves.toEqual({ id: 'c1' });
    expect(seen.map(({ url }) => url)).toEqual([
      '/api/candidates/c1/comments',
      '/api/session',
      '/api/candidates/c1/comments',
    ]);
  });

  it('waits for a sign-in when the session has expired, then sends the same body again', async () => {
    let isSignedIn = false;
    const seen = service(() => (isSignedIn ? json(200, { id: 'c1' }) : refusal(401, 'unauthenticated')));
    const unsubscribe = signInGate.subscribe(() => {
      if (!signInGate.isWaiting()) return;
      isSignedIn = true;
      signInGate.settle(true);
    });
    await expect(comment()).resolves.toEqual({ id: 'c1' });
    expect(seen.map(({ body }) => body)).toEqual([{ text: 'Kept' }, { text: 'Kept' }]);
    unsubscribe();
  });

  it('lets all calls that fail meanwhile wait for one sign-in', async () => {
    let isSignedIn = false;
    let timesAsked = 0;
    service(() => (isSignedIn ? json(200, { id: 'c1' }) : refusal(401, 'unauthenticated')));
    const unsubscribe = signInGate.subscribe(() => {
      if (signInGate.isWaiting()) timesAsked += 1;
    });
    const calls = [comment(), comment(), comment()];
    await vi.waitFor(() => expect(signInGate.isWaiting()).toBe(true));
    isSignedIn = true;
    signInGate.settle(true);
    await expect(Promise.all(calls)).resolves.toHaveLength(3);
    expect(timesAsked).toBe(1);
    unsubscribe();
  });

  it('gives the refusal back when nobody signs in', async () => {
    service(() => refusal(401, 'unauthenticated', 'Sign in first.'));
    await expect(comment()).rejects.toMatchObject({ code: 'unauthenticated', message: 'Sign in first.' });
  });

  it('keeps every issue and the request id of a refusal', async () => {
    const issues = [{ path: ['spanMm'], message: 'Span must be at least 100 mm' }];
    service(() =>
      json(400, { error: { code: 'invalid-input', message: 'Check.', issues, requestId: 'r-9' } }),
    );
    await expect(comment()).rejects.toMatchObject({ status: 400, issues, requestId: 'r-9' });
  });

  it('speaks plainly of an answer that is not the service’s own', async () => {
    service(() => new Response('<h1>Bad gateway</h1>', { status: 502 }));
    await expect(comment()).rejects.toMatchObject({
      code: 'internal',
      message: 'The service answered with an error (502).',
    });
  });

  it('says that the service cannot be reached', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new TypeError('Failed to fetch')));
    await expect(comment()).rejects.toBeInstanceOf(ApiError);
    await expect(comment()).rejects.toMatchObject({ code: 'offline' });
  });
});
