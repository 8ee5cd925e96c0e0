import { and, asc, eq, sql } from 'drizzle-orm';
import { emptyChunk } from '#shared/sweep/chunk.ts';
import { framePlaces } from '#shared/sweep/feasible-frame.ts';
import { mergeChunks } from '#shared/sweep/merge.ts';
import { mergeNearMisses, noNearMisses } from '#shared/sweep/near-misses.ts';
import { chunkFromBytes } from '../compute/chunk-bytes.ts';
import { nearMissesFromBytes } from '../compute/near-miss-bytes.ts';
import type { KeptRun } from '../compute/rank-desk.ts';
import type { Database } from '../db/client.ts';
import { keptSections } from '../db/schema/kept-sections.ts';
import { isKeptWhole } from './kept-sections.ts';

/** Bytes held; what was not asked for longest goes first. */
const MOST_BYTES = 2 ** 27;
/** Read in pieces, so that the thread that answers is never held up for long. */
const SLICE_BYTES = 2 ** 20;

/** What runs kept, read once and held while it is asked for. */
export class KeptShelf {
  readonly #db: Database;
  readonly #runs = new Map<string, KeptRun>();
  readonly #loading = new Map<string, Promise<KeptRun | null>>();

  constructor(db: Database) {
    this.#db = db;
  }

  /** Null where the run did not keep all its sections, or in a layout of another version. */
  async find(runId: string): Promise<KeptRun | null> {
    const held = this.#runs.get(runId);
    if (held !== undefined) {
      this.hold(runId, held);
      return held;
    }
    const loading = this.#loading.get(runId) ?? this.#load(runId);
    this.#loading.set(runId, loading);
    try {
      return await loading;
    } finally {
      this.#loading.delete(runId);
    }
  }

  hold(runId: string, kept: KeptRun): void {
    // Deleted and set again: a Map iterates in order of insertion, so its first key is the longest unused.
    this.#runs.delete(runId);
    this.#runs.set(runId, kept);
    let bytes = [...this.#runs.values()].reduce((sum, { block }) => sum + block.byteLength, 0);
    for (const [oldest, { block }] of this.#runs) {
      if (bytes <= MOST_BYTES || this.#runs.size === 1) return;
      this.#runs.delete(oldest);
      bytes -= block.byteLength;
    }
  }

  async #load(runId: string): Promise<KeptRun | null> {
    if (!(await isKeptWhole(this.#db, runId))) return null;
    const pieces = await this.#db
      .select({
        from: keptSections.fromPlace,
        bytes: sql<number>`octet_length(${keptSections.frames})`,
        counted: keptSections.counted,
        nearMisses: keptSections.nearMisses,
      })
      .from(keptSections)
      .where(eq(keptSections.runId, runId))
      .orderBy(asc(keptSections.fromPlace));
    try {
      const counted = pieces.map((piece) => chunkFromBytes(piece.counted)).reduce(mergeChunks, emptyChunk());
      const nearMisses = pieces
        .map((piece) => nearMissesFromBytes(piece.nearMisses))
        .reduce(mergeNearMisses, noNearMisses());
      const block = await this.#readFrames(runId, pieces);
      const kept = { block, frames: framePlaces(new Uint8Array(block)), counted, nearMisses };
      this.hold(runId, kept);
      return kept;
    } catch (error) {
      if (error instanceof RangeError) return null;
      throw error;
    }
  }

  async #readFrames(
    runId: string,
    pieces: readonly { readonly from: number; readonly bytes: number }[],
  ): Promise<SharedArrayBuffer> {
    const block = new SharedArrayBuffer(pieces.reduce((sum, { bytes }) => sum + bytes, 0));
    const target = new Uint8Array(block);
    let at = 0;
    for (const { from, bytes } of pieces)
      for (let read = 0; read < bytes; read += SLICE_BYTES) {
        const slice = await this.#readSlice(runId, from, read);
        if (slice === undefined) throw new RangeError('What the run kept was taken out meanwhile');
        target.set(slice, at);
        at += slice.length;
      }
    return block;
  }

  async #readSlice(runId: string, from: number, read: number): Promise<Buffer | undefined> {
    const [row] = await this.#db
      .select({ slice: sql<Buffer>`substr(${keptSections.frames}, ${read + 1}, ${SLICE_BYTES})` })
      .from(keptSections)
      .where(and(eq(keptSections.runId, runId), eq(keptSections.fromPlace, from)));
    return row?.slice;
  }
}
