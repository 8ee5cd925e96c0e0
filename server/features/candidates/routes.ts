import type { Router } from 'express';
import type { ResponseOf } from '#shared/contract/endpoints.ts';
import type { Candidate, Person } from '#shared/contract/records.ts';
import type { Database } from '../../db/client.ts';
import type { Deps } from '../../deps.ts';
import { bind } from '../../http/bind.ts';
import { requireReadableProject } from '../../http/project-access.ts';
import { commentOnCandidate, moveCandidate, pinCandidate } from './commands.ts';
import { findSheetRefusal, isOpenForChecking } from './policy.ts';
import { presentCandidate, presentSheetValues } from './present.ts';
import { listCandidates, requireCandidate } from './queries.ts';
import { registerSheetPdf } from './sheet-pdf.ts';
import { listSheetValues, setSheetValue } from './sheet-values.ts';
import { registerTakeoffExport } from './takeoff-export.ts';

export function registerCandidateRoutes(router: Router, deps: Deps): void {
  bind(router, deps, 'listCandidates', async ({ person, params, deps: { db } }) => {
    const { id } = await requireReadableProject(db, person, { projectId: params.id, what: 'Project' });
    return (await listCandidates(db, id)).map((record) => presentCandidate(record, person));
  });

  bind(router, deps, 'pinCandidate', async ({ person, params, body }) =>
    readCandidate(deps.db, person, await pinCandidate(deps, person, { projectId: params.id, input: body })),
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

  bind(router, deps, 'listSheetValues', ({ person, params, deps: { db } }) =>
    readSheetValues(db, person, params.id),
  );

  bind(router, deps, 'setSheetValue', async ({ person, params, body, deps: { db } }) => {
    await setSheetValue(db, person, { id: params.id, ...body });
    return readSheetValues(db, person, params.id);
  });

  registerSheetPdf(router, deps);
  registerTakeoffExport(router, deps);
}

async function readSheetValues(
  db: Database,
  person: Person,
  id: string,
): Promise<ResponseOf<'listSheetValues'>> {
  const { candidate } = await requireCandidate(db, person, id);
  return {
    values: presentSheetValues(await listSheetValues(db, candidate), person),
    mayWrite: isOpenForChecking(candidate.state) && findSheetRefusal(candidate, person) === undefined,
  };
}

async function readCandidate(db: Database, person: Person, id: string): Promise<Candidate> {
  return presentCandidate(await requireCandidate(db, person, id), person);
}
