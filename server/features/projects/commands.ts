import { and, eq, inArray, isNull, notInArray } from 'drizzle-orm';
import type { z } from 'zod';
import type { PriceBook, ProjectDesignBasis } from '#shared/contract/design-basis.ts';
import type { Issue } from '#shared/contract/errors.ts';
import type { Person, projectInputSchema } from '#shared/contract/records.ts';
import type { Database } from '../../db/client.ts';
import { violatesUnique } from '../../db/database-error.ts';
import { people } from '../../db/schema/people.ts';
import { projectMembers } from '../../db/schema/project-members.ts';
import { projects } from '../../db/schema/projects.ts';
import { conflict, invalidInput } from '../../errors.ts';
import { canLeaveByOwnHand } from './policy.ts';

type ProjectInput = z.infer<typeof projectInputSchema>;

function refuseTakenNumber(error: unknown, number: string): never {
  if (!violatesUnique(error, 'projects_number_key')) throw error;
  const message = `Another project has the number ${number} already`;
  throw conflict(message, [{ path: ['number'], message }]);
}

/** Whoever creates a project is its first member. */
export async function createProject(db: Database, input: ProjectInput, creator: Person): Promise<string> {
  return db
    .transaction(async (tx) => {
      const [created] = await tx
        .insert(projects)
        .values({ ...input, createdBy: creator.id })
        .returning({ id: projects.id });
      await tx.insert(projectMembers).values({ projectId: created!.id, personId: creator.id });
      return created!.id;
    })
    .catch((error: unknown) => refuseTakenNumber(error, input.number));
}

export async function renameProject(
  db: Database,
  id: string,
  input: Pick<ProjectInput, 'name' | 'number'>,
): Promise<void> {
  await db
    .update(projects)
    .set(input)
    .where(eq(projects.id, id))
    .catch((error: unknown) => refuseTakenNumber(error, input.number));
}

export async function setDesignBasis(
  db: Database,
  id: string,
  designBasis: ProjectDesignBasis,
): Promise<void> {
  await db.update(projects).set({ designBasis }).where(eq(projects.id, id));
}

/** Two rates for one strength would leave open which one counts; the engine matches f′c within 0.01 MPa. */
const SAME_STRENGTH_MPA = 0.01;

export async function setPriceBook(db: Database, id: string, priceBook: PriceBook): Promise<void> {
  const issues: Issue[] = priceBook.concrete.flatMap(({ fcMPa }, i) =>
    priceBook.concrete.slice(0, i).some((earlier) => Math.abs(earlier.fcMPa - fcMPa) <= SAME_STRENGTH_MPA)
      ? [{ path: ['concrete', i, 'fcMPa'], message: 'This strength stands in the price book already' }]
      : [],
  );
  if (issues.length > 0) throw invalidInput(issues);
  await db.update(projects).set({ priceBook }).where(eq(projects.id, id));
}

async function requireKnownPeople(db: Database, personIds: readonly string[]): Promise<void> {
  const known = await db
    .select({ id: people.id })
    .from(people)
    .where(and(inArray(people.id, [...personIds]), isNull(people.disabledAt)));
  const knownIds = new Set(known.map(({ id }) => id));
  const issues: Issue[] = personIds.flatMap((id, i) =>
    knownIds.has(id.toLowerCase()) ? [] : [{ path: ['personIds', i], message: 'Nobody is known by this id' }],
  );
  if (issues.length > 0) throw invalidInput(issues);
}

/** Replaces the members. People with a shut account are not shown among them and stay as they are. */
export async function setMembers(
  db: Database,
  { projectId, personIds, actor }: { projectId: string; personIds: readonly string[]; actor: Person },
): Promise<void> {
  const wanted = [...new Set(personIds.map((id) => id.toLowerCase()))];
  if (!wanted.includes(actor.id) && !canLeaveByOwnHand(actor)) {
    throw invalidInput([{ path: ['personIds'], message: 'You cannot take yourself off the project' }]);
  }
  await requireKnownPeople(db, personIds);
  await db.transaction(async (tx) => {
    // Of two who choose at once the later one's choice stands, whole.
    await tx
      .select({ id: projects.id })
      .from(projects)
      .where(eq(projects.id, projectId))
      .for('no key update');
    const openAccounts = tx.select({ id: people.id }).from(people).where(isNull(people.disabledAt));
    await tx
      .delete(projectMembers)
      .where(
        and(
          eq(projectMembers.projectId, projectId),
          notInArray(projectMembers.personId, wanted),
          inArray(projectMembers.personId, openAccounts),
        ),
      );
    await tx
      .insert(projectMembers)
      .values(wanted.map((personId) => ({ projectId, personId })))
      .onConflictDoNothing();
  });
}
