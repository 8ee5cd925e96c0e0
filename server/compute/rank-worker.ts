import { amountTables, type AmountTables } from '#shared/sweep/amount-tables.ts';
import { decodeFrames } from '#shared/sweep/feasible-frame.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import { hasFilters } from '#shared/sweep/range-filters.ts';
import { rankKept } from '#shared/sweep/rank-kept.ts';
import { RateWatch } from '#shared/sweep/rate-watch.ts';
import { RowFilter } from '#shared/sweep/row-filter.ts';
import { takeOverFrame } from '#shared/sweep/take-over.ts';
import { openSweep } from '#shared/sweep/sweep-range.ts';
import type {
  BlockPart,
  JudgeReply,
  JudgeTask,
  RankReply,
  RankTask,
  TakeReply,
  TakeTask,
} from './rank-protocol.ts';

const framesOf = ({ block, from, to }: BlockPart) => decodeFrames(new Uint8Array(block, from, to - from));

/** Entry point of a thread that ranks kept sections. */
export default function work(task: RankTask | TakeTask | JudgeTask): RankReply | TakeReply | JudgeReply {
  if (task.kind === 'judge') return judge(task);
  return task.kind === 'rank' ? rank(task) : take(task);
}

function judge({ problem, view, from, to }: JudgeTask): JudgeReply {
  const steps = openSweep(prepareSweep(problem, view), { keeping: { hasNumbers: true } });
  steps.advance(from, to);
  const { frame, nearMisses } = steps.kept()!;
  if (frame === null) throw new RangeError('The sections have more spacings than can be kept');
  return { chunk: steps.finish(), frame, nearMisses };
}

function rank({ part, problem, view, rates, filters, isCompared }: RankTask): RankReply {
  const frames = framesOf(part);
  const tables = amountTables(problem);
  const most = frames.reduce((sum, { count }) => sum + count, 0);
  const watch = isCompared ? new RateWatch(tables, view, { rates: problem.basis.rates, most }) : null;
  const filter = hasFilters(filters) ? new RowFilter(filters, tables.space, problem.basis.barStandard) : null;
  const ranking = { tables, view, rates, muNmm: problem.demand.muNmm, filter, witness: watch };
  const atRates = { ...problem, basis: { ...problem.basis, rates } };
  const chunk = rankKept(frames, ranking, () => prepareSweep(atRates, view));
  return {
    chunk,
    count: watch?.count ?? 0,
    near: watch?.near() ?? new Float64Array(0),
    winner: watch?.winner ?? null,
  };
}

function take({ part, problem, view, widening }: TakeTask): TakeReply {
  const tables: AmountTables = amountTables(problem);
  const taken = framesOf(part).map((frame) => takeOverFrame(frame, widening, tables.space));
  const isKept = taken.every((bytes) => bytes !== null);
  if (!isKept) throw new RangeError('Sections that were kept once cannot be kept in a wider space');
  const block = Buffer.concat(taken);
  const frames = decodeFrames(new Uint8Array(block.buffer, block.byteOffset, block.length));
  const ranking = {
    tables,
    view,
    rates: problem.basis.rates,
    muNmm: problem.demand.muNmm,
    filter: null,
    witness: null,
  };
  return {
    chunk: rankKept(frames, ranking, () => prepareSweep(problem, view)),
    frames: new Uint8Array(block),
    count: frames.reduce((sum, { count }) => sum + count, 0),
  };
}
