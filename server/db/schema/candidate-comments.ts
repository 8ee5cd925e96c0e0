import { sql } from 'drizzle-orm';
import { bigint, check, index, pgTable, text, timestamp, uuid } from 'drizzle-orm/pg-core';
import { candidates } from './candidates.ts';
import { people } from './people.ts';

export const candidateComments = pgTable(
  'candidate_comments',
  {
    id: uuid().primaryKey().defaultRandom(),
    position: bigint({ mode: 'number' }).notNull().generatedAlwaysAsIdentity(),
    candidateId: uuid('candidate_id')
      .notNull()
      .references(() => candidates.id),
    authorId: uuid('author_id')
      .notNull()
      .references(() => people.id),
    text: text().notNull(),
    createdAt: timestamp('created_at', { withTimezone: true }).notNull().defaultNow(),
  },
  (t) => [
    index('candidate_comments_candidate_idx').on(t.candidateId, t.position),
    check('candidate_comments_text_check', sql`${t.text} <> ''`),
  ],
);
