import bcrypt from 'bcryptjs';
import { sql } from 'drizzle-orm';
import { startComputePool } from '../compute/pool.ts';
import { readConfig } from '../config.ts';
import { createDatabase, createPool, type Database } from '../db/client.ts';
import { people } from '../db/schema/people.ts';
import { computeDemoRuns } from '../demo/office.ts';
import { writeOffice } from '../demo/write-office.ts';
import { createLog } from '../log.ts';
import { DEMO_PASSWORD } from './demo-accounts.mjs';

/** Any number will do as long as nothing else in this database locks it. */
const SEED_LOCK = 72_710_217;

const config = readConfig();
const pool = createPool(config.databaseUrl, createLog(config.logLevel));
try {
  const db = createDatabase(pool);
  if (await isEmpty(db)) await seed(db);
} finally {
  await pool.end();
}

/** A database in which anybody has an account is somebody's own. */
async function isEmpty(db: Database): Promise<boolean> {
  return (await db.$count(people)) === 0;
}

async function seed(db: Database): Promise<void> {
  const compute = await startComputePool(config.computeThreads);
  try {
    const [demoRuns, passwordHash] = await Promise.all([
      computeDemoRuns(compute),
      bcrypt.hash(DEMO_PASSWORD, config.passwordCost),
    ]);
    await db.transaction(async (tx) => {
      // Two services may start at once on an empty database.
      await tx.execute(sql`select pg_advisory_xact_lock(${SEED_LOCK})`);
      if (await isEmpty(tx)) await writeOffice(tx, { passwordHash, demoRuns });
    });
  } finally {
    await compute.close();
  }
}
