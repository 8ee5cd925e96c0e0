import { eq, sql } from 'drizzle-orm';
import type { Person } from '#shared/contract/records.ts';
import { people } from '../../db/schema/people.ts';
import type { Deps } from '../../deps.ts';

/** Whoever has this e-mail and password. A shut account looks like a wrong password, and takes as long. */
export async function findPersonByPassword(
  { db, passwords }: Pick<Deps, 'db' | 'passwords'>,
  { email, password }: { email: string; password: string },
): Promise<Person | undefined> {
  const [row] = await db
    .select()
    .from(people)
    .where(eq(sql`lower(${people.email})`, email.toLowerCase()));
  const isRight = await passwords.verify(password, row?.passwordHash);
  if (row === undefined || !isRight || row.disabledAt !== null) return undefined;
  return { id: row.id, name: row.name, email: row.email, role: row.role };
}
