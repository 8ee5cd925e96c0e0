import { and, eq, sql, type SQL } from 'drizzle-orm';
import type { Person, Role } from '#shared/contract/records.ts';
import type { Database } from '../db/client.ts';
import { projectMembers } from '../db/schema/project-members.ts';
import { projects } from '../db/schema/projects.ts';
import { forbidden, notFound } from '../errors.ts';

export type ProjectRow = typeof projects.$inferSelect;

/** The condition, in a query that names `projects`, that the person may read the project. None for an admin. */
export function isWithinReach(db: Database, person: Person): SQL | undefined {
  if (person.role === 'admin') return undefined;
  return sql`exists (${db
    .select({ one: sql`1` })
    .from(projectMembers)
    .where(and(eq(projectMembers.projectId, projects.id), eq(projectMembers.personId, person.id)))})`;
}

/** The project, where the person may read it: its members do, and an admin reads all. */
export async function findReadableProject(
  db: Database,
  person: Person,
  projectId: string,
): Promise<ProjectRow | undefined> {
  const [project] = await db
    .select()
    .from(projects)
    .where(and(eq(projects.id, projectId), isWithinReach(db, person)));
  return project;
}

/** To everyone else it does not exist, and neither does what is in it; `what` is the thing that was asked for. */
export async function requireReadableProject(
  db: Database,
  person: Person,
  { projectId, what }: { projectId: string; what: string },
): Promise<ProjectRow> {
  const project = await findReadableProject(db, person, projectId);
  if (project === undefined) throw notFound(what);
  return project;
}

/** Rates are the office's own business: viewers are clients and contractors. */
const RATE_READERS: readonly Role[] = ['admin', 'engineer', 'checker', 'estimator'];

export const canSeeRates = (person: Pick<Person, 'role'>): boolean => RATE_READERS.includes(person.role);

/** `deed` ends the sentence "Your role (viewer) may not …". */
export function requireRole(person: Person, roles: readonly Role[], deed: string): void {
  if (!roles.includes(person.role)) throw forbidden(`Your role (${person.role}) may not ${deed}`);
}
