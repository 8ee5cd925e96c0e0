import { beforeAll, describe, expect, it } from 'vitest';
import {
  beamInput,
  createBeam,
  createProject,
  createSweep,
  evaluateInput,
  sweepDefinition,
} from '../support/factories.ts';
import { signedIn, type SignedIn } from '../support/signed-in.ts';
import { useTestService } from '../support/test-service.ts';

const service = useTestService();
let engineer: SignedIn;
let projectId: string;
beforeAll(async () => {
  engineer = await signedIn(service, 'engineer');
  projectId = (await createProject(service.deps, { members: [engineer.person] })).id;
});

const newSweep = (beamId: string) => createSweep(service.deps, { beamId, creator: engineer.person });
const pinTo = (beamId: string) =>
  engineer.post(`/projects/${projectId}/candidates`, {
    beamId,
    source: { kind: 'section', section: evaluateInput.section },
    note: '',
  });

describe('a beam', () => {
  it('keeps its demands to the digit, unknown ones as unknown', async () => {
    const input = { ...beamInput, mark: 'K-7', muNmm: 298_765_432.125, vuN: null, depthCapMm: null };
    const { body } = await engineer.post(`/projects/${projectId}/beams`, input).expect(200);
    expect(body).toMatchObject({ ...input, projectId, sweepCount: 0, candidateCount: 0 });
    const changed = await engineer.put(`/beams/${body.id}`, { ...input, muNmm: 0 }).expect(200);
    expect(changed.body).toEqual({ ...body, muNmm: 0 });
  });

  it('has a mark of its own in the project, and the refusal stands at the field', async () => {
    await engineer.post(`/projects/${projectId}/beams`, { ...beamInput, mark: 'T1' }).expect(200);
    const taken = [{ path: ['mark'], message: 'Another beam of this project has the mark t1 already' }];
    const second = await engineer
      .post(`/projects/${projectId}/beams`, { ...beamInput, mark: 't1' })
      .expect(409);
    expect(second.body.error.issues).toEqual(taken);
    const { id } = await createBeam(service.deps, projectId);
    const renamed = await engineer.put(`/beams/${id}`, { ...beamInput, mark: 't1' }).expect(409);
    expect(renamed.body.error.issues).toEqual(taken);
    const elsewhere = await createProject(service.deps, { members: [engineer.person] });
    await engineer.post(`/projects/${elsewhere.id}/beams`, { ...beamInput, mark: 'T1' }).expect(200);
  });

  it('names every demand that cannot be', async () => {
    const { body } = await engineer
      .post(`/projects/${projectId}/beams`, {
        ...beamInput,
        mark: ' ',
        spanMm: -7200,
        count: 1.5,
        muNmm: '300',
      })
      .expect(400);
    expect(body.error.issues).toEqual([
      { path: ['mark'], message: 'Mark is missing' },
      { path: ['spanMm'], message: 'Span must be at least 100 mm' },
      { path: ['count'], message: 'Count must be a whole number' },
      { path: ['muNmm'], message: 'Moment Mu must be a number' },
    ]);
  });

  it('is listed in the order its mark is read: B2 before B10', async () => {
    const { id } = await createProject(service.deps, { members: [engineer.person] });
    for (const mark of ['B10', 'b2', 'A3']) await createBeam(service.deps, id, mark);
    const { body } = await engineer.get(`/projects/${id}/beams`).expect(200);
    expect(body.map(({ mark }: { mark: string }) => mark)).toEqual(['A3', 'b2', 'B10']);
  });

  it('goes with its sweeps while nothing was run or pinned', async () => {
    const { id } = await createBeam(service.deps, projectId);
    const sweep = await newSweep(id);
    await engineer.delete(`/beams/${id}`).expect(200);
    await engineer.get(`/sweeps/${sweep.id}`).expect(404);
  });

  it('stays, with everything in it, once it has a run or a candidate', async () => {
    const [run, pinned] = [
      await createBeam(service.deps, projectId),
      await createBeam(service.deps, projectId),
    ];
    const sweep = await newSweep(run.id);
    await engineer.post(`/sweeps/${sweep.id}/runs`).expect(200);
    await pinTo(pinned.id).expect(200);
    for (const { id } of [run, pinned]) {
      const { body } = await engineer.delete(`/beams/${id}`).expect(409);
      expect(body.error.message).toMatch(/kept for good, so it cannot be deleted$/);
    }
    const { body } = await engineer.get(`/projects/${projectId}/beams`).expect(200);
    const countsOf = (id: string) => body.find((beam: { id: string }) => beam.id === id);
    expect(countsOf(run.id)).toMatchObject({ sweepCount: 1, candidateCount: 0 });
    expect(countsOf(pinned.id)).toMatchObject({ sweepCount: 0, candidateCount: 1 });
  });
});

describe('a sweep', () => {
  const space = sweepDefinition.space;
  let beamId: string;
  beforeAll(async () => {
    beamId = (await createBeam(service.deps, projectId, 'S1')).id;
  });
  const save = (changes: object) =>
    engineer.post(`/beams/${beamId}/sweeps`, {
      name: 'Wide',
      definition: { ...sweepDefinition, space: { ...space, ...changes } },
    });

  it('comes back as it was saved, under its beam', async () => {
    const { body } = await save({}).expect(200);
    expect(body).toMatchObject({
      name: 'Wide',
      definition: sweepDefinition,
      beamId,
      beamMark: 'S1',
      runs: [],
    });
    expect((await engineer.get(`/sweeps/${body.id}`).expect(200)).body).toEqual(body);
    const listed = await engineer.get(`/projects/${projectId}/sweeps`).expect(200);
    expect(listed.body).toContainEqual(body);
  });

  it('names every range that cannot be, at its own field', async () => {
    const { body } = await save({
      width: { kind: 'range', from: 400, to: 300, step: 50 },
      depth: { kind: 'range', from: 500, to: 700, step: 0 },
      fc: { kind: 'list', values: [] },
      tension: { kind: 'bars', sizes: [], counts: [0], none: false },
    }).expect(400);
    const at = (...path: (string | number)[]) => ['definition', 'space', ...path];
    expect(body.error.issues).toEqual([
      { path: at('width', 'to'), message: 'Width b: the end is below the start' },
      { path: at('depth', 'step'), message: 'Depth h: the step must be more than zero' },
      { path: at('fc', 'values'), message: 'Concrete strength f′c: enter at least one value' },
      { path: at('tension', 'counts', 0), message: 'Number of bars must be at least 1' },
      { path: at('tension', 'sizes'), message: 'Tension bars: choose at least one size' },
    ]);
  });

  it('has steel areas inside the section, however near its face, and none that are but a trace', async () => {
    const areas = (areasMm2: number[], at: object) => ({
      tension: { kind: 'areas', areasMm2, at },
      compression: { kind: 'areas', areasMm2: [0], at: { offsetMm: 50 } },
    });
    const path = ['definition', 'space', 'tension'];
    for (const [changes, field, message] of [
      [areas([500], { offsetMm: 1e-13 }), ['at', 'offsetMm'], 'Distance from the face must be at least 1 mm'],
      [areas([500], { shareOfDepth: 1e-17 }), ['at', 'shareOfDepth'], 'Share of h must be at least 0.001'],
      [
        areas([500, 1e-9], { offsetMm: 1 }),
        ['areasMm2', 1],
        'Tension bars: area must be 0, or at least 1 mm²',
      ],
    ] as const) {
      const { body } = await save(changes).expect(400);
      expect(body.error.issues).toEqual([{ path: [...path, ...field], message }]);
    }
    const sweep = (await save(areas([500], { offsetMm: 1 })).expect(200)).body;
    const run = (await engineer.post(`/sweeps/${sweep.id}/runs`).expect(200)).body;
    await engineer.get(`/runs/${run.id}/sections/0`).expect(200);
  });

  it('names every bar that the project’s standard does not list', async () => {
    const { body } = await save({
      tension: { kind: 'bars', sizes: ['20', '25', '#8'], counts: [3], none: false },
      stirrups: [null, { bar: '10M', legs: 2, spacingMm: 200 }],
    }).expect(400);
    expect(body.error.issues).toEqual([
      {
        path: ['definition', 'space', 'tension', 'sizes', 2],
        message: 'EN 10080 / ISO 6935 lists no bar #8',
      },
      {
        path: ['definition', 'space', 'stirrups', 1, 'bar'],
        message: 'EN 10080 / ISO 6935 lists no bar 10M',
      },
    ]);
  });

  it('may be saved too large to run; the run is refused with the count and the axis to coarsen', async () => {
    const fine = { kind: 'range', from: 300, to: 1300, step: 0.5 };
    const { body } = await save({
      width: fine,
      depth: { ...fine, from: 400 },
      fc: { kind: 'range', from: 20, to: 74, step: 1 },
      fy: { kind: 'range', from: 300, to: 500, step: 0.5 },
    }).expect(200);
    const tooLarge = await engineer.post(`/sweeps/${body.id}/runs`);
    expect([tooLarge.status, tooLarge.body.error.code]).toEqual([422, 'too-many-sections']);
    // 2001 widths × 1801 depths × 55 strengths × 401 yields × 2 sizes × 3 counts: more than bounds search.
    expect(tooLarge.body.error.message).toContain((2001 * 1801 * 55 * 401 * 6).toLocaleString('en-US'));
    expect(tooLarge.body.error.issues[0].path).toEqual(['definition', 'space', 'width', 'step']);
  });

  it('keeps its runs when it changes, and cannot be deleted any more', async () => {
    const { id } = await newSweep(beamId);
    const run = await engineer.post(`/sweeps/${id}/runs`).expect(200);
    const definition = { ...sweepDefinition, demand: { ...sweepDefinition.demand, muNmm: 1e6 } };
    const { body } = await engineer.put(`/sweeps/${id}`, { name: 'Lighter', definition }).expect(200);
    expect(body.runs).toHaveLength(1);
    expect(Date.parse(body.updatedAt)).toBeGreaterThan(Date.parse(body.createdAt));
    const frozen = await engineer.get(`/runs/${run.body.id}`).expect(200);
    expect(frozen.body.definition).toEqual(sweepDefinition);
    const refused = await engineer.delete(`/sweeps/${id}`).expect(409);
    expect(refused.body.error.message).toBe(
      '“Lighter” has runs, which are kept for good, so it cannot be deleted',
    );
  });

  it('without runs can be deleted', async () => {
    const { id } = await newSweep(beamId);
    await engineer.delete(`/sweeps/${id}`).expect(200);
    await engineer.get(`/sweeps/${id}`).expect(404);
    await engineer.delete(`/sweeps/${id}`).expect(404);
  });
});
