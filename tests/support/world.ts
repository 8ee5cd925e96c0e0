import { randomUUID } from 'node:crypto';
import type { Candidate, Person, Run } from '#shared/contract/records.ts';
import { createBeam, createProject, createSweep, evaluateInput } from './factories.ts';
import type { SignedIn } from './signed-in.ts';
import type { TestService } from './test-service.ts';

/** A project with something of every kind in it, made by `author`: the ids that the endpoints are called with. */
export interface World {
  project: string;
  members: string[];
  beam: string;
  spareBeam: string;
  sweep: string;
  spareSweep: string;
  run: string;
  view: string;
  candidate: string;
  shareLink: string;
  shareToken: string;
  savedView: string;
}

export async function createWorld(
  { deps }: TestService,
  author: SignedIn,
  otherMembers: readonly Person[],
): Promise<World> {
  const members = [author.person, ...otherMembers];
  const project = await createProject(deps, { members });
  const [beam, spareBeam] = [await createBeam(deps, project.id), await createBeam(deps, project.id)];
  const creator = author.person;
  const sweep = await createSweep(deps, { beamId: beam.id, creator });
  const spareSweep = await createSweep(deps, { beamId: beam.id, creator });
  const run: Run = (await author.post(`/sweeps/${sweep.id}/runs`).expect(200)).body;
  const pin = { beamId: beam.id, source: { kind: 'section', section: evaluateInput.section }, note: '' };
  const pinned: Candidate = (await author.post(`/projects/${project.id}/candidates`, pin).expect(200)).body;
  const view = { name: randomUUID(), runId: run.id, address: { x: 'costPerM', y: 'depthMm' } };
  const saved = (await author.post(`/sweeps/${sweep.id}/saved-views`, view).expect(200)).body;
  const link = (await author.post(`/projects/${project.id}/share-links`).expect(200)).body;
  return {
    project: project.id,
    members: members.map(({ id }) => id),
    beam: beam.id,
    spareBeam: spareBeam.id,
    sweep: sweep.id,
    spareSweep: spareSweep.id,
    run: run.id,
    view: run.views[0]!.viewId,
    candidate: pinned.id,
    shareLink: link.id,
    shareToken: link.token,
    savedView: saved.id,
  };
}
