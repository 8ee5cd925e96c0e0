import fc from 'fast-check';
import type { Agent } from 'supertest';
import { beforeAll, describe, expect, it } from 'vitest';
import { endpoints, type EndpointName } from '#shared/contract/endpoints.ts';
import {
  beamInput,
  designBasis,
  evaluateInput,
  officeStandard,
  priceBook,
  sweepDefinition,
} from '../support/factories.ts';
import { signedIn, type SignedIn } from '../support/signed-in.ts';
import { useTestService } from '../support/test-service.ts';
import { createWorld, type World } from '../support/world.ts';

const service = useTestService();
let admin: SignedIn;
let checker: SignedIn;
let world: World;
let standardId: string;
beforeAll(async () => {
  admin = await signedIn(service, 'admin');
  const author = await signedIn(service, 'engineer');
  checker = await signedIn(service, 'checker');
  world = await createWorld(service, author, [admin.person, checker.person]);
  const standard = { ...officeStandard, name: 'To be damaged' };
  standardId = (await admin.post('/office-standards', standard).expect(200)).body.id;
});

/** Stands for a number that JSON can write and a double cannot hold. */
const BEYOND_DOUBLE = '@1e999@';
const writeJson = (value: unknown) => (JSON.stringify(value) ?? '').replaceAll(`"${BEYOND_DOUBLE}"`, '1e999');

const post = (path: string, body: string, agent: Agent = admin.agent) =>
  agent
    .post(`/api${path}`)
    .set('x-csrf-token', admin.csrfToken)
    .set('content-type', 'application/json')
    .send(body);

describe('a body that cannot be read', () => {
  const beams = () => `/projects/${world.project}/beams`;

  it('is refused as bad JSON, not as a failure', async () => {
    for (const text of [
      '{',
      '{"a":}',
      'null',
      '"text"',
      '12',
      '[1,2',
      '{"a":1}}',
      '\u0000',
      '{"mark": NaN}',
    ]) {
      const { status, body } = await post(beams(), text);
      expect([status, body.error.code], text).toEqual([400, 'invalid-input']);
      expect(body.error.requestId).toMatch(/^[0-9a-f-]{36}$/);
    }
  });

  it('is refused when it is too large, and says so', async () => {
    const { status, body } = await post(
      beams(),
      writeJson({ ...beamInput, location: 'x'.repeat(1_100_000) }),
    );
    expect([status, body.error.message]).toEqual([413, 'The body is too large']);
  });

  it('is refused in an encoding nobody speaks', async () => {
    const encoded = await post(beams(), '{}').set('content-encoding', 'rot13');
    const charset = await post(beams(), '{}').set('content-type', 'application/json; charset=klingon');
    expect([encoded.status, charset.status]).toEqual([415, 415]);
  });

  it('of another type counts as no body: every field is missing', async () => {
    const { status, body } = await admin
      .call('post', beams())
      .set('content-type', 'text/plain')
      .send(writeJson(beamInput));
    expect([status, body.error.code]).toEqual([400, 'invalid-input']);
    expect(body.error.issues.map(({ path }: { path: string[] }) => path[0])).toContain('mark');
  });

  it('may be deep or crafted against prototypes without effect', async () => {
    const deep = '['.repeat(200_000) + ']'.repeat(200_000);
    expect((await post(beams(), `{"mark":${deep}}`)).status).toBe(400);
    const crafted = `{"__proto__":{"mark":"P"},"constructor":{"prototype":{"isAdmin":true}}}`;
    expect((await post(beams(), crafted)).status).toBe(400);
    expect(Reflect.get({}, 'isAdmin')).toBeUndefined();
  });

  it('with text that cannot be stored is refused at its field', async () => {
    for (const text of ['a\u0000b', 'half a pair \ud83d']) {
      const { body } = await post(beams(), writeJson({ ...beamInput, mark: 'Z', location: text })).expect(
        400,
      );
      expect(body.error.issues).toEqual([
        { path: ['location'], message: 'The text holds a character that cannot be stored' },
      ]);
    }
    await post(beams(), writeJson({ ...beamInput, mark: '梁 🏗', location: 'ø' })).expect(200);
  });

  it('with a number beyond every double is refused at its field', async () => {
    const { body } = await post(beams(), writeJson({ ...beamInput, mark: 'Z', muNmm: BEYOND_DOUBLE })).expect(
      400,
    );
    expect(body.error.issues).toEqual([{ path: ['muNmm'], message: 'Moment Mu must be a number' }]);
  });
});

const NASTY: unknown[] = [
  null,
  '',
  ' ',
  '0',
  'NaN',
  'a\u0000b',
  '\ud800',
  'x'.repeat(10_000),
  [],
  {},
  [[[]]],
  true,
  0,
  -0,
  -1,
  0.1,
  1e308,
  5e-324,
  2 ** 53,
  -1e308,
  BEYOND_DOUBLE,
  '00000000-0000-0000-0000-000000000000',
];

/** Every path to something in a value, the value itself included. */
function pathsIn(value: unknown, base: (string | number)[] = []): (string | number)[][] {
  if (typeof value !== 'object' || value === null) return [base];
  return [base, ...Object.entries(value).flatMap(([key, entry]) => pathsIn(entry, [...base, key]))];
}

function withAt(value: unknown, path: (string | number)[], put: unknown): unknown {
  const [key, ...rest] = path;
  if (key === undefined) return put;
  const copy: Record<string, unknown> = Array.isArray(value)
    ? (Object.assign([], value) as unknown as Record<string, unknown>)
    : { ...(value as Record<string, unknown>) };
  copy[key] = withAt(copy[key], rest, put);
  return copy;
}

/** The valid body with one to three things in it replaced. */
const damaged = (valid: object): fc.Arbitrary<unknown> =>
  fc
    .array(
      fc.tuple(fc.constantFrom(...pathsIn(valid)), fc.oneof(fc.constantFrom(...NASTY), fc.jsonValue())),
      {
        minLength: 1,
        maxLength: 3,
      },
    )
    .map((changes) =>
      changes.reduce<unknown>((body, [path, put]) => {
        try {
          return withAt(body, path, put);
        } catch {
          return put;
        }
      }, valid),
    );

interface Target {
  id: () => string;
  valid: () => object;
  /** Who may send it; the admin where not said. */
  by?: () => SignedIn;
}
const project = () => world.project;
const TARGETS: Partial<Record<EndpointName, Target>> = {
  signIn: { id: () => '', valid: () => ({ email: 'a@office.example', password: 'x' }) },
  createProject: { id: () => '', valid: () => ({ name: 'P', number: 'N', designBasis }) },
  updateProject: { id: project, valid: () => ({ name: 'P', number: 'N' }) },
  setDesignBasis: { id: project, valid: () => designBasis },
  setPriceBook: { id: project, valid: () => priceBook },
  setMembers: { id: project, valid: () => ({ personIds: world.members }) },
  createBeam: { id: project, valid: () => beamInput },
  updateBeam: { id: () => world.beam, valid: () => beamInput },
  createSweep: { id: () => world.beam, valid: () => ({ name: 'S', definition: sweepDefinition }) },
  updateSweep: { id: () => world.spareSweep, valid: () => ({ name: 'S', definition: sweepDefinition }) },
  openView: { id: () => world.run, valid: () => ({ x: 'steelKgPerM', y: 'costPerM' }) },
  rankRun: {
    id: () => world.run,
    valid: () => ({
      view: { x: 'steelKgPerM', y: 'costPerM' },
      rates: { base: 'today', changes: { steel: 10 } },
      filters: { depthMm: { low: 1, high: 2 } },
      bandShare: 0.05,
    }),
  },
  createOfficeStandard: { id: () => '', valid: () => officeStandard },
  updateOfficeStandard: { id: () => standardId, valid: () => officeStandard },
  createSavedView: {
    id: () => world.sweep,
    valid: () => ({ name: 'V', runId: world.run, address: { x: 'depthMm' } }),
  },
  updateSavedView: {
    id: () => world.savedView,
    valid: () => ({ name: 'V', runId: world.run, address: { x: 'depthMm' } }),
  },
  evaluate: { id: project, valid: () => evaluateInput },
  pinCandidate: {
    id: project,
    valid: () => ({
      beamId: world.beam,
      source: { kind: 'section', section: evaluateInput.section },
      note: '',
    }),
  },
  moveCandidate: { id: () => world.candidate, valid: () => ({ to: 'checked', note: '' }) },
  commentOnCandidate: { id: () => world.candidate, valid: () => ({ text: 'Noted' }) },
  setSheetValue: { id: () => world.candidate, valid: () => ({ line: 'mn', value: 1 }), by: () => checker },
};

describe('no input gives a 500', () => {
  it('for every endpoint that takes a body', () => {
    const withBody = Object.entries(endpoints).filter(
      ([, { body }]) => body !== null && Object.keys('shape' in body ? body.shape : { any: 1 }).length > 0,
    );
    expect(Object.keys(TARGETS).sort()).toEqual(withBody.map(([name]) => name).sort());
  });

  it.each(Object.keys(TARGETS) as EndpointName[])('%s', async (name) => {
    const { id, valid, by = () => admin } = TARGETS[name]!;
    const { method, path } = endpoints[name];
    const statuses = new Set<number>();
    const body = fc.oneof(
      { weight: 3, arbitrary: damaged(valid()) },
      fc.jsonValue(),
      fc.constantFrom(...NASTY),
    );
    await fc.assert(
      fc.asyncProperty(body, async (sent) => {
        const answer = await by()
          .call(method, path.replace(':id', id()))
          .set('content-type', 'application/json')
          .send(writeJson(sent));
        statuses.add(answer.status);
        expect(answer.status, JSON.stringify(answer.body)).toBeLessThan(500);
        if (answer.status >= 400) {
          expect(answer.body.error.message.length).toBeGreaterThan(0);
          expect(Array.isArray(answer.body.error.issues)).toBe(true);
        }
      }),
      { numRuns: 120, seed: 20_260 },
    );
    // The damage reached the schemas, and was not turned away at the door.
    expect([...statuses]).toContain(400);
    if (name !== 'signIn') for (const status of [401, 403, 429]) expect([...statuses]).not.toContain(status);
  });

  it('whatever stands in the path', async () => {
    const segment = fc.oneof(
      fc.string(),
      fc.string({ unit: 'binary' }),
      fc.uuid(),
      fc.constantFrom('..', '%', '%ff'),
    );
    const routes = Object.values(endpoints).filter(
      ({ path, method }) => path.includes(':') && method === 'get',
    );
    await fc.assert(
      fc.asyncProperty(
        fc.constantFrom(...routes),
        fc.array(segment, { minLength: 2, maxLength: 2 }),
        async (route, parts) => {
          const encode = (part: string) => {
            try {
              return encodeURIComponent(part);
            } catch {
              return '%ed%a0%80';
            }
          };
          const [first, second] = parts.map(encode);
          const path = route.path
            .replace(/:(id|token)/, () => first!)
            .replace(/:(viewId|index)/, () => second!);
          expect((await admin.get(path)).status).toBeLessThan(500);
        },
      ),
      { numRuns: 300, seed: 20_261 },
    );
  });
});
