import { and, eq, inArray, max } from 'drizzle-orm';
import type { Person, RunState } from '#shared/contract/records.ts';
import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import type { DesignBasis } from '#shared/engine/section.ts';
import { ENGINE_VERSION } from '#shared/engine/version.ts';
import type { View } from '#shared/sweep/problem.ts';
import { spaceSize } from '#shared/sweep/space.ts';
import type { Database } from '../../db/client.ts';
import { beams } from '../../db/schema/beams.ts';
import { runViews } from '../../db/schema/run-views.ts';
import { runs } from '../../db/schema/runs.ts';
import { sweeps } from '../../db/schema/sweeps.ts';
import { conflict, forbidden, invalidInput, notFound } from '../../errors.ts';
import { frozenBasis } from '../../http/frozen-basis.ts';
import { requireReadableProject, requireRole } from '../../http/project-access.ts';
import { changeView, type ViewTarget } from '../../jobs/change-view.ts';
import { dequeueComputeView, enqueueComputeView } from '../../jobs/compute-view-job.ts';
import { describePart } from '../../jobs/describe-result.ts';
import { notifyViewCancelled } from '../../jobs/run-notifications.ts';
import { findMissingInputs } from './available-measures.ts';
import { canSeeView, RUNNERS } from './policy.ts';
import { requireView, type RunRecord, type ViewRow } from './queries.ts';
import { requireRunnable } from './runnable.ts';

const UNFINISHED: RunState[] = ['queued', 'running'];
/** A run for each beam of a floor at once; more would keep everybody else's waiting. */
const RUNS_PER_PERSON = 50;
/** Anyone who reads a run may look at it through other measures, a few at a time. */
const UNFINISHED_VIEWS_PER_RUN = 8;

/** Freezes the sweep as it is now and puts its computation in the queue. Answers the run's id. */
export async function startRun(db: Database, person: Person, sweepId: string): Promise<string> {
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
      sectionCount: spaceSize(definition.space),
      startedBy,
    })
    .returning({ id: runs.id });
  await insertView(tx, run!.id, definition.view);
  return run!.id;
}

/** Answers its id; undefined where the run has such a view already. */
async function insertView(tx: Database, runId: string, { x, y }: View): Promise<string | undefined> {
  const [inserted] = await tx
    .insert(runViews)
    .values({ runId, x, y })
    .onConflictDoNothing()
    .returning({ id: runViews.id });
  if (inserted === undefined) return undefined;
  await enqueueComputeView(tx, inserted.id);
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
    for (const { viewId } of unfinished) await cancelView(tx, { runId: run.id, viewId, run });
  });
}

async function cancelView(
  tx: Database,
  { runId, viewId, run }: { runId: string; viewId: string; run: RunRecord['run'] },
): Promise<void> {
  const now = new Date();
  const waiting: ViewTarget = { runId, viewId, from: ['queued'] };
  const cancelled = await changeView(tx, waiting, {
    state: 'cancelled',
    cancelRequestedAt: now,
    finishedAt: now,
    message: describePart(0, run.sectionCount),
  });
  if (cancelled !== undefined) {
    await dequeueComputeView(tx, viewId);
    return;
  }
  const asked = await changeView(tx, { ...waiting, from: ['running'] }, { cancelRequestedAt: now });
  if (asked !== undefined) await notifyViewCancelled(tx, viewId);
}

/**
 * The run seen through two measures, computed from its frozen inputs where it was not yet. One that failed or was
 * cancelled is computed anew, except the run's own: a run happens once.
 */
export async function openView(
  db: Database,
  person: Person,
  { record, view }: { record: RunRecord; view: View },
): Promise<ViewRow> {
  if (!canSeeView(person, view)) throw forbidden(`Your role (${person.role}) may not see costs`);
  const { run, project } = record;
  const { space, demand, rules } = run.definition;
  const missing = findMissingInputs(view, {
    problem: { space, demand, rules, basis: run.basis },
    units: project.designBasis.units,
    path: [],
  });
  if (missing.length > 0) throw invalidInput(missing);
  const viewId = await db.transaction(async (tx) => {
    const id = (await insertView(tx, run.id, view)) ?? (await retryView(tx, record, view));
    await refuseTooManyViews(tx, run.id);
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

async function retryView(tx: Database, { run }: RunRecord, { x, y }: View): Promise<string> {
  const [existing] = await tx
    .select({ id: runViews.id })
    .from(runViews)
    .where(and(eq(runViews.runId, run.id), eq(runViews.x, x), eq(runViews.y, y)));
  const viewId = existing!.id;
  const own = run.definition.view;
  if (own.x === x && own.y === y) return viewId;
  const again = await changeView(
    tx,
    { runId: run.id, viewId, from: ['failed', 'cancelled'] },
    { state: 'queued', message: null, cancelRequestedAt: null, finishedAt: null, startedAt: null },
  );
  if (again !== undefined) await enqueueComputeView(tx, viewId);
  return viewId;
}
