import type { Router } from 'express';
import type { Deps } from '../../deps.ts';
import { bind } from '../../http/bind.ts';
import { requireRole } from '../../http/project-access.ts';
import { listWorkers, readQueue } from '../../jobs/queue-status.ts';
import { readRunningLoad } from '../../jobs/running-load.ts';
import { OPERATORS } from './policy.ts';
import { listFailures, listRunningShards, listViewsUnderWay } from './queries.ts';

export function registerOperationsRoutes(router: Router, deps: Deps): void {
  bind(router, deps, 'getOperations', async ({ person, deps: { db, config } }) => {
    requireRole(person, OPERATORS, 'see how the service works');
    const [workers, queue, shards, views, failures, { office }] = await Promise.all([
      listWorkers(db),
      readQueue(db),
      listRunningShards(db),
      listViewsUnderWay(db),
      listFailures(db),
      readRunningLoad(db, person.id, config.runningLimits),
    ]);
    return { workers, queue, shards, views, failures, load: office };
  });
}
