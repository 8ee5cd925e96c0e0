import { randomUUID } from 'node:crypto';
import { beforeAll, describe, expect, it } from 'vitest';
import { endpoints, type EndpointName } from '#shared/contract/endpoints.ts';
import { ROLES, type Role } from '#shared/contract/records.ts';
import {
  beamInput,
  designBasis,
  evaluateInput,
  officeStandard,
  priceBook,
  sweepDefinition,
} from '../support/factories.ts';
import { openBrowser, signedIn, type SignedIn } from '../support/signed-in.ts';
import { useTestService } from '../support/test-service.ts';
import { createWorld, type World } from '../support/world.ts';

const EVERYBODY = ROLES;
const DESIGNERS: readonly Role[] = ['admin', 'engineer'];
const OFFICE: readonly Role[] = ['admin', 'engineer', 'checker', 'estimator'];

/** One call of an endpoint: the id in its path, its body, and the roles whose members it serves. */
interface Rule {
  id?: (world: World) => string;
  /** Of a thing of the office, which everybody in it may ask for. */
  officeId?: () => string;
  body?: (world: World) => object;
  serves: readonly Role[];
}

const project = (world: World) => world.project;
let standardIds: string[];
const standardInput = () => ({ ...officeStandard, name: randomUUID() });
const savedView = ({ run }: World) => ({ name: randomUUID(), runId: run, address: { x: 'depthMm' } });
const ranking = () => ({
  view: { x: 'steelKgPerM', y: 'widthMm' },
  rates: { base: 'run', changes: {} },
  filters: {},
  bandShare: 0.05,
});
const sweepInput = () => ({ name: 'Renamed', definition: sweepDefinition });
const pin = (world: World) => ({
  beamId: world.beam,
  source: { kind: 'section', section: { ...evaluateInput.section, widthMm: 400 } },
  note: '',
});

/**
 * Who may do what, as decided for the product; the order is that of the calls on one project. Signing in and out and
 * the shared page are for everyone and have tests of their own.
 */
const RULES: Record<
  Exclude<EndpointName, 'getSession' | 'signIn' | 'signOut' | 'getSharedShortlist'>,
  Rule
> = {
  listPeople: { serves: DESIGNERS },
  listOfficeStandards: { serves: OFFICE },
  createOfficeStandard: { serves: ['admin'], body: standardInput },
  updateOfficeStandard: { officeId: () => standardIds[0]!, serves: ['admin'], body: standardInput },
  deleteOfficeStandard: { officeId: () => standardIds[1]!, serves: ['admin'] },
  listProjects: { serves: EVERYBODY },
  createProject: { serves: DESIGNERS, body: () => ({ name: 'New', number: randomUUID(), designBasis }) },
  getProject: { id: project, serves: EVERYBODY },
  updateProject: { id: project, serves: DESIGNERS, body: () => ({ name: 'New', number: randomUUID() }) },
  setDesignBasis: { id: project, serves: DESIGNERS, body: () => designBasis },
  setPriceBook: { id: project, serves: ['admin', 'estimator'], body: () => priceBook },
  setMembers: { id: project, serves: DESIGNERS, body: ({ members }) => ({ personIds: members }) },
  listBeams: { id: project, serves: EVERYBODY },
  createBeam: { id: project, serves: DESIGNERS, body: () => ({ ...beamInput, mark: randomUUID() }) },
  updateBeam: { id: (w) => w.beam, serves: DESIGNERS, body: () => ({ ...beamInput, mark: randomUUID() }) },
  deleteBeam: { id: (w) => w.spareBeam, serves: DESIGNERS },
  listSweeps: { id: project, serves: EVERYBODY },
  createSweep: { id: (w) => w.beam, serves: DESIGNERS, body: sweepInput },
  getSweep: { id: (w) => w.sweep, serves: EVERYBODY },
  updateSweep: { id: (w) => w.sweep, serves: DESIGNERS, body: sweepInput },
  deleteSweep: { id: (w) => w.spareSweep, serves: DESIGNERS },
  startRun: { id: (w) => w.sweep, serves: DESIGNERS, body: () => ({}) },
  getRun: { id: (w) => w.run, serves: EVERYBODY },
  cancelRun: { id: (w) => w.run, serves: DESIGNERS, body: () => ({}) },
  resumeRun: { id: (w) => w.run, serves: DESIGNERS, body: () => ({}) },
  getRunningLoad: { serves: DESIGNERS },
  getOperations: { serves: ['admin'] },
  openView: { id: (w) => w.run, serves: EVERYBODY, body: () => ({ x: 'steelKgPerM', y: 'widthMm' }) },
  rankRun: { id: (w) => w.run, serves: OFFICE, body: ranking },
  getView: { id: (w) => w.run, serves: EVERYBODY },
  getSection: { id: (w) => w.run, serves: EVERYBODY },
  listSavedViews: { id: project, serves: EVERYBODY },
  createSavedView: { id: (w) => w.sweep, serves: OFFICE, body: savedView },
  // Whoever made it may too, and whoever leads the project: see saved-views.test.ts.
  updateSavedView: { id: (w) => w.savedView, serves: ['admin'], body: savedView },
  deleteSavedView: { id: (w) => w.savedView, serves: ['admin'] },
  evaluate: { id: project, serves: EVERYBODY, body: () => evaluateInput },
  listCandidates: { id: project, serves: EVERYBODY },
  pinCandidate: { id: project, serves: DESIGNERS, body: pin },
  getCandidate: { id: (w) => w.candidate, serves: EVERYBODY },
  commentOnCandidate: {
    id: (w) => w.candidate,
    serves: ['admin', 'engineer', 'checker', 'estimator'],
    body: () => ({ text: 'Noted' }),
  },
  listSheetValues: { id: (w) => w.candidate, serves: EVERYBODY },
  setSheetValue: {
    id: (w) => w.candidate,
    serves: ['checker'],
    body: () => ({ line: 'mn', value: 250e6 }),
  },
  moveCandidate: {
    id: (w) => w.candidate,
    serves: ['admin', 'checker'],
    body: () => ({ to: 'checked', note: '' }),
  },
  listShareLinks: { id: project, serves: DESIGNERS },
  createShareLink: { id: project, serves: DESIGNERS, body: () => ({}) },
  revokeShareLink: { id: (w) => w.shareLink, serves: DESIGNERS },
};
const NAMES = Object.keys(RULES) as (keyof typeof RULES)[];

const service = useTestService();
let author: SignedIn;
beforeAll(async () => {
  author = await signedIn(service, 'engineer');
  const admin = await signedIn(service, 'admin');
  standardIds = [];
  for (const body of [standardInput(), standardInput()])
    standardIds.push((await admin.post('/office-standards', body).expect(200)).body.id);
});

function callAs(caller: Pick<SignedIn, 'call'>, name: keyof typeof RULES, world: World, id?: string) {
  const rule = RULES[name];
  const path = endpoints[name].path
    .replace(':id', id ?? rule.id?.(world) ?? rule.officeId?.() ?? '')
    .replace(':viewId', world.view)
    .replace(':index', '7');
  const call = caller.call(endpoints[name].method, path);
  return rule.body === undefined ? call : call.send(rule.body(world));
}

describe('every endpoint', () => {
  it('has a rule here', () => {
    const open = ['getSession', 'signIn', 'signOut', 'getSharedShortlist'];
    expect([...NAMES, ...open].sort()).toEqual(Object.keys(endpoints).sort());
  });

  it.each(ROLES)('serves a member who is %s exactly what the role may do', async (role) => {
    const member = await signedIn(service, role);
    const world = await createWorld(service, author, [member.person]);
    for (const name of NAMES) {
      const { serves } = RULES[name];
      const { status, body } = await callAs(member, name, world);
      if (serves.includes(role)) {
        expect(status, `${name} for ${role}: ${JSON.stringify(body)}`).toBe(200);
      } else {
        expect([status, body.error?.code], `${name} for ${role}`).toEqual([403, 'forbidden']);
      }
    }
  });

  it.each(ROLES.filter((role) => role !== 'admin'))(
    'of another’s project does not exist for %s',
    async (role) => {
      const outsider = await signedIn(service, role);
      const world = await createWorld(service, author, []);
      for (const name of NAMES.filter((each) => RULES[each].id !== undefined)) {
        const theirs = await callAs(outsider, name, world);
        const nobodys = await callAs(outsider, name, world, randomUUID());
        expect(theirs.status, name).toBe(404);
        expect({ ...theirs.body.error, requestId: '' }, name).toEqual({
          ...nobodys.body.error,
          requestId: '',
        });
      }
    },
  );

  it('lets an admin reach a project without being a member', async () => {
    const admin = await signedIn(service, 'admin');
    const world = await createWorld(service, author, []);
    for (const name of ['getProject', 'listBeams', 'getRun', 'listCandidates', 'updateProject'] as const) {
      expect((await callAs(admin, name, world)).status, name).toBe(200);
    }
    const listed = await admin.get('/projects').expect(200);
    expect(listed.body.map(({ id }: { id: string }) => id)).toContain(world.project);
  });

  it('answers 404 to an id that is none, whoever asks', async () => {
    const admin = await signedIn(service, 'admin');
    const world = await createWorld(service, author, []);
    const ids = ['1', 'null', "' or 1=1 --", '%00', '../session', 'a'.repeat(5000)];
    for (const name of NAMES.filter((each) => RULES[each].id !== undefined)) {
      for (const id of ids) {
        const { status, body } = await callAs(admin, name, world, encodeURIComponent(id));
        expect([status, body.error?.code], `${name} ${id.slice(0, 20)}`).toEqual([404, 'not-found']);
      }
    }
  });

  it('asks for a session before it says anything else', async () => {
    const { agent, csrfToken } = await openBrowser(service.app);
    const anonymous: Pick<SignedIn, 'call'> = {
      call: (method, path) => agent[method](`/api${path}`).set('x-csrf-token', csrfToken),
    };
    const world = await createWorld(service, author, []);
    for (const name of NAMES) {
      const { status, body } = await callAs(anonymous, name, world);
      expect([status, body.error?.code], name).toEqual([401, 'unauthenticated']);
    }
  });
});

describe('rates', () => {
  /** Everything a member can read, as one text. */
  async function readAll(member: SignedIn, world: World): Promise<string> {
    const readable = NAMES.filter(
      (name) => endpoints[name].method === 'get' && RULES[name].serves === EVERYBODY,
    );
    const answers = await Promise.all(
      [...readable, 'evaluate' as const].map((name) => callAs(member, name, world)),
    );
    expect(answers.map(({ status }) => status)).toEqual(answers.map(() => 200));
    return JSON.stringify(answers.map(({ body }) => body));
  }

  it('reach everybody in the office and no viewer, wherever they are kept', async () => {
    for (const role of ROLES) {
      const member = await signedIn(service, role);
      const world = await createWorld(service, author, [member.person]);
      const read = await readAll(member, world);
      const mentions = [priceBook.currency, priceBook.source, 'steelPerKg'].map((text) =>
        read.includes(text),
      );
      expect(mentions, role).toEqual(mentions.map(() => role !== 'viewer'));
    }
  });

  it('are not on the shared page, whoever opens it', async () => {
    const world = await createWorld(service, author, []);
    const { text } = await author.get(`/shared/${world.shareToken}`).expect(200);
    expect(text).toContain('"candidates":[{');
    expect(text).not.toContain('steelPerKg');
    expect(text).not.toContain(priceBook.currency);
  });
});
