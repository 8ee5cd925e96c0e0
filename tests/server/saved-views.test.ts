import { beforeAll, describe, expect, it } from 'vitest';
import type { SavedView } from '#shared/contract/saved-view.ts';
import { createBeam, createProject, createSweep } from '../support/factories.ts';
import { signedIn, type SignedIn } from '../support/signed-in.ts';
import { useTestService } from '../support/test-service.ts';

const service = useTestService();
let lead: SignedIn;
let maker: SignedIn;
let colleague: SignedIn;
let viewer: SignedIn;
let projectId: string;
let sweepId: string;
let runId: string;

const startedRun = async (by: SignedIn, sweep: string): Promise<string> =>
  (await by.post(`/sweeps/${sweep}/runs`).expect(200)).body.id;

beforeAll(async () => {
  lead = await signedIn(service, 'engineer');
  maker = await signedIn(service, 'checker');
  colleague = await signedIn(service, 'engineer');
  viewer = await signedIn(service, 'viewer');
  const members = [lead, maker, colleague, viewer].map(({ person }) => person);
  projectId = (await createProject(service.deps, { members })).id;
  const beam = await createBeam(service.deps, projectId);
  sweepId = (await createSweep(service.deps, { beamId: beam.id, creator: lead.person })).id;
  runId = await startedRun(lead, sweepId);
});

const address = { x: 'steelKgPerM', y: 'depthMm', f: 'depthMm:500~700', i: '12' };
const save = (by: SignedIn, name: string, parts: object = address) =>
  by.post(`/sweeps/${sweepId}/saved-views`, { name, runId, address: parts });
const listed = async (by: SignedIn): Promise<SavedView[]> =>
  (await by.get(`/projects/${projectId}/saved-views`).expect(200)).body;

describe('a saved view', () => {
  it('comes back to everybody of the project as it was saved, with its maker and its run', async () => {
    const { body } = await save(maker, 'Shallow ones').expect(200);
    expect(body).toMatchObject({
      name: 'Shallow ones',
      address,
      sweepId,
      runId,
      runNumber: 1,
      createdBy: { id: maker.person.id, name: maker.person.name },
      mayChange: true,
    });
    for (const [reader, mayChange] of [
      [lead, true],
      [colleague, false],
      [viewer, false],
    ] as const)
      expect(await listed(reader)).toContainEqual({ ...body, mayChange });
  });

  it('has a name of its own in its sweep, whatever its capitals, and the refusal stands at the field', async () => {
    await save(maker, 'By cost').expect(200);
    const taken = await save(colleague, 'by COST').expect(409);
    expect(taken.body.error.issues).toEqual([
      { path: ['name'], message: 'Another view of this sweep is named by COST already' },
    ]);
    const { id } = (await save(maker, 'Other').expect(200)).body;
    await maker.put(`/saved-views/${id}`, { name: 'By Cost', runId, address }).expect(409);
    const blank = await save(maker, '  ').expect(400);
    expect(blank.body.error.issues).toEqual([{ path: ['name'], message: 'Name of the view is missing' }]);
  });

  it('is changed and deleted by its maker and the project’s lead, and by no other member', async () => {
    const { id } = (await save(maker, 'Mine').expect(200)).body;
    const renamed = { name: 'Mine, wider', runId, address: { x: 'depthMm' } };
    const refused = await colleague.put(`/saved-views/${id}`, renamed).expect(403);
    expect(refused.body.error.message).toMatch(/^The checker made this view/);
    await colleague.delete(`/saved-views/${id}`).expect(403);
    await viewer.delete(`/saved-views/${id}`).expect(403);
    expect((await maker.put(`/saved-views/${id}`, renamed).expect(200)).body).toMatchObject(renamed);
    const byLead = await lead.put(`/saved-views/${id}`, { ...renamed, name: 'Ours' }).expect(200);
    expect(byLead.body).toMatchObject({ name: 'Ours', createdBy: { id: maker.person.id } });
    await lead.delete(`/saved-views/${id}`).expect(200);
    await maker.delete(`/saved-views/${id}`).expect(404);
  });

  it('belongs to a run of its own sweep', async () => {
    const beam = await createBeam(service.deps, projectId);
    const other = await createSweep(service.deps, { beamId: beam.id, creator: lead.person });
    const foreign = await startedRun(lead, other.id);
    const { body } = await maker
      .post(`/sweeps/${sweepId}/saved-views`, { name: 'Strange', runId: foreign, address })
      .expect(400);
    expect(body.error.issues).toEqual([{ path: ['runId'], message: 'This is no run of the sweep' }]);
  });

  it('tells a viewer nothing of rates: one that names cost is not listed', async () => {
    await save(maker, 'Dear ones', { ...address, f: 'costPerM:90~110' }).expect(200);
    expect((await listed(lead)).map(({ name }) => name)).toContain('Dear ones');
    expect((await listed(viewer)).map(({ name }) => name)).not.toContain('Dear ones');
  });

  it('is no store: an address has a few short parts', async () => {
    const letters = [...'abcdefghijklmnopqrstuvwxyz'];
    const many = Object.fromEntries(
      [...letters, ...letters.map((one) => `${one}${one}`)].map((key) => [key, '1']),
    );
    await save(maker, 'Many', many).expect(400);
    await save(maker, 'Long', { x: 'a'.repeat(2001) }).expect(400);
    await save(maker, 'Named', { 'X-1': 'a' }).expect(400);
  });
});
