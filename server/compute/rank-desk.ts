import { Piscina } from 'piscina';
import { emptyChunk, type ChunkResult } from '#shared/sweep/chunk.ts';
import { framePlaces, type FramePlace } from '#shared/sweep/feasible-frame.ts';
import { mergeChunks } from '#shared/sweep/merge.ts';
import { mergeNearMisses, noNearMisses, type NearMisses } from '#shared/sweep/near-misses.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import { isAhead } from '#shared/sweep/rate-watch.ts';
import type {
  BlockPart,
  JudgeReply,
  JudgeTask,
  RankReply,
  RankTask,
  TakeReply,
  TakeTask,
} from './rank-protocol.ts';
import { resolveWorkerFile } from './worker-file.ts';

type WithoutPart<T> = Omit<T, 'kind' | 'part'>;

interface KeptBlock {
  readonly block: SharedArrayBuffer;
  readonly frames: readonly FramePlace[];
}

/** All that a run kept, in memory that threads share. */
export interface KeptRun extends KeptBlock {
  readonly counted: ChunkResult;
  readonly nearMisses: NearMisses;
}

/**
 * Ranks kept sections on threads of its own: whoever waits for an answer neither waits behind a sweep's chunk nor holds up
 * the thread that answers, and, since sweeps are nicer, gets the processor first.
 */
export interface RankDesk {
  rank(kept: KeptBlock, task: WithoutPart<RankTask>): Promise<RankReply>;
  take(kept: KeptBlock, task: WithoutPart<TakeTask>): Promise<readonly TakeReply[]>;
  /** The sections of a small space judged anew. */
  judge(problem: SweepProblem, whole: { readonly view: View; readonly sections: number }): Promise<KeptRun>;
  close(): Promise<void>;
}

/** A thread stands ready for the first who asks; more come and go. */
const IDLE_MS = 60_000;
/** Sections that are worth a thread of their own: some 5 ms. */
const LEAST_PART = 2 ** 16;
/** So that a thread that begins late leaves the others little to wait for. */
const JUDGED_PARTS_PER_THREAD = 4;

export async function startRankDesk(threads: number): Promise<RankDesk> {
  const piscina = new Piscina<RankTask | TakeTask | JudgeTask, RankReply | TakeReply | JudgeReply>({
    filename: await resolveWorkerFile('rank-worker'),
    minThreads: 1,
    maxThreads: threads,
    concurrentTasksPerWorker: 1,
    idleTimeout: IDLE_MS,
  });
  return {
    rank: async (kept, task) => {
      const parts = partsOf(kept, threads);
      const replies = await Promise.all(
        parts.map((part) => piscina.run({ ...task, kind: 'rank', part }) as Promise<RankReply>),
      );
      return replies.reduce(joinReplies);
    },
    take: (kept, task) =>
      Promise.all(
        partsOf(kept, threads).map(
          (part) => piscina.run({ ...task, kind: 'take', part }) as Promise<TakeReply>,
        ),
      ),
    judge: async (problem, { view, sections }) => {
      const size = Math.max(LEAST_PART, Math.ceil(sections / (threads * JUDGED_PARTS_PER_THREAD)));
      const starts = Array.from({ length: Math.ceil(sections / size) }, (_, i) => i * size);
      const replies = await Promise.all(
        starts.map((from) => {
          const to = Math.min(from + size, sections);
          return piscina.run({ kind: 'judge', problem, view, from, to }) as Promise<JudgeReply>;
        }),
      );
      return joinJudged(replies);
    },
    close: () => piscina.destroy(),
  };
}

/** Neighbouring frames, about as many sections in each part; one part at least, also of nothing. */
function partsOf({ block, frames }: KeptBlock, threads: number): BlockPart[] {
  const total = frames.reduce((sum, { count }) => sum + count, 0);
  const size = Math.max(LEAST_PART, Math.ceil(total / threads));
  const parts: { from: number; to: number; count: number }[] = [];
  for (const { from, to, count } of frames) {
    const last = parts.at(-1);
    // Half a frame over is nearer than half a frame under.
    if (last !== undefined && last.count + count / 2 <= size) {
      last.to = to;
      last.count += count;
    } else parts.push({ from, to, count });
  }
  if (parts.length === 0) parts.push({ from: 0, to: 0, count: 0 });
  return parts.map(({ from, to }) => ({ block, from, to }));
}

function joinReplies(a: RankReply, b: RankReply): RankReply {
  return {
    chunk: mergeChunks(a.chunk, b.chunk),
    count: a.count + b.count,
    near: joined(a.near, b.near),
    winner: b.winner !== null && isAhead(b.winner.own, b.winner.index, a.winner) ? b.winner : a.winner,
  };
}

function joined(a: Float64Array, b: Float64Array): Float64Array {
  const all = new Float64Array(a.length + b.length);
  all.set(a);
  all.set(b, a.length);
  return all;
}

function joinJudged(replies: readonly JudgeReply[]): KeptRun {
  const block = new SharedArrayBuffer(replies.reduce((sum, { frame }) => sum + frame.length, 0));
  const bytes = new Uint8Array(block);
  let at = 0;
  for (const { frame } of replies) {
    bytes.set(frame, at);
    at += frame.length;
  }
  return {
    block,
    frames: framePlaces(bytes),
    counted: replies.map(({ chunk }) => chunk).reduce(mergeChunks, emptyChunk()),
    nearMisses: replies.map((reply) => reply.nearMisses).reduce(mergeNearMisses, noNearMisses()),
  };
}
