import { randomUUID } from 'node:crypto';
import { hostname } from 'node:os';
import { eq, sql } from 'drizzle-orm';
import { ENGINE_VERSION } from '#shared/engine/version.ts';
import type { ProcessKind } from '#shared/contract/operations.ts';
import type { Database } from '../db/client.ts';
import { workerProcesses } from '../db/schema/worker-processes.ts';
import type { Log } from '../log.ts';
import type { DatabaseListener } from './database-listener.ts';
import type { WorkTally } from './work-tally.ts';

const HEARTBEAT_MS = 1000;
/** After the database was away all hearts seem to stand still; by then everybody's has had the time to beat. */
const SETTLING_MS = 4000;
/** The rate shown is that of so many heartbeats. */
const RATE_BEATS = 5;

interface RegistryOptions {
  readonly kind: ProcessKind;
  readonly threads: number;
  readonly db: Database;
  readonly log: Log;
  readonly listener: DatabaseListener;
  readonly tally: WorkTally;
}

/**
 * Says in the database that this process lives and what it does: a heartbeat every second, by which a machine that
 * vanished is found out, and a lock of its connection, which tells of a killed process at once (see DatabaseListener).
 */
export class WorkerRegistry {
  readonly id = randomUUID();
  readonly #options: RegistryOptions;
  readonly #queueWorkerIds = new Set<string>();
  readonly #beats: { readonly at: number; readonly sections: number }[] = [];
  #timer: NodeJS.Timeout | undefined;
  #lastBeat: Promise<void> = Promise.resolve();
  #isAway = false;
  #steadyFrom = -Infinity;

  constructor(options: RegistryOptions) {
    this.#options = options;
  }

  async start(): Promise<void> {
    const { db, kind, threads, listener } = this.#options;
    await listener.holdProcessLock(this.id);
    await db.insert(workerProcesses).values({
      id: this.id,
      kind,
      threads,
      host: hostname(),
      pid: process.pid,
      engineVersion: ENGINE_VERSION,
    });
    this.#timer = setInterval(() => this.#beat(), HEARTBEAT_MS);
    this.#timer.unref();
  }

  async stop(): Promise<void> {
    clearInterval(this.#timer);
    await this.#lastBeat;
    await this.#options.db
      .update(workerProcesses)
      .set({ ...this.#describe(), sectionsPerSecond: 0, endedAt: sql`clock_timestamp()`, end: 'stopped' })
      .where(eq(workerProcesses.id, this.id))
      .catch((error: unknown) => this.#options.log.warn({ err: error }, 'The end could not be written'));
  }

  /** Whether others may be judged by their heartbeats. */
  get isSteady(): boolean {
    return !this.#isAway && performance.now() >= this.#steadyFrom;
  }

  /** The names are written at once: a job that is locked under an unknown one is taken for a dead worker's. */
  note(change: 'begins' | 'ended', workerId: string): void {
    if (change === 'begins') this.#queueWorkerIds.add(workerId);
    else this.#queueWorkerIds.delete(workerId);
    if (this.#timer !== undefined) this.#beat();
  }

  #beat(): void {
    this.#lastBeat = this.#lastBeat.then(() => this.#write());
  }

  async #write(): Promise<void> {
    const { db, log } = this.#options;
    try {
      // Whoever took this process for lost was wrong: it says so itself.
      await db
        .update(workerProcesses)
        .set({ ...this.#describe(), endedAt: null, end: null })
        .where(eq(workerProcesses.id, this.id));
      if (this.#isAway) this.#steadyFrom = performance.now() + SETTLING_MS;
      this.#isAway = false;
    } catch (error) {
      if (!this.#isAway) log.warn({ err: error }, 'A worker could not show that it lives');
      this.#isAway = true;
    }
  }

  #describe() {
    const { tally } = this.#options;
    return {
      heartbeatAt: sql`clock_timestamp()`,
      queueWorkerIds: [...this.#queueWorkerIds],
      sectionsDone: tally.sections,
      shardsDone: tally.shards,
      shardsFailed: tally.failures,
      sectionsPerSecond: this.#rate(),
    };
  }

  #rate(): number {
    const now = { at: performance.now(), sections: this.#options.tally.sections };
    this.#beats.push(now);
    if (this.#beats.length > RATE_BEATS) this.#beats.shift();
    const first = this.#beats[0]!;
    return now.at > first.at ? ((now.sections - first.sections) / (now.at - first.at)) * 1000 : 0;
  }
}
