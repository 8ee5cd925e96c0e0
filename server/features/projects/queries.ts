import { and, asc, desc, eq, inArray, isNull } from 'drizzle-orm';
import type { Person, Project } from '#shared/contract/records.ts';
import type { Database } from '../../db/client.ts';
import { beams } from '../../db/schema/beams.ts';
import { candidates } from '../../db/schema/candidates.ts';
import { people } from '../../db/schema/people.ts';
import { projectMembers } from '../../db/schema/project-members.ts';
import { projects } from '../../db/schema/projects.ts';
import { isWithinReach } from '../../http/project-access.ts';
import { presentProject } from './present.ts';

async function listMembers(db: Database, projectIds: string[]): Promise<Map<string, Person[]>> {
  const rows = await db
    .select({
      projectId: projectMembers.projectId,
      person: { id: people.id, name: people.name, email: people.email, role: people.role },
    })
    .from(projectMembers)
    .innerJoin(people, eq(people.id, projectMembers.personId))
    .where(and(inArray(projectMembers.projectId, projectIds), isNull(people.disabledAt)))
    .orderBy(asc(people.name), asc(people.id));
  const byProject = new Map<string, Person[]>(projectIds.map((id) => [id, []]));
  for (const { projectId, person } of rows) byProject.get(projectId)?.push(person);
  return byProject;
}

/** The projects the person may read, newest first; with `id`, that one if it is among them. */
export async function listProjects(db: Database, person: Person, id?: string): Promise<Project[]> {
  const isHere = eq(candidates.projectId, projects.id);
  const rows = await db
    .select({
      project: projects,
      beamCount: db.$count(beams, eq(beams.projectId, projects.id)),
      candidateCount: db.$count(candidates, isHere),
      approvedCount: db.$count(candidates, and(isHere, eq(candidates.state, 'approved'))),
    })
    .from(projects)
    .where(and(id === undefined ? undefined : eq(projects.id, id), isWithinReach(db, person)))
    .orderBy(desc(projects.createdAt), desc(projects.id));
  const members = await listMembers(
    db,
    rows.map(({ project }) => project.id),
  );
  return rows.map((row) => presentProject({ ...row, members: members.get(row.project.id) ?? [] }, person));
}
