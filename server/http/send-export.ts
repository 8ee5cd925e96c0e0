import { createReadStream } from 'node:fs';
import { pipeline } from 'node:stream/promises';
import type { Response } from 'express';
import type { TableFormat } from '#shared/contract/endpoints/file-endpoints.ts';
import type { ExportOrder } from '../compute/export-desk.ts';
import type { Deps } from '../deps.ts';
import { tooManyRequests } from '../errors.ts';

const MEDIA_TYPE: Readonly<Record<TableFormat, string>> = {
  csv: 'text/csv; charset=utf-8',
  xlsx: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
};

interface ExportToSend {
  readonly order: ExportOrder;
  readonly fileName: string;
  /** What to refuse with where the file would hold more rows than it may. */
  readonly refusal: (count: number) => Error;
}

/** Has a table written and sends it; whoever hangs up ends the work. */
export async function sendExport(
  { exportDesk }: Pick<Deps, 'exportDesk'>,
  res: Response,
  file: ExportToSend,
) {
  if (exportDesk.isFull())
    throw tooManyRequests('Several files are being written at the moment. Try again in a minute.');
  const hungUp = new AbortController();
  res.once('close', () => hungUp.abort());
  try {
    await exportDesk.write(file.order, hungUp.signal, async (path, { count, isWritten }) => {
      if (!isWritten) throw file.refusal(count);
      res.attachment(file.fileName).set('content-type', MEDIA_TYPE[file.order.request.format]);
      await pipeline(createReadStream(path), res);
    });
  } catch (error) {
    // Nobody is left to be told.
    if (!hungUp.signal.aborted) throw error;
  }
}
