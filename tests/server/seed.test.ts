import { execFile } from 'node:child_process';
import { promisify } from 'node:util';
import pg from 'pg';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { DEMO_ACCOUNTS, DEMO_PASSWORD } from '#server/cli/demo-accounts.mjs';
import { CANDIDATE_STATES, type Candidate, type Project, type Sweep } from '#shared/contract/records.ts';
import { openOffice, type TestOffice } from '../support/office.ts';
import { testEnvironment } from '../support/test-environment.ts';
import { createTestDatabase, type TestDatabase } from '../support/test-database.ts';

const run = promisify(execFile);

async function seed(database: TestDatabase): Promise<void> {
  const env = { ...process.env, ...testEnvironment(database.url) };
  await run(process.execPath, ['--import', 'tsx', 'server/cli/seed.ts'], { env });
}

/** Everything but what measures time or salts a password. */
async function digestOf(database: TestDatabase): Promise<string[]> {
  const connection = new pg.Client({ connectionString: database.url });
  await connection.connect();
  const tables = [
    'projects',
    'project_members',
    'beams',
    'sweeps',
    'runs',
    'run_views',
    'candidates',
    'candidate_transitions',
    'candidate_comments',
    'office_standards',
    'saved_views',
  ];
  const digests: string[] = [];
  for (const table of tables) {
    const { rows } = await connection.query<{ count: number; digest: string }>(
      `select count(*)::int as count, md5(string_agg(md5((to_jsonb(t) - 'elapsed_ms' - 'position')::text), ''
         order by (to_jsonb(t) - 'elapsed_ms' - 'position')::text)) as digest from ${table} t`,
    );
    digests.push(`${table} ${rows[0]!.count} ${rows[0]!.digest}`);
  }
  await connection.end();
  return digests;
}

describe('the demo office', () => {
  let database: TestDatabase;
  let office: TestOffice;
  let first: string[];

  beforeAll(async () => {
    database = await createTestDatabase();
    await seed(database);
    first = await digestOf(database);
    office = await openOffice(database);
  });
  afterAll(() => office.close());

  async function signIn(role: string) {
    const { email } = DEMO_ACCOUNTS.find((account) => account.role === role)!;
    return office.signIn(email, DEMO_PASSWORD);
  }
  const read = async <T>(role: string, path: string): Promise<T> =>
    (await (await signIn(role)).get(path).expect(200)).body;

  test('is there once, however often it is seeded', async () => {
    await seed(database);
    expect(await digestOf(database)).toEqual(first);
  });

  test('is the same office wherever it is set up', async () => {
    const other = await createTestDatabase();
    await seed(other);
    const second = await digestOf(other);
    await other.drop();
    expect(second).toEqual(first);
  });

  test('lets one person of each role in, and shows the project without members to the admin alone', async () => {
    const seen = new Map<string, string[]>();
    for (const { role } of DEMO_ACCOUNTS) {
      const projects = await read<Project[]>(role, '/projects');
      seen.set(role, projects.map(({ name }) => name).sort());
    }
    const open = ['Saltmarket Arcade', 'Tidemill Library', 'Wharf Lane Clinic'];
    for (const role of ['engineer', 'checker', 'estimator', 'viewer']) expect(seen.get(role)).toEqual(open);
    expect(seen.get('admin')).toEqual(['Gorse Hill Depot', ...open]);
  });

  test('has runs of every size, one over a million sections and one with nothing feasible', async () => {
    const [library] = (await read<Project[]>('engineer', '/projects')).filter(
      ({ name }) => name === 'Tidemill Library',
    );
    expect(library).toMatchObject({ beamCount: 9, candidateCount: 7, approvedCount: 1 });
    const sweeps = await read<Sweep[]>('engineer', `/projects/${library!.id}/sweeps`);
    const runs = sweeps.flatMap((sweep) => sweep.runs);
    expect(
      runs.every(({ state, evaluated, sectionCount }) => state === 'finished' && evaluated === sectionCount),
    ).toBe(true);
    expect(Math.max(...runs.map(({ sectionCount }) => sectionCount))).toBeGreaterThan(1_000_000);
    expect(runs.filter(({ feasible }) => feasible === 0)).toHaveLength(1);
    expect(runs.filter(({ frontCount }) => frontCount > 3).length).toBeGreaterThan(2);
  });

  test('has a slab worked in, and a frame of class M by EN that hogs at its columns', async () => {
    const projects = await read<Project[]>('engineer', '/projects');
    const lists = await Promise.all(
      projects.map(({ id }) => read<Candidate[]>('checker', `/projects/${id}/candidates`)),
    );
    const snapshots = lists.flat().map(({ snapshot }) => snapshot);
    const inCompression = snapshots.filter(({ section }) => section.flange?.face === 'compression');
    const hogging = snapshots.filter(({ section }) => section.flange?.face === 'tension');
    expect(inCompression.length).toBeGreaterThan(1);
    expect(hogging.length).toBeGreaterThan(1);
    for (const { basis, evaluation } of hogging) {
      expect(basis).toMatchObject({ ruleSet: 'en1992', seismicSystem: 'dcm' });
      expect(evaluation.checks.map(({ id }) => id)).toEqual(
        expect.arrayContaining(['seismic-steel', 'hoop-spacing', 'shear', 'axis-depth']),
      );
    }
  });

  test('has a candidate in every state, each reproduced by the engine of today', async () => {
    const projects = await read<Project[]>('engineer', '/projects');
    const lists = await Promise.all(
      projects.map(({ id }) => read<Candidate[]>('checker', `/projects/${id}/candidates`)),
    );
    const all = lists.flat();
    expect(new Set(all.map(({ state }) => state))).toEqual(new Set(CANDIDATE_STATES));
    expect(all.every((candidate) => candidate.isReproducedByCurrentEngine)).toBe(true);
    expect(all.every(({ snapshot }) => snapshot.evaluation.meetsListedChecks)).toBe(true);
    for (const { author, transitions } of all)
      for (const { to, by } of transitions)
        expect(by.id === author.id).toBe(to === 'proposed' || to === 'superseded');
  });
});
