import type { Router } from 'express';
import {
  byIdAndFormat,
  MOST_OPTIONS_IN_FILE,
  TAKEOFF_FILE_PATH,
  takeoffFileQuerySchema,
} from '#shared/contract/endpoints/file-endpoints.ts';
import { unitSystemLabel } from '#shared/print/basis-labels.ts';
import { fileName } from '#shared/print/file-name.ts';
import type { Deps } from '../../deps.ts';
import { conflict, invalidInput, notFound } from '../../errors.ts';
import type { HeadLine } from '../../files/table-file.ts';
import { canSeeRates, requireReadableProject, type ProjectRow } from '../../http/project-access.ts';
import { sendExport } from '../../http/send-export.ts';
import { requireSignedInPerson } from '../../http/signed-in-person.ts';
import { requireValidBody, requireValidParams } from '../../http/validate.ts';
import { presentCandidate } from './present.ts';
import { listCandidates, type CandidateRecord } from './queries.ts';

/** Takeoff of pinned sections as a file, for whoever may read the project; without rates for whoever may not see them. */
export function registerTakeoffExport(router: Router, deps: Deps): void {
  router.get(TAKEOFF_FILE_PATH, async (req, res) => {
    const { db } = deps;
    const person = await requireSignedInPerson(db, req);
    const { id, format } = requireValidParams(byIdAndFormat, req.params);
    const { pins } = requireValidBody(takeoffFileQuerySchema, req.query);
    const project = await requireReadableProject(db, person, { projectId: id, what: 'Project' });
    const records = chosen(await listCandidates(db, id), pins);
    const { units } = project.designBasis;
    const candidates = records.map((record) => presentCandidate(record, person));
    const labels = pins.length === 0 ? ['shortlist'] : candidates.map(({ label }) => label);
    await sendExport(deps, res, {
      order: {
        kind: 'takeoff',
        request: { candidates, units, isMoneyShown: canSeeRates(person), head: headOf(project), format },
      },
      fileName: fileName([project.number, 'takeoff', ...labels], format),
      refusal: (count) => new Error(`A takeoff of ${count} lines was refused`),
    });
  });
}

/** In the order asked for: the first is what others are compared with. Without a choice, all but what was superseded. */
function chosen(records: readonly CandidateRecord[], pins: readonly string[]): readonly CandidateRecord[] {
  const found =
    pins.length === 0
      ? records.filter(({ candidate }) => candidate.state !== 'superseded')
      : [...new Set(pins)].map((pin) => {
          const record = records.find(({ candidate }) => candidate.id === pin);
          if (record === undefined) throw notFound('Candidate');
          return record;
        });
  if (found.length === 0) throw conflict('Nothing is pinned in this project yet');
  if (found.length > MOST_OPTIONS_IN_FILE)
    throw invalidInput([{ path: ['pins'], message: `Choose at most ${MOST_OPTIONS_IN_FILE} candidates` }]);
  return found;
}

const headOf = ({ name, number, designBasis }: ProjectRow): readonly HeadLine[] => [
  ['Project', `${name} (${number})`],
  ['Units', unitSystemLabel(designBasis.units)],
  [
    'Quantities',
    'Per length of beam × span × beams, the section constant along the span; laps and waste are lines of their own; concrete is gross. A missing rate leaves its amount, and the totals with it, blank.',
  ],
  ['Caution', 'A licensed engineer verifies the design under the codes that apply at the site.'],
];
