import { sql } from 'drizzle-orm';
import { bigint, check, index, pgTable, uuid } from 'drizzle-orm/pg-core';
import { runs } from './runs.ts';

/** A run whose space holds another run's whole, and takes over what that one kept instead of computing it again. */
export const takenSections = pgTable(
  'taken_sections',
  {
    runId: uuid('run_id')
      .primaryKey()
      .references(() => runs.id, { onDelete: 'cascade' }),
    fromRunId: uuid('from_run_id')
      .notNull()
      .references(() => runs.id),
    /** All sections of the other run. */
    sections: bigint({ mode: 'number' }).notNull(),
  },
  (t) => [
    index('taken_sections_from_idx').on(t.fromRunId),
    check('taken_sections_other_run_check', sql`${t.runId} <> ${t.fromRunId}`),
    check('taken_sections_sections_check', sql`${t.sections} > 0`),
  ],
);
