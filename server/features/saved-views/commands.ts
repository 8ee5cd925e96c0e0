import { and, count, eq } from 'drizzle-orm';
import type { SavedViewInput } from '#shared/contract/saved-view.ts';
import type { Database } from '../../db/client.ts';
import { violatesUnique } from '../../db/database-error.ts';
import { runs } from '../../db/schema/runs.ts';
import { savedViews } from '../../db/schema/saved-views.ts';
import { conflict, invalidInput } from '../../errors.ts';

/** More than anyone reads through; it keeps a slip of a script from filling the list. */
const MOST_VIEWS_OF_SWEEP = 100;

function refuseTakenName(error: unknown, name: string): never {
  if (!violatesUnique(error, 'saved_views_name_key')) throw error;
  const message = `Another view of this sweep is named ${name} already`;
  throw conflict(message, [{ path: ['name'], message }]);
}

async function requireRunOfSweep(db: Database, { runId, sweepId }: { runId: string; sweepId: string }) {
  const [run] = await db
    .select({ id: runs.id })
    .from(runs)
    .where(and(eq(runs.id, runId), eq(runs.sweepId, sweepId)));
  if (run === undefined) throw invalidInput([{ path: ['runId'], message: 'This is no run of the sweep' }]);
}

export async function createSavedView(
  db: Database,
  input: SavedViewInput,
  { sweepId, createdBy }: { sweepId: string; createdBy: string },
): Promise<string> {
  await requireRunOfSweep(db, { runId: input.runId, sweepId });
  const [kept] = await db.select({ views: count() }).from(savedViews).where(eq(savedViews.sweepId, sweepId));
  if ((kept?.views ?? 0) >= MOST_VIEWS_OF_SWEEP)
    throw conflict(`A sweep keeps at most ${MOST_VIEWS_OF_SWEEP} views: delete one that nobody needs`);
  const [created] = await db
    .insert(savedViews)
    .values({ ...input, sweepId, createdBy })
    .returning({ id: savedViews.id })
    .catch((error: unknown) => refuseTakenName(error, input.name));
  return created!.id;
}

/** A view changed by somebody else still names whoever made it. */
export async function updateSavedView(
  db: Database,
  input: SavedViewInput,
  { id, sweepId }: { id: string; sweepId: string },
): Promise<void> {
  await requireRunOfSweep(db, { runId: input.runId, sweepId });
  await db
    .update(savedViews)
    .set(input)
    .where(eq(savedViews.id, id))
    .catch((error: unknown) => refuseTakenName(error, input.name));
}

export async function deleteSavedView(db: Database, id: string): Promise<void> {
  await db.delete(savedViews).where(eq(savedViews.id, id));
}
