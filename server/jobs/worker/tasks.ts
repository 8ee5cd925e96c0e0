import type { JobHelpers, TaskList } from 'graphile-worker';
import {
  BOUNDS_TASK,
  MERGE_TASK,
  mergePayloadSchema,
  SHARD_TASK,
  shardPayloadSchema,
  SMALL_RUN_TASK,
} from '../compute-jobs.ts';
import { computeShard } from './compute-shard.ts';
import type { WorkContext } from './context.ts';
import { mergeView } from './merge-view.ts';
import { MergedShards } from './merged-shards.ts';
import { searchView } from './search-view.ts';

/**
 * The handlers of the queue's tasks, by the lane they are taken in: small runs and merges never wait for a place that a
 * shard of a large run holds.
 */
export function createTasks(context: Omit<WorkContext, 'stopSignal'>) {
  const merged = new MergedShards();
  return (
    stopSignal: AbortSignal,
  ): { readonly quick: TaskList; readonly bulk: TaskList; readonly bounds: TaskList } => {
    const takeShard = async (payload: unknown, helpers: JobHelpers) => {
      const key = shardPayloadSchema.parse(payload);
      // Set on every job that is handed to a handler: it is what locks it.
      await computeShard({ ...key, workerId: helpers.job.locked_by! }, { ...context, stopSignal });
    };
    const search = async (payload: unknown, helpers: JobHelpers) => {
      const key = shardPayloadSchema.parse(payload);
      await searchView({ ...key, workerId: helpers.job.locked_by! }, { ...context, stopSignal });
    };
    const merge = (payload: unknown) =>
      mergeView(mergePayloadSchema.parse(payload).viewId, { ...context, merged, stopSignal });
    return {
      quick: { [SMALL_RUN_TASK]: takeShard, [MERGE_TASK]: merge },
      bulk: { [SHARD_TASK]: takeShard },
      bounds: { [BOUNDS_TASK]: search },
    };
  };
}
