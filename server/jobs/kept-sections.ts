import { eq, sql } from 'drizzle-orm';
import type { ChunkResult } from '#shared/sweep/chunk.ts';
import { chunkToBytes } from '../compute/chunk-bytes.ts';
import { nearMissesToBytes } from '../compute/near-miss-bytes.ts';
import type { KeepRoom, KeptSections } from '../compute/sweep-in-chunks.ts';
import type { Database } from '../db/client.ts';
import { keptSections } from '../db/schema/kept-sections.ts';
import type { SectionRange } from './plan-shards.ts';

/** Sections a run keeps for other views at most: about a byte each. With more, views are computed from the space. */
const MOST_KEPT = 2 ** 25;
/** So many of them keep μφ and strength, 16 bytes more; of the others the hot loop works them out again. */
const MOST_WITH_NUMBERS = 2 ** 20;
/** What all runs keep; the oldest go first. */
const MOST_BYTES = 2 ** 31;

/** Room for what a piece of a run's own view finds; null where there is none. */
export async function findKeepRoom(db: Database, runId: string): Promise<KeepRoom | null> {
  const [row] = await db
    .select({ feasible: sql<string>`coalesce(sum(${keptSections.feasible}), 0)` })
    .from(keptSections)
    .where(eq(keptSections.runId, runId));
  const feasible = Number(row!.feasible);
  if (feasible >= MOST_KEPT) return null;
  return { sections: MOST_KEPT - feasible, numbers: Math.max(0, MOST_WITH_NUMBERS - feasible) };
}

interface KeptPart {
  readonly runId: string;
  readonly range: SectionRange;
  readonly chunk: ChunkResult;
  readonly kept: KeptSections;
}

/** Writes what a piece found, for other views. Once: pieces do not overlap, and the first that is written stays. */
export async function keepSections(db: Database, { runId, range, chunk, kept }: KeptPart): Promise<void> {
  await db
    .insert(keptSections)
    .values({
      runId,
      fromPlace: range.from,
      toPlace: range.to,
      feasible: kept.feasible,
      frames: Buffer.concat(kept.frames),
      counted: chunkToBytes(chunk),
      nearMisses: nearMissesToBytes(kept.nearMisses),
    })
    .onConflictDoNothing();
  await makeRoom(db, MOST_BYTES);
}

/** Whether what the run kept covers all its sections. */
export async function isKeptWhole(db: Database, runId: string): Promise<boolean> {
  const { rows } = await db.execute<{ whole: boolean }>(sql`
    select coalesce(sum(to_place - from_place), -1) = (select section_count from runs where id = ${runId}) as whole
    from kept_sections where run_id = ${runId}`);
  return rows[0]?.whole === true;
}

/** Takes out what the oldest runs kept beyond so many bytes, but for what an unfinished run is to take over. */
export async function makeRoom(db: Database, mostBytes: number): Promise<void> {
  await db.execute(sql`
    with sized as (
      select run_id, sum(octet_length(frames)) as bytes from kept_sections group by run_id
    ), newest_first as (
      select run_id, sum(bytes) over (order by runs.created_at desc, run_id) as upto
      from sized join runs on runs.id = run_id
    )
    delete from kept_sections kept where run_id in (select run_id from newest_first where upto > ${mostBytes})
      and not exists (
        select from taken_sections taken join runs on runs.id = taken.run_id
        where taken.from_run_id = kept.run_id and runs.state <> 'finished')`);
}
