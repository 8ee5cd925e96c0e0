import { eq } from 'drizzle-orm';
import { isSameView, type SweepProblem } from '#shared/sweep/problem.ts';
import { mergeChunks } from '#shared/sweep/merge.ts';
import { renumberNearMisses } from '#shared/sweep/near-misses.ts';
import { chunkOfView } from '#shared/sweep/rank-kept.ts';
import { expandSpace } from '#shared/sweep/space.ts';
import { takeOverCounts } from '#shared/sweep/take-over.ts';
import { renumbering, wideningOf, type Widening } from '#shared/sweep/widening.ts';
import { sweepInChunks, type SweptPart } from '../../compute/sweep-in-chunks.ts';
import type { Database } from '../../db/client.ts';
import { runs } from '../../db/schema/runs.ts';
import { takenSections } from '../../db/schema/taken-sections.ts';
import { findKeepRoom } from '../kept-sections.ts';
import type { ClaimedShard } from './claim-shard.ts';
import type { WorkContext } from './context.ts';

interface ShardWork {
  readonly shard: ClaimedShard;
  readonly cancelFlag: Int32Array;
  readonly onProgress: (part: SweptPart) => void;
}

type Context = Pick<WorkContext, 'db' | 'compute' | 'rankDesk' | 'keptShelf'>;

/**
 * Does a shard's work in the cheapest way that gives its result: taken over from another run, ranked from what the run
 * kept, or swept.
 */
export async function workOnShard(work: ShardWork, context: Context): Promise<SweptPart> {
  const { shard } = work;
  if (!isSameView(shard.view, shard.ownView)) {
    const isWhole = shard.from === 0 && shard.to === shard.sectionCount;
    const ranked = isWhole ? await rankShard(shard, context) : null;
    return ranked ?? sweep(work, context, { widening: null, keepRoom: null });
  }
  const taking = await findTaking(context.db, shard);
  if (taking !== null && shard.from >= taking.widening.added) return takeOver(shard, taking, context);
  const keepRoom = await findKeepRoom(context.db, shard.runId);
  return sweep(work, context, { widening: taking?.widening ?? null, keepRoom });
}

const sweep = (
  { shard: { viewId, problem, view, from, to }, cancelFlag, onProgress }: ShardWork,
  { compute }: Context,
  options: Pick<Parameters<typeof sweepInChunks>[0], 'widening' | 'keepRoom'>,
): Promise<SweptPart> =>
  sweepInChunks({ pool: compute, key: viewId, problem, view, from, to, cancelFlag, onProgress, ...options });

/** Null where the run kept too little for this view. */
async function rankShard(
  { runId, problem, view, to }: ClaimedShard,
  { rankDesk, keptShelf }: Context,
): Promise<SweptPart | null> {
  const kept = await keptShelf.find(runId);
  if (kept === null) return null;
  const { rates } = problem.basis;
  const { chunk: ranked } = await rankDesk.rank(kept, {
    problem,
    view,
    rates,
    filters: {},
    isCompared: false,
  });
  const chunk = chunkOfView(kept, ranked, view);
  return chunk && { chunk, doneTo: to, kept: null };
}

interface Taking {
  readonly fromRunId: string;
  readonly widening: Widening;
}

async function findTaking(
  db: Database,
  { runId, problem }: { readonly runId: string; readonly problem: SweepProblem },
): Promise<Taking | null> {
  const [from] = await db
    .select({ fromRunId: runs.id, definition: runs.definition, basis: runs.basis })
    .from(takenSections)
    .innerJoin(runs, eq(runs.id, takenSections.fromRunId))
    .where(eq(takenSections.runId, runId));
  if (from === undefined) return null;
  const { space, demand, rules } = from.definition;
  const widening = wideningOf({ space, demand, rules, basis: from.basis }, problem);
  if (widening === null) throw new Error(`Run ${runId} is no widening of the run it takes sections from`);
  return { fromRunId: from.fromRunId, widening };
}

async function takeOver(
  { problem, view, to }: ClaimedShard,
  { fromRunId, widening }: Taking,
  { rankDesk, keptShelf }: Context,
): Promise<SweptPart> {
  const from = await keptShelf.find(fromRunId);
  if (from === null) throw new Error(`What run ${fromRunId} kept is gone`);
  const replies = await rankDesk.take(from, { problem, view, widening });
  const space = expandSpace(problem.space, problem.basis.barStandard);
  const nearMisses = renumberNearMisses(from.nearMisses, renumbering(widening, space));
  const counted = takeOverCounts(from.counted, widening, space);
  const ranked = replies.map((reply) => reply.chunk).reduce(mergeChunks);
  const chunk = chunkOfView({ counted, nearMisses }, ranked, view);
  if (chunk === null) throw new Error('The nearest misses that were kept do not serve this view');
  const frames = replies.map((reply) => reply.frames);
  const feasible = replies.reduce((sum, reply) => sum + reply.count, 0);
  return { chunk, doneTo: to, kept: { feasible, frames, nearMisses } };
}
