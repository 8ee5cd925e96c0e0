import type { Express } from 'express';
import { afterAll, beforeAll } from 'vitest';
import { buildApp } from '#server/app.ts';
import { readConfig, type Config } from '#server/config.ts';
import type { Deps } from '#server/deps.ts';
import { startServices } from '#server/services.ts';
import { createTestDatabase } from './test-database.ts';
import { testEnvironment } from './test-environment.ts';

export interface TestService {
  app: Express;
  deps: Deps;
  /** Another front on the same database, with fresh counters: for limits of its own. */
  buildWith: (changes: Partial<Config>) => Express;
}

/** The whole service, queue and threads included, on a database of its own; started before the file's tests. */
export function useTestService(changes: Partial<Config> = {}): TestService {
  const service = {} as TestService;
  const endings: (() => Promise<void>)[] = [];
  beforeAll(async () => {
    const database = await createTestDatabase();
    endings.push(database.drop);
    const config: Config = { ...readConfig(testEnvironment(database.url)), ...changes };
    const services = await startServices(config);
    endings.push(async () => {
      services.endStreams();
      await services.stop();
    });
    service.deps = services.deps;
    service.buildWith = (more) => buildApp({ ...services.deps, config: { ...config, ...more } });
    service.app = buildApp(services.deps);
  });
  afterAll(async () => {
    for (const end of endings.reverse()) await end();
  });
  return service;
}
