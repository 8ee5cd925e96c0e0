import { type ChildProcess, spawn } from 'node:child_process';
import { once } from 'node:events';
import { rmSync } from 'node:fs';
import path from 'node:path';
import { asc, eq } from 'drizzle-orm';
import { buildServer } from '#server/cli/build.mjs';
import { PROJECT_ROOT, TEST_FOLDER } from '#server/cli/project-paths.mjs';
import { createDatabase, createPool } from '#server/db/client.ts';
import { runViews } from '#server/db/schema/run-views.ts';
import { runs } from '#server/db/schema/runs.ts';
import { viewShards } from '#server/db/schema/view-shards.ts';
import { cancelRun, resumeRun, startRun } from '#server/features/runs/commands.ts';
import { requireRun } from '#server/features/runs/queries.ts';
import { RunEvents } from '#server/jobs/run-events.ts';
import { createLog } from '#server/log.ts';
import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import type { Person } from '#shared/contract/records.ts';
import { addProject, type OfficeProject } from './office-project.ts';
import { insertPeople, type Account } from './office.ts';
import { testEnvironment } from './test-environment.ts';

const NO_LIMITS = { person: Infinity, office: Infinity };

/** The server as it is built for real, without the client: once for a test file. */
export async function buildForDrills(): Promise<{ folder: string; remove: () => void }> {
  const folder = path.join(TEST_FOLDER, `drill-server-${process.pid}`);
  await buildServer(folder);
  return { folder, remove: () => rmSync(folder, { recursive: true, force: true }) };
}

type View = typeof runViews.$inferSelect;

/** A run that a drill has started, seen through the database. */
export interface DrillRun {
  readonly read: () => Promise<typeof runs.$inferSelect>;
  readonly readView: () => Promise<View>;
  readonly readShards: () => Promise<(typeof viewShards.$inferSelect)[]>;
  /** The first state of its view of which that holds. */
  readonly until: (holds: (view: View) => boolean) => Promise<View>;
  readonly cancel: () => Promise<void>;
  readonly resume: () => Promise<void>;
}

/** An office without its service: runs are begun here, and processes that compute them come and go. */
export class DrillOffice {
  readonly #url: string;
  readonly #folder: string;
  readonly #log = createLog('silent');
  readonly #pool: ReturnType<typeof createPool>;
  readonly db: ReturnType<typeof createDatabase>;
  readonly #runEvents: RunEvents;
  readonly #processes = new Set<ChildProcess>();
  #people!: Map<Account, string>;
  #project!: OfficeProject;

  private constructor(url: string, folder: string) {
    this.#url = url;
    this.#folder = folder;
    this.#pool = createPool(url, this.#log);
    this.db = createDatabase(this.#pool);
    this.#runEvents = new RunEvents({ databaseUrl: url, log: this.#log });
  }

  static async open(url: string, folder: string): Promise<DrillOffice> {
    const office = new DrillOffice(url, folder);
    await office.#runEvents.start();
    office.#people = await insertPeople(office.db, 'nobody signs in');
    office.#project = await addProject({
      deps: { db: office.db },
      idOf: (account) => office.#people.get(account)!,
    });
    return office;
  }

  async close(): Promise<void> {
    await Promise.all([...this.#processes].map((child) => this.kill(child)));
    await this.#runEvents.stop();
    await this.#pool.end();
  }

  /** The service with its built-in worker, or a worker alone; it computes once it is up. */
  start(program: 'main' | 'worker', environment: NodeJS.ProcessEnv = {}): ChildProcess {
    const child = spawn(process.execPath, [path.join(this.#folder, `${program}.js`)], {
      cwd: PROJECT_ROOT,
      env: { ...process.env, ...testEnvironment(this.#url), PORT: '0', LOG_LEVEL: 'error', ...environment },
      stdio: ['ignore', 'ignore', 'inherit'],
    });
    this.#processes.add(child);
    return child;
  }

  async kill(child: ChildProcess, signal: NodeJS.Signals = 'SIGKILL'): Promise<void> {
    this.#processes.delete(child);
    if (child.exitCode !== null || child.signalCode !== null) return;
    child.kill(signal);
    await once(child, 'exit');
  }

  async startRun(definition: SweepDefinition, account: 'engineer' | 'admin' = 'engineer'): Promise<DrillRun> {
    const { db } = this;
    const person: Person = { id: this.#people.get(account)!, name: '', email: '', role: account };
    const sweepId = await this.#project.addSweep(definition);
    const runId = await startRun(db, person, { sweepId, limits: NO_LIMITS });
    const readView = async () => (await db.select().from(runViews).where(eq(runViews.runId, runId)))[0]!;
    const record = () => requireRun(db, person, runId);
    return {
      read: async () => (await db.select().from(runs).where(eq(runs.id, runId)))[0]!,
      readView,
      readShards: async () =>
        db
          .select()
          .from(viewShards)
          .where(eq(viewShards.viewId, (await readView()).id))
          .orderBy(asc(viewShards.fromIndex)),
      until: (holds) => this.#until(runId, readView, holds),
      cancel: async () => cancelRun(db, person, await record()),
      resume: async () => resumeRun(db, person, { record: await record(), limits: NO_LIMITS }),
    };
  }

  #until(runId: string, readView: () => Promise<View>, holds: (view: View) => boolean): Promise<View> {
    return new Promise((resolve) => {
      const check = () => {
        // A database that is away for a moment is asked again by the event of its return.
        readView().then(
          (view) => {
            if (!holds(view)) return;
            unfollow();
            resolve(view);
          },
          () => undefined,
        );
      };
      const unfollow = this.#runEvents.follow(runId, {
        onViewChanged: check,
        onGap: check,
        onClosed: () => undefined,
      });
      check();
    });
  }
}
