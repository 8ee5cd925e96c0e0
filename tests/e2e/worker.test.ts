import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { expect, it } from 'vitest';
import { PROJECT_ROOT } from '#server/cli/project-paths.mjs';
import { workerProcesses } from '#server/db/schema/worker-processes.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { DrillOffice } from '../support/drill-office.ts';
import { scaledSweep } from '../support/office-project.ts';
import { createTestDatabase } from '../support/test-database.ts';

it('npm run worker computes the runs of the database it is given, and leaves it in order', async () => {
  const database = await createTestDatabase();
  const office = await DrillOffice.open(database.url, 'no server of its own');
  const worker = spawn('npm', ['run', 'worker'], {
    cwd: PROJECT_ROOT,
    stdio: ['ignore', 'ignore', 'inherit'],
    env: { ...process.env, DATABASE_URL: database.url, LOG_LEVEL: 'error' },
  });
  const ended = once(worker, 'exit');
  try {
    const run = await office.startRun(scaledSweep(6, 1801));
    const { state, hash, merged } = await run.until(
      ({ state: now }) => now === 'finished' || now === 'failed',
    );
    const { definition, basis, sectionCount } = await run.read();
    const problem = { ...definition, basis };
    const { hash: expected } = finishResult(
      problem,
      definition.view,
      sweepRange(prepareSweep(problem, definition.view), 0, sectionCount),
    );
    expect({ state, hash, merged }).toEqual({ state: 'finished', hash: expected, merged: sectionCount });
    worker.kill('SIGTERM');
    await ended;
    const [process, ...others] = await office.db.select().from(workerProcesses);
    expect(others).toEqual([]);
    expect(process).toMatchObject({ kind: 'worker', end: 'stopped' });
    expect(process!.sectionsDone).toBe(sectionCount);
  } finally {
    worker.kill('SIGTERM');
    await office.close();
    await database.drop();
  }
});
