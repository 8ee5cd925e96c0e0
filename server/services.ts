import type { ProcessKind } from '#shared/contract/operations.ts';
import { startBoundsDesk } from './compute/bounds-desk.ts';
import { startExportDesk } from './compute/export-desk.ts';
import { startPasswords } from './compute/passwords.ts';
import { startComputePool } from './compute/pool.ts';
import { startRankDesk, type RankDesk } from './compute/rank-desk.ts';
import { startSheetDesk } from './compute/sheet-desk.ts';
import type { Config, WorkerConfig } from './config.ts';
import { createDatabase, createPool, type Database } from './db/client.ts';
import type { Deps } from './deps.ts';
import { createSessionStore } from './http/session-store.ts';
import { KeptShelf } from './jobs/kept-shelf.ts';
import { Queue } from './jobs/queue.ts';
import { RunEvents } from './jobs/run-events.ts';
import { WorkTally } from './jobs/work-tally.ts';
import { createTasks } from './jobs/worker/tasks.ts';
import { WorkerRegistry } from './jobs/worker-registry.ts';
import { createLog, type Log } from './log.ts';

export interface Services {
  readonly deps: Deps;
  /** Ends the streams of whoever follows a run, so that the HTTP server can close. */
  endStreams(): void;
  /** Ends everything that `startServices` began; jobs in work are put back first. */
  stop(): Promise<void>;
}

/** Everything behind the HTTP server: connections and, unless it is told to leave that to others, threads and queue. */
export async function startServices(config: Config): Promise<Services> {
  const { databaseUrl } = config;
  const log = createLog(config.logLevel);
  const [passwords, sheetDesk, exportDesk, rankDesk] = await Promise.all([
    startPasswords(config.passwordCost),
    startSheetDesk(),
    startExportDesk(),
    startRankDesk(config.computeThreads),
  ]);
  const pool = createPool(databaseUrl, log);
  const db = createDatabase(pool);
  const keptShelf = new KeptShelf(db);
  const sessionStore = createSessionStore(pool, log);
  const runEvents = new RunEvents({ databaseUrl, log });
  await runEvents.start();
  const tally = new WorkTally();
  const work = config.hasBuiltInWorker
    ? await startWork('service', { config, db, log, runEvents, tally, rankDesk, keptShelf })
    : undefined;
  return {
    deps: {
      ...{ config, log, pool, db, sessionStore, passwords, tally, sheetDesk, exportDesk, runEvents },
      ...{ rankDesk, keptShelf },
    },
    endStreams: () => runEvents.endStreams(),
    stop: async () => {
      sessionStore.close();
      await work?.stop();
      await runEvents.stop();
      await Promise.all([passwords.close(), sheetDesk.close(), exportDesk.close(), rankDesk.close()]);
      await pool.end();
    },
  };
}

/** A worker by itself: it takes jobs of the same database and serves nothing. */
export async function startWorker(
  config: WorkerConfig,
): Promise<{ readonly log: Log; readonly stop: () => Promise<void> }> {
  const { databaseUrl } = config;
  const log = createLog(config.logLevel);
  const pool = createPool(databaseUrl, log);
  const db = createDatabase(pool);
  const runEvents = new RunEvents({ databaseUrl, log });
  await runEvents.start();
  const rankDesk = await startRankDesk(config.computeThreads);
  const keptShelf = new KeptShelf(db);
  const tally = new WorkTally();
  const work = await startWork('worker', { config, db, log, runEvents, tally, rankDesk, keptShelf });
  return {
    log,
    stop: async () => {
      await work.stop();
      await Promise.all([runEvents.stop(), rankDesk.close()]);
      await pool.end();
    },
  };
}

interface WorkOptions {
  readonly config: WorkerConfig;
  readonly db: Database;
  readonly log: Log;
  readonly runEvents: RunEvents;
  readonly tally: WorkTally;
  readonly rankDesk: RankDesk;
  readonly keptShelf: KeptShelf;
}

async function startWork(
  kind: ProcessKind,
  { config, ...context }: WorkOptions,
): Promise<{ readonly stop: () => Promise<void> }> {
  const compute = await startComputePool(config.computeThreads);
  const boundsDesk = await startBoundsDesk(config.computeThreads);
  const { threads } = compute;
  const { db, log, runEvents, tally } = context;
  const { listener } = runEvents;
  const registry = new WorkerRegistry({ kind, threads, db, log, listener, tally });
  const tasks = createTasks({ ...context, compute, boundsDesk });
  const queue = new Queue({ databaseUrl: config.databaseUrl, db, log, registry, createTasks: tasks });
  await queue.start();
  return {
    stop: async () => {
      await queue.stop();
      await Promise.all([compute.close(), boundsDesk.close()]);
    },
  };
}
