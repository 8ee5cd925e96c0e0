import { check, index, pgTable, timestamp, uuid } from 'drizzle-orm/pg-core';
import { sql } from 'drizzle-orm';
import { people } from './people.ts';
import { projects } from './projects.ts';

/** A link to the shortlist without signing in. The token is derived from the id and the service's secret, never stored. */
export const shareLinks = pgTable(
  'share_links',
  {
    id: uuid().primaryKey().defaultRandom(),
    projectId: uuid('project_id')
      .notNull()
      .references(() => projects.id, { onDelete: 'cascade' }),
    createdBy: uuid('created_by')
      .notNull()
      .references(() => people.id),
    createdAt: timestamp('created_at', { withTimezone: true }).notNull().defaultNow(),
    expiresAt: timestamp('expires_at', { withTimezone: true }).notNull(),
    revokedAt: timestamp('revoked_at', { withTimezone: true }),
  },
  (t) => [
    index('share_links_project_idx').on(t.projectId),
    check('share_links_expiry_check', sql`${t.expiresAt} > ${t.createdAt}`),
  ],
);
