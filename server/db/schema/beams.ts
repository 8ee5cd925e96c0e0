import { sql } from 'drizzle-orm';
import {
  check,
  doublePrecision,
  integer,
  pgTable,
  text,
  timestamp,
  unique,
  uniqueIndex,
  uuid,
} from 'drizzle-orm/pg-core';
import { projects } from './projects.ts';

/** A beam mark of a project with its demands: lengths mm, forces N, moments N·mm. */
export const beams = pgTable(
  'beams',
  {
    id: uuid().primaryKey().defaultRandom(),
    projectId: uuid('project_id')
      .notNull()
      .references(() => projects.id, { onDelete: 'cascade' }),
    mark: text().notNull(),
    location: text().notNull(),
    spanMm: doublePrecision('span_mm').notNull(),
    count: integer().notNull(),
    muNmm: doublePrecision('mu_nmm').notNull(),
    vuN: doublePrecision('vu_n'),
    ductilityTarget: doublePrecision('ductility_target'),
    depthCapMm: doublePrecision('depth_cap_mm'),
    createdAt: timestamp('created_at', { withTimezone: true }).notNull().defaultNow(),
  },
  (t) => [
    uniqueIndex('beams_mark_key').on(t.projectId, sql`lower(${t.mark})`),
    // What candidates refer to, so that a candidate cannot name a beam of another project.
    unique('beams_id_project_key').on(t.id, t.projectId),
    check('beams_mark_check', sql`${t.mark} <> ''`),
    // PostgreSQL counts NaN above every number, hence the upper bound on each.
    check('beams_span_check', sql`${t.spanMm} > 0 and ${t.spanMm} < 'Infinity'`),
    check('beams_count_check', sql`${t.count} > 0`),
    check('beams_mu_check', sql`${t.muNmm} >= 0 and ${t.muNmm} < 'Infinity'`),
    check('beams_vu_check', sql`${t.vuN} >= 0 and ${t.vuN} < 'Infinity'`),
    check('beams_ductility_check', sql`${t.ductilityTarget} >= 0 and ${t.ductilityTarget} < 'Infinity'`),
    check('beams_depth_cap_check', sql`${t.depthCapMm} > 0 and ${t.depthCapMm} < 'Infinity'`),
  ],
);
