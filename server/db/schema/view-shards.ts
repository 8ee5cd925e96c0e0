import { sql } from 'drizzle-orm';
import { bigint, check, doublePrecision, index, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core';
import { bytes } from './bytes.ts';
import { runViews } from './run-views.ts';

/**
 * A range of a view's sections that is computed in one piece, wherever there is a worker. The shards of a view cover its
 * sections without overlap. View and range say what is computed, so a result is the same whoever brings it: the first one
 * is kept, and a trigger refuses any other. They go when the view is finished.
 */
export const viewShards = pgTable(
  'view_shards',
  {
    viewId: uuid('view_id')
      .notNull()
      .references(() => runViews.id),
    fromIndex: bigint('from_index', { mode: 'number' }).notNull(),
    /** Exclusive. */
    toIndex: bigint('to_index', { mode: 'number' }).notNull(),
    /** Sections done from the first on, by whoever holds it now. */
    evaluated: bigint({ mode: 'number' }).notNull().default(0),
    /** The merged chunks of the whole range (see chunk-bytes.ts); null until it is done. */
    result: bytes(),
    /** The queue's worker that computes it; null when nobody does. */
    workerId: text('worker_id'),
    /** By the clock of whoever computed it. */
    tookMs: doublePrecision('took_ms'),
  },
  (t) => [
    primaryKey({ columns: [t.viewId, t.fromIndex] }),
    index('view_shards_held_idx')
      .on(t.workerId)
      .where(sql`${t.workerId} is not null`),
    check('view_shards_range_check', sql`0 <= ${t.fromIndex} and ${t.fromIndex} < ${t.toIndex}`),
    check(
      'view_shards_evaluated_check',
      sql`0 <= ${t.evaluated} and ${t.evaluated} <= ${t.toIndex} - ${t.fromIndex}`,
    ),
    check(
      'view_shards_done_check',
      sql`${t.result} is null or (${t.workerId} is null and ${t.evaluated} = ${t.toIndex} - ${t.fromIndex})`,
    ),
  ],
);
