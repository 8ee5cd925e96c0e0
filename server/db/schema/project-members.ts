import { index, pgTable, primaryKey, uuid } from 'drizzle-orm/pg-core';
import { people } from './people.ts';
import { projects } from './projects.ts';

export const projectMembers = pgTable(
  'project_members',
  {
    projectId: uuid('project_id')
      .notNull()
      .references(() => projects.id, { onDelete: 'cascade' }),
    personId: uuid('person_id')
      .notNull()
      .references(() => people.id, { onDelete: 'cascade' }),
  },
  (t) => [
    primaryKey({ columns: [t.projectId, t.personId] }),
    index('project_members_person_idx').on(t.personId),
  ],
);
