import { pgTable, text, timestamp } from 'drizzle-orm/pg-core';

/** Heartbeats of the queue's workers: the jobs of one that fell silent are unlocked, see server/jobs. */
export const jobWorkers = pgTable('job_workers', {
  id: text().primaryKey(),
  startedAt: timestamp('started_at', { withTimezone: true }).notNull().defaultNow(),
  heartbeatAt: timestamp('heartbeat_at', { withTimezone: true }).notNull().defaultNow(),
});
