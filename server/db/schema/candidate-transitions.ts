import { sql } from 'drizzle-orm';
import { bigint, check, index, jsonb, pgTable, text, timestamp, uuid } from 'drizzle-orm/pg-core';
import { CANDIDATE_STATES, type SheetValue } from '#shared/contract/records.ts';
import { candidates } from './candidates.ts';
import { oneOf } from './one-of.ts';
import { people } from './people.ts';

/** Who moved a candidate, when and why. Rows are only ever added: a trigger refuses the rest. */
export const candidateTransitions = pgTable(
  'candidate_transitions',
  {
    id: uuid().primaryKey().defaultRandom(),
    /** The order of writing, which equal time stamps cannot give. */
    position: bigint({ mode: 'number' }).notNull().generatedAlwaysAsIdentity(),
    candidateId: uuid('candidate_id')
      .notNull()
      .references(() => candidates.id),
    /** Null for the pin itself. */
    from: text('from_state', { enum: CANDIDATE_STATES }),
    to: text('to_state', { enum: CANDIDATE_STATES }).notNull(),
    byId: uuid('by_id')
      .notNull()
      .references(() => people.id),
    note: text().notNull(),
    /** Own values of the sheet as they were when it was checked or approved; null for every other step. */
    sheetValues: jsonb('sheet_values').$type<SheetValue[]>(),
    createdAt: timestamp('created_at', { withTimezone: true }).notNull().defaultNow(),
  },
  (t) => [
    index('candidate_transitions_candidate_idx').on(t.candidateId, t.position),
    check('candidate_transitions_from_check', oneOf(t.from, CANDIDATE_STATES)),
    check('candidate_transitions_to_check', oneOf(t.to, CANDIDATE_STATES)),
    check(
      'candidate_transitions_sheet_values_check',
      sql`${t.sheetValues} is null or (${t.to} in ('checked', 'approved') and jsonb_typeof(${t.sheetValues}) = 'array')`,
    ),
  ],
);
