import type { Ranking } from '#shared/contract/ranking.ts';
import { MEASURE_DIRECTION } from '#shared/engine/measures.ts';
import { formatDuration, formatWhole } from '#shared/print/format-quantity.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import { measureText } from './measure-text.ts';
import { percentText } from './asked-rates.ts';

/** Whether the section that leads at the run's own rates still leads, and else what it gives away. */
export function winnerWords(ranking: Ranking, reader: MeasureReader): string {
  const { result, runWinner, isSameWinner } = ranking;
  const best = result.front[0];
  if (best === undefined || runWinner === null) return 'No section meets every listed check.';
  const { x } = result.view;
  if (isSameWinner) return 'The same section comes first as at the run’s own rates.';
  const theirs = runWinner.atTheseRates.x;
  const values = `${measureText(x, theirs, reader)} against ${measureText(x, best.x, reader)}`;
  const away =
    ((MEASURE_DIRECTION[x] === 'less' ? theirs - best.x : best.x - theirs) / Math.abs(best.x)) * 100;
  if (!(away > 0)) return 'Another section comes first, level with the one that led at the run’s own rates.';
  return `Another section comes first. The one that led at the run’s own rates: ${values}, ${percentText(away)}.`;
}

/** What stands in the proof line's place: that this is worked out, and from what. */
export const rankedClaim = ({ count, tookMs }: Ranking): string =>
  `${formatWhole(count)} ${count === 1 ? 'section' : 'sections'} ranked anew in ${formatDuration(tookMs)}, not the run’s own record`;
