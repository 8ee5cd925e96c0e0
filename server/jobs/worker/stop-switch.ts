import { createCancelFlag } from '../../compute/sweep-in-chunks.ts';
import type { RunEvents } from '../run-events.ts';

/** Stops a sweep within one batch, for whichever reason comes first, and remembers whether somebody cancelled it. */
export class StopSwitch {
  /** Shared with the threads. */
  readonly flag = createCancelFlag();
  #isCancelled = false;
  readonly #unfollow: () => void;

  constructor(viewId: string, { runEvents, stopSignal }: { runEvents: RunEvents; stopSignal: AbortSignal }) {
    const stop = () => this.stop();
    const unfollow = runEvents.onCancelled(viewId, () => this.cancel());
    stopSignal.addEventListener('abort', stop);
    if (stopSignal.aborted) stop();
    this.#unfollow = () => {
      unfollow();
      stopSignal.removeEventListener('abort', stop);
    };
  }

  get isCancelled(): boolean {
    return this.#isCancelled;
  }

  cancel(): void {
    this.#isCancelled = true;
    this.stop();
  }

  stop(): void {
    Atomics.store(this.flag, 0, 1);
  }

  release(): void {
    this.#unfollow();
  }
}
