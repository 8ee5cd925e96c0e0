import { pino } from 'pino';
import { expect, it } from 'vitest';
import { createDatabase, createPool } from '#server/db/client.ts';
import { workerProcesses } from '#server/db/schema/worker-processes.ts';
import { Queue } from '#server/jobs/queue.ts';
import { RunEvents } from '#server/jobs/run-events.ts';
import { WorkTally } from '#server/jobs/work-tally.ts';
import { WorkerRegistry } from '#server/jobs/worker-registry.ts';
import { createTestDatabase } from '../support/test-database.ts';

it('stops in order without a complaint in the log', async () => {
  const database = await createTestDatabase();
  const complaints: string[] = [];
  const log = pino({ level: 'warn' }, { write: (line) => void complaints.push(line) });
  const pool = createPool(database.url, log);
  const runEvents = new RunEvents({ databaseUrl: database.url, log });
  const { listener } = runEvents;
  const db = createDatabase(pool);
  const registry = new WorkerRegistry({
    kind: 'worker',
    threads: 1,
    db,
    log,
    listener,
    tally: new WorkTally(),
  });
  const createTasks = () => ({
    quick: { quick: () => undefined },
    bulk: { bulk: () => undefined },
    bounds: { bounds: () => undefined },
  });
  const queue = new Queue({ databaseUrl: database.url, db, log, registry, createTasks });
  await runEvents.start();
  await queue.start();
  await queue.stop();
  const [row] = await db.select().from(workerProcesses);
  expect(row).toMatchObject({ id: registry.id, end: 'stopped', queueWorkerIds: [] });
  await runEvents.stop();
  await pool.end();
  // The database is left to the next run's sweep-out: dropping it would cut sockets that are still closing.
  expect(complaints).toEqual([]);
});
