import { and, eq, ne } from 'drizzle-orm';
import type { CandidateState, Person, PinInput, Snapshot } from '#shared/contract/records.ts';
import type { Database } from '../../db/client.ts';
import type { Deps } from '../../deps.ts';
import { violatesReference } from '../../db/database-error.ts';
import { candidateComments } from '../../db/schema/candidate-comments.ts';
import { candidateTransitions } from '../../db/schema/candidate-transitions.ts';
import { candidates } from '../../db/schema/candidates.ts';
import { projects } from '../../db/schema/projects.ts';
import { conflict, forbidden, invalidInput, notFound } from '../../errors.ts';
import { requireReadableBeam, type BeamRow } from '../../http/beam-access.ts';
import { requireReadableProject, requireRole } from '../../http/project-access.ts';
import { labelOf } from './label.ts';
import { canFollow, COMMENT, findRefusal, PIN } from './policy.ts';
import { requirePinnable } from './pinnable.ts';
import { requireCandidate } from './queries.ts';
import { listSheetValues } from './sheet-values.ts';
import { hashSnapshot, withStudies } from './snapshot.ts';

/** Freezes a section with everything that decided its numbers. Answers the candidate's id. */
export async function pinCandidate(
  { db, sheetDesk }: Pick<Deps, 'db' | 'sheetDesk'>,
  person: Person,
  { projectId, input }: { projectId: string; input: PinInput },
): Promise<string> {
  const project = await requireReadableProject(db, person, { projectId, what: 'Project' });
  requireRole(person, PIN, 'pin candidates');
  const { beam } = await requireReadableBeam(db, person, input.beamId);
  if (beam.projectId !== project.id) throw notFound('Beam');
  const pinned = await requirePinnable(db, { project, beam, source: input.source });
  const { section, basis, demand, rules } = pinned;
  const snapshot = withStudies(pinned, await sheetDesk.studies(section, { basis, demand, rules }));
  return db
    .transaction((tx) => insertCandidate(tx, { person, beam, input, snapshot }))
    .catch((error: unknown) => {
      // The beam was deleted a moment ago; nothing else that a candidate refers to ever is.
      throw violatesReference(error) ? notFound('Beam') : error;
    });
}

interface NewCandidate {
  readonly person: Person;
  readonly beam: BeamRow;
  readonly input: PinInput;
  readonly snapshot: Snapshot;
}

async function insertCandidate(
  tx: Database,
  { person, beam, input, snapshot }: NewCandidate,
): Promise<string> {
  const { projectId } = beam;
  // Pins of one project come one after the other: each takes the next label.
  await tx.select({ id: projects.id }).from(projects).where(eq(projects.id, projectId)).for('no key update');
  const hash = hashSnapshot(snapshot);
  await refuseDuplicate(tx, beam, hash);
  const pinned = await tx.$count(candidates, eq(candidates.projectId, projectId));
  const { source, note } = input;
  const [inserted] = await tx
    .insert(candidates)
    .values({
      projectId,
      beamId: beam.id,
      label: labelOf(pinned),
      note,
      authorId: person.id,
      runId: source.kind === 'run' ? source.runId : null,
      sectionIndex: source.kind === 'run' ? source.index : null,
      snapshot,
      hash,
    })
    .returning({ id: candidates.id });
  const candidateId = inserted!.id;
  await tx
    .insert(candidateTransitions)
    .values({ candidateId, from: null, to: 'proposed', byId: person.id, note });
  return candidateId;
}

async function refuseDuplicate(tx: Database, beam: BeamRow, hash: string): Promise<void> {
  const [twin] = await tx
    .select({ label: candidates.label })
    .from(candidates)
    .where(
      and(eq(candidates.beamId, beam.id), eq(candidates.hash, hash), ne(candidates.state, 'superseded')),
    );
  if (twin !== undefined)
    throw conflict(`This section is already pinned on beam ${beam.mark}, as candidate ${twin.label}`);
}

/**
 * Moves a candidate on. Its row is locked: of two who move it at once one wins, and the other is told. A check and an
 * approval keep the own values of the sheet as they are at that moment.
 */
export async function moveCandidate(
  db: Database,
  person: Person,
  { id, to, note }: { id: string; to: CandidateState; note: string },
): Promise<void> {
  await requireCandidate(db, person, id);
  await db.transaction(async (tx) => {
    const [candidate] = await tx.select().from(candidates).where(eq(candidates.id, id)).for('update');
    const { state, label } = candidate!;
    const refusal = findRefusal(candidate!, to, person);
    if (refusal !== undefined) throw forbidden(refusal);
    if (!canFollow(state, to))
      throw conflict(`Candidate ${label} is ${state} now, and from there it cannot become ${to}`);
    if (to === 'returned' && note === '')
      throw invalidInput([{ path: ['note'], message: 'Say why it is returned' }]);
    await tx.update(candidates).set({ state: to }).where(eq(candidates.id, id));
    const recorded = to === 'checked' || to === 'approved' ? await listSheetValues(tx, candidate!) : null;
    await tx
      .insert(candidateTransitions)
      .values({ candidateId: id, from: state, to, byId: person.id, note, sheetValues: recorded });
  });
}

export async function commentOnCandidate(
  db: Database,
  person: Person,
  { id, text }: { id: string; text: string },
): Promise<void> {
  await requireCandidate(db, person, id);
  requireRole(person, COMMENT, 'comment');
  await db.insert(candidateComments).values({ candidateId: id, authorId: person.id, text });
}
