import { and, eq, isNull, sql } from 'drizzle-orm';
import { finishResult } from '#shared/sweep/finish.ts';
import type { SweptPart } from '../../compute/sweep-in-chunks.ts';
import { runViews } from '../../db/schema/run-views.ts';
import { viewShards } from '../../db/schema/view-shards.ts';
import { changeView, COUNT_TIME, type ViewChange } from '../change-view.ts';
import { describeResult } from '../describe-result.ts';
import { isShard, type ClaimedShard } from './claim-shard.ts';
import type { WorkContext } from './context.ts';
import type { StopSwitch } from './stop-switch.ts';

/** Often enough for a front that seems to grow by itself, seldom enough to cost nothing. */
const INTERVAL_MS = 150;
/** Counts alone, of each of several shards: a page that is told too often never comes to draw its chart. */
const COUNT_INTERVAL_MS = 500;
/** A front of many points takes time to put together, on the thread that answers requests: no more than this share. */
const LARGEST_SHARE = 0.2;

/** Sections done of a view: of the shards that are, and of those in work as far as their workers have said. */
export const evaluatedOf = (viewId: string) =>
  sql`greatest(${runViews.merged}, (select sum(evaluated) from view_shards where view_id = ${viewId}))`;

/**
 * Writes how far a shard is, every INTERVAL_MS at most and one write at a time; what comes in between is skipped. A run
 * that is one shard shows its front as well; otherwise fronts grow shard by shard.
 */
export class ShardProgress {
  readonly #context: Pick<WorkContext, 'db' | 'log' | 'tally'>;
  readonly #shard: ClaimedShard;
  readonly #stopSwitch: StopSwitch;
  #doneTo: number;
  #nextWriteAt = -Infinity;
  #writing: Promise<void> | undefined;

  constructor(
    context: Pick<WorkContext, 'db' | 'log' | 'tally'>,
    shard: ClaimedShard,
    stopSwitch: StopSwitch,
  ) {
    this.#context = context;
    this.#shard = shard;
    this.#stopSwitch = stopSwitch;
    this.#doneTo = shard.from;
  }

  offer(part: SweptPart): void {
    this.#context.tally.addSections(part.doneTo - this.#doneTo);
    this.#doneTo = part.doneTo;
    if (this.#writing !== undefined || performance.now() < this.#nextWriteAt) return;
    this.#nextWriteAt = performance.now() + (this.#isWhole ? INTERVAL_MS : COUNT_INTERVAL_MS);
    this.#writing = this.#write(part).finally(() => {
      this.#writing = undefined;
    });
  }

  /** Waits for a write in progress, so that it cannot overtake what is written next. */
  async settle(): Promise<void> {
    await this.#writing;
  }

  async #write(part: SweptPart): Promise<void> {
    const { db, log } = this.#context;
    const { runId, viewId, from, workerId } = this.#shard;
    try {
      const front = this.#describeFront(part);
      const view = await db.transaction(async (tx) => {
        const [held] = await tx
          .update(viewShards)
          .set({ evaluated: part.doneTo - from })
          .where(and(isShard(this.#shard), isNull(viewShards.result), eq(viewShards.workerId, workerId)))
          .returning({ from: viewShards.fromIndex });
        if (held === undefined) return undefined;
        return changeView(
          tx,
          { runId, viewId, from: ['running'] },
          { evaluated: evaluatedOf(viewId), ...COUNT_TIME, ...front },
        );
      });
      // Undefined: another worker holds the shard now, or the view has ended. A cancel's notification may be missed.
      if (view === undefined) this.#stopSwitch.stop();
      else if (view.cancelRequestedAt !== null) this.#stopSwitch.cancel();
    } catch (error) {
      // Progress is worth nothing later: the next write, or the final one, tells more.
      log.warn({ err: error }, 'Progress could not be written');
    }
  }

  /** Whether the run is this one shard. */
  get #isWhole(): boolean {
    const { from, to, sectionCount } = this.#shard;
    return from === 0 && to === sectionCount;
  }

  #describeFront({ chunk }: SweptPart): ViewChange {
    if (!this.#isWhole) return {};
    const { problem, view } = this.#shard;
    const begunAt = performance.now();
    const result = finishResult(problem, view, chunk);
    const tookMs = performance.now() - begunAt;
    this.#nextWriteAt = Math.max(this.#nextWriteAt, begunAt + tookMs / LARGEST_SHARE);
    return describeResult(result);
  }
}
