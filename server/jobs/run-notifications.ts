import { sql } from 'drizzle-orm';
import { z } from 'zod';
import type { Database } from '../db/client.ts';

/** Channels of NOTIFY: they reach every process that serves the runs, and only once the sender's writes are visible. */
export const VIEW_CHANGED_CHANNEL = 'run_events';
export const VIEW_CANCELLED_CHANNEL = 'run_cancellations';

export const viewChangedSchema = z.object({
  runId: z.string(),
  viewId: z.string(),
  /** Increases from one event of the run to the next. */
  sequence: z.number(),
});
export type ViewChanged = z.infer<typeof viewChangedSchema>;

export async function notifyViewChanged(tx: Database, change: ViewChanged): Promise<void> {
  await tx.execute(sql`select pg_notify(${VIEW_CHANGED_CHANNEL}, ${JSON.stringify(change)})`);
}

/** Tells the worker that computes the view, in whichever process, to stop. */
export async function notifyViewCancelled(tx: Database, viewId: string): Promise<void> {
  await tx.execute(sql`select pg_notify(${VIEW_CANCELLED_CHANNEL}, ${viewId})`);
}
