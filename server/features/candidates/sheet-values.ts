import { and, asc, eq } from 'drizzle-orm';
import type { Person, SheetValue, SheetValueInput } from '#shared/contract/records.ts';
import { comparableValues } from '#shared/sheet/sheet-parts.ts';
import type { Database } from '../../db/client.ts';
import { candidates } from '../../db/schema/candidates.ts';
import { people } from '../../db/schema/people.ts';
import { sheetValues } from '../../db/schema/sheet-values.ts';
import { conflict, forbidden, invalidInput } from '../../errors.ts';
import { findSheetRefusal, isOpenForChecking } from './policy.ts';
import { requireCandidate } from './queries.ts';

type CandidateRow = typeof candidates.$inferSelect;

/** Own values on a candidate's sheet, each beside the sheet's, in the order of its lines. */
export async function listSheetValues(db: Database, candidate: CandidateRow): Promise<SheetValue[]> {
  const rows = await db
    .select({ own: sheetValues, by: { id: people.id, name: people.name } })
    .from(sheetValues)
    .innerJoin(people, eq(people.id, sheetValues.personId))
    .where(eq(sheetValues.candidateId, candidate.id))
    .orderBy(asc(people.name), asc(people.id));
  return [...comparableValues(candidate.snapshot)].flatMap(([line, onSheet]) =>
    rows
      .filter(({ own }) => own.line === line)
      .map(({ own, by }) => ({
        line,
        value: own.value,
        onSheet,
        by,
        updatedAt: own.updatedAt.toISOString(),
      })),
  );
}

/** Writes, changes or (null) takes away the person's own value for one line. */
export async function setSheetValue(
  db: Database,
  person: Person,
  { id, line, value }: SheetValueInput & { readonly id: string },
): Promise<void> {
  const { candidate } = await requireCandidate(db, person, id);
  const refusal = findSheetRefusal(candidate, person);
  if (refusal !== undefined) throw forbidden(refusal);
  if (!comparableValues(candidate.snapshot).has(line))
    throw invalidInput([{ path: ['line'], message: 'The sheet has no such line to compare with' }]);
  await db.transaction(async (tx) => {
    // Against an approval at the same moment: what it records is all there is, and nothing comes after it.
    const [now] = await tx.select().from(candidates).where(eq(candidates.id, id)).for('update');
    const { state, label } = now!;
    if (!isOpenForChecking(state))
      throw conflict(`Candidate ${label} is ${state} now, and its calculation sheet is closed`);
    await write(tx, { candidateId: id, line, personId: person.id, value });
  });
}

interface OwnValue {
  readonly candidateId: string;
  readonly line: string;
  readonly personId: string;
  readonly value: number | null;
}

async function write(tx: Database, { value, ...key }: OwnValue): Promise<void> {
  if (value === null) {
    await tx
      .delete(sheetValues)
      .where(
        and(
          eq(sheetValues.candidateId, key.candidateId),
          eq(sheetValues.line, key.line),
          eq(sheetValues.personId, key.personId),
        ),
      );
    return;
  }
  const updatedAt = new Date();
  await tx
    .insert(sheetValues)
    .values({ ...key, value, updatedAt })
    .onConflictDoUpdate({
      target: [sheetValues.candidateId, sheetValues.line, sheetValues.personId],
      set: { value, updatedAt },
    });
}
