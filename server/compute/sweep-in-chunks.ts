import type { ChunkResult } from '#shared/sweep/chunk.ts';
import { emptyChunk } from '#shared/sweep/chunk.ts';
import { mergeChunks } from '#shared/sweep/merge.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import type { ComputePool } from './pool.ts';

/** About 50 ms of work: enough to make the 0.1 ms of a task's way to a thread vanish, little enough to take turns. */
const LARGEST_CHUNK = 2 ** 18;
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
  readonly sectionCount: number;
  /** Shared with the threads: set its cell to stop all chunks after their batch. */
  readonly cancelFlag: Int32Array;
  readonly chunkSections?: number;
  readonly onProgress?: (merged: ChunkResult, evaluated: number) => void;
}

/** What is merged when it ended: everything, or the part done before the cancel flag was set. */
export interface ChunkedSweepResult {
  readonly chunk: ChunkResult;
  readonly evaluated: number;
}

export function createCancelFlag(): Int32Array {
  return new Int32Array(new SharedArrayBuffer(Int32Array.BYTES_PER_ELEMENT));
}

/** Sweeps the whole space on the pool. The result does not depend on the threads, the chunks or their order. */
export async function sweepInChunks(sweep: ChunkedSweep): Promise<ChunkedSweepResult> {
  const { pool, key, problem, view, sectionCount, cancelFlag, onProgress } = sweep;
  const chunkSections = sweep.chunkSections ?? chunkSizeFor(sectionCount, pool.threads);
  let merged = emptyChunk();
  let evaluated = 0;
  let next = 0;
  const isStopped = () => Atomics.load(cancelFlag, 0) !== 0;

  async function takeChunks(): Promise<void> {
    while (next < sectionCount && !isStopped()) {
      const from = next;
      const to = Math.min(from + chunkSections, sectionCount);
      next = to;
      const reply = await pool.sweep({ key, problem, view, from, to, cancelFlag });
      merged = mergeChunks(merged, reply.chunk);
      evaluated += reply.doneTo - from;
      onProgress?.(merged, evaluated);
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
  return { chunk: merged, evaluated };
}

function chunkSizeFor(sectionCount: number, threads: number): number {
  const wanted = Math.ceil(sectionCount / (threads * CHUNKS_PER_THREAD));
  return Math.min(LARGEST_CHUNK, Math.max(SMALLEST_CHUNK, wanted));
}
