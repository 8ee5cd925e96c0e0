/**
 * The service as a client meets it, on a database of its own: the time from the click that starts a run of a million, and
 * of ten million, sections to its final result on the stream, and the commonest reads; sections evaluated for many at once;
 * then what people wait for while a run of a hundred and seventy million keeps the threads busy, and how soon that is
 * cancelled. The service has a process of its own; client, service, threads and database share the cores.
 */
import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import { idSchema } from '#shared/contract/numbers.ts';
import { MEASURE_IDS, type MeasureId } from '#shared/engine/measures.ts';
import { evaluateInput } from '../tests/support/factories.ts';
import { scaledSweep, SMALL_SWEEP } from '../tests/support/office-project.ts';
import { followRun, hasEnded } from '../tests/support/run-stream.ts';
import { openOfficeApart } from './office-apart.ts';

const MILLION = scaledSweep(20, 521);
const MILLION_COUNT = 20 * 521 * 96;
const TEN_MILLION = scaledSweep(58, 1801);
const TEN_MILLION_COUNT = 58 * 1801 * 96;
const HUGE = scaledSweep(1001, 1801);
const ROUNDS = 9;
const LARGE_ROUNDS = 3;
const CANCELS = 5;
/** Views opened beside each of them: each pair of measures once. */
const RANKS = 20;
/** Views of the run of a million opened beside each: four at once are under way at most. */
const VIEWS = 4;
/** Past the pairs that begin with the measure of the run's own. */
const OTHER_PAIRS = MEASURE_IDS.length - 1;
/** People who ask at once, each for the next as soon as they are answered. */
const CLIENTS = 8;
/** Of the whole way to the screen, 1.5 s, this much is the server's. */
const LIMIT_MS = 500;
const READS = 300;
/** Evaluating one section, or ranking a small run anew, beside a sweep: 99 of 100 within this. */
const BESIDE_LIMIT_MS = 50;

const office = await openOfficeApart();
try {
  await measure();
} finally {
  await office.close();
}

async function measure(): Promise<void> {
  const { project, engineer, call } = office;
  const idIn = (answer: unknown, key: 'id' | 'viewId') =>
    idSchema.parse((answer as Record<typeof key, unknown>)[key]);

  async function start(definition: SweepDefinition): Promise<string> {
    const sweepId = await project.addSweep(definition);
    return idIn(await call('POST', `/sweeps/${sweepId}/runs`, {}), 'id');
  }

  async function timeRuns(definition: SweepDefinition, rounds: number) {
    const times: number[] = [];
    let runId = '';
    for (let round = 0; round < rounds; round++) {
      const startedAt = performance.now();
      runId = await start(definition);
      const stream = await followRun(office, engineer, { runId });
      await stream.until(hasEnded);
      times.push(performance.now() - startedAt);
      stream.close();
    }
    return { runId, times };
  }

  async function time(count: number, act: (i: number) => Promise<unknown>): Promise<number[]> {
    const times: number[] = [];
    for (let i = 0; i < count; i++) {
      const startedAt = performance.now();
      await act(i);
      times.push(performance.now() - startedAt);
    }
    return times;
  }

  const million = await timeRuns(MILLION, ROUNDS);
  console.log(
    `run of ${MILLION_COUNT} sections, click to final result: ${describe(million.times)} (limit ${LIMIT_MS} ms)`,
  );
  const large = await timeRuns(TEN_MILLION, LARGE_ROUNDS);
  console.log(`run of ${TEN_MILLION_COUNT} sections, click to final result: ${describe(large.times)}`);
  const reads = [`/runs/${million.runId}`, `/runs/${million.runId}/sections/123456`];
  const read = (path: string) => call('GET', path);
  for (const path of reads)
    console.log(
      `GET ${path.replace(million.runId, ':id')}: ${describe(await time(READS, () => read(path)))}`,
    );

  const { runId: small } = await timeRuns(SMALL_SWEEP, 1);
  const views = pairsOf(MEASURE_IDS);
  const rank = async (i: number) => {
    const stream = await followRun(office, engineer, { runId: small });
    const viewId = idIn(await call('POST', `/runs/${small}/views`, views[i]), 'viewId');
    await stream.until((event) => event.progress.viewId === viewId && hasEnded(event));
    stream.close();
  };
  const evaluate = () => call('POST', `/projects/${project.projectId}/evaluations`, evaluateInput);

  /** What each of several people at once waits, and how many are answered a second. */
  async function load(name: string, requests: number): Promise<void> {
    const startedAt = performance.now();
    const lanes = await Promise.all(
      Array.from({ length: CLIENTS }, () => time(requests / CLIENTS, evaluate)),
    );
    const perSecond = (requests * 1000) / (performance.now() - startedAt);
    console.log(`${name}: ${describeTail(lanes.flat())}, ${perSecond.toFixed(0)} a second`);
  }
  await time(READS, evaluate);
  console.log(`evaluate: ${describeTail(await time(READS, evaluate))}`);
  await load(`${CLIENTS} people evaluating`, 2 * READS);

  const beside: Record<string, number[]> = {};
  const cancels: number[] = [];
  for (let round = 0; round < CANCELS; round++) {
    const huge = await start(HUGE);
    const stream = await followRun(office, engineer, { runId: huge });
    await stream.until(({ progress }) => progress.evaluated > 0);
    stream.close();
    const leave = await office.follow(huge);
    const some = READS / CANCELS;
    const counts: Record<string, number> = {
      'rank a small run anew': RANKS,
      'open a view of the million': VIEWS,
    };
    const act = {
      evaluate,
      'rank a small run anew': () => rank(next++),
      'read a run': () => read(reads[0]!),
      'open a view of the million': () => call('POST', `/runs/${million.runId}/views`, views[nextView++]),
    };
    let next = round * RANKS;
    let nextView = OTHER_PAIRS + round * VIEWS;
    for (const [name, once] of Object.entries(act))
      beside[name] = [...(beside[name] ?? []), ...(await time(counts[name] ?? some, once))];
    if (round === CANCELS - 1) await load(`${CLIENTS} people evaluating beside a sweep`, READS);
    leave();
    const cancelled = await followRun(office, engineer, { runId: huge });
    cancels.push(
      ...(await time(1, async () => {
        await call('POST', `/runs/${huge}/cancel`, {});
        await cancelled.until(hasEnded);
      })),
    );
    cancelled.close();
  }
  for (const [name, times] of Object.entries(beside))
    console.log(`beside a sweep, ${name}: ${describeTail(times)} (limit ${BESIDE_LIMIT_MS} ms)`);
  console.log(`cancel to what is kept: ${describe(cancels)} (limit 1000 ms)`);
  if (median(million.times) > LIMIT_MS) process.exitCode = 1;
}

/** All pairs of two different ones. */
function pairsOf(measures: readonly MeasureId[]): { x: MeasureId; y: MeasureId }[] {
  return measures.flatMap((x) => measures.filter((y) => y !== x).map((y) => ({ x, y })));
}

function percentile(values: readonly number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.min(sorted.length - 1, Math.ceil(share * sorted.length) - 1)]!;
}

function describeTail(times: readonly number[]): string {
  return `${describe(times)}, 99th percentile ${percentile(times, 0.99).toFixed(1)} ms`;
}

function median(values: readonly number[]): number {
  return [...values].sort((a, b) => a - b)[values.length >> 1]!;
}

function describe(times: readonly number[]): string {
  const [least, most] = [Math.min(...times), Math.max(...times)];
  return `median ${median(times).toFixed(1)} ms, ${least.toFixed(1)} to ${most.toFixed(1)} ms`;
}
