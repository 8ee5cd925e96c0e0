import { and, eq, inArray, sql, type SQL } from 'drizzle-orm';
import type { PgUpdateSetSource } from 'drizzle-orm/pg-core';
import type { RunState } from '#shared/contract/records.ts';
import { isSameView, type View } from '#shared/sweep/problem.ts';
import type { Database } from '../db/client.ts';
import { runViews } from '../db/schema/run-views.ts';
import { runs } from '../db/schema/runs.ts';
import { notifyViewChanged } from './run-notifications.ts';

export interface ViewTarget {
  readonly runId: string;
  readonly viewId: string;
  /** States the view must be in; in any other the change is refused. */
  readonly from: readonly RunState[];
  /** What must hold besides. */
  readonly when?: SQL | undefined;
}

export type ViewChange = Pick<
  PgUpdateSetSource<typeof runViews>,
  | 'state'
  | 'evaluated'
  | 'merged'
  | 'feasible'
  | 'search'
  | 'elapsedMs'
  | 'countedAt'
  | 'result'
  | 'frontCount'
  | 'hash'
  | 'message'
  | 'startedAt'
  | 'finishedAt'
  | 'cancelRequestedAt'
> & { readonly state?: RunState };

/** All but the result, which can be large. */
const CHANGED_COLUMNS = {
  id: runViews.id,
  x: runViews.x,
  y: runViews.y,
  z: runViews.z,
  state: runViews.state,
  merged: runViews.merged,
  cancelRequestedAt: runViews.cancelRequestedAt,
};
export type ChangedView = Pick<typeof runViews.$inferSelect, keyof typeof CHANGED_COLUMNS>;

const ENDED: readonly RunState[] = ['finished', 'cancelled', 'failed'];

/** Longer than between two reports of a worker; what lies between two further apart is no work but an outage. */
const LONGEST_GAP_MS = 2000;
const NOW = sql`clock_timestamp()`;
const WORKED = sql<number>`elapsed_ms + case when counted_at is null then 0
  else least(extract(epoch from ${NOW} - counted_at) * 1000, ${LONGEST_GAP_MS}) end`;
/** Parts of a change: begins to count the time a view is worked on, brings it up to date, ends it. */
export const COUNT_FROM_NOW: ViewChange = { countedAt: NOW };
export const COUNT_TIME: ViewChange = { elapsedMs: WORKED, countedAt: NOW };
export const STOP_COUNTING: ViewChange = { elapsedMs: WORKED, countedAt: null };

/**
 * The one way to change a view: writes it, keeps the run's own state in step, and tells whoever follows the run.
 * Answers the view as it is now, or undefined where the target did not allow it.
 */
export async function changeView(
  db: Database,
  target: ViewTarget,
  change: ViewChange,
): Promise<ChangedView | undefined> {
  return db.transaction(async (tx) => {
    // The run's row first, always: its lock puts the events of all its views in order of commit, without deadlocks.
    const [run] = await tx
      .update(runs)
      .set({ eventSequence: sql`${runs.eventSequence} + 1` })
      .where(eq(runs.id, target.runId))
      .returning({ sequence: runs.eventSequence, view: sql<View>`definition->'view'` });
    if (run === undefined) return undefined;
    const [view] = await tx
      .update(runViews)
      .set({
        ...change,
        sequence: run.sequence,
        ...(change.result === undefined ? {} : { resultSequence: run.sequence }),
      })
      .where(and(eq(runViews.id, target.viewId), inArray(runViews.state, [...target.from]), target.when))
      .returning(CHANGED_COLUMNS);
    if (view === undefined) return undefined;
    const isOwnView = isSameView(run.view, view);
    if (isOwnView && change.state !== undefined) await setRunState(tx, target.runId, change.state);
    await notifyViewChanged(tx, { runId: target.runId, viewId: view.id, sequence: run.sequence });
    return view;
  });
}

/** A run is in the state of its own view, the one its definition asks for; opening another does not change it. */
async function setRunState(tx: Database, runId: string, state: RunState): Promise<void> {
  await tx
    .update(runs)
    .set({ state, finishedAt: ENDED.includes(state) ? sql`now()` : null })
    .where(eq(runs.id, runId));
}
