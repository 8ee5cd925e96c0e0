import { eq } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import { candidateComments } from '#server/db/schema/candidate-comments.ts';
import { candidateTransitions } from '#server/db/schema/candidate-transitions.ts';
import { candidates } from '#server/db/schema/candidates.ts';
import { runViews } from '#server/db/schema/run-views.ts';
import { runs } from '#server/db/schema/runs.ts';
import { beams } from '#server/db/schema/beams.ts';
import { createBeam, createProject, beamInput, sweepDefinition } from '../support/factories.ts';
import { signedIn, type SignedIn } from '../support/signed-in.ts';
import { useTestService } from '../support/test-service.ts';
import { createWorld, type World } from '../support/world.ts';

const service = useTestService();
let author: SignedIn;
let world: World;
beforeAll(async () => {
  author = await signedIn(service, 'engineer');
  world = await createWorld(service, author, []);
  await author.post(`/candidates/${world.candidate}/comments`, { text: 'As agreed' }).expect(200);
});

/** What PostgreSQL said, below the query that Drizzle names. */
const refusal = async (write: Promise<unknown>): Promise<string> =>
  write.then(
    () => 'accepted',
    (error: Error) => (error.cause instanceof Error ? error.cause.message : error.message),
  );

describe('the database itself refuses', () => {
  it.each([
    ['definition', { definition: { ...sweepDefinition, view: { x: 'depthMm', y: 'widthMm' } } }],
    ['basis', { basis: {} as never }],
    ['engine_version', { engineVersion: '99' }],
    ['section_count', { sectionCount: 1 }],
    ['number', { number: 77 }],
  ] as const)('to change the %s of a run', async (column, values) => {
    const { db } = service.deps;
    expect(await refusal(db.update(runs).set(values).where(eq(runs.id, world.run)))).toBe(
      `runs.${column} is frozen`,
    );
  });

  it.each([
    ['snapshot', { snapshot: {} as never }],
    ['hash', { hash: '0'.repeat(64) }],
    ['author_id', { authorId: '00000000-0000-0000-0000-000000000000' }],
    ['note', { note: 'another' }],
    ['label', { label: 'ZZ' }],
  ] as const)('to change the %s of a candidate', async (column, values) => {
    const { db } = service.deps;
    const write = db.update(candidates).set(values).where(eq(candidates.id, world.candidate));
    expect(await refusal(write)).toBe(`candidates.${column} is frozen`);
  });

  it('to rewrite or remove who moved a candidate and what was said', async () => {
    const { db } = service.deps;
    const transitions = 'Rows of candidate_transitions are only ever added';
    const comments = 'Rows of candidate_comments are only ever added';
    expect(await refusal(db.update(candidateTransitions).set({ note: 'x' }))).toBe(transitions);
    expect(await refusal(db.delete(candidateTransitions))).toBe(transitions);
    expect(await refusal(db.update(candidateComments).set({ text: 'x' }))).toBe(comments);
    expect(await refusal(db.delete(candidateComments))).toBe(comments);
  });

  it('to remove the views of a run, and so the run itself', async () => {
    const { db } = service.deps;
    expect(await refusal(db.delete(runViews))).toBe('Rows of run_views are kept for good');
    expect(await refusal(db.delete(runs))).toContain('foreign key');
  });

  it('a candidate on a beam of another project', async () => {
    const { db } = service.deps;
    const elsewhere = await createProject(service.deps, { members: [author.person] });
    const foreign = await createBeam(service.deps, elsewhere.id);
    const [row] = await db.select().from(candidates).where(eq(candidates.id, world.candidate));
    const copy = { ...row!, id: undefined, label: 'Q', beamId: foreign.id };
    expect(await refusal(db.insert(candidates).values(copy))).toContain('candidates_beam_fk');
  });

  it('a beam with a demand that is no number, or with none of it', async () => {
    const { db } = service.deps;
    const insert = (values: object) =>
      refusal(db.insert(beams).values({ ...beamInput, projectId: world.project, mark: 'X', ...values }));
    expect(await insert({ muNmm: Number.NaN })).toContain('beams_mu_check');
    expect(await insert({ spanMm: Infinity })).toContain('beams_span_check');
    expect(await insert({ count: 0 })).toContain('beams_count_check');
    expect(await insert({ ductilityTarget: -1 })).toContain('beams_ductility_check');
  });

  it('but lets a candidate move and a run end', async () => {
    const { db } = service.deps;
    const moved = db.update(candidates).set({ state: 'returned' }).where(eq(candidates.id, world.candidate));
    expect(await refusal(moved)).toBe('accepted');
    expect(await refusal(db.update(runs).set({ eventSequence: 999 }).where(eq(runs.id, world.run)))).toBe(
      'accepted',
    );
  });
});
