import { writeFile } from 'node:fs/promises';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { TableFormat } from '#shared/contract/endpoints/file-endpoints.ts';
import { writeTableFile, type HeadLine } from './table-file.ts';
import type { TakeoffCandidate } from './takeoff-lines.ts';
import { takeoffColumns, takeoffRows } from './takeoff-table.ts';
import { takeoffWorkbook } from './takeoff-workbook.ts';

export interface TakeoffFileRequest {
  readonly candidates: readonly TakeoffCandidate[];
  readonly units: UnitSystem;
  readonly isMoneyShown: boolean;
  readonly head: readonly HeadLine[];
  readonly format: TableFormat;
}

/** What a candidate was frozen with; printed with it, since rates and engine travel with each pin. */
const candidateHead = ({ beam, snapshot, createdAt, hash }: TakeoffCandidate): readonly HeadLine[] => [
  ['Beam', `${beam.mark} ${beam.location}`.trim()],
  ['Pinned', createdAt.slice(0, 10)],
  ['Design code', snapshot.evaluation.ruleSet.title],
  ['Engine', snapshot.engineVersion],
  ['Hash', hash],
];

/** Writes the takeoff of candidates; answers how many lines or sheets it has. */
export async function writeTakeoffFile(request: TakeoffFileRequest, path: string): Promise<number> {
  const { candidates, units, isMoneyShown, head, format } = request;
  if (format === 'xlsx') {
    await writeFile(path, await takeoffWorkbook({ candidates, units, isMoneyShown, head, candidateHead }));
    return candidates.length;
  }
  const rows = candidates.flatMap((candidate) => takeoffRows(candidate, units));
  await writeTableFile(
    { name: 'Takeoff', head, columns: takeoffColumns(units, isMoneyShown), rows },
    'csv',
    path,
  );
  return rows.length;
}
