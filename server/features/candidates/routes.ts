import type { Router } from 'express';
import type { Candidate, Person } from '#shared/contract/records.ts';
import type { Database } from '../../db/client.ts';
import type { Deps } from '../../deps.ts';
import { bind } from '../../http/bind.ts';
import { requireReadableProject } from '../../http/project-access.ts';
import { commentOnCandidate, moveCandidate, pinCandidate } from './commands.ts';
import { presentCandidate } from './present.ts';
import { listCandidates, requireCandidate } from './queries.ts';

export function registerCandidateRoutes(router: Router, deps: Deps): void {
  bind(router, deps, 'listCandidates', async ({ person, params, deps: { db } }) => {
    const { id } = await requireReadableProject(db, person, { projectId: params.id, what: 'Project' });
    return (await listCandidates(db, id)).map((record) => presentCandidate(record, person));
  });

  bind(router, deps, 'pinCandidate', async ({ person, params, body, deps: { db } }) =>
    readCandidate(db, person, await pinCandidate(db, person, { projectId: params.id, input: body })),
  );

  bind(router, deps, 'getCandidate', ({ person, params, deps: { db } }) =>
    readCandidate(db, person, params.id),
  );

  bind(router, deps, 'moveCandidate', async ({ person, params, body, deps: { db } }) => {
    await moveCandidate(db, person, { id: params.id, to: body.to, note: body.note });
    return readCandidate(db, person, params.id);
  });

  bind(router, deps, 'commentOnCandidate', async ({ person, params, body, deps: { db } }) => {
    await commentOnCandidate(db, person, { id: params.id, text: body.text });
    return readCandidate(db, person, params.id);
  });
}

async function readCandidate(db: Database, person: Person, id: string): Promise<Candidate> {
  return presentCandidate(await requireCandidate(db, person, id), person);
}
