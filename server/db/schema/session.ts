import { index, json, pgTable, timestamp, varchar } from 'drizzle-orm/pg-core';

/** The table connect-pg-simple reads and writes; its columns are the ones that package expects. */
export const session = pgTable(
  'session',
  {
    sid: varchar().primaryKey(),
    sess: json().notNull(),
    expire: timestamp({ precision: 6 }).notNull(),
  },
  (t) => [index('session_expire_idx').on(t.expire)],
);
