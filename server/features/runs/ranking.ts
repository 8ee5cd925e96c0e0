import type { Person } from '#shared/contract/records.ts';
import type { Ranking, RankingInput } from '#shared/contract/ranking.ts';
import { isCurveMeasure } from '#shared/engine/curve-basis.ts';
import type { Rates } from '#shared/engine/section.ts';
import { ENGINE_VERSION } from '#shared/engine/version.ts';
import { BAND_SHARE } from '#shared/sweep/band.ts';
import { emptyChunk, type ChunkResult } from '#shared/sweep/chunk.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import { changedRates } from '#shared/sweep/rate-changes.ts';
import type { RangeFilters } from '#shared/sweep/range-filters.ts';
import { signOf } from '#shared/sweep/tally.ts';
import { ratesSchema } from '#shared/contract/design-basis.ts';
import type { KeptRun } from '../../compute/rank-desk.ts';
import type { RankReply } from '../../compute/rank-protocol.ts';
import type { Deps } from '../../deps.ts';
import { conflict, forbidden, invalidInput } from '../../errors.ts';
import { canSeeRates } from '../../http/project-access.ts';
import { findMissingInputs } from './available-measures.ts';
import type { RunRecord } from './queries.ts';

/** Sections of a run that kept none are judged anew for the ranking where that takes a second at most. */
const MOST_JUDGED_ANEW = 2 ** 22;

type RankDeps = Pick<Deps, 'rankDesk' | 'keptShelf'>;

/** Ranks a run's sections at other rates, in any view, within any ranges; nothing of it is stored. */
export async function rankRun(
  { rankDesk, keptShelf }: RankDeps,
  person: Person,
  { record, input }: { record: RunRecord; input: RankingInput },
): Promise<Omit<Ranking, 'rates'> & { readonly rates: Rates | null }> {
  if (!canSeeRates(person)) throw forbidden(`Your role (${person.role}) may not see rates`);
  const startedAt = performance.now();
  const problem = problemOf(record);
  const rates = ratesAskedFor(record, input);
  const { view } = input;
  const missing = findMissingInputs(view, {
    problem: { ...problem, basis: { ...problem.basis, rates } },
    units: record.project.designBasis.units,
    path: ['view'],
  });
  if (missing.length > 0) throw invalidInput(missing);
  const kept = await findSections({ rankDesk, keptShelf }, record, problem);
  const filters: RangeFilters = input.filters;
  const reply = await rankDesk.rank(kept, { problem, view, rates, filters, isCompared: true });
  const result = finishResult(problem, view, chunkOfRanking(kept.counted, reply.chunk));
  return {
    rates,
    result,
    count: reply.count,
    ...comparedWithRun(reply, view, input.bandShare),
    tookMs: performance.now() - startedAt,
  };
}

function problemOf({ run }: RunRecord): SweepProblem {
  const { space, demand, rules } = run.definition;
  return { space, demand, rules, basis: run.basis };
}

function ratesAskedFor(
  { run, project }: RunRecord,
  { rates: { base, changes } }: RankingInput,
): Rates | null {
  const today = project.priceBook && ratesSchema.parse(project.priceBook);
  const rates = base === 'run' ? run.basis.rates : today;
  if (rates === null && base === 'today')
    throw invalidInput([{ path: ['rates', 'base'], message: 'The project has no price book' }]);
  return rates && changedRates(rates, changes);
}

/** What the run kept; of a small run that kept nothing, its sections judged anew. */
async function findSections(
  { rankDesk, keptShelf }: RankDeps,
  { run }: RunRecord,
  problem: SweepProblem,
): Promise<KeptRun> {
  if (run.state !== 'finished')
    throw conflict('The run has not finished: its sections are not all known yet');
  if (run.engineVersion !== ENGINE_VERSION)
    throw conflict(
      `The run was computed by engine ${run.engineVersion}; the engine is ${ENGINE_VERSION} by now. Start a new run.`,
    );
  const kept = await keptShelf.find(run.id);
  if (kept !== null) return kept;
  if (run.method === 'bounds' || run.sectionCount > MOST_JUDGED_ANEW || isCurveMeasure(problem.basis))
    throw conflict('The sections of this run are not kept. Start a new run at these rates.');
  const judged = await rankDesk.judge(problem, { view: run.definition.view, sections: run.sectionCount });
  keptShelf.hold(run.id, judged);
  return judged;
}

/** What was counted does not depend on rates; sections best without a check were found at the run's own, so they are left out. */
function chunkOfRanking(counted: ChunkResult, ranked: ChunkResult): ChunkResult {
  const { withoutX, withoutY, withoutIndex } = emptyChunk();
  return {
    ...counted,
    ...{ withoutX, withoutY, withoutIndex },
    bestValue: ranked.bestValue,
    bestIndex: ranked.bestIndex,
    front: ranked.front,
    frontInThree: ranked.frontInThree,
    band: ranked.band,
    density: ranked.density,
  };
}

function comparedWithRun(
  { chunk, near, winner }: RankReply,
  view: View,
  bandShare: number,
): Pick<Ranking, 'bandCount' | 'runWinner' | 'isSameWinner'> {
  const best = chunk.front[0]?.x ?? Infinity;
  const limit = best + Math.min(bandShare, BAND_SHARE) * Math.abs(best);
  const [x, y] = [signOf(view.x), signOf(view.y)];
  return {
    bandCount: near.reduce((count, value) => (value <= limit ? count + 1 : count), 0),
    runWinner: winner && {
      index: winner.index,
      atRunRates: { x: x * winner.own.x, y: y * winner.own.y },
      atTheseRates: { x: x * winner.asked.x, y: y * winner.asked.y },
    },
    isSameWinner: winner !== null && winner.index === chunk.front[0]?.ties[0],
  };
}
