import { and, eq, isNull } from 'drizzle-orm';
import type { Request } from 'express';
import type { SessionData, Store } from 'express-session';
import type { Person } from '#shared/contract/records.ts';
import type { Database } from '../db/client.ts';
import { people } from '../db/schema/people.ts';
import type { Deps } from '../deps.ts';
import { unauthenticated } from '../errors.ts';

async function findOpenAccount(db: Database, personId: string | undefined): Promise<Person | undefined> {
  if (personId === undefined) return undefined;
  const [person] = await db
    .select({ id: people.id, name: people.name, email: people.email, role: people.role })
    .from(people)
    .where(and(eq(people.id, personId), isNull(people.disabledAt)));
  return person;
}

/** Read anew for each request: a changed role or a shut account takes effect at once. */
export const findSignedInPerson = (db: Database, req: Request): Promise<Person | undefined> =>
  findOpenAccount(db, req.session.personId);

export async function requireSignedInPerson(db: Database, req: Request): Promise<Person> {
  const person = await findSignedInPerson(db, req);
  if (person === undefined) throw unauthenticated();
  return person;
}

const readSession = (store: Store, id: string): Promise<SessionData | undefined> =>
  new Promise((resolve, reject) => {
    store.get(id, (error: unknown, session) => {
      if (error === undefined || error === null) resolve(session ?? undefined);
      else reject(error instanceof Error ? error : new Error('The session could not be read'));
    });
  });

/** For an answer that goes on: who it goes to by now. The session may have ended since the request came. */
export async function findPersonStillSignedIn(
  { db, sessionStore }: Pick<Deps, 'db' | 'sessionStore'>,
  { sessionID }: Request,
): Promise<Person | undefined> {
  const session = await readSession(sessionStore, sessionID);
  return findOpenAccount(db, session?.personId);
}
