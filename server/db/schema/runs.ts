import { sql } from 'drizzle-orm';
import {
  bigint,
  check,
  index,
  integer,
  jsonb,
  pgTable,
  text,
  timestamp,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { RUN_STATES } from '#shared/contract/records.ts';
import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import type { DesignBasis } from '#shared/engine/section.ts';
import { RUN_METHODS } from '#shared/sweep/run-method.ts';
import { oneOf } from './one-of.ts';
import { people } from './people.ts';
import { sweeps } from './sweeps.ts';

/**
 * One execution of a sweep. What it was asked (`definition`, `basis`, `engineVersion`, `method`, `sectionCount`) is frozen: a
 * trigger refuses to change it. The reference to the sweep has no cascade, so that a sweep with runs cannot go.
 */
export const runs = pgTable(
  'runs',
  {
    id: uuid().primaryKey().defaultRandom(),
    sweepId: uuid('sweep_id')
      .notNull()
      .references(() => sweeps.id),
    /** 1, 2, 3 … within the sweep. */
    number: integer().notNull(),
    definition: jsonb().$type<SweepDefinition>().notNull(),
    basis: jsonb().$type<DesignBasis>().notNull(),
    engineVersion: text('engine_version').notNull(),
    method: text({ enum: RUN_METHODS }).notNull().default('every-section'),
    sectionCount: bigint('section_count', { mode: 'number' }).notNull(),
    state: text({ enum: RUN_STATES }).notNull().default('queued'),
    startedBy: uuid('started_by')
      .notNull()
      .references(() => people.id),
    createdAt: timestamp('created_at', { withTimezone: true }).notNull().defaultNow(),
    /** Number of the last event of the run's stream; taken by every write to one of its views, in order of commit. */
    eventSequence: bigint('event_sequence', { mode: 'number' }).notNull().default(0),
    finishedAt: timestamp('finished_at', { withTimezone: true }),
  },
  (t) => [
    unique('runs_number_key').on(t.sweepId, t.number),
    index('runs_unfinished_idx')
      .on(t.state)
      .where(sql`${t.state} in ('queued', 'running')`),
    check('runs_number_check', sql`${t.number} > 0`),
    check('runs_section_count_check', sql`${t.sectionCount} >= 0`),
    check('runs_state_check', oneOf(t.state, RUN_STATES)),
    check('runs_method_check', oneOf(t.method, RUN_METHODS)),
  ],
);
