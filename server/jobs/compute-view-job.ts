import { sql } from 'drizzle-orm';
import { z } from 'zod';
import { idSchema } from '#shared/contract/numbers.ts';
import type { Database } from '../db/client.ts';

export const COMPUTE_VIEW_TASK = 'compute-view';

export const computeViewPayloadSchema = z.object({ viewId: idSchema });

/** With the view's id behind it, the key of its one job. */
export const VIEW_JOB_KEY_PREFIX = 'view:';

/** A job that ends its process (out of memory, say) is not tried for ever. */
const MAX_ATTEMPTS = 4;

/** Puts a view in the queue within the caller's transaction, so that there is never a view without its job. */
export async function enqueueComputeView(tx: Database, viewId: string): Promise<void> {
  await tx.execute(sql`
    select graphile_worker.add_job(
      ${COMPUTE_VIEW_TASK},
      json_build_object('viewId', ${viewId}::text),
      job_key => ${computeViewJobKey(viewId)},
      max_attempts => ${MAX_ATTEMPTS}
    )`);
}

/** Takes a view's waiting job out of the queue; one that is being worked on is left to its worker. */
export async function dequeueComputeView(tx: Database, viewId: string): Promise<void> {
  await tx.execute(sql`select graphile_worker.remove_job(${computeViewJobKey(viewId)})`);
}

const computeViewJobKey = (viewId: string) => VIEW_JOB_KEY_PREFIX + viewId;
