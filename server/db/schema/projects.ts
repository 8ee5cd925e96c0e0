import { sql } from 'drizzle-orm';
import { check, jsonb, pgTable, text, timestamp, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import type { PriceBook, ProjectDesignBasis } from '#shared/contract/design-basis.ts';
import { people } from './people.ts';

export const projects = pgTable(
  'projects',
  {
    id: uuid().primaryKey().defaultRandom(),
    name: text().notNull(),
    number: text().notNull(),
    designBasis: jsonb('design_basis').$type<ProjectDesignBasis>().notNull(),
    priceBook: jsonb('price_book').$type<PriceBook>(),
    createdBy: uuid('created_by')
      .notNull()
      .references(() => people.id),
    createdAt: timestamp('created_at', { withTimezone: true }).notNull().defaultNow(),
  },
  (t) => [
    uniqueIndex('projects_number_key').on(sql`lower(${t.number})`),
    check('projects_name_check', sql`${t.name} <> ''`),
    check('projects_number_check', sql`${t.number} <> ''`),
  ],
);
