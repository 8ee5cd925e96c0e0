import { and, eq, inArray, isNull, max, type SQL } from 'drizzle-orm';
import type { Person, RunState } from '#shared/contract/records.ts';
import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import type { DesignBasis } from '#shared/engine/section.ts';
import { ENGINE_VERSION } from '#shared/engine/version.ts';
import { isSameView, type View } from '#shared/sweep/problem.ts';
import { methodOf } from '#shared/sweep/run-method.ts';
import { spaceSize } from '#shared/sweep/space.ts';
import type { RunningLimits } from '../../config.ts';
import type { Database } from '../../db/client.ts';
import { beams } from '../../db/schema/beams.ts';
import { runViews } from '../../db/schema/run-views.ts';
import { runs } from '../../db/schema/runs.ts';
import { sweeps } from '../../db/schema/sweeps.ts';
import { conflict, forbidden, invalidInput, notFound } from '../../errors.ts';
import { frozenBasis } from '../../http/frozen-basis.ts';
import { requireReadableProject, requireRole } from '../../http/project-access.ts';
import { changeView } from '../../jobs/change-view.ts';
import { enqueueShards, insertShards } from '../../jobs/compute-jobs.ts';
import { countedSections } from '../../jobs/counted-sections.ts';
import { cancelView, resumeView } from '../../jobs/end-view.ts';
import { findMissingInputs } from './available-measures.ts';
import { canSeeView, RUNNERS } from './policy.ts';
import { requireView, type RunRecord, type ViewRow } from './queries.ts';
import { refuseTooManySections, takeTurn } from './running-limits.ts';
import { requireRunnable } from './runnable.ts';
import { takeFromEarlierRun } from './taking.ts';

const UNFINISHED: RunState[] = ['queued', 'running'];
const RESUMABLE: readonly RunState[] = ['cancelled', 'failed'];
/** A run for each beam of a floor at once; more would keep everybody else's waiting. */
const RUNS_PER_PERSON = 50;
/** Anyone who reads a run may look at it through other measures, a few at a time. */
const UNFINISHED_VIEWS_PER_RUN = 8;

/** Freezes the sweep as it is now and puts its computation in the queue. Answers the run's id. */
export async function startRun(
  db: Database,
  person: Person,
  { sweepId, limits }: { sweepId: string; limits: RunningLimits },
): Promise<string> {
  return db.transaction(async (tx) => {
    // The sweep's row is locked: runs are numbered one after the other, and nobody edits it in between.
    const [sweep] = await tx.select().from(sweeps).where(eq(sweeps.id, sweepId)).for('update');
    const [beam] = sweep === undefined ? [] : await tx.select().from(beams).where(eq(beams.id, sweep.beamId));
    if (sweep === undefined || beam === undefined) throw notFound('Sweep');
    const project = await requireReadableProject(tx, person, { projectId: beam.projectId, what: 'Sweep' });
    requireRole(person, RUNNERS, 'start runs');
    await refuseTooManyRuns(tx, person);
    const basis = frozenBasis(project);
    requireRunnable(sweep.definition, basis, project.designBasis.units);
    const method = methodOf(sweep.definition, basis);
    const adding = countedSections({ method, sectionCount: spaceSize(sweep.definition.space) });
    await refuseTooManySections(tx, { person, limits, adding });
    return insertRun(tx, { sweepId, definition: sweep.definition, basis, startedBy: person.id });
  });
}

async function refuseTooManyRuns(tx: Database, { id }: Person): Promise<void> {
  const underWay = await tx.$count(runs, and(eq(runs.startedBy, id), inArray(runs.state, UNFINISHED)));
  if (underWay >= RUNS_PER_PERSON)
    throw conflict(`You have ${underWay} runs under way. Wait for some of them, or cancel them.`);
}

interface NewRun {
  readonly sweepId: string;
  readonly definition: SweepDefinition;
  readonly basis: DesignBasis;
  readonly startedBy: string;
}

async function insertRun(tx: Database, { sweepId, definition, basis, startedBy }: NewRun): Promise<string> {
  const [last] = await tx
    .select({ number: max(runs.number) })
    .from(runs)
    .where(eq(runs.sweepId, sweepId));
  const [run] = await tx
    .insert(runs)
    .values({
      sweepId,
      number: (last?.number ?? 0) + 1,
      definition,
      basis,
      engineVersion: ENGINE_VERSION,
      method: methodOf(definition, basis),
      sectionCount: spaceSize(definition.space),
      startedBy,
    })
    .returning({ id: runs.id, sectionCount: runs.sectionCount, method: runs.method });
  const { space, demand, rules, view } = definition;
  if (run!.method === 'every-section')
    await takeFromEarlierRun(tx, { ...run!, sweepId, problem: { space, demand, rules, basis } });
  await insertView(tx, run!, { view, openedBy: null });
  return run!.id;
}

/** Answers its id; undefined where the run has such a view already. */
async function insertView(
  tx: Database,
  { id: runId, sectionCount, method }: Pick<RunRecord['run'], 'id' | 'sectionCount' | 'method'>,
  { view: { x, y, z }, openedBy }: { view: View; openedBy: string | null },
): Promise<string | undefined> {
  const [inserted] = await tx
    .insert(runViews)
    .values({ runId, x, y, z: z ?? null, openedBy })
    .onConflictDoNothing()
    .returning({ id: runViews.id });
  if (inserted === undefined) return undefined;
  await insertShards(tx, inserted.id, { from: 0, to: sectionCount, method });
  await enqueueShards(tx, inserted.id);
  // No change but the event: whoever follows the run learns of the new view.
  await changeView(tx, { runId, viewId: inserted.id, from: ['queued'] }, {});
  return inserted.id;
}

/** Stops what is in work, keeping what is done, and takes out what still waits. Nothing to stop is no error. */
export async function cancelRun(db: Database, person: Person, { run }: RunRecord): Promise<void> {
  requireRole(person, RUNNERS, 'cancel runs');
  await db.transaction(async (tx) => {
    const unfinished = await tx
      .select({ viewId: runViews.id })
      .from(runViews)
      .where(and(eq(runViews.runId, run.id), inArray(runViews.state, UNFINISHED)));
    for (const { viewId } of unfinished)
      await cancelView(tx, { runId: run.id, viewId, sectionCount: run.sectionCount, method: run.method });
  });
}

/** Takes the run's own view up again where it was left. One under way, or finished, has nothing to resume: no error. */
export async function resumeRun(
  db: Database,
  person: Person,
  { record: { run }, limits }: { record: RunRecord; limits: RunningLimits },
): Promise<void> {
  requireRole(person, RUNNERS, 'resume runs');
  await db.transaction(async (tx) => {
    await takeTurn(tx);
    const view = await requireOwnView(tx, run);
    if (!RESUMABLE.includes(view.state)) return;
    refuseOtherEngine(run);
    await refuseTooManyRuns(tx, person);
    await refuseTooManySections(tx, {
      person,
      limits,
      adding: run.method === 'bounds' ? countedSections(run) : run.sectionCount - view.evaluated,
    });
    const { sectionCount, method } = run;
    await resumeView(tx, { runId: run.id, viewId: view.id, sectionCount, method });
  });
}

const isViewOf = ({ id }: RunRecord['run'], { x, y, z }: View): SQL | undefined =>
  and(
    eq(runViews.runId, id),
    eq(runViews.x, x),
    eq(runViews.y, y),
    z ? eq(runViews.z, z) : isNull(runViews.z),
  );

async function requireOwnView(tx: Database, run: RunRecord['run']) {
  const [view] = await tx
    .select({ id: runViews.id, state: runViews.state, evaluated: runViews.evaluated })
    .from(runViews)
    .where(isViewOf(run, run.definition.view));
  if (view === undefined) throw notFound('View');
  return view;
}

/** Shards of two engines do not add up to the result of either. */
function refuseOtherEngine({ engineVersion }: RunRecord['run']): void {
  if (engineVersion !== ENGINE_VERSION)
    throw conflict(
      `The run was started with engine ${engineVersion}; the engine is ${ENGINE_VERSION} by now. Start a new run.`,
    );
}

/**
 * The run seen through two measures, computed from its frozen inputs where it was not yet. One that failed or was
 * cancelled is taken up again, except the run's own: that is resumed by whoever may run it.
 */
export async function openView(
  db: Database,
  person: Person,
  { record, view, limits }: { record: RunRecord; view: View; limits: RunningLimits },
): Promise<ViewRow> {
  if (!canSeeView(person, view)) throw forbidden(`Your role (${person.role}) may not see costs`);
  const { run, project } = record;
  const { space, demand, rules } = run.definition;
  if (view.z && run.method === 'bounds')
    throw invalidInput([
      { path: ['z'], message: 'A run by bounds finds fronts in two measures only: leave the third out' },
    ]);
  const missing = findMissingInputs(view, {
    problem: { space, demand, rules, basis: run.basis },
    units: project.designBasis.units,
    path: [],
  });
  if (missing.length > 0) throw invalidInput(missing);
  const viewId = await db.transaction(async (tx) => {
    await takeTurn(tx);
    const inserted = await insertView(tx, run, { view, openedBy: person.id });
    const { id, isBegun } =
      inserted === undefined ? await retryView(tx, record, view) : { id: inserted, isBegun: true };
    await refuseTooManyViews(tx, run.id);
    // Its own sections are counted already.
    if (isBegun) await refuseTooManySections(tx, { person, limits, adding: 0 });
    return id;
  });
  return requireView(db, person, { runId: run.id, viewId });
}

/** Called with the new one among them: its run's row is locked, so the count holds. */
async function refuseTooManyViews(tx: Database, runId: string): Promise<void> {
  const isUnfinished = and(eq(runViews.runId, runId), inArray(runViews.state, UNFINISHED));
  if ((await tx.$count(runViews, isUnfinished)) > UNFINISHED_VIEWS_PER_RUN)
    throw conflict(
      `${UNFINISHED_VIEWS_PER_RUN} views of this run are computed already. Wait for one of them.`,
    );
}

async function retryView(
  tx: Database,
  { run }: RunRecord,
  view: View,
): Promise<{ id: string; isBegun: boolean }> {
  const [existing] = await tx.select({ id: runViews.id }).from(runViews).where(isViewOf(run, view));
  const { id } = existing!;
  const own = run.definition.view;
  if (isSameView(own, view) || run.engineVersion !== ENGINE_VERSION) return { id, isBegun: false };
  const { sectionCount, method } = run;
  return { id, isBegun: await resumeView(tx, { runId: run.id, viewId: id, sectionCount, method }) };
}
