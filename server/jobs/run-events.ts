import type { Log } from '../log.ts';
import { DatabaseListener } from './database-listener.ts';
import {
  VIEW_CANCELLED_CHANNEL,
  VIEW_CHANGED_CHANNEL,
  viewChangedSchema,
  type ViewChanged,
} from './run-notifications.ts';

export interface RunFollower {
  onViewChanged: (change: ViewChanged) => void;
  /** Events may have been missed: look at everything again. */
  onGap: () => void;
  /** The service stops. */
  onClosed: () => void;
}

/** What happens to runs, from whichever process, handed to those in this process who follow one. */
export class RunEvents {
  readonly listener: DatabaseListener;
  readonly #followers = new Map<string, Set<RunFollower>>();
  readonly #cancellations = new Map<string, Set<() => void>>();

  constructor(options: { databaseUrl: string; log: Log }) {
    this.listener = new DatabaseListener({
      ...options,
      channels: [VIEW_CHANGED_CHANNEL, VIEW_CANCELLED_CHANNEL],
      onNotification: (channel, payload) => this.#receive(channel, payload),
      onReconnected: () => this.#forEachFollower((follower) => follower.onGap()),
    });
  }

  start(): Promise<void> {
    return this.listener.start();
  }

  /** Ends what follows runs, ahead of the rest: an HTTP server with open streams does not close. */
  endStreams(): void {
    this.#forEachFollower((follower) => follower.onClosed());
  }

  async stop(): Promise<void> {
    this.endStreams();
    await this.listener.stop();
  }

  /** Answers the function that ends it. */
  follow(runId: string, follower: RunFollower): () => void {
    return addTo(this.#followers, runId, follower);
  }

  /** Calls back when the view is to be cancelled; answers the function that ends it. */
  onCancelled(viewId: string, callback: () => void): () => void {
    return addTo(this.#cancellations, viewId, callback);
  }

  #receive(channel: string, payload: string): void {
    if (channel === VIEW_CANCELLED_CHANNEL) {
      for (const callback of this.#cancellations.get(payload) ?? []) callback();
      return;
    }
    const change = viewChangedSchema.parse(JSON.parse(payload));
    for (const follower of this.#followers.get(change.runId) ?? []) follower.onViewChanged(change);
  }

  #forEachFollower(act: (follower: RunFollower) => void): void {
    for (const followers of this.#followers.values()) for (const follower of [...followers]) act(follower);
  }
}

function addTo<T>(sets: Map<string, Set<T>>, key: string, member: T): () => void {
  const set = sets.get(key) ?? new Set();
  sets.set(key, set.add(member));
  return () => {
    set.delete(member);
    if (set.size === 0 && sets.get(key) === set) sets.delete(key);
  };
}
