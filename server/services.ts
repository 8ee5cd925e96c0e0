import { startPasswords } from './compute/passwords.ts';
import { startComputePool } from './compute/pool.ts';
import type { Config } from './config.ts';
import { createDatabase, createPool } from './db/client.ts';
import type { Deps } from './deps.ts';
import { createSessionStore } from './http/session-store.ts';
import { createLog } from './log.ts';

export interface Services {
  readonly deps: Deps;
  /** Ends everything that `startServices` began, last begun first. */
  stop(): Promise<void>;
}

/** Everything behind the HTTP server: connections, threads and the queue. */
export async function startServices(config: Config): Promise<Services> {
  const log = createLog(config.logLevel);
  const [passwords, compute] = await Promise.all([
    startPasswords(config.passwordCost),
    startComputePool(config.computeThreads),
  ]);
  const pool = createPool(config.databaseUrl, log);
  const sessionStore = createSessionStore(pool, log);
  return {
    deps: { config, log, pool, db: createDatabase(pool), sessionStore, passwords, compute },
    stop: async () => {
      sessionStore.close();
      await Promise.all([compute.close(), passwords.close()]);
      await pool.end();
    },
  };
}
