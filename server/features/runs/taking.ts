import { and, desc, eq, lt } from 'drizzle-orm';
import type { Run } from '#shared/contract/records.ts';
import { ENGINE_VERSION } from '#shared/engine/version.ts';
import type { SweepProblem } from '#shared/sweep/problem.ts';
import { wideningOf } from '#shared/sweep/widening.ts';
import type { Database } from '../../db/client.ts';
import { runs } from '../../db/schema/runs.ts';
import { takenSections } from '../../db/schema/taken-sections.ts';
import { isKeptWhole } from '../../jobs/kept-sections.ts';

/** Earlier runs of the sweep that are looked at, the largest first: each is read with its definition. */
const MOST_LOOKED_AT = 8;

interface WideningRun {
  readonly id: string;
  readonly sweepId: string;
  readonly sectionCount: number;
  readonly problem: SweepProblem;
}

/** What a run took over from an earlier one. */
export async function findTaken(db: Database, runId: string): Promise<Run['taken']> {
  const [taken] = await db
    .select({ runId: runs.id, number: runs.number, sections: takenSections.sections })
    .from(takenSections)
    .innerJoin(runs, eq(runs.id, takenSections.fromRunId))
    .where(eq(takenSections.runId, runId));
  return taken ?? null;
}

/**
 * Notes the largest finished run of the sweep whose every section the new run has too, on the same basis, rates, demand and
 * rules, if it kept what it found: its sections are then taken over instead of computed again. A run with nothing new is
 * none of these: whoever runs the same again wants to see it repeat.
 */
export async function takeFromEarlierRun(
  tx: Database,
  { id, sweepId, sectionCount, problem }: WideningRun,
): Promise<void> {
  const earlier = await tx
    .select({
      id: runs.id,
      definition: runs.definition,
      basis: runs.basis,
      sections: runs.sectionCount,
    })
    .from(runs)
    .where(
      and(
        eq(runs.sweepId, sweepId),
        eq(runs.state, 'finished'),
        eq(runs.method, 'every-section'),
        eq(runs.engineVersion, ENGINE_VERSION),
        lt(runs.sectionCount, sectionCount),
      ),
    )
    .orderBy(desc(runs.sectionCount), desc(runs.number))
    .limit(MOST_LOOKED_AT);
  for (const { id: fromRunId, definition, basis, sections } of earlier) {
    const { space, demand, rules } = definition;
    if (wideningOf({ space, demand, rules, basis }, problem) === null) continue;
    if (!(await isKeptWhole(tx, fromRunId))) continue;
    await tx.insert(takenSections).values({ runId: id, fromRunId, sections });
    return;
  }
}
