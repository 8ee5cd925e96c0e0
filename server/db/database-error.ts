import { DrizzleQueryError } from 'drizzle-orm/errors';
import pg from 'pg';

const rootCause = (error: unknown): unknown =>
  error instanceof DrizzleQueryError ? rootCause(error.cause) : error;

function findDatabaseError(error: unknown): pg.DatabaseError | undefined {
  const cause = rootCause(error);
  return cause instanceof pg.DatabaseError ? cause : undefined;
}

/** Whether a write was refused by the UNIQUE constraint or unique index of that name. */
export const violatesUnique = (error: unknown, constraint: string): boolean => {
  const cause = findDatabaseError(error);
  return cause?.code === '23505' && cause.constraint === constraint;
};

/** Whether a row could not go, or not come, because of another table's reference. */
export const violatesReference = (error: unknown): boolean => findDatabaseError(error)?.code === '23503';

/** Whether a table or column is not there: the schema is older than this version, or not made yet. */
export const isSchemaBehind = (error: unknown): boolean =>
  ['42P01', '42703'].includes(findDatabaseError(error)?.code ?? '');

/** Shutting down, starting up, or all connections taken (PostgreSQL's manual, appendix A). */
const AWAY_STATES = ['57P01', '57P02', '57P03', '53300', '08000', '08003', '08006'];
const AWAY_ERRORS = ['ECONNREFUSED', 'ECONNRESET', 'EPIPE', 'ETIMEDOUT'];
// What pg says without a code when a connection breaks or none comes free in time.
const AWAY_MESSAGE =
  /^(Connection terminated|timeout exceeded when trying to connect|Client has encountered)/;

/** Whether the database cannot be reached, as opposed to having refused something. */
export function isDatabaseAway(error: unknown): boolean {
  const cause = rootCause(error);
  if (!(cause instanceof Error)) return false;
  const code = 'code' in cause ? String(cause.code) : '';
  return AWAY_STATES.includes(code) || AWAY_ERRORS.includes(code) || AWAY_MESSAGE.test(cause.message);
}
