import { eq, type SQL } from 'drizzle-orm';
import type { Beam } from '#shared/contract/records.ts';
import type { Database } from '../../db/client.ts';
import { beams } from '../../db/schema/beams.ts';
import { candidates } from '../../db/schema/candidates.ts';
import { sweeps } from '../../db/schema/sweeps.ts';
import { notFound } from '../../errors.ts';

/** B2 before B10, as the marks are read. */
const byMark = new Intl.Collator('en', { numeric: true, sensitivity: 'base' });

async function findBeams(db: Database, condition: SQL): Promise<Beam[]> {
  const rows = await db
    .select({
      beam: beams,
      sweepCount: db.$count(sweeps, eq(sweeps.beamId, beams.id)),
      candidateCount: db.$count(candidates, eq(candidates.beamId, beams.id)),
    })
    .from(beams)
    .where(condition);
  return rows.map(({ beam: { createdAt, ...beam }, ...counts }) => ({ ...beam, ...counts }));
}

export async function listBeams(db: Database, projectId: string): Promise<Beam[]> {
  const found = await findBeams(db, eq(beams.projectId, projectId));
  return found.sort((a, b) => byMark.compare(a.mark, b.mark) || (a.id < b.id ? -1 : 1));
}

export async function getBeam(db: Database, id: string): Promise<Beam> {
  const [beam] = await findBeams(db, eq(beams.id, id));
  if (beam === undefined) throw notFound('Beam');
  return beam;
}
