import { sql } from 'drizzle-orm';
import {
  check,
  doublePrecision,
  index,
  pgTable,
  primaryKey,
  text,
  timestamp,
  uuid,
} from 'drizzle-orm/pg-core';
import { candidates } from './candidates.ts';
import { people } from './people.ts';

/** What a checker got for one line of a candidate's calculation sheet, in stored units. One per line and person. */
export const sheetValues = pgTable(
  'sheet_values',
  {
    candidateId: uuid('candidate_id')
      .notNull()
      .references(() => candidates.id),
    /** Id of the line on the sheet, made from the frozen snapshot, which never changes. */
    line: text().notNull(),
    personId: uuid('person_id')
      .notNull()
      .references(() => people.id),
    value: doublePrecision().notNull(),
    updatedAt: timestamp('updated_at', { withTimezone: true }).notNull().defaultNow(),
  },
  (t) => [
    primaryKey({ name: 'sheet_values_pk', columns: [t.candidateId, t.line, t.personId] }),
    index('sheet_values_person_idx').on(t.personId),
    check('sheet_values_line_check', sql`${t.line} <> '' and length(${t.line}) <= 80`),
    // PostgreSQL counts NaN above every number, hence the upper bound.
    check('sheet_values_value_check', sql`${t.value} > '-Infinity' and ${t.value} < 'Infinity'`),
  ],
);
