import { and, eq, isNull } from 'drizzle-orm';
import type { Request } from 'express';
import type { Person } from '#shared/contract/records.ts';
import type { Database } from '../db/client.ts';
import { people } from '../db/schema/people.ts';
import { unauthenticated } from '../errors.ts';

/** Read anew for each request: a changed role or a shut account takes effect at once. */
export async function findSignedInPerson(db: Database, req: Request): Promise<Person | undefined> {
  const { personId } = req.session;
  if (personId === undefined) return undefined;
  const [person] = await db
    .select({ id: people.id, name: people.name, email: people.email, role: people.role })
    .from(people)
    .where(and(eq(people.id, personId), isNull(people.disabledAt)));
  return person;
}

export async function requireSignedInPerson(db: Database, req: Request): Promise<Person> {
  const person = await findSignedInPerson(db, req);
  if (person === undefined) throw unauthenticated();
  return person;
}
