import { eq } from 'drizzle-orm';
import type { Person } from '#shared/contract/records.ts';
import type { Database } from '../db/client.ts';
import { beams } from '../db/schema/beams.ts';
import { notFound } from '../errors.ts';
import { requireReadableProject, type ProjectRow } from './project-access.ts';

export type BeamRow = typeof beams.$inferSelect;

/** The beam of that id with its project, where the person may read the project. */
export async function requireReadableBeam(
  db: Database,
  person: Person,
  id: string,
): Promise<{ beam: BeamRow; project: ProjectRow }> {
  const [beam] = await db.select().from(beams).where(eq(beams.id, id));
  if (beam === undefined) throw notFound('Beam');
  return {
    beam,
    project: await requireReadableProject(db, person, { projectId: beam.projectId, what: 'Beam' }),
  };
}
