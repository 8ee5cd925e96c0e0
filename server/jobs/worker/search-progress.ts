import { and, eq, isNull } from 'drizzle-orm';
import { boundedResult } from '#shared/sweep/bounded-result.ts';
import type { BoundsReport } from '../../compute/bounds-protocol.ts';
import { viewShards } from '../../db/schema/view-shards.ts';
import { changeView, COUNT_TIME } from '../change-view.ts';
import { describeSearch } from '../describe-result.ts';
import { isShard, type ClaimedShard } from './claim-shard.ts';
import type { WorkContext } from './context.ts';
import type { KnownFront } from './known-front.ts';
import type { StopSwitch } from './stop-switch.ts';

/** Often enough for a front that seems to settle by itself, seldom enough to cost nothing. */
const INTERVAL_MS = 250;

interface Searching {
  readonly stopSwitch: StopSwitch;
  readonly known: KnownFront;
}

/** Writes how far a search by bounds is with the front it has, one write at a time; what comes in between is skipped. */
export class SearchProgress {
  readonly #context: Pick<WorkContext, 'db' | 'log' | 'tally'>;
  readonly #shard: ClaimedShard;
  readonly #searching: Searching;
  #counted = 0;
  #nextWriteAt = -Infinity;
  #writing: Promise<void> | undefined;

  constructor(context: Pick<WorkContext, 'db' | 'log' | 'tally'>, shard: ClaimedShard, searching: Searching) {
    this.#context = context;
    this.#shard = shard;
    this.#searching = searching;
  }

  offer(report: BoundsReport): void {
    const { evaluated } = report.state;
    this.#context.tally.addSections(evaluated - this.#counted);
    this.#counted = evaluated;
    if (this.#writing !== undefined || performance.now() < this.#nextWriteAt) return;
    this.#nextWriteAt = performance.now() + INTERVAL_MS;
    this.#writing = this.#write(report).finally(() => {
      this.#writing = undefined;
    });
  }

  /** Waits for a write in progress, so that it cannot overtake what is written next. */
  async settle(): Promise<void> {
    await this.#writing;
  }

  async #write({ state, found }: BoundsReport): Promise<void> {
    const { db, log } = this.#context;
    const { runId, viewId, workerId, problem, view } = this.#shard;
    const { stopSwitch, known } = this.#searching;
    try {
      const result = boundedResult(problem, view, {
        state,
        found: known.joinedWith(found),
        near: [],
        isProven: false,
      });
      const changed = await db.transaction(async (tx) => {
        const { rowCount } = await tx
          .update(viewShards)
          .set({ evaluated: state.evaluated })
          .where(and(isShard(this.#shard), isNull(viewShards.result), eq(viewShards.workerId, workerId)));
        if (rowCount !== 1) return undefined;
        const target = { runId, viewId, from: ['running'] } as const;
        return changeView(tx, target, { ...describeSearch(result, state), ...COUNT_TIME });
      });
      // Undefined: another worker holds the search now, or the view has ended. A cancel's notification may be missed.
      if (changed === undefined) stopSwitch.stop();
      else if (changed.cancelRequestedAt !== null) stopSwitch.cancel();
    } catch (error) {
      // Progress is worth nothing later: the next write, or the final one, tells more.
      log.warn({ err: error }, 'Progress could not be written');
    }
  }
}
