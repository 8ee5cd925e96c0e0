import { setTimeout as delay } from 'node:timers/promises';
import { finishResult } from '#shared/sweep/finish.ts';
import type { ComputePool } from '../../compute/pool.ts';
import { sweepInChunks, type ChunkedSweepResult } from '../../compute/sweep-in-chunks.ts';
import type { Database } from '../../db/client.ts';
import { isDatabaseAway } from '../../db/database-error.ts';
import type { Log } from '../../log.ts';
import { changeView, type ViewChange, type ViewTarget } from '../change-view.ts';
import { enqueueComputeView } from '../compute-view-job.ts';
import { describePart, describeResult } from '../describe-result.ts';
import type { RunEvents } from '../run-events.ts';
import { claimView, type ClaimedView } from './claim-view.ts';
import { ProgressWriter } from './progress-writer.ts';
import { StopSwitch } from './stop-switch.ts';

export interface ComputeViewContext {
  readonly db: Database;
  readonly compute: ComputePool;
  readonly runEvents: RunEvents;
  readonly log: Log;
  /** Fires when the service stops. */
  readonly stopSignal: AbortSignal;
}

const FAILURE_MESSAGE =
  'The computation could not be finished because of an error on our side. Start a new run.';
/** A restart of the database takes seconds; the result of a long run is worth the wait. */
const WRITE_ATTEMPTS = 20;
const WRITE_RETRY_MS = 500;

/**
 * Computes one view of a run from the run's frozen inputs. May run again after a crash: it starts over, and only the
 * worker that claimed the view last can write to it, so the result is written once.
 */
export async function computeView(
  { viewId, workerId }: { viewId: string; workerId: string },
  context: ComputeViewContext,
): Promise<void> {
  const claimed = await claimView(context.db, { viewId, workerId });
  if (claimed === undefined) return;
  const target: ViewTarget = { runId: claimed.runId, viewId, from: ['running'], heldBy: workerId };
  if (claimed.isCancelRequested) {
    // Its worker died before it could obey; what that one had written is kept.
    const message = describePart(claimed.evaluated, claimed.sectionCount);
    await writeEnd(context, target, { state: 'cancelled', message });
    return;
  }
  const stopSwitch = new StopSwitch(viewId, context);
  try {
    await computeClaimed({ claimed, target, stopSwitch }, context);
  } catch (error) {
    if (isDatabaseAway(error)) throw error;
    if (context.stopSignal.aborted) {
      await putBack(context.db, target);
      return;
    }
    context.log.error({ err: error, viewId }, 'A view could not be computed');
    await writeEnd(context, target, { state: 'failed', message: FAILURE_MESSAGE });
  } finally {
    stopSwitch.release();
  }
}

interface Claim {
  readonly claimed: ClaimedView;
  readonly target: ViewTarget;
  readonly stopSwitch: StopSwitch;
}

async function computeClaimed(
  { claimed, target, stopSwitch }: Claim,
  context: ComputeViewContext,
): Promise<void> {
  const startedAt = performance.now();
  const progress = new ProgressWriter(context, target, { claimed, startedAt, stopSwitch });
  const swept = await sweepInChunks({
    pool: context.compute,
    key: target.viewId,
    problem: claimed.problem,
    view: claimed.view,
    sectionCount: claimed.sectionCount,
    cancelFlag: stopSwitch.flag,
    onProgress: (merged) => progress.offer(merged),
  });
  await progress.settle();
  const isCutShort = swept.evaluated < claimed.sectionCount;
  if (isCutShort && !stopSwitch.isCancelled && context.stopSignal.aborted) {
    await putBack(context.db, target);
    return;
  }
  await writeEnd(context, target, describeEnd(claimed, swept, performance.now() - startedAt));
}

/** A cancel that came when everything was done leaves a finished run. */
function describeEnd(claimed: ClaimedView, swept: ChunkedSweepResult, elapsedMs: number): ViewChange {
  const result = finishResult(claimed.problem, claimed.view, swept.chunk);
  const isFinished = swept.evaluated === claimed.sectionCount;
  return {
    ...describeResult(result),
    elapsedMs,
    state: isFinished ? 'finished' : 'cancelled',
    hash: isFinished ? result.hash : null,
    message: isFinished ? null : describePart(swept.evaluated, claimed.sectionCount),
  };
}

async function writeEnd(context: ComputeViewContext, target: ViewTarget, change: ViewChange): Promise<void> {
  for (let attempt = 1; ; attempt++) {
    try {
      await changeView(context.db, target, { ...change, workerId: null, finishedAt: new Date() });
      return;
    } catch (error) {
      if (!isDatabaseAway(error) || attempt === WRITE_ATTEMPTS) throw error;
      await delay(WRITE_RETRY_MS);
    }
  }
}

/** The service stops: another process, or this one's next start, takes the view up again. */
async function putBack(db: Database, target: ViewTarget): Promise<void> {
  await db.transaction(async (tx) => {
    const view = await changeView(tx, target, { state: 'queued', workerId: null, startedAt: null });
    if (view !== undefined) await enqueueComputeView(tx, target.viewId);
  });
}
