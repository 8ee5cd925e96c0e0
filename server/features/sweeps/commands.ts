import { eq, sql } from 'drizzle-orm';
import type { z } from 'zod';
import { findUnknownBars } from '#shared/contract/known-bars.ts';
import type { sweepInputSchema } from '#shared/contract/records.ts';
import type { BarStandard } from '#shared/engine/section.ts';
import type { Database } from '../../db/client.ts';
import { violatesReference } from '../../db/database-error.ts';
import { sweeps } from '../../db/schema/sweeps.ts';
import { conflict, invalidInput, notFound } from '../../errors.ts';

type SweepInput = z.infer<typeof sweepInputSchema>;

/** What the schema cannot know: which bars the project's standard lists. */
function requireKnownBars({ definition }: SweepInput, standard: BarStandard): void {
  const issues = findUnknownBars(definition, standard);
  if (issues.length > 0) {
    throw invalidInput(issues.map(({ path, message }) => ({ path: ['definition', ...path], message })));
  }
}

export async function createSweep(
  db: Database,
  input: SweepInput,
  at: { beamId: string; creatorId: string; standard: BarStandard },
): Promise<string> {
  requireKnownBars(input, at.standard);
  const [created] = await db
    .insert(sweeps)
    .values({ ...input, beamId: at.beamId, createdBy: at.creatorId })
    .returning({ id: sweeps.id })
    .catch((error: unknown) => {
      throw violatesReference(error) ? notFound('Beam') : error;
    });
  return created!.id;
}

/** Runs made before keep the definition they were made with. */
export async function updateSweep(
  db: Database,
  input: SweepInput,
  at: { id: string; standard: BarStandard },
): Promise<void> {
  requireKnownBars(input, at.standard);
  await db
    .update(sweeps)
    .set({ ...input, updatedAt: sql`now()` })
    .where(eq(sweeps.id, at.id));
}

/** Runs are kept for good: their reference, which does not cascade, holds the sweep. */
export async function deleteSweep(db: Database, { id, name }: { id: string; name: string }): Promise<void> {
  await db
    .delete(sweeps)
    .where(eq(sweeps.id, id))
    .catch((error: unknown) => {
      if (!violatesReference(error)) throw error;
      throw conflict(`“${name}” has runs, which are kept for good, so it cannot be deleted`);
    });
}
