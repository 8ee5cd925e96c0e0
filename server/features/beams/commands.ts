import { eq } from 'drizzle-orm';
import type { BeamInput } from '#shared/contract/records.ts';
import type { Database } from '../../db/client.ts';
import { violatesReference, violatesUnique } from '../../db/database-error.ts';
import { beams } from '../../db/schema/beams.ts';
import { conflict, notFound } from '../../errors.ts';

function refuseTakenMark(error: unknown, mark: string): never {
  if (!violatesUnique(error, 'beams_mark_key')) throw error;
  const message = `Another beam of this project has the mark ${mark} already`;
  throw conflict(message, [{ path: ['mark'], message }]);
}

export async function createBeam(db: Database, projectId: string, input: BeamInput): Promise<string> {
  const created = await db
    .insert(beams)
    .values({ ...input, projectId })
    .returning({ id: beams.id })
    .catch((error: unknown) => refuseTakenMark(error, input.mark));
  return created[0]!.id;
}

export async function updateBeam(db: Database, id: string, input: BeamInput): Promise<void> {
  const updated = await db
    .update(beams)
    .set(input)
    .where(eq(beams.id, id))
    .returning({ id: beams.id })
    .catch((error: unknown) => refuseTakenMark(error, input.mark));
  if (updated.length === 0) throw notFound('Beam');
}

/** Its sweeps go with it. Runs and candidates do not go: their references, which do not cascade, hold the beam. */
export async function deleteBeam(db: Database, { id, mark }: { id: string; mark: string }): Promise<void> {
  await db
    .delete(beams)
    .where(eq(beams.id, id))
    .catch((error: unknown) => {
      if (!violatesReference(error)) throw error;
      throw conflict(`${mark} has runs or pinned sections, which are kept for good, so it cannot be deleted`);
    });
}
