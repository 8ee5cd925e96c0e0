import { sql } from 'drizzle-orm';
import {
  bigint,
  check,
  doublePrecision,
  index,
  integer,
  jsonb,
  pgTable,
  text,
  timestamp,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { RUN_STATES, type SearchProgress } from '#shared/contract/records.ts';
import { MEASURE_IDS } from '#shared/engine/measures.ts';
import type { ViewResult } from '#shared/sweep/result.ts';
import { oneOf } from './one-of.ts';
import { people } from './people.ts';
import { runs } from './runs.ts';

/** A run seen through two measures, or three where z is given: computed once from the run's frozen inputs, then kept. */
export const runViews = pgTable(
  'run_views',
  {
    id: uuid().primaryKey().defaultRandom(),
    runId: uuid('run_id')
      .notNull()
      .references(() => runs.id),
    x: text({ enum: MEASURE_IDS }).notNull(),
    y: text({ enum: MEASURE_IDS }).notNull(),
    z: text({ enum: MEASURE_IDS }),
    state: text({ enum: RUN_STATES }).notNull().default('queued'),
    evaluated: bigint({ mode: 'number' }).notNull().default(0),
    /** Null by bounds, which do not count it. */
    feasible: bigint({ mode: 'number' }).default(0),
    /** How far a search by bounds is; null where every section is evaluated. */
    search: jsonb().$type<SearchProgress>(),
    elapsedMs: doublePrecision('elapsed_ms').notNull().default(0),
    /** The final result, or the part that was done when it was cancelled. */
    result: jsonb().$type<ViewResult>(),
    frontCount: integer('front_count').notNull().default(0),
    hash: text(),
    /** Why it failed, in words for the person who reads it. */
    message: text(),
    /** The run's event this state was sent with. */
    sequence: bigint({ mode: 'number' }).notNull().default(0),
    /** The run's event the result was last changed with; 0 while there is none. */
    resultSequence: bigint('result_sequence', { mode: 'number' }).notNull().default(0),
    /** Sections the result covers; `evaluated` counts those in work too. */
    merged: bigint({ mode: 'number' }).notNull().default(0),
    /** Who opened it; null for the run's own view, which whoever started the run did. */
    openedBy: uuid('opened_by').references(() => people.id),
    cancelRequestedAt: timestamp('cancel_requested_at', { withTimezone: true }),
    createdAt: timestamp('created_at', { withTimezone: true }).notNull().defaultNow(),
    startedAt: timestamp('started_at', { withTimezone: true }),
    /** When `elapsed_ms` was last brought up to date; null while nobody works on it. */
    countedAt: timestamp('counted_at', { withTimezone: true }),
    finishedAt: timestamp('finished_at', { withTimezone: true }),
  },
  (t) => [
    unique('run_views_measures_key').on(t.runId, t.x, t.y, t.z).nullsNotDistinct(),
    index('run_views_unfinished_idx')
      .on(t.state)
      .where(sql`${t.state} in ('queued', 'running')`),
    check('run_views_x_check', oneOf(t.x, MEASURE_IDS)),
    check('run_views_y_check', oneOf(t.y, MEASURE_IDS)),
    check('run_views_z_check', oneOf(t.z, MEASURE_IDS)),
    check('run_views_measures_differ_check', sql`${t.x} <> ${t.y} and ${t.z} <> ${t.x} and ${t.z} <> ${t.y}`),
    check('run_views_state_check', oneOf(t.state, RUN_STATES)),
    check(
      'run_views_counts_check',
      sql`0 <= coalesce(${t.feasible}, 0) and coalesce(${t.feasible}, 0) <= ${t.merged} and ${t.merged} <= ${t.evaluated}`,
    ),
    check(
      'run_views_finished_check',
      sql`${t.state} <> 'finished' or (${t.result} is not null and ${t.hash} is not null)`,
    ),
  ],
);
