import { afterAll, beforeAll, expect, test } from 'vitest';
import type { Candidate, Run, ViewProgress } from '#shared/contract/records.ts';
import { addProject, PRICE_BOOK, SMALL_SWEEP, type OfficeProject } from '../support/office-project.ts';
import { followRun, hasEnded } from '../support/run-stream.ts';
import type { TestOffice } from '../support/office.ts';
import type { SignedIn } from '../support/signed-in.ts';
import { openTestOffice } from '../support/test-office.ts';

let office: TestOffice;
let project: OfficeProject;
let engineer: SignedIn;
let viewer: SignedIn;
let byCost: Run;
let bySteel: Run;
let candidate: Candidate;
/** Every rate of the price book, and costs that follow from them, as they would be printed in JSON. */
let secrets: string[];

const { demand, rules } = SMALL_SWEEP;

beforeAll(async () => {
  office = await openTestOffice();
  project = await addProject(office);
  [engineer, viewer] = [await office.as('engineer'), await office.as('viewer')];
  byCost = await run({ ...SMALL_SWEEP, view: { x: 'costPerM', y: 'depthMm' } });
  bySteel = await run(SMALL_SWEEP);
  const source = { kind: 'run', runId: bySteel.id, index: 2000 };
  const input = { beamId: project.beamId, source, note: '' };
  candidate = (await engineer.post(`/projects/${project.projectId}/candidates`, input).expect(200)).body;
  secrets = collectSecrets(candidate);
});
afterAll(() => office.close());

async function run(definition: typeof SMALL_SWEEP): Promise<Run> {
  const answer = await engineer.post(`/sweeps/${await project.addSweep(definition)}/runs`).expect(200);
  const stream = await followRun(office, engineer, { runId: answer.body.id });
  await stream.until(hasEnded);
  stream.close();
  return (await engineer.get(`/runs/${answer.body.id}`).expect(200)).body;
}

function collectSecrets({ snapshot, takeoff }: Candidate): string[] {
  const { steelPerKg, stirrupPerKg, formworkPerM2, steelCo2ePerKg, concrete } = PRICE_BOOK;
  const { cost } = snapshot.evaluation.quantities;
  const mixes = concrete.flatMap((mix) => [mix.costPerM3, mix.co2eKgPerM3]);
  const rates = [steelPerKg, stirrupPerKg, formworkPerM2, steelCo2ePerKg, ...mixes];
  const costs = [cost!.steel, cost!.stirrups, cost!.concrete, cost!.formwork, cost!.total, takeoff.cost];
  return [...rates, ...costs, PRICE_BOOK.currency].map(String);
}

const findSecrets = (text: string) => secrets.filter((secret) => text.includes(secret));

const READS = [
  ['the project', () => `/projects/${project.projectId}`],
  ['its sweeps', () => `/projects/${project.projectId}/sweeps`],
  ['a run by cost', () => `/runs/${byCost.id}`],
  ['a run by steel', () => `/runs/${bySteel.id}`],
  ['a view', () => `/runs/${bySteel.id}/views/${bySteel.views[0]!.viewId}`],
  ['a section', () => `/runs/${bySteel.id}/sections/2000`],
  ['the shortlist', () => `/projects/${project.projectId}/candidates`],
  ['a candidate', () => `/candidates/${candidate.id}`],
] as const;

test('there are secrets to find: an engineer is shown them', async () => {
  expect(secrets.every((secret) => /^(\d+\.\d{2,}|XTS)$/.test(secret))).toBe(true);
  const { text } = await engineer.get(`/candidates/${candidate.id}`).expect(200);
  expect(findSecrets(text).length).toBeGreaterThan(12);
});

test.each(READS)('a viewer reads %s without a rate or a cost in it', async (_what, pathOf) => {
  const { text } = await viewer.get(pathOf()).expect(200);
  expect(findSecrets(text)).toEqual([]);
  expect(text).not.toMatch(/"costPerM":\d/);
  expect(text).not.toMatch(/"measure":"costPerM"/);
});

test('a viewer’s own evaluation has quantities and carbon, and no cost', async () => {
  const { section } = candidate.snapshot;
  const answer = await viewer
    .post(`/projects/${project.projectId}/evaluations`, { section, demand, rules, basis: {} })
    .expect(200);
  expect(findSecrets(answer.text)).toEqual([]);
  const { quantities } = candidate.snapshot.evaluation;
  expect(answer.body.evaluation.quantities).toEqual({ ...quantities, cost: null });
});

test('a viewer cannot open or read a view by cost, and follows such a run without its result', async () => {
  const path = `/runs/${byCost.id}/views`;
  await viewer.post(path, { x: 'costPerM', y: 'widthMm' }).expect(403);
  await viewer.post(path, { x: 'depthMm', y: 'widthMm', z: 'costPerM' }).expect(403);
  await viewer.get(`${path}/${byCost.views[0]!.viewId}`).expect(403);
  const stream = await followRun(office, viewer, { runId: byCost.id });
  const { progress } = await stream.until(hasEnded);
  stream.close();
  expect(progress.result).toBeNull();
  expect(progress.message).toContain('costs');
  const full: ViewProgress = (await engineer.get(`${path}/${byCost.views[0]!.viewId}`).expect(200)).body;
  expect(stream.raw()).not.toContain(String(full.result!.front[0]!.x));
});

test('a shared link shows the shortlist to anybody, with no rate, cost or comment', async () => {
  await engineer.post(`/candidates/${candidate.id}/comments`, { text: 'Between ourselves' }).expect(200);
  const link = await engineer.post(`/projects/${project.projectId}/share-links`).expect(200);
  const answer = await fetch(`${office.origin}/api/shared/${link.body.token}`);
  const text = await answer.text();
  expect(answer.status).toBe(200);
  expect(JSON.parse(text).candidates[0]).toMatchObject({ label: 'A', takeoff: { cost: null } });
  expect(findSecrets(text)).toEqual([]);
  expect(text).not.toContain('Between ourselves');
});

test('estimators and checkers see rates', async () => {
  for (const account of ['estimator', 'checker', 'admin'] as const) {
    const { body } = await (await office.as(account)).get(`/candidates/${candidate.id}`).expect(200);
    expect(body.snapshot.basis.rates.steelPerKg).toBe(PRICE_BOOK.steelPerKg);
    expect(body.takeoff.cost).toBe(candidate.takeoff.cost);
  }
});
