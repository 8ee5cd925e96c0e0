import { availableParallelism } from 'node:os';
import { MEASURE_IDS } from '#shared/engine/measures.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import type { View } from '#shared/sweep/problem.ts';
import { spaceSize } from '#shared/sweep/space.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { startBoundsDesk } from '#server/compute/bounds-desk.ts';
import { searchByBounds } from '#server/compute/search-by-bounds.ts';
import { createCancelFlag } from '#server/compute/sweep-in-chunks.ts';
import { vastProblem } from '../tests/sweep/vast-problem.ts';
import { report } from './report.ts';

/** Pairs an office compares by; others by name: `npx tsx bench/bounds.ts barCount depthMm 1e10 1`. */
const USUAL: readonly View[] = [
  { x: 'costPerM', y: 'depthMm' },
  { x: 'steelKgPerM', y: 'depthMm' },
  { x: 'costPerM', y: 'co2eKgPerM' },
  { x: 'steelKgPerM', y: 'curvatureDuctility' },
  { x: 'costPerM', y: 'curvatureDuctility' },
  { x: 'costPerM', y: 'designStrengthNmm' },
];
const LONGEST_MS = 60_000;

/** What the hot loop takes for one section of this space, every section of a row evaluated, ns. */
function nsASection(): number {
  const prepared = prepareSweep(vastProblem(1e9), USUAL[0]!);
  const from = Math.floor(prepared.space.size / 2);
  const count = 2_000_000;
  sweepRange(prepared, from, from + count);
  const begunAt = performance.now();
  sweepRange(prepared, from, from + count);
  return ((performance.now() - begunAt) * 1e6) / count;
}

async function search(view: View, { sections, threads }: { sections: number; threads: number }) {
  const problem = vastProblem(sections);
  const size = spaceSize(problem.space);
  const desk = await startBoundsDesk(threads);
  const cancelFlag = createCancelFlag();
  const timer = setTimeout(() => Atomics.store(cancelFlag, 0, 1), LONGEST_MS);
  const begunAt = performance.now();
  const usage = process.cpuUsage();
  const { state, found, isDone } = await searchByBounds({
    ...{ desk, problem, view, known: [], cancelFlag },
    onProgress: () => undefined,
  });
  const { user, system } = process.cpuUsage(usage);
  const ms = performance.now() - begunAt;
  clearTimeout(timer);
  await desk.close();
  report(`${view.x} against ${view.y}, ${threads} threads${isDone ? '' : ', NOT ENDED'}`, {
    sections: size,
    seconds: ms / 1000,
    'seconds of processor': (user + system) / 1e6,
    'of evaluating every section': ms / ((size * nsEach) / 1e6 / threads),
    evaluated: state.evaluated,
    boxes: state.boxesClosed,
    front: found.length,
  });
}

const [x, y, sections = '1e10', threads] = process.argv.slice(2);
const measure = (name: string | undefined) => MEASURE_IDS.find((id) => id === name);
const [one, other] = [measure(x), measure(y)];
const nsEach = nsASection();
for (const view of one && other ? [{ x: one, y: other }] : USUAL)
  await search(view, { sections: Number(sections), threads: Number(threads ?? availableParallelism()) });
