import { Piscina } from 'piscina';
import type { EvaluationContext } from '#shared/engine/evaluate.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import type { Studies } from '#shared/engine/studies.ts';
import type { SheetFileRequest, SheetTask } from './sheet-worker.ts';
import { resolveWorkerFile } from './worker-file.ts';

/** What calculation sheets take long for, done on a thread of their own: neither the service nor a sweep waits for it. */
export interface SheetDesk {
  pdf(request: SheetFileRequest): Promise<Buffer>;
  studies(section: SectionInput, context: EvaluationContext): Promise<Studies>;
  close(): Promise<void>;
}

/** The thread begins with the first sheet and ends when none has been asked for in so long. */
const IDLE_MS = 60_000;

export async function startSheetDesk(): Promise<SheetDesk> {
  const piscina = new Piscina<SheetTask, Uint8Array | Studies>({
    filename: await resolveWorkerFile('sheet-worker'),
    minThreads: 0,
    maxThreads: 1,
    concurrentTasksPerWorker: 1,
    idleTimeout: IDLE_MS,
  });
  return {
    pdf: async (request) => Buffer.from((await piscina.run({ kind: 'pdf', request })) as Uint8Array),
    studies: async (section, context) =>
      (await piscina.run({ kind: 'studies', section, context })) as Studies,
    close: () => piscina.destroy(),
  };
}
