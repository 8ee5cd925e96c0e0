import type { BoundsDesk } from '../../compute/bounds-desk.ts';
import type { ComputePool } from '../../compute/pool.ts';
import type { RankDesk } from '../../compute/rank-desk.ts';
import type { Database } from '../../db/client.ts';
import type { Log } from '../../log.ts';
import type { KeptShelf } from '../kept-shelf.ts';
import type { RunEvents } from '../run-events.ts';
import type { WorkTally } from '../work-tally.ts';

/** What the handlers of jobs are handed. */
export interface WorkContext {
  readonly db: Database;
  readonly compute: ComputePool;
  readonly boundsDesk: BoundsDesk;
  readonly rankDesk: RankDesk;
  readonly keptShelf: KeptShelf;
  readonly runEvents: RunEvents;
  readonly log: Log;
  readonly tally: WorkTally;
  /** Fires when the process is to stop. */
  readonly stopSignal: AbortSignal;
}

export const FAILURE_MESSAGE =
  'The computation could not be finished because of an error on our side. Resume the run, or start a new one.';
