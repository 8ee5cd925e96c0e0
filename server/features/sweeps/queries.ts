import { desc, eq, inArray, type SQL } from 'drizzle-orm';
import type { Person, Sweep } from '#shared/contract/records.ts';
import type { Database } from '../../db/client.ts';
import { listRunSummaries } from '../../db/run-summaries.ts';
import { beams } from '../../db/schema/beams.ts';
import { runs } from '../../db/schema/runs.ts';
import { sweeps } from '../../db/schema/sweeps.ts';
import { notFound } from '../../errors.ts';
import type { BeamRow } from '../../http/beam-access.ts';
import { requireReadableProject, type ProjectRow } from '../../http/project-access.ts';

export type SweepRow = typeof sweeps.$inferSelect;

/** The sweep of that id with its beam and project, where the person may read the project. */
export async function requireReadableSweep(
  db: Database,
  person: Person,
  id: string,
): Promise<{ sweep: SweepRow; beam: BeamRow; project: ProjectRow }> {
  const [found] = await db
    .select({ sweep: sweeps, beam: beams })
    .from(sweeps)
    .innerJoin(beams, eq(beams.id, sweeps.beamId))
    .where(eq(sweeps.id, id));
  if (found === undefined) throw notFound('Sweep');
  const { projectId } = found.beam;
  return { ...found, project: await requireReadableProject(db, person, { projectId, what: 'Sweep' }) };
}

async function findSweeps(db: Database, condition: SQL): Promise<Sweep[]> {
  const rows = await db
    .select({ sweep: sweeps, beam: { projectId: beams.projectId, beamMark: beams.mark } })
    .from(sweeps)
    .innerJoin(beams, eq(beams.id, sweeps.beamId))
    .where(condition)
    .orderBy(desc(sweeps.createdAt), desc(sweeps.id));
  const ids = rows.map(({ sweep }) => sweep.id);
  const summaries = await listRunSummaries(db, inArray(runs.sweepId, ids));
  return rows.map(({ sweep, beam }) => ({
    ...beam,
    id: sweep.id,
    beamId: sweep.beamId,
    name: sweep.name,
    definition: sweep.definition,
    createdAt: sweep.createdAt.toISOString(),
    updatedAt: sweep.updatedAt.toISOString(),
    runs: summaries.filter(({ sweepId }) => sweepId === sweep.id),
  }));
}

export const listSweeps = (db: Database, projectId: string): Promise<Sweep[]> =>
  findSweeps(db, eq(beams.projectId, projectId));

export async function getSweep(db: Database, id: string): Promise<Sweep> {
  const [sweep] = await findSweeps(db, eq(sweeps.id, id));
  if (sweep === undefined) throw notFound('Sweep');
  return sweep;
}
