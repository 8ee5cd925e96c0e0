import { sql } from 'drizzle-orm';
import { check, pgTable, text, timestamp, uniqueIndex, uuid } from 'drizzle-orm/pg-core';
import { ROLES } from '#shared/contract/records.ts';
import { oneOf } from './one-of.ts';

/** Everyone who may sign in. Nobody is deleted, because runs and approvals name them: `disabledAt` shuts the door. */
export const people = pgTable(
  'people',
  {
    id: uuid().primaryKey().defaultRandom(),
    name: text().notNull(),
    email: text().notNull(),
    role: text({ enum: ROLES }).notNull(),
    passwordHash: text('password_hash').notNull(),
    createdAt: timestamp('created_at', { withTimezone: true }).notNull().defaultNow(),
    disabledAt: timestamp('disabled_at', { withTimezone: true }),
  },
  (t) => [
    uniqueIndex('people_email_key').on(sql`lower(${t.email})`),
    check('people_role_check', oneOf(t.role, ROLES)),
    check('people_name_check', sql`${t.name} <> ''`),
    check('people_email_check', sql`${t.email} like '%_@_%'`),
  ],
);
