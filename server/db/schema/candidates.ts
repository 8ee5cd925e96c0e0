import { sql } from 'drizzle-orm';
import {
  bigint,
  check,
  foreignKey,
  index,
  jsonb,
  pgTable,
  text,
  timestamp,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import { CANDIDATE_STATES, type Snapshot } from '#shared/contract/records.ts';
import { beams } from './beams.ts';
import { oneOf } from './one-of.ts';
import { people } from './people.ts';
import { projects } from './projects.ts';
import { runs } from './runs.ts';

/** A pinned section. All but `state` is frozen: a trigger refuses to change it. */
export const candidates = pgTable(
  'candidates',
  {
    id: uuid().primaryKey().defaultRandom(),
    projectId: uuid('project_id')
      .notNull()
      .references(() => projects.id),
    beamId: uuid('beam_id').notNull(),
    /** A, B, … Z, AA within the project. */
    label: text().notNull(),
    state: text({ enum: CANDIDATE_STATES }).notNull().default('proposed'),
    note: text().notNull(),
    authorId: uuid('author_id')
      .notNull()
      .references(() => people.id),
    runId: uuid('run_id').references(() => runs.id),
    sectionIndex: bigint('section_index', { mode: 'number' }),
    snapshot: jsonb().$type<Snapshot>().notNull(),
    /** SHA-256 over the snapshot's canonical JSON. */
    hash: text().notNull(),
    createdAt: timestamp('created_at', { withTimezone: true }).notNull().defaultNow(),
  },
  (t) => [
    unique('candidates_label_key').on(t.projectId, t.label),
    foreignKey({
      name: 'candidates_beam_fk',
      columns: [t.beamId, t.projectId],
      foreignColumns: [beams.id, beams.projectId],
    }),
    // The same section is pinned once per beam, unless the earlier pin has been superseded.
    uniqueIndex('candidates_snapshot_key')
      .on(t.beamId, t.hash)
      .where(sql`${t.state} <> 'superseded'`),
    index('candidates_beam_idx').on(t.beamId),
    index('candidates_run_idx').on(t.runId),
    check('candidates_state_check', oneOf(t.state, CANDIDATE_STATES)),
    check('candidates_label_check', sql`${t.label} ~ '^[A-Z]+$'`),
    check('candidates_hash_check', sql`${t.hash} ~ '^[0-9a-f]{64}$'`),
    check('candidates_source_check', sql`(${t.runId} is null) = (${t.sectionIndex} is null)`),
    check('candidates_section_index_check', sql`${t.sectionIndex} >= 0`),
  ],
);
