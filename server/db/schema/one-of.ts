import { sql, type AnyColumn, type SQL } from 'drizzle-orm';

/** The condition that a text column holds one of a closed vocabulary, for a CHECK constraint. */
export function oneOf(column: AnyColumn, values: readonly string[]): SQL {
  const list = values.map((value) => `'${value.replaceAll("'", "''")}'`).join(', ');
  return sql`${column} in (${sql.raw(list)})`;
}
