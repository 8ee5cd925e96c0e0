import { calculationSheetPdf, type SheetFile } from '../files/calculation-sheet-pdf.ts';

/** Fonts are read and cut to the letters used for a quarter of a second without a pause, hence the thread. */
export default async function work(file: SheetFile): Promise<Uint8Array> {
  return calculationSheetPdf(file);
}
