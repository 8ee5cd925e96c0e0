import { isCurveMeasure } from '#shared/engine/curve-basis.ts';
import type { ChunkResult } from '#shared/sweep/chunk.ts';
import { emptyChunk } from '#shared/sweep/chunk.ts';
import { mergeChunks } from '#shared/sweep/merge.ts';
import { mergeNearMisses, noNearMisses, type NearMisses } from '#shared/sweep/near-misses.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import type { Widening } from '#shared/sweep/widening.ts';
import type { ComputePool } from './pool.ts';
import type { SweepReply } from './protocol.ts';

/** About 40 ms of work: enough to make the 0.1 ms of a task's way to a thread vanish, little enough to take turns. */
const LARGEST_CHUNK = 2 ** 19;
/** The same where curves are drawn, of which each takes as long as hundreds of sections. */
const LARGEST_CURVE_CHUNK = 2 ** 16;
/** Below this the way to a thread costs more than the work. */
const SMALLEST_CHUNK = 2 ** 12;
/** A small run is cut so that every thread has work and progress can be seen. */
const CHUNKS_PER_THREAD = 8;
/** One chunk in work and one waiting per thread: no thread idles, and another run's chunk waits for few. */
const IN_FLIGHT_PER_THREAD = 2;

interface ChunkedSweep {
  readonly pool: ComputePool;
  /** Names the problem and view in the threads' caches. */
  readonly key: string;
  readonly problem: SweepProblem;
  readonly view: View;
  /** The sections [from, to); from the first where not said. */
  readonly from?: number;
  readonly to: number;
  /** Shared with the threads: set its cell to stop all chunks after their batch. */
  readonly cancelFlag: Int32Array;
  readonly chunkSections?: number;
  /** Where given, from and to are places among the sections that are new beside another run's. */
  readonly widening?: Widening | null;
  /** Room for sections kept for other views; none are where it is left out. */
  readonly keepRoom?: KeepRoom | null;
  readonly onProgress?: (part: SweptPart) => void;
}

/** How many sections may be kept, and how many of them with their numbers. */
export interface KeepRoom {
  readonly sections: number;
  readonly numbers: number;
}

/** Sections kept for other views, as frames one behind the other. */
export interface KeptSections {
  readonly feasible: number;
  readonly frames: readonly Uint8Array[];
  readonly nearMisses: NearMisses;
}

const NOTHING_KEPT: KeptSections = { feasible: 0, frames: [], nearMisses: noNearMisses() };

/** What is done of a range: all of [from, doneTo), and nothing behind it, so that the rest is one range again. */
export interface SweptPart {
  readonly chunk: ChunkResult;
  readonly doneTo: number;
  /** Null where none were to be kept, or there was no room. */
  readonly kept: KeptSections | null;
}

export function createCancelFlag(): Int32Array {
  return new Int32Array(new SharedArrayBuffer(Int32Array.BYTES_PER_ELEMENT));
}

/**
 * Sweeps a range on the pool, or its first part when the cancel flag is set meanwhile. The result of the range does not
 * depend on the threads, the chunks or their order.
 */
export async function sweepInChunks(sweep: ChunkedSweep): Promise<SweptPart> {
  const { pool, key, problem, view, to, cancelFlag, onProgress } = sweep;
  const { from = 0 } = sweep;
  const chunkSections = sweep.chunkSections ?? chunkSizeFor(to - from, pool.threads, problem);
  const { widening = null, keepRoom = null } = sweep;
  const done = new DonePart(from, keepRoom);
  let next = from;
  const isStopped = () => Atomics.load(cancelFlag, 0) !== 0;

  async function takeChunks(): Promise<void> {
    while (next < to && !isStopped()) {
      const chunkFrom = next;
      next = Math.min(chunkFrom + chunkSections, to);
      const range = { from: chunkFrom, to: next };
      const task = { key, problem, view, ...range, widening, keeping: done.keeping, cancelFlag };
      const hasGrown = done.add(chunkFrom, await pool.sweep(task, to - from));
      if (hasGrown) onProgress?.(done.part);
    }
  }

  const lanes = Array.from({ length: pool.threads * IN_FLIGHT_PER_THREAD }, takeChunks);
  try {
    await Promise.all(lanes);
  } catch (error) {
    // The other lanes' chunks would be of no use.
    Atomics.store(cancelFlag, 0, 1);
    await Promise.allSettled(lanes);
    throw error;
  }
  return done.part;
}

/** Chunks merged from the first on; what came before its turn waits for those ahead of it. */
class DonePart {
  #part: SweptPart;
  readonly #early = new Map<number, SweepReply>();

  readonly #room: KeepRoom | null;
  /** Sections that came to be kept, also ahead of their turn. */
  #feasible = 0;

  constructor(from: number, room: KeepRoom | null) {
    this.#room = room;
    this.#part = { chunk: emptyChunk(), doneTo: from, kept: room && NOTHING_KEPT };
  }

  /** What the next chunk is to keep. */
  get keeping(): { readonly hasNumbers: boolean } | null {
    if (this.#room === null || this.#part.kept === null) return null;
    return { hasNumbers: this.#feasible < this.#room.numbers };
  }

  get part(): SweptPart {
    return this.#part;
  }

  /** Answers whether the part has grown. */
  add(from: number, reply: SweepReply): boolean {
    this.#early.set(from, reply);
    this.#feasible += reply.kept?.feasible ?? 0;
    const before = this.#part.doneTo;
    for (;;) {
      const following = this.#early.get(this.#part.doneTo);
      if (following === undefined) return this.#part.doneTo > before;
      this.#early.delete(this.#part.doneTo);
      this.#part = {
        chunk: mergeChunks(this.#part.chunk, following.chunk),
        doneTo: following.doneTo,
        kept: this.#withKept(following),
      };
    }
  }

  #withKept({ kept: piece }: SweepReply): KeptSections | null {
    const { kept } = this.#part;
    const isRoom = this.#room !== null && this.#feasible <= this.#room.sections;
    if (kept === null || piece === null || piece.frame === null || !isRoom) return null;
    return {
      feasible: kept.feasible + piece.feasible,
      frames: piece.feasible === 0 ? kept.frames : [...kept.frames, piece.frame],
      nearMisses: mergeNearMisses(kept.nearMisses, piece.nearMisses),
    };
  }
}

function chunkSizeFor(sectionCount: number, threads: number, { basis }: SweepProblem): number {
  const wanted = Math.ceil(sectionCount / (threads * CHUNKS_PER_THREAD));
  const largest = isCurveMeasure(basis) ? LARGEST_CURVE_CHUNK : LARGEST_CHUNK;
  return Math.min(largest, Math.max(SMALLEST_CHUNK, wanted));
}
