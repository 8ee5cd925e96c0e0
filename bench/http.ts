/**
 * The service as a client meets it, on a database of its own: the time from the click that starts a run of a million
 * sections to its final result on the stream, and the commonest reads.
 */
import { randomUUID } from 'node:crypto';
import pg from 'pg';
import { joinPostgres, leavePostgres } from '#server/cli/postgres.mjs';
import { TEST_FOLDER } from '#server/cli/project-paths.mjs';
import { runSchema } from '#shared/contract/records.ts';
import { migrateDatabase } from '#server/db/migrate.ts';
import { openOffice } from '../tests/support/office.ts';
import { addProject, scaledSweep } from '../tests/support/office-project.ts';
import { followRun, hasEnded } from '../tests/support/run-stream.ts';

const MILLION = scaledSweep(20, 521);
const MILLION_COUNT = 20 * 521 * 96;
const ROUNDS = 9;
/** Of the whole way to the screen, 1.5 s, this much is the server's. */
const LIMIT_MS = 500;
const READS = 300;

const { maintenanceUrl } = await joinPostgres(TEST_FOLDER, { isDisposable: true });
const name = `bench_${randomUUID().replaceAll('-', '')}`;
const url = maintenanceUrl.replace(/\/postgres$/, `/${name}`);
await administer(`create database ${name}`);
await migrateDatabase(url);
const office = await openOffice({ url, drop: () => administer(`drop database ${name} with (force)`) });
try {
  await measure();
} finally {
  await office.close();
  await leavePostgres(TEST_FOLDER);
}

async function administer(sql: string): Promise<void> {
  const connection = new pg.Client({ connectionString: maintenanceUrl });
  await connection.connect();
  await connection.query(sql);
  await connection.end();
}

async function measure(): Promise<void> {
  const project = await addProject(office);
  const engineer = await office.as('engineer');
  const times: number[] = [];
  let runId = '';
  for (let round = 0; round < ROUNDS; round++) {
    const sweepId = await project.addSweep(MILLION);
    const startedAt = performance.now();
    const answer = await engineer.post(`/sweeps/${sweepId}/runs`).expect(200);
    runId = runSchema.shape.id.parse((answer.body as { id: unknown }).id);
    const stream = await followRun(office, engineer, { runId });
    await stream.until(hasEnded);
    times.push(performance.now() - startedAt);
    stream.close();
  }
  const runMs = median(times);
  console.log(
    `run of ${MILLION_COUNT} sections, click to final result: ${describe(times)} (limit ${LIMIT_MS} ms)`,
  );
  for (const path of [`/runs/${runId}`, `/runs/${runId}/sections/123456`])
    console.log(`GET ${path.replace(runId, ':id')}: ${describe(await timeReads(path))}`);
  if (runMs > LIMIT_MS) process.exitCode = 1;

  async function timeReads(path: string): Promise<number[]> {
    const reads: number[] = [];
    for (let i = 0; i < READS; i++) {
      const startedAt = performance.now();
      await engineer.get(path).expect(200);
      reads.push(performance.now() - startedAt);
    }
    return reads;
  }
}

function median(values: readonly number[]): number {
  return [...values].sort((a, b) => a - b)[values.length >> 1]!;
}

function describe(times: readonly number[]): string {
  const [least, most] = [Math.min(...times), Math.max(...times)];
  return `median ${median(times).toFixed(1)} ms, ${least.toFixed(1)} to ${most.toFixed(1)} ms`;
}
