import { randomUUID } from 'node:crypto';
import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { people } from '#server/db/schema/people.ts';
import { createPerson, createProject, designBasis, priceBook } from '../support/factories.ts';
import { signedIn, type SignedIn } from '../support/signed-in.ts';
import { useTestService } from '../support/test-service.ts';
import { createWorld } from '../support/world.ts';

const service = useTestService();
let engineer: SignedIn;
beforeAll(async () => {
  engineer = await signedIn(service, 'engineer');
});

const newProject = (number: string = randomUUID()) => ({ name: 'Mill', number, designBasis });

describe('a project', () => {
  it('keeps what it was created with, and its creator is its first member', async () => {
    const input = newProject();
    const { body } = await engineer.post('/projects', input).expect(200);
    expect(body).toMatchObject({ ...input, members: [engineer.person], beamCount: 0, priceBook: null });
    const again = await engineer.get(`/projects/${body.id}`).expect(200);
    expect(again.body).toEqual(body);
  });

  it('has a number of its own, whatever the case, and the refusal stands at the field', async () => {
    await engineer.post('/projects', newProject('26-014a')).expect(200);
    const { status, body } = await engineer.post('/projects', newProject(' 26-014A '));
    expect([status, body.error.code]).toEqual([409, 'conflict']);
    expect(body.error.issues).toEqual([
      { path: ['number'], message: 'Another project has the number 26-014A already' },
    ]);
    const mine = await engineer.post('/projects', newProject()).expect(200);
    await engineer.patch(`/projects/${mine.body.id}`, { name: 'Mill', number: '26-014a' }).expect(409);
  });

  it('names every field of a design basis that is out of bounds', async () => {
    const { id } = await createProject(service.deps, { members: [engineer.person] });
    const { body } = await engineer
      .put(`/projects/${id}/design-basis`, {
        ...designBasis,
        coverMm: -1,
        fyMPa: '420',
        ruleSet: 'x',
        slabMm: null,
      })
      .expect(400);
    expect(body.error.issues).toEqual(
      expect.arrayContaining([
        { path: ['ruleSet'], message: 'Choose a design code' },
        { path: ['slabMm'], message: 'Slab thickness must be a number' },
        { path: ['fyMPa'], message: 'Yield strength fy must be a number' },
        { path: ['coverMm'], message: 'Clear cover must be at least 0 mm' },
      ]),
    );
    expect(body.error.issues).toHaveLength(4);
  });

  it('counts what is in it, and only that', async () => {
    const checker = await signedIn(service, 'checker');
    const world = await createWorld(service, engineer, [checker.person]);
    await createWorld(service, engineer, []);
    const counts = async () => {
      const { body } = await engineer.get(`/projects/${world.project}`).expect(200);
      return [body.beamCount, body.candidateCount, body.approvedCount];
    };
    expect(await counts()).toEqual([2, 1, 0]);
    for (const to of ['checked', 'approved']) {
      await checker.post(`/candidates/${world.candidate}/transitions`, { to, note: '' }).expect(200);
    }
    expect(await counts()).toEqual([2, 1, 1]);
  });

  it('is listed newest first and only to its members', async () => {
    const reader = await signedIn(service, 'viewer');
    const older = await createProject(service.deps, { members: [engineer.person, reader.person] });
    await createProject(service.deps, { members: [engineer.person] });
    const newer = await createProject(service.deps, { members: [engineer.person, reader.person] });
    const { body } = await reader.get('/projects').expect(200);
    expect(body.map(({ id }: { id: string }) => id)).toEqual([newer.id, older.id]);
  });
});

describe('a price book', () => {
  it('keeps a missing rate as missing', async () => {
    const estimator = await signedIn(service, 'estimator');
    const { id } = await createProject(service.deps, { members: [estimator.person], priceBook: null });
    const input = { ...priceBook, steelPerKg: null, concrete: [] };
    const { body } = await estimator.put(`/projects/${id}/price-book`, input).expect(200);
    expect(body.priceBook).toEqual(input);
  });

  it('takes one rate for a strength, and says which row repeats it', async () => {
    const estimator = await signedIn(service, 'estimator');
    const { id } = await createProject(service.deps, { members: [estimator.person] });
    const mix = (fcMPa: number) => ({ fcMPa, costPerM3: 100, co2eKgPerM3: null });
    const input = { ...priceBook, concrete: [mix(30), mix(35), mix(30.005)] };
    const { body } = await estimator.put(`/projects/${id}/price-book`, input).expect(400);
    expect(body.error.issues).toEqual([
      { path: ['concrete', 2, 'fcMPa'], message: 'This strength stands in the price book already' },
    ]);
  });
});

describe('the members', () => {
  it('are replaced as a whole; a name given twice counts once', async () => {
    const [first, second] = [await createPerson(service.deps, { role: 'checker' }), engineer.person];
    const { id } = await createProject(service.deps, { members: [engineer.person] });
    const personIds = [first.id, second.id, first.id.toUpperCase()];
    const { body } = await engineer.put(`/projects/${id}/members`, { personIds }).expect(200);
    expect(body.members.map((member: { id: string }) => member.id).sort()).toEqual(
      [first.id, second.id].sort(),
    );
  });

  it('cannot lose the engineer who sets them, but an admin may leave', async () => {
    const admin = await signedIn(service, 'admin');
    const { id } = await createProject(service.deps, { members: [engineer.person, admin.person] });
    const refused = await engineer
      .put(`/projects/${id}/members`, { personIds: [admin.person.id] })
      .expect(400);
    expect(refused.body.error.issues).toEqual([
      { path: ['personIds'], message: 'You cannot take yourself off the project' },
    ]);
    const left = await admin.put(`/projects/${id}/members`, { personIds: [engineer.person.id] }).expect(200);
    expect(left.body.members).toEqual([engineer.person]);
  });

  it('are known people with open accounts: every unknown one is named', async () => {
    const shut = await createPerson(service.deps, { role: 'viewer' });
    await service.deps.db.update(people).set({ disabledAt: new Date() }).where(eq(people.id, shut.id));
    const { id } = await createProject(service.deps, { members: [engineer.person] });
    const personIds = [randomUUID(), engineer.person.id, shut.id];
    const { body } = await engineer.put(`/projects/${id}/members`, { personIds }).expect(400);
    expect(body.error.issues.map(({ path }: { path: unknown }) => path)).toEqual([
      ['personIds', 0],
      ['personIds', 2],
    ]);
  });

  it('with a shut account are not shown, and are members again when it opens', async () => {
    const away = await createPerson(service.deps, { role: 'viewer' });
    const setDisabled = (disabledAt: Date | null) =>
      service.deps.db.update(people).set({ disabledAt }).where(eq(people.id, away.id));
    const { id } = await createProject(service.deps, { members: [engineer.person, away] });
    await setDisabled(new Date());
    const personIds = [engineer.person.id];
    const during = await engineer.put(`/projects/${id}/members`, { personIds }).expect(200);
    expect(during.body.members).toEqual([engineer.person]);
    await setDisabled(null);
    const after = await engineer.get(`/projects/${id}`).expect(200);
    expect(after.body.members).toHaveLength(2);
  });
});
