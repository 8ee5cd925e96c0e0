import { setTimeout as delay } from 'node:timers/promises';
import { isDatabaseAway } from '../../db/database-error.ts';

/** A restart of the database takes seconds; what was computed is worth the wait. */
const ATTEMPTS = 20;
const RETRY_MS = 500;

/** Writes, and tries again for a while when the database is away. What it writes must be alike when written twice. */
export async function persistently<T>(write: () => Promise<T>): Promise<T> {
  for (let attempt = 1; ; attempt++) {
    try {
      return await write();
    } catch (error) {
      if (!isDatabaseAway(error) || attempt === ATTEMPTS) throw error;
      await delay(RETRY_MS);
    }
  }
}
