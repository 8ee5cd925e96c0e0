import { and, eq, inArray, isNotNull } from 'drizzle-orm';
import { emptyChunk, type ChunkResult } from '#shared/sweep/chunk.ts';
import { mergeChunks } from '#shared/sweep/merge.ts';
import { chunkFromBytes } from '../../compute/chunk-bytes.ts';
import type { Database } from '../../db/client.ts';
import { viewShards } from '../../db/schema/view-shards.ts';

/** Shards are joined for show no more often than this. */
const INTERVAL_MS = 200;
/** Joining and finishing happens on the thread that answers requests: no more than this share of its time. */
const LARGEST_SHARE = 0.2;
/** Views whose shards are kept joined; a view more is joined from the start each time. */
const MAX_VIEWS = 8;

interface Merged {
  readonly chunk: ChunkResult;
  /** First indices of the shards in it; a shard that is done never changes. */
  readonly shards: ReadonlySet<number>;
  readonly nextAt: number;
}

const NOTHING: Merged = { chunk: emptyChunk(), shards: new Set(), nextAt: -Infinity };

/** What this process has joined of each view so far, so that each shard is read and added once. */
export class MergedShards {
  readonly #views = new Map<string, Merged>();

  /** How long to wait before the view is joined for show again, ms. */
  pauseMs(viewId: string): number {
    return Math.max(0, (this.#views.get(viewId)?.nextAt ?? 0) - performance.now());
  }

  /** All shards that are done by now, as one. */
  async bringUpToDate(
    db: Database,
    viewId: string,
  ): Promise<{ readonly chunk: ChunkResult; readonly shardCount: number }> {
    const isDone = and(eq(viewShards.viewId, viewId), isNotNull(viewShards.result));
    const done = await db.select({ from: viewShards.fromIndex }).from(viewShards).where(isDone);
    const known = this.#views.get(viewId) ?? NOTHING;
    const missing = done.map(({ from }) => from).filter((from) => !known.shards.has(from));
    const isMissing = inArray(viewShards.fromIndex, missing);
    const rows =
      missing.length === 0
        ? []
        : await db.select({ result: viewShards.result }).from(viewShards).where(and(isDone, isMissing));
    const chunk = rows.reduce((sum, { result }) => mergeChunks(sum, chunkFromBytes(result!)), known.chunk);
    const shards = new Set([...known.shards, ...missing]);
    this.#keep(viewId, { chunk, shards, nextAt: performance.now() + INTERVAL_MS });
    return { chunk, shardCount: done.length };
  }

  /** Does what is done with the joined shards, and puts the next time off by what that takes. */
  timed<T>(viewId: string, work: () => T): T {
    const begunAt = performance.now();
    const answer = work();
    const known = this.#views.get(viewId) ?? NOTHING;
    const nextAt = begunAt + Math.max(INTERVAL_MS, (performance.now() - begunAt) / LARGEST_SHARE);
    this.#keep(viewId, { ...known, nextAt });
    return answer;
  }

  forget(viewId: string): void {
    this.#views.delete(viewId);
  }

  #keep(viewId: string, merged: Merged): void {
    // Deleted and set again: a Map iterates in order of insertion, so its first key is the longest unused.
    this.#views.delete(viewId);
    this.#views.set(viewId, merged);
    if (this.#views.size > MAX_VIEWS) this.forget(this.#views.keys().next().value!);
  }
}
