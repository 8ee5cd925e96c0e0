import { asc, eq, inArray, type SQL } from 'drizzle-orm';
import type { Person } from '#shared/contract/records.ts';
import type { Database } from '../../db/client.ts';
import { beams } from '../../db/schema/beams.ts';
import { candidateComments } from '../../db/schema/candidate-comments.ts';
import { candidateTransitions } from '../../db/schema/candidate-transitions.ts';
import { candidates } from '../../db/schema/candidates.ts';
import { people } from '../../db/schema/people.ts';
import { notFound } from '../../errors.ts';
import { requireReadableProject } from '../../http/project-access.ts';

const SIGNATURE = { id: people.id, name: people.name, role: people.role };

type Signature = Pick<Person, 'id' | 'name' | 'role'>;

export interface CandidateRecord {
  readonly candidate: typeof candidates.$inferSelect;
  readonly beam: typeof beams.$inferSelect;
  readonly author: Signature;
  readonly comments: readonly (typeof candidateComments.$inferSelect & { by: Signature })[];
  readonly transitions: readonly (typeof candidateTransitions.$inferSelect & { by: Signature })[];
}

/** In the order they were pinned. */
export const listCandidates = (db: Database, projectId: string): Promise<CandidateRecord[]> =>
  findCandidates(db, eq(candidates.projectId, projectId));

async function getCandidate(db: Database, id: string): Promise<CandidateRecord> {
  const [record] = await findCandidates(db, eq(candidates.id, id));
  if (record === undefined) throw notFound('Candidate');
  return record;
}

/** The candidate, where the person may read its project. */
export async function requireCandidate(db: Database, person: Person, id: string): Promise<CandidateRecord> {
  const record = await getCandidate(db, id);
  await requireReadableProject(db, person, { projectId: record.candidate.projectId, what: 'Candidate' });
  return record;
}

async function findCandidates(db: Database, condition: SQL): Promise<CandidateRecord[]> {
  const rows = await db
    .select({ candidate: candidates, beam: beams, author: SIGNATURE })
    .from(candidates)
    .innerJoin(beams, eq(beams.id, candidates.beamId))
    .innerJoin(people, eq(people.id, candidates.authorId))
    .where(condition)
    .orderBy(asc(candidates.createdAt), asc(candidates.id));
  const ids = rows.map(({ candidate }) => candidate.id);
  const [comments, transitions] = await Promise.all([findComments(db, ids), findTransitions(db, ids)]);
  return rows.map((row) => ({
    ...row,
    comments: comments.filter((comment) => comment.candidateId === row.candidate.id),
    transitions: transitions.filter((transition) => transition.candidateId === row.candidate.id),
  }));
}

async function findComments(db: Database, ids: string[]): Promise<CandidateRecord['comments'][number][]> {
  const rows = await db
    .select({ comment: candidateComments, by: SIGNATURE })
    .from(candidateComments)
    .innerJoin(people, eq(people.id, candidateComments.authorId))
    .where(inArray(candidateComments.candidateId, ids))
    .orderBy(asc(candidateComments.position));
  return rows.map(({ comment, by }) => ({ ...comment, by }));
}

async function findTransitions(
  db: Database,
  ids: string[],
): Promise<CandidateRecord['transitions'][number][]> {
  const rows = await db
    .select({ transition: candidateTransitions, by: SIGNATURE })
    .from(candidateTransitions)
    .innerJoin(people, eq(people.id, candidateTransitions.byId))
    .where(inArray(candidateTransitions.candidateId, ids))
    .orderBy(asc(candidateTransitions.position));
  return rows.map(({ transition, by }) => ({ ...transition, by }));
}
