import { eq } from 'drizzle-orm';
import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest';
import type { Role, Run } from '#shared/contract/records.ts';
import { people } from '#server/db/schema/people.ts';
import { createPerson } from '../support/factories.ts';
import { addProject, SMALL_SWEEP, type OfficeProject } from '../support/office-project.ts';
import type { TestOffice } from '../support/office.ts';
import { followRun, hasEnded, type RunStream } from '../support/run-stream.ts';
import { signInAs, type SignedIn } from '../support/signed-in.ts';
import { openTestOffice } from '../support/test-office.ts';

let office: TestOffice;
let project: OfficeProject;
let engineer: SignedIn;
let run: Run;

beforeAll(async () => {
  office = await openTestOffice();
  project = await addProject(office);
  engineer = await office.as('engineer');
});
afterAll(() => office.close());
beforeEach(async () => {
  const sweepId = await project.addSweep(SMALL_SWEEP);
  run = (await engineer.post(`/sweeps/${sweepId}/runs`).expect(200)).body;
});

const setMembers = (...ids: string[]) =>
  engineer
    .put(`/projects/${project.projectId}/members`, { personIds: [engineer.person.id, ...ids] })
    .expect(200);

/** Somebody new on the project, with a session of their own. */
async function join(role: Role): Promise<SignedIn> {
  const person = await createPerson(office.deps, { role });
  await setMembers(person.id);
  return signInAs(office.origin, person);
}

async function followToEnd(reader: SignedIn): Promise<RunStream> {
  const stream = await followRun(office, reader, { runId: run.id });
  await stream.until(hasEnded);
  return stream;
}

/** Something happens to the run that whoever still may is told of. */
async function changeRun(): Promise<{ viewId: string }> {
  const { body } = await engineer.post(`/runs/${run.id}/views`, { x: 'depthMm', y: 'widthMm' }).expect(200);
  return body;
}

const LOSSES: readonly (readonly [string, (reader: SignedIn) => Promise<unknown>])[] = [
  ['is taken off the project', () => setMembers()],
  ['signs out', (reader) => reader.delete('/session').expect(200)],
  [
    'has the account shut',
    (reader) =>
      office.deps.db.update(people).set({ disabledAt: new Date() }).where(eq(people.id, reader.person.id)),
  ],
];

test.each(LOSSES)('a stream ends, with nothing more in it, when its reader %s', async (_what, lose) => {
  const reader = await join('checker');
  const stream = await followToEnd(reader);
  await lose(reader);
  const known = stream.events.length;
  await changeRun();
  await stream.ended;
  expect(stream.events).toHaveLength(known);
});

test('a stream goes on without costs when its reader becomes a viewer', async () => {
  const reader = await join('checker');
  const stream = await followToEnd(reader);
  const measures = (viewId: string) =>
    stream.events
      .findLast(({ progress }) => progress.viewId === viewId)!
      .progress.result!.best.map(({ measure }) => measure);
  expect(measures(run.views[0]!.viewId)).toContain('costPerM');
  await office.deps.db.update(people).set({ role: 'viewer' }).where(eq(people.id, reader.person.id));
  const { viewId } = await changeRun();
  await stream.until((event) => event.progress.viewId === viewId && hasEnded(event));
  stream.close();
  expect(measures(viewId)).not.toContain('costPerM');
});

test('one person follows twenty runs at once and is told when it is too many; others are not held up', async () => {
  const reader = await join('checker');
  const follow = () => followRun(office, reader, { runId: run.id });
  const streams = await Promise.all(Array.from({ length: 20 }, follow));
  const { body } = await reader.get(`/runs/${run.id}/events`).expect(429);
  expect(body.error).toMatchObject({
    code: 'too-many-requests',
    message: 'You follow 20 runs at once already. Close some of their pages.',
  });
  (await followToEnd(engineer)).close();
  streams.pop()!.close();
  await expect.poll(async () => (await follow()).headers['content-type']).toMatch(/^text\/event-stream/);
  for (const stream of streams) stream.close();
});

test('whoever hangs up before the stream has begun holds no place in it', async () => {
  const reader = await join('checker');
  for (let i = 0; i < 60; i++) {
    const hungUp = new AbortController();
    const headers = { cookie: reader.cookie };
    const answer = fetch(`${office.origin}/api/runs/${run.id}/events`, { headers, signal: hungUp.signal });
    setTimeout(() => hungUp.abort(), i % 6);
    await answer.then((stream) => stream.body!.cancel()).catch(() => undefined);
  }
  await expect
    .poll(async () => {
      const stream = await followRun(office, reader, { runId: run.id });
      stream.close();
      return stream.headers['content-type'];
    })
    .toMatch(/^text\/event-stream/);
});
