import { createHash } from 'node:crypto';
import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { candidates } from '#server/db/schema/candidates.ts';
import { studiesOf } from '#shared/engine/studies.ts';
import type { Candidate, CandidateState, Run } from '#shared/contract/records.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { addProject, DESIGN_BASIS, SMALL_SWEEP, type OfficeProject } from '../support/office-project.ts';
import { followRun, hasEnded } from '../support/run-stream.ts';
import type { Account, TestOffice } from '../support/office.ts';
import { openTestOffice } from '../support/test-office.ts';

let office: TestOffice;
let project: OfficeProject;
let run: Run;
let front: number[];

beforeAll(async () => {
  office = await openTestOffice();
  project = await addProject(office);
  const engineer = await office.as('engineer');
  const sweepId = await project.addSweep(SMALL_SWEEP);
  run = (await engineer.post(`/sweeps/${sweepId}/runs`).expect(200)).body;
  const stream = await followRun(office, engineer, { runId: run.id });
  const { progress } = await stream.until(hasEnded);
  stream.close();
  front = progress.result!.front.map(({ index }) => index);
});
afterAll(() => office.close());

const SECTION: SectionInput = {
  widthMm: 300,
  depthMm: 600,
  fcMPa: 28,
  fyMPa: 420,
  coverMm: 40,
  stirrup: { bar: '10', legs: 2, spacingMm: 200 },
  reinforcement: { kind: 'bars', tension: [{ bar: '25', count: 4 }], compression: [{ bar: '20', count: 2 }] },
};

async function pinAs(account: Account, source: object, note = '') {
  const person = await office.as(account);
  return person.post(`/projects/${project.projectId}/candidates`, {
    beamId: project.beamId,
    source,
    note,
  });
}

let depthMm = 600;
/** A candidate no other test has: each is 5 mm deeper. */
async function pinNew(account: Account = 'engineer'): Promise<Candidate> {
  depthMm += 5;
  const answer = await pinAs(account, { kind: 'section', section: { ...SECTION, depthMm } }, 'By hand');
  expect(answer.status).toBe(200);
  return answer.body;
}

async function move(account: Account, { id }: Candidate, to: CandidateState, note = 'As agreed') {
  return (await office.as(account)).post(`/candidates/${id}/transitions`, { to, note });
}

async function read(account: Account, { id }: Candidate): Promise<Candidate> {
  return (await (await office.as(account)).get(`/candidates/${id}`).expect(200)).body;
}

describe('a pin', () => {
  test('freezes the section of a run with the run’s inputs, and its hash can be repeated by anyone', async () => {
    const answer = await pinAs('engineer', { kind: 'run', runId: run.id, index: front[0] }, 'Least steel');
    expect(answer.status).toBe(200);
    const pinned: Candidate = answer.body;
    const shown = await (await office.as('engineer')).get(`/runs/${run.id}/sections/${front[0]}`).expect(200);
    const { section, demand, rules, basis } = pinned.snapshot;
    expect(pinned.snapshot).toEqual({
      section: shown.body.section,
      evaluation: shown.body.evaluation,
      demand: SMALL_SWEEP.demand,
      rules: SMALL_SWEEP.rules,
      basis: run.basis,
      engineVersion: run.engineVersion,
      studies: JSON.parse(JSON.stringify(studiesOf(section, { demand, rules, basis }))),
    });
    expect(pinned).toMatchObject({
      label: 'A',
      state: 'proposed',
      note: 'Least steel',
      runId: run.id,
      sectionIndex: front[0],
      isReproducedByCurrentEngine: true,
    });
    expect(pinned.transitions).toMatchObject([{ from: null, to: 'proposed', note: 'Least steel' }]);
    expect(pinned.hash).toBe(sha256OfSorted(pinned.snapshot));
  });

  test('of the same section on the same beam is refused, until the first is superseded', async () => {
    const source = { kind: 'run', runId: run.id, index: front[1] };
    const first = await pinAs('engineer', source);
    const again = await pinAs('admin', source);
    expect(again.status).toBe(409);
    expect(again.body.error.message).toBe(
      `This section is already pinned on beam B1, as candidate ${first.body.label}`,
    );
    expect((await move('engineer', first.body, 'superseded')).status).toBe(200);
    expect((await pinAs('engineer', source)).status).toBe(200);
  });

  test('does not change when the project’s basis and rates do', async () => {
    const pinned = await pinNew();
    const engineer = await office.as('engineer');
    const estimator = await office.as('estimator');
    const basis = { ...DESIGN_BASIS, ruleSet: 'aci318m-14', slabMm: 150 };
    await engineer.put(`/projects/${project.projectId}/design-basis`, basis).expect(200);
    const rates = { ...run.basis.rates!, steelPerKg: 7, source: 'Dearer' };
    await estimator.put(`/projects/${project.projectId}/price-book`, rates).expect(200);
    expect(await read('engineer', pinned)).toEqual(pinned);
    const later = await pinNew();
    expect(later.snapshot.basis).toMatchObject({
      ruleSet: 'aci318m-14',
      slabMm: 150,
      rates: { steelPerKg: 7 },
    });
    await engineer.put(`/projects/${project.projectId}/design-basis`, DESIGN_BASIS).expect(200);
  });

  test('cannot be changed in the database either', async () => {
    const pinned = await pinNew();
    const { db } = office.deps;
    const change = db.update(candidates).set({ note: 'Other' }).where(eq(candidates.id, pinned.id));
    await expect(change).rejects.toMatchObject({ cause: { message: 'candidates.note is frozen' } });
  });

  test('of a section that fails checks says so; of one that cannot be built is refused with the reason', async () => {
    const weak = { ...SECTION, depthMm: 300 };
    const answer = await pinAs('engineer', { kind: 'section', section: weak });
    expect(answer.body.snapshot.evaluation.meetsListedChecks).toBe(false);
    const crowded = {
      ...SECTION,
      widthMm: 150,
      reinforcement: { ...SECTION.reinforcement, tension: [{ bar: '40', count: 12 }] },
    };
    const refused = await pinAs('engineer', { kind: 'section', section: crowded });
    expect(refused.status).toBe(400);
    expect(refused.body.error.issues[0].path).toEqual(['source', 'section', 'reinforcement']);
    expect(refused.body.error.issues[0].message).toMatch(/cannot be pinned: \S/);
  });

  test('of an unknown bar, a section beyond the run, or another beam’s run names the field', async () => {
    const unknown = {
      ...SECTION,
      reinforcement: { kind: 'bars', tension: [{ bar: '#8', count: 3 }], compression: [] },
    };
    const bar = await pinAs('engineer', { kind: 'section', section: unknown });
    expect(bar.status).toBe(400);
    expect(bar.body.error.issues[0].path.slice(0, 3)).toEqual(['source', 'section', 'reinforcement']);
    const beyond = await pinAs('engineer', { kind: 'run', runId: run.id, index: 2880 });
    expect(beyond.body.error.issues[0].path).toEqual(['source', 'index']);
    const other = await addProject(office);
    const engineer = await office.as('engineer');
    const source = { kind: 'run', runId: run.id, index: 0 };
    await engineer
      .post(`/projects/${other.projectId}/candidates`, { beamId: other.beamId, source, note: '' })
      .expect(404);
    await engineer
      .post(`/projects/${other.projectId}/candidates`, { beamId: project.beamId, source, note: '' })
      .expect(404);
  });

  test('of several at once takes one label each', async () => {
    const fresh = await addProject(office);
    const engineer = await office.as('engineer');
    const answers = await Promise.all(
      Array.from({ length: 28 }, (_, i) =>
        engineer.post(`/projects/${fresh.projectId}/candidates`, {
          beamId: fresh.beamId,
          source: { kind: 'section', section: { ...SECTION, depthMm: 500 + 10 * i } },
          note: '',
        }),
      ),
    );
    const labels = answers.map((answer) => String(answer.body.label));
    expect(labels.sort()).toEqual([...'ABCDEFGHIJKLMNOPQRSTUVWXYZ', 'AA', 'AB'].sort());
  });
});

describe('the shortlist', () => {
  test('gives tonnes by bar for span × count', async () => {
    const { takeoff, snapshot, beam } = await pinNew();
    const metres = (beam.spanMm / 1000) * beam.count;
    expect(metres).toBe(45);
    const tension = takeoff.lines.find((line) => line.position === 'tension')!;
    // 4 bars of 25 mm at 3.853 kg/m (EN 10080) over 45 m.
    expect(tension).toMatchObject({ bar: '25', tonnes: expect.closeTo((4 * 3.853 * 45) / 1000, 12) });
    expect(takeoff.concreteM3).toBeCloseTo(
      (snapshot.section.widthMm * snapshot.section.depthMm * metres) / 1e6,
      12,
    );
    expect(takeoff.currency).toBe('XTS');
  });

  test('is read by members only', async () => {
    const pinned = await pinNew();
    const outsider = await office.as('outsider');
    await outsider.get(`/projects/${project.projectId}/candidates`).expect(404);
    await outsider.get(`/candidates/${pinned.id}`).expect(404);
    expect((await move('outsider', pinned, 'superseded')).status).toBe(404);
    await outsider.post(`/candidates/${pinned.id}/comments`, { text: 'Hello' }).expect(404);
    expect((await pinAs('outsider', { kind: 'section', section: SECTION })).status).toBe(404);
    const viewer = await office.as('viewer');
    const list = await viewer.get(`/projects/${project.projectId}/candidates`).expect(200);
    expect(list.body.map(({ id }: Candidate) => id)).toContain(pinned.id);
  });

  test('takes pins of engineers and admins only', async () => {
    for (const account of ['checker', 'estimator', 'viewer'] as const)
      expect((await pinAs(account, { kind: 'section', section: SECTION })).status).toBe(403);
  });
});

describe('a candidate', () => {
  test('is checked and approved by somebody else, and every step is on record', async () => {
    const pinned = await pinNew();
    expect((await move('checker', pinned, 'checked')).status).toBe(200);
    const approved = await move('checker', pinned, 'approved', 'Matches my own figures');
    expect(approved.body.state).toBe('approved');
    expect(
      approved.body.transitions.map(({ from, to }: Candidate['transitions'][number]) => [from, to]),
    ).toEqual([
      [null, 'proposed'],
      ['proposed', 'checked'],
      ['checked', 'approved'],
    ]);
    expect(approved.body.transitions[2]).toMatchObject({
      by: { name: 'The checker', role: 'checker' },
      note: 'Matches my own figures',
    });
  });

  test('is never checked, approved or returned by its author, not even an admin', async () => {
    for (const author of ['engineer', 'admin'] as const) {
      const pinned = await pinNew(author);
      expect((await move(author, pinned, 'checked')).status).toBe(403);
      expect((await move(author, pinned, 'returned')).status).toBe(403);
      await move('checker', pinned, 'checked');
      const refused = await move(author, pinned, 'approved');
      expect(refused.status).toBe(403);
      expect(refused.body.error.message).toContain('someone else');
      expect((await read(author, pinned)).state).toBe('checked');
    }
  });

  test('is moved by nobody whose role does not allow it', async () => {
    const pinned = await pinNew('admin');
    for (const account of ['engineer', 'estimator', 'viewer'] as const)
      for (const to of ['checked', 'approved', 'returned', 'superseded', 'proposed'] as const)
        expect([account, to, (await move(account, pinned, to)).status]).toEqual([account, to, 403]);
    expect((await read('viewer', pinned)).allowedTransitions).toEqual([]);
  });

  test('is returned with a reason only, and proposed again by its author', async () => {
    const pinned = await pinNew();
    const silent = await move('checker', pinned, 'returned', '  ');
    expect(silent.status).toBe(400);
    expect(silent.body.error.issues).toEqual([{ path: ['note'], message: 'Say why it is returned' }]);
    expect((await move('checker', pinned, 'returned', 'Cover is 50 on this face')).status).toBe(200);
    expect((await move('checker', pinned, 'proposed')).status).toBe(403);
    expect((await read('engineer', pinned)).allowedTransitions.sort()).toEqual(['proposed', 'superseded']);
    expect((await move('engineer', pinned, 'proposed')).body.state).toBe('proposed');
  });

  test('goes only where its state leads', async () => {
    const pinned = await pinNew();
    const skipped = await move('checker', pinned, 'approved');
    expect(skipped.status).toBe(409);
    expect(skipped.body.error.message).toBe(
      `Candidate ${pinned.label} is proposed now, and from there it cannot become approved`,
    );
    await move('engineer', pinned, 'superseded');
    for (const to of ['checked', 'returned'] as const)
      expect((await move('checker', pinned, to)).status).toBe(409);
    expect((await move('admin', pinned, 'superseded')).status).toBe(409);
  });

  test('approved and returned at once takes one and refuses the other', async () => {
    for (let i = 0; i < 5; i++) {
      const pinned = await pinNew();
      await move('checker', pinned, 'checked');
      const [approved, returned] = await Promise.all([
        move('checker', pinned, 'approved'),
        move('admin', pinned, 'returned'),
      ]);
      expect([approved.status, returned.status].sort()).toEqual([200, 409]);
      const after = await read('viewer', pinned);
      expect(after.state).toBe(approved.status === 200 ? 'approved' : 'returned');
      expect(after.transitions).toHaveLength(3);
    }
  });

  test('is commented on by everyone in the office, in order, and by no viewer', async () => {
    const pinned = await pinNew();
    for (const account of ['engineer', 'checker', 'estimator', 'admin'] as const) {
      const person = await office.as(account);
      await person.post(`/candidates/${pinned.id}/comments`, { text: `From the ${account}` }).expect(200);
    }
    const viewer = await office.as('viewer');
    await viewer.post(`/candidates/${pinned.id}/comments`, { text: 'Mine' }).expect(403);
    const empty = await (
      await office.as('engineer')
    ).post(`/candidates/${pinned.id}/comments`, { text: ' ' });
    expect(empty.body.error.issues).toEqual([{ path: ['text'], message: 'Comment is missing' }]);
    const { comments } = await read('viewer', pinned);
    expect(comments.map(({ author, text }) => [author.role, text])).toEqual([
      ['engineer', 'From the engineer'],
      ['checker', 'From the checker'],
      ['estimator', 'From the estimator'],
      ['admin', 'From the admin'],
    ]);
  });

  test('whose frozen numbers today’s engine does not give is marked, and shown as frozen', async () => {
    const pinned = await pinNew();
    const { evaluation } = pinned.snapshot;
    const older = {
      ...pinned.snapshot,
      engineVersion: '0.9.0',
      evaluation: { ...evaluation, measures: { ...evaluation.measures, steelKgPerM: 17.5 } },
    };
    const { db } = office.deps;
    const [row] = await db.select().from(candidates).where(eq(candidates.id, pinned.id));
    const { id: _id, ...values } = row!;
    const [copy] = await db
      .insert(candidates)
      .values({ ...values, label: 'ZZ', snapshot: older, hash: sha256OfSorted(older) })
      .returning();
    const shown = await read('engineer', { ...pinned, id: copy!.id });
    expect(shown.isReproducedByCurrentEngine).toBe(false);
    expect(shown.snapshot).toEqual(older);
  });
});

/** Written again here: JSON with sorted keys, and Node's own SHA-256. */
function sha256OfSorted(value: unknown): string {
  const write = (entry: unknown): string => {
    if (Array.isArray(entry)) return `[${entry.map(write).join(',')}]`;
    if (typeof entry !== 'object' || entry === null) return JSON.stringify(entry);
    const record = entry as Record<string, unknown>;
    const keys = Object.keys(record).sort();
    return `{${keys.map((key) => `${JSON.stringify(key)}:${write(record[key])}`).join(',')}}`;
  };
  return createHash('sha256').update(write(value)).digest('hex');
}
