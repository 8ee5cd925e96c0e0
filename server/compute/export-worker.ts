import type { TableFormat } from '#shared/contract/endpoints/file-endpoints.ts';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import { ENGINE_VERSION } from '#shared/engine/version.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import type { SweepProblem } from '#shared/sweep/problem.ts';
import { expandSpace, sectionAt } from '#shared/sweep/space.ts';
import { sectionColumns, type SectionRow } from '../files/section-columns.ts';
import { writeTableFile, type HeadLine } from '../files/table-file.ts';
import { writeTakeoffFile, type TakeoffFileRequest } from '../files/takeoff-file.ts';
import { selectSections, type SelectedSection, type SelectQuery } from './select-sections.ts';

export interface SectionsFileRequest {
  readonly query: SelectQuery;
  /** The sections, where the run's result names them; null where they have to be found. */
  readonly known: readonly SelectedSection[] | null;
  readonly reader: MeasureReader;
  readonly isMoneyShown: boolean;
  readonly head: readonly HeadLine[];
  readonly format: TableFormat;
}

/** Written to a file of its own: nothing is sent until it is whole, so a refusal is never half a table. */
export type ExportTask = { readonly path: string } & (
  | { readonly kind: 'sections'; readonly request: SectionsFileRequest }
  | { readonly kind: 'takeoff'; readonly request: TakeoffFileRequest }
);

/** Rows of the file; it was not written where there are more than it may hold. */
export interface ExportReply {
  readonly count: number;
  readonly isWritten: boolean;
}

export default async function writeExport(task: ExportTask): Promise<ExportReply> {
  if (task.kind === 'sections') return writeSections(task.request, task.path);
  return { count: await writeTakeoffFile(task.request, task.path), isWritten: true };
}

async function writeSections(request: SectionsFileRequest, path: string): Promise<ExportReply> {
  const { query, known, format } = request;
  const found = known === null ? selectSections(query) : { count: known.length, sections: known };
  if (found.sections === null) return { count: found.count, isWritten: false };
  const rows = judged(query.problem, found.sections);
  const columns = sectionColumns({
    reader: request.reader,
    section: sectionAt(expandSpace(query.problem.space, query.problem.basis.barStandard), 0),
    isMoneyShown: request.isMoneyShown,
    hasTies: query.list === 'front',
  });
  const head: HeadLine[] = [
    ...request.head,
    ['Rows computed by engine', ENGINE_VERSION],
    ['Rows', found.count],
  ];
  await writeTableFile({ name: 'Sections', head, columns, rows }, format, path);
  return { count: found.count, isWritten: true };
}

/** By the layer that explains: it tells the stirrups as built and what governs, and its numbers are the hot loop's to the bit. */
function* judged(problem: SweepProblem, sections: readonly SelectedSection[]): Generator<SectionRow> {
  const space = expandSpace(problem.space, problem.basis.barStandard);
  for (const { index, tieCount } of sections) {
    const section = sectionAt(space, index);
    yield { index, tieCount, section, evaluation: evaluateSection(section, problem) };
  }
}
