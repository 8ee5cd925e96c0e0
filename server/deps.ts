import type { Store } from 'express-session';
import type pg from 'pg';
import type { ExportDesk } from './compute/export-desk.ts';
import type { Passwords } from './compute/passwords.ts';
import type { RankDesk } from './compute/rank-desk.ts';
import type { SheetDesk } from './compute/sheet-desk.ts';
import type { Config } from './config.ts';
import type { Database } from './db/client.ts';
import type { KeptShelf } from './jobs/kept-shelf.ts';
import type { RunEvents } from './jobs/run-events.ts';
import type { WorkTally } from './jobs/work-tally.ts';
import type { Log } from './log.ts';

/** What routes and jobs are handed; made and ended by services.ts. */
export interface Deps {
  readonly config: Config;
  readonly log: Log;
  readonly pool: pg.Pool;
  readonly db: Database;
  readonly sessionStore: Store;
  readonly passwords: Passwords;
  readonly tally: WorkTally;
  readonly sheetDesk: SheetDesk;
  readonly exportDesk: ExportDesk;
  readonly rankDesk: RankDesk;
  readonly keptShelf: KeptShelf;
  readonly runEvents: RunEvents;
}
