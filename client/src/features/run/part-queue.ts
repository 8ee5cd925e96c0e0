import type { ViewEvent } from '#shared/contract/records.ts';
import { whenIdle } from '#client/src/lib/when-idle.ts';
import { isUnderWay } from './view-progress.ts';

/** A page that is never idle still shows a part this often. */
const LONGEST_WAIT_MS = 2000;

export interface PartQueue {
  readonly add: (progress: ViewEvent) => void;
  readonly close: () => void;
}

/**
 * Parts of a run may come faster than a busy machine draws them, and each one taken would start the drawing of the last
 * over. A part waits until the page is idle and gives way to the next of its view; an end is taken at once.
 */
export function createPartQueue(take: (progress: ViewEvent) => void): PartQueue {
  const waiting = new Map<string, ViewEvent>();
  let callOff: (() => void) | null = null;
  const takeAll = () => {
    callOff = null;
    const parts = [...waiting.values()];
    waiting.clear();
    parts.forEach(take);
  };
  return {
    add: (progress) => {
      if (isUnderWay(progress.state)) {
        // One that comes without its result leaves that of the one it takes the place of.
        waiting.set(progress.viewId, { ...waiting.get(progress.viewId), ...progress });
        callOff ??= whenIdle(takeAll, LONGEST_WAIT_MS);
        return;
      }
      waiting.delete(progress.viewId);
      take(progress);
    },
    close: () => {
      callOff?.();
      waiting.clear();
    },
  };
}
