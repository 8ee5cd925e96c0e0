import { sql } from 'drizzle-orm';
import {
  bigint,
  check,
  doublePrecision,
  index,
  integer,
  pgTable,
  text,
  timestamp,
  uuid,
} from 'drizzle-orm/pg-core';
import { PROCESS_ENDS, PROCESS_KINDS } from '#shared/contract/operations.ts';
import { oneOf } from './one-of.ts';

/** Every process that takes jobs, while it lives and for a while after. Clocks are the database's. */
export const workerProcesses = pgTable(
  'worker_processes',
  {
    id: uuid().primaryKey(),
    /** The service with its built-in worker, or a worker alone. */
    kind: text({ enum: PROCESS_KINDS }).notNull(),
    host: text().notNull(),
    pid: integer().notNull(),
    threads: integer().notNull(),
    engineVersion: text('engine_version').notNull(),
    /** Names under which its jobs are locked in the queue. */
    queueWorkerIds: text('queue_worker_ids').array().notNull().default([]),
    sectionsDone: bigint('sections_done', { mode: 'number' }).notNull().default(0),
    shardsDone: integer('shards_done').notNull().default(0),
    shardsFailed: integer('shards_failed').notNull().default(0),
    /** Over the last few seconds. */
    sectionsPerSecond: doublePrecision('sections_per_second').notNull().default(0),
    startedAt: timestamp('started_at', { withTimezone: true }).notNull().defaultNow(),
    heartbeatAt: timestamp('heartbeat_at', { withTimezone: true }).notNull().defaultNow(),
    endedAt: timestamp('ended_at', { withTimezone: true }),
    /** Stopped in order, or lost: its heart stands still or its connection is gone. */
    end: text({ enum: PROCESS_ENDS }),
  },
  (t) => [
    index('worker_processes_live_idx')
      .on(t.heartbeatAt)
      .where(sql`${t.endedAt} is null`),
    check('worker_processes_kind_check', oneOf(t.kind, PROCESS_KINDS)),
    check('worker_processes_end_check', sql`(${t.end} is null) = (${t.endedAt} is null)`),
    check('worker_processes_end_kind_check', oneOf(t.end, PROCESS_ENDS)),
  ],
);
