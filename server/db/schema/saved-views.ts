import { sql } from 'drizzle-orm';
import { check, index, jsonb, pgTable, text, timestamp, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import type { ViewAddress } from '#shared/contract/saved-view.ts';
import { people } from './people.ts';
import { runs } from './runs.ts';
import { sweeps } from './sweeps.ts';

/** A named way of looking at the runs of a sweep. It changes no result, so it may be changed itself. */
export const savedViews = pgTable(
  'saved_views',
  {
    id: uuid().primaryKey().defaultRandom(),
    sweepId: uuid('sweep_id')
      .notNull()
      .references(() => sweeps.id, { onDelete: 'cascade' }),
    /** The run it was seen on, which its chosen section belongs to. */
    runId: uuid('run_id')
      .notNull()
      .references(() => runs.id, { onDelete: 'cascade' }),
    name: text().notNull(),
    address: jsonb().$type<ViewAddress>().notNull(),
    createdBy: uuid('created_by')
      .notNull()
      .references(() => people.id),
    createdAt: timestamp('created_at', { withTimezone: true }).notNull().defaultNow(),
  },
  (t) => [
    uniqueIndex('saved_views_name_key').on(t.sweepId, sql`lower(${t.name})`),
    index('saved_views_run_idx').on(t.runId),
    check('saved_views_name_check', sql`${t.name} <> ''`),
    check('saved_views_address_check', sql`jsonb_typeof(${t.address}) = 'object'`),
  ],
);
