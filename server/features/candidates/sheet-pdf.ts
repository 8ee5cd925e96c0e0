import type { Router } from 'express';
import { z } from 'zod';
import { PAPERS, SHEET_PDF_PATH } from '#shared/contract/endpoints.ts';
import { idSchema } from '#shared/contract/numbers.ts';
import type { Deps } from '../../deps.ts';
import { requireReadableProject } from '../../http/project-access.ts';
import { requireSignedInPerson } from '../../http/signed-in-person.ts';
import { requireValidBody, requireValidParams } from '../../http/validate.ts';
import { presentCandidate, presentSheetValues } from './present.ts';
import { requireCandidate } from './queries.ts';
import { listSheetValues } from './sheet-values.ts';

const paramsSchema = z.object({ id: idSchema });
const querySchema = z.object({
  paper: z.enum(PAPERS, { error: `Paper must be ${PAPERS.join(' or ')}` }).default('a4'),
});

/** The sheet as a file, for whoever may read the candidate and with what that reader is shown of it. */
export function registerSheetPdf(router: Router, { db, sheetDesk }: Deps): void {
  router.get(SHEET_PDF_PATH, async (req, res) => {
    const person = await requireSignedInPerson(db, req);
    const { id } = requireValidParams(paramsSchema, req.params);
    const { paper } = requireValidBody(querySchema, req.query);
    const record = await requireCandidate(db, person, id);
    const { projectId, label, createdAt, hash } = record.candidate;
    const project = await requireReadableProject(db, person, { projectId, what: 'Candidate' });
    const { name, number } = project;
    const candidate = presentCandidate(record, person);
    const file = await sheetDesk.pdf({
      source: { project: { name, number }, units: project.designBasis.units, candidate },
      ownValues: presentSheetValues(await listSheetValues(db, record.candidate), person),
      paper,
      writtenAt: createdAt,
      footer: `${number} · beam ${record.beam.mark} · candidate ${label} · ${hash.slice(0, 16)}`,
    });
    const fileName = `sheet-${record.beam.mark}-${label}`.replace(/[^\w.-]+/g, '-');
    res.type('application/pdf').attachment(`${fileName}.pdf`).send(file);
  });
}
