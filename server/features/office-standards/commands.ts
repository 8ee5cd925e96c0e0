import { eq, sql } from 'drizzle-orm';
import type { OfficeStandardInput } from '#shared/contract/office-standard.ts';
import type { Database } from '../../db/client.ts';
import { violatesUnique } from '../../db/database-error.ts';
import { officeStandards } from '../../db/schema/office-standards.ts';
import { conflict, notFound } from '../../errors.ts';

function refuseTakenName(error: unknown, name: string): never {
  if (!violatesUnique(error, 'office_standards_name_key')) throw error;
  const message = `Another standard of the office is named ${name} already`;
  throw conflict(message, [{ path: ['name'], message }]);
}

const rowOf = ({ name, units, barStandard, ...standard }: OfficeStandardInput, updatedBy: string) => ({
  ...{ name, units, barStandard, standard, updatedBy },
});

export async function createOfficeStandard(
  db: Database,
  input: OfficeStandardInput,
  by: string,
): Promise<string> {
  const [created] = await db
    .insert(officeStandards)
    .values(rowOf(input, by))
    .returning({ id: officeStandards.id })
    .catch((error: unknown) => refuseTakenName(error, input.name));
  return created!.id;
}

/** Sweeps filled from it before keep what they were filled with. */
export async function updateOfficeStandard(
  db: Database,
  input: OfficeStandardInput,
  { id, by }: { id: string; by: string },
): Promise<void> {
  const changed = await db
    .update(officeStandards)
    .set({ ...rowOf(input, by), updatedAt: sql`now()` })
    .where(eq(officeStandards.id, id))
    .returning({ id: officeStandards.id })
    .catch((error: unknown) => refuseTakenName(error, input.name));
  if (changed.length === 0) throw notFound('Office standard');
}

export async function deleteOfficeStandard(db: Database, id: string): Promise<void> {
  const gone = await db
    .delete(officeStandards)
    .where(eq(officeStandards.id, id))
    .returning({ id: officeStandards.id });
  if (gone.length === 0) throw notFound('Office standard');
}
