import { sql } from 'drizzle-orm';
import type { Person } from '#shared/contract/records.ts';
import type { RunningLimits } from '../../config.ts';
import type { Database } from '../../db/client.ts';
import { conflict } from '../../errors.ts';
import { readRunningLoad } from '../../jobs/running-load.ts';

/** Held while a run or a view is begun, so that two at once cannot both be the last one that fits. */
const LOAD_LOCK = 72_710_218;

const print = (count: number) => count.toLocaleString('en-US');

interface Addition {
  readonly person: Person;
  readonly limits: RunningLimits;
  /** Sections that come on top of those counted already. */
  readonly adding: number;
}

/** Whoever begins something takes turns from here to the end of the transaction. Before any run's row is locked. */
export async function takeTurn(tx: Database): Promise<void> {
  await tx.execute(sql`select pg_advisory_xact_lock(${LOAD_LOCK})`);
}

export async function refuseTooManySections(
  tx: Database,
  { person, limits, adding }: Addition,
): Promise<void> {
  await takeTurn(tx);
  const { own, office } = await readRunningLoad(tx, person.id, limits);
  if (own.sections + adding > own.limit)
    throw conflict(
      `You would have ${print(own.sections + adding)} sections under way; the limit for one person is ` +
        `${print(own.limit)}. Wait for some of your runs, or cancel them.`,
    );
  if (office.sections + adding > office.limit)
    throw conflict(
      `The office would have ${print(office.sections + adding)} sections under way; its limit is ` +
        `${print(office.limit)}. Wait for some of the runs.`,
    );
}
