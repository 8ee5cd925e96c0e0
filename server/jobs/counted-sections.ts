import { sql, type SQL } from 'drizzle-orm';
import type { RunMethod } from '#shared/sweep/run-method.ts';
import { runViews } from '../db/schema/run-views.ts';
import { runs } from '../db/schema/runs.ts';

/**
 * What a search by bounds counts for against the limits on what may be under way. It evaluates some ten thousandth of its
 * space, and nobody knows beforehand how much: this is some ten seconds of sweeping, which is what most searches take.
 */
const COUNTED_BY_BOUNDS = 40_000_000;

/** Sections of work that a run not begun yet stands for. */
export const countedSections = ({
  method,
  sectionCount,
}: {
  method: RunMethod;
  sectionCount: number;
}): number => (method === 'bounds' ? Math.min(sectionCount, COUNTED_BY_BOUNDS) : sectionCount);

/** The same of a view under way: what is left of it. */
export const COUNTED_LEFT: SQL = sql`case when ${runs.method} = 'bounds'
  then greatest(0, least(${runs.sectionCount}, ${COUNTED_BY_BOUNDS}::bigint) - ${runViews.evaluated})
  else ${runs.sectionCount} - ${runViews.evaluated} end`;
