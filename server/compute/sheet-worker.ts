import type { SheetSource } from '#shared/sheet/build-sheet.ts';
import { buildSheet } from '#shared/sheet/build-sheet.ts';
import type { EvaluationContext } from '#shared/engine/evaluate.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { studiesOf, type Studies } from '#shared/engine/studies.ts';
import { calculationSheetPdf, type SheetFile } from '../files/calculation-sheet-pdf.ts';

export type SheetFileRequest = Omit<SheetFile, 'sheet'> & { readonly source: SheetSource };

/**
 * What the thread is asked for: a sheet's file, for which fonts are read and cut to the letters used for a quarter of a
 * second without a pause, or the studies of a section that is pinned, some tens of milliseconds.
 */
export type SheetTask =
  | { readonly kind: 'pdf'; readonly request: SheetFileRequest }
  | { readonly kind: 'studies'; readonly section: SectionInput; readonly context: EvaluationContext };

export default async function work(task: SheetTask): Promise<Uint8Array | Studies> {
  if (task.kind === 'studies') return studiesOf(task.section, task.context);
  const { source, ...rest } = task.request;
  return calculationSheetPdf({ ...rest, sheet: buildSheet(source) });
}
