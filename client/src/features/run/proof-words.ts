import type { Run, RunState } from '#shared/contract/records.ts';
import type { BoundsProof, ViewResult } from '#shared/sweep/result.ts';
import { formatWhole } from '#shared/print/format-quantity.ts';

const sections = (count: number) => `${formatWhole(count)} ${count === 1 ? 'section' : 'sections'}`;

/** What the front rests on where every section is evaluated, or those that were before somebody stopped it. */
function evaluatedClaim({ front, evaluated, sectionCount }: ViewResult, isWhole: boolean): string {
  const count = formatWhole(evaluated);
  if (front.length === 0) return `${count} sections evaluated, none meets every check`;
  return isWhole
    ? `${sections(evaluated)} evaluated, none better than the front`
    : `${count} of ${formatWhole(sectionCount)} evaluated, none of these better than the front`;
}

/** The same for a search by bounds: what was evaluated, and what need not have been. */
function boundsClaim({ front, evaluated, sectionCount, bounds }: ViewResult): string {
  const whole = sections(sectionCount);
  const looked = evaluated === 0 ? 'none evaluated yet' : `${formatWhole(evaluated)} evaluated`;
  if (bounds?.isProven !== true)
    return front.length === 0
      ? `${whole}; ${looked}${evaluated === 0 ? '' : ', none of these meets every check'}; the rest not settled`
      : `${whole}; ${looked}; front not proven, better ones may be left`;
  return front.length === 0
    ? `${whole}; ${looked}, the rest proven unable to meet every check: none does`
    : `${whole}; ${looked}, the rest proven unnecessary; none better than the front`;
}

/** The proof line's claim. */
export function proofClaim(result: ViewResult, state: RunState): string {
  return result.bounds === undefined ? evaluatedClaim(result, state === 'finished') : boundsClaim(result);
}

/** How many sections meet every check, or that nobody counted. */
export const feasibleClaim = ({ feasible }: ViewResult): string =>
  feasible === null
    ? 'sections that meet every check: not counted by bounds'
    : `${formatWhole(feasible)} meet every listed check`;

/** Which sections were not computed again, for they are another run's too; null where all were. */
export const takenClaim = ({ taken, sectionCount }: Pick<Run, 'taken' | 'sectionCount'>): string | null =>
  taken &&
  `${sections(taken.sections)} taken from run ${taken.number}, ${formatWhole(sectionCount - taken.sections)} new computed`;

/** What a chart of a run by bounds does not show. */
export function boundsWords({ isProven, hasBand }: BoundsProof): string {
  if (!isProven) return 'By bounds: front so far, no cloud';
  return hasBand
    ? 'By bounds: no cloud'
    : 'By bounds: no cloud, and no band of a measure that many sections share';
}
