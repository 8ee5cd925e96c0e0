import type { ChunkResult } from '#shared/sweep/chunk.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import type { Database } from '../../db/client.ts';
import type { Log } from '../../log.ts';
import { changeView, type ViewTarget } from '../change-view.ts';
import { describeResult } from '../describe-result.ts';
import type { ClaimedView } from './claim-view.ts';
import type { StopSwitch } from './stop-switch.ts';

/** Often enough for a front that seems to grow by itself, seldom enough to cost nothing. */
const INTERVAL_MS = 150;
/** A front of many points takes time to put together, on the thread that answers requests: no more than this share. */
const LARGEST_SHARE = 0.2;

interface ProgressOptions {
  readonly claimed: ClaimedView;
  /** By performance.now(). */
  readonly startedAt: number;
  readonly stopSwitch: StopSwitch;
}

/** Writes what is done so far, every INTERVAL_MS at most and one write at a time; what comes in between is skipped. */
export class ProgressWriter {
  readonly #context: { db: Database; log: Log };
  readonly #target: ViewTarget;
  readonly #options: ProgressOptions;
  #nextWriteAt = -Infinity;
  #writing: Promise<void> | undefined;

  constructor(context: { db: Database; log: Log }, target: ViewTarget, options: ProgressOptions) {
    this.#context = context;
    this.#target = target;
    this.#options = options;
  }

  offer(merged: ChunkResult): void {
    if (this.#writing !== undefined || performance.now() < this.#nextWriteAt) return;
    this.#nextWriteAt = performance.now() + INTERVAL_MS;
    this.#writing = this.#write(merged).finally(() => {
      this.#writing = undefined;
    });
  }

  /** Waits for a write in progress, so that it cannot overtake what is written next. */
  async settle(): Promise<void> {
    await this.#writing;
  }

  async #write(merged: ChunkResult): Promise<void> {
    const { claimed, startedAt, stopSwitch } = this.#options;
    try {
      const begunAt = performance.now();
      const result = finishResult(claimed.problem, claimed.view, merged);
      const tookMs = performance.now() - begunAt;
      this.#nextWriteAt = Math.max(this.#nextWriteAt, begunAt + tookMs / LARGEST_SHARE);
      const elapsedMs = performance.now() - startedAt;
      const view = await changeView(this.#context.db, this.#target, { ...describeResult(result), elapsedMs });
      // Undefined: another worker holds the view now. A cancel's notification may have been missed.
      if (view === undefined) stopSwitch.stop();
      else if (view.cancelRequestedAt !== null) stopSwitch.cancel();
    } catch (error) {
      // Progress is worth nothing later: the next write, or the final one, tells more.
      this.#context.log.warn({ err: error }, 'Progress could not be written');
    }
  }
}
