import { startPasswords } from './compute/passwords.ts';
import { startComputePool } from './compute/pool.ts';
import { startSheetFiles } from './compute/sheet-files.ts';
import type { Config } from './config.ts';
import { createDatabase, createPool } from './db/client.ts';
import type { Deps } from './deps.ts';
import { createSessionStore } from './http/session-store.ts';
import { Queue } from './jobs/queue.ts';
import { RunEvents } from './jobs/run-events.ts';
import { createTasks } from './jobs/worker/tasks.ts';
import { createLog } from './log.ts';

export interface Services {
  readonly deps: Deps;
  /** Ends the streams of whoever follows a run, so that the HTTP server can close. */
  endStreams(): void;
  /** Ends everything that `startServices` began; jobs in work are put back first. */
  stop(): Promise<void>;
}

/** Everything behind the HTTP server: connections, threads and the queue. */
export async function startServices(config: Config): Promise<Services> {
  const { databaseUrl } = config;
  const log = createLog(config.logLevel);
  const [passwords, compute, sheetFiles] = await Promise.all([
    startPasswords(config.passwordCost),
    startComputePool(config.computeThreads),
    startSheetFiles(),
  ]);
  const pool = createPool(databaseUrl, log);
  const db = createDatabase(pool);
  const sessionStore = createSessionStore(pool, log);
  const runEvents = new RunEvents({ databaseUrl, log });
  await runEvents.start();
  const tasks = createTasks({ db, compute, runEvents, log });
  const queue = new Queue({ databaseUrl, db, log, listener: runEvents.listener, createTasks: tasks });
  await queue.start();
  return {
    deps: { config, log, pool, db, sessionStore, passwords, compute, sheetFiles, runEvents },
    endStreams: () => runEvents.endStreams(),
    stop: async () => {
      sessionStore.close();
      await queue.stop();
      await runEvents.stop();
      await Promise.all([compute.close(), passwords.close(), sheetFiles.close()]);
      await pool.end();
    },
  };
}
