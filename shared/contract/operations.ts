import { z } from 'zod';
import { RUN_METHODS } from '../sweep/run-method.ts';
import { idSchema } from './numbers.ts';

/** Who takes jobs: the service with its built-in worker, or a worker by itself. */
export const PROCESS_KINDS = ['service', 'worker'] as const;
export type ProcessKind = (typeof PROCESS_KINDS)[number];

/** How one ended: in order, or without a word. */
export const PROCESS_ENDS = ['stopped', 'lost'] as const;

const share = z.object({ sections: z.number(), limit: z.number() });

/** Sections under way, the reader's own and everybody's, and how many may be. */
export const runningLoadSchema = z.object({ own: share, office: share });
export type RunningLoad = z.infer<typeof runningLoadSchema>;

const timestamp = z.iso.datetime();

export const workerProcessSchema = z.object({
  id: idSchema,
  kind: z.enum(PROCESS_KINDS),
  host: z.string(),
  pid: z.number(),
  threads: z.number(),
  engineVersion: z.string(),
  startedAt: timestamp,
  /** Since its last heartbeat, by the database's clock. */
  silentMs: z.number(),
  end: z.enum(PROCESS_ENDS).nullable(),
  endedAt: timestamp.nullable(),
  sectionsDone: z.number(),
  shardsDone: z.number(),
  shardsFailed: z.number(),
  sectionsPerSecond: z.number(),
});
export type WorkerProcess = z.infer<typeof workerProcessSchema>;

/** What waits in the queue, by kind of job. */
export const QUEUE_KINDS = ['small-run', 'shard', 'bounds', 'merge'] as const;
export const queueKindSchema = z.object({
  kind: z.enum(QUEUE_KINDS),
  waiting: z.number(),
  running: z.number(),
  /** Tried as often as they may be. */
  failed: z.number(),
  oldestWaitingMs: z.number().nullable(),
});
export type QueueKind = z.infer<typeof queueKindSchema>;

const runOfProject = {
  runId: idSchema,
  projectId: idSchema,
  beamMark: z.string(),
  sweepName: z.string(),
  runNumber: z.number(),
};

/** A shard somebody has in work. */
export const runningShardSchema = z.object({
  ...runOfProject,
  viewId: idSchema,
  from: z.number(),
  to: z.number(),
  evaluated: z.number(),
  /** The process that holds it; null for one that is not known any more. */
  processId: idSchema.nullable(),
  heldMs: z.number().nullable(),
});
export type RunningShard = z.infer<typeof runningShardSchema>;

/** A view under way, of which any number of shards may be in work. */
export const viewUnderWaySchema = z.object({
  ...runOfProject,
  viewId: idSchema,
  startedBy: z.string(),
  state: z.enum(['queued', 'running']),
  isCancelling: z.boolean(),
  method: z.enum(RUN_METHODS),
  sectionCount: z.number(),
  evaluated: z.number(),
  /** Ruled out unseen, by bounds; else 0. */
  provenUnnecessary: z.number(),
  elapsedMs: z.number(),
  shards: z.number(),
  shardsDone: z.number(),
});
export type ViewUnderWay = z.infer<typeof viewUnderWaySchema>;

export const viewFailureSchema = z.object({
  ...runOfProject,
  viewId: idSchema,
  failedAt: timestamp,
  message: z.string(),
});
export type ViewFailure = z.infer<typeof viewFailureSchema>;

/** What the operator of the service sees of its work. */
export const operationsSchema = z.object({
  workers: z.array(workerProcessSchema),
  queue: z.array(queueKindSchema),
  shards: z.array(runningShardSchema),
  views: z.array(viewUnderWaySchema),
  /** Of the last week, the latest first. */
  failures: z.array(viewFailureSchema),
  load: runningLoadSchema.shape.office,
});
export type Operations = z.infer<typeof operationsSchema>;
