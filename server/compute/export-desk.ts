import { randomUUID } from 'node:crypto';
import { rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { Piscina } from 'piscina';
import type { ExportReply, ExportTask } from './export-worker.ts';
import { resolveWorkerFile } from './worker-file.ts';

type WithoutPath<T> = T extends { readonly path: string } ? Omit<T, 'path'> : never;
export type ExportOrder = WithoutPath<ExportTask>;

/** Writes tables of any length on a thread of its own: neither the service nor a sweep waits for it. */
export interface ExportDesk {
  /** Whether as many wait already as are let in. */
  isFull(): boolean;
  /** Writes the file, hands it to `use`, and takes it away when that has ended. `signal` ends the work. */
  write(
    order: ExportOrder,
    signal: AbortSignal,
    use: (file: string, reply: ExportReply) => Promise<void>,
  ): Promise<void>;
  close(): Promise<void>;
}

/** The thread begins with the first file and ends when none has been asked for in so long. */
const IDLE_MS = 60_000;
/** Files in work or waiting; the last one then waits some minutes at worst. */
const MOST_WAITING = 8;
/** Gives way to whoever waits for an answer, as sweeps do. */
const NICE = 5;

export async function startExportDesk(): Promise<ExportDesk> {
  const piscina = new Piscina<ExportTask, ExportReply>({
    filename: await resolveWorkerFile('export-worker'),
    minThreads: 0,
    maxThreads: 1,
    concurrentTasksPerWorker: 1,
    idleTimeout: IDLE_MS,
    niceIncrement: NICE,
  });
  let inWork = 0;
  return {
    isFull: () => inWork >= MOST_WAITING,
    write: async (order, signal, use) => {
      const file = path.join(tmpdir(), `fairweight-${randomUUID()}`);
      inWork++;
      try {
        const reply = await piscina.run({ ...order, path: file }, { signal });
        await use(file, reply);
      } finally {
        inWork--;
        await rm(file, { force: true });
      }
    },
    close: () => piscina.destroy(),
  };
}
