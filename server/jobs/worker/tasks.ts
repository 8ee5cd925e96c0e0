import type { JobHelpers, TaskList } from 'graphile-worker';
import { COMPUTE_VIEW_TASK, computeViewPayloadSchema } from '../compute-view-job.ts';
import { computeView, type ComputeViewContext } from './compute-view.ts';

/** The handlers of the queue's tasks. */
export function createTasks(context: Omit<ComputeViewContext, 'stopSignal'>) {
  return (stopSignal: AbortSignal): TaskList => ({
    [COMPUTE_VIEW_TASK]: async (payload: unknown, helpers: JobHelpers) => {
      const { viewId } = computeViewPayloadSchema.parse(payload);
      // Set on every job that is handed to a handler: it is what locks it.
      const workerId = helpers.job.locked_by!;
      await computeView({ viewId, workerId }, { ...context, stopSignal });
    },
  });
}
