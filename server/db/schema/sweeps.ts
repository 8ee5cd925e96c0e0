import { sql } from 'drizzle-orm';
import { check, index, jsonb, pgTable, text, timestamp, uuid } from 'drizzle-orm/pg-core';
import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import { beams } from './beams.ts';
import { people } from './people.ts';

/** A saved design space. It goes with its beam as long as it has no runs; `runs` keeps it otherwise. */
export const sweeps = pgTable(
  'sweeps',
  {
    id: uuid().primaryKey().defaultRandom(),
    beamId: uuid('beam_id')
      .notNull()
      .references(() => beams.id, { onDelete: 'cascade' }),
    name: text().notNull(),
    definition: jsonb().$type<SweepDefinition>().notNull(),
    createdBy: uuid('created_by')
      .notNull()
      .references(() => people.id),
    createdAt: timestamp('created_at', { withTimezone: true }).notNull().defaultNow(),
    updatedAt: timestamp('updated_at', { withTimezone: true }).notNull().defaultNow(),
  },
  (t) => [index('sweeps_beam_idx').on(t.beamId), check('sweeps_name_check', sql`${t.name} <> ''`)],
);
