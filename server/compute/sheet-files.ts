import { Piscina } from 'piscina';
import type { SheetFile } from '../files/calculation-sheet-pdf.ts';
import { resolveWorkerFile } from './worker-file.ts';

/** Calculation sheets as files, made on a thread of their own: neither the service nor a sweep waits for one. */
export interface SheetFiles {
  pdf(file: SheetFile): Promise<Buffer>;
  close(): Promise<void>;
}

/** The thread begins with the first sheet and ends when none has been asked for in so long. */
const IDLE_MS = 60_000;

export async function startSheetFiles(): Promise<SheetFiles> {
  const piscina = new Piscina<SheetFile, Uint8Array>({
    filename: await resolveWorkerFile('sheet-worker'),
    minThreads: 0,
    maxThreads: 1,
    concurrentTasksPerWorker: 1,
    idleTimeout: IDLE_MS,
  });
  return {
    pdf: async (file) => Buffer.from(await piscina.run(file)),
    close: () => piscina.destroy(),
  };
}
