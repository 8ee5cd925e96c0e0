import { sql } from 'drizzle-orm';
import { bigint, check, pgTable, primaryKey, uuid } from 'drizzle-orm/pg-core';
import { bytes } from './bytes.ts';
import { runs } from './runs.ts';

/**
 * What a run leaves for other views and other rates: for each piece of its own view that was computed, the sections that
 * meet every check as compact columns, and what was counted. Written once, in pieces that do not overlap; whole when they
 * cover the run. Absent where too much was found, and taken out again, the oldest first, to make room; views are then
 * computed from the space. Goes with its run.
 */
export const keptSections = pgTable(
  'kept_sections',
  {
    runId: uuid('run_id')
      .notNull()
      .references(() => runs.id, { onDelete: 'cascade' }),
    /** Places in the order the run computes its sections in: indices, unless it takes some from another run. */
    fromPlace: bigint('from_place', { mode: 'number' }).notNull(),
    toPlace: bigint('to_place', { mode: 'number' }).notNull(),
    feasible: bigint({ mode: 'number' }).notNull(),
    /** Frames (see feasible-frame.ts). */
    frames: bytes().notNull(),
    /** The piece's merged chunks (see chunk-bytes.ts), of which other views take what does not depend on the view. */
    counted: bytes().notNull(),
    nearMisses: bytes('near_misses').notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.runId, t.fromPlace] }),
    check('kept_sections_range_check', sql`0 <= ${t.fromPlace} and ${t.fromPlace} < ${t.toPlace}`),
    check(
      'kept_sections_feasible_check',
      sql`0 <= ${t.feasible} and ${t.feasible} <= ${t.toPlace} - ${t.fromPlace}`,
    ),
  ],
);
