import { sql } from 'drizzle-orm';
import { check, jsonb, pgTable, text, timestamp, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import { UNIT_SYSTEMS } from '#shared/contract/design-basis.ts';
import type { OfficeStandardInput } from '#shared/contract/office-standard.ts';
import { BAR_STANDARDS } from '#shared/engine/section.ts';
import { oneOf } from './one-of.ts';
import { people } from './people.ts';

/** What the office builds: its bars, mixes, increments and usual ranges. Sweeps copy from it and do not refer to it. */
export const officeStandards = pgTable(
  'office_standards',
  {
    id: uuid().primaryKey().defaultRandom(),
    name: text().notNull(),
    units: text({ enum: UNIT_SYSTEMS }).notNull(),
    barStandard: text('bar_standard', { enum: BAR_STANDARDS }).notNull(),
    /** The rest of it, in SI. */
    standard: jsonb().$type<Omit<OfficeStandardInput, 'name' | 'units' | 'barStandard'>>().notNull(),
    updatedBy: uuid('updated_by')
      .notNull()
      .references(() => people.id),
    updatedAt: timestamp('updated_at', { withTimezone: true }).notNull().defaultNow(),
  },
  (t) => [
    uniqueIndex('office_standards_name_key').on(sql`lower(${t.name})`),
    check('office_standards_name_check', sql`${t.name} <> ''`),
    check('office_standards_units_check', oneOf(t.units, UNIT_SYSTEMS)),
    check('office_standards_bar_standard_check', oneOf(t.barStandard, BAR_STANDARDS)),
  ],
);
