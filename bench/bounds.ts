import { MEASURE_IDS } from '#shared/engine/measures.ts';
import { BoundedSearch } from '#shared/sweep/bounded-search.ts';
import type { View } from '#shared/sweep/problem.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import { spaceSize } from '#shared/sweep/space.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { report } from './report.ts';
import { vastProblem } from '../tests/sweep/vast-problem.ts';

/** Pairs an office compares by; others by name: `node bench/bounds.ts barCount depthMm`. */
const USUAL: readonly View[] = [
  { x: 'costPerM', y: 'depthMm' },
  { x: 'steelKgPerM', y: 'depthMm' },
  { x: 'costPerM', y: 'co2eKgPerM' },
  { x: 'steelKgPerM', y: 'curvatureDuctility' },
  { x: 'costPerM', y: 'curvatureDuctility' },
  { x: 'costPerM', y: 'designStrengthNmm' },
];
const LONGEST_MS = 20_000;

/** What the hot loop takes for one section of this space, evaluated in rows, ns. */
function nsASection(): number {
  const problem = vastProblem(1e9);
  const prepared = prepareSweep(problem, USUAL[0]!);
  const from = Math.floor(prepared.space.size / 2);
  const count = 1_000_000;
  sweepRange(prepared, from, from + count);
  const begunAt = performance.now();
  sweepRange(prepared, from, from + count);
  return ((performance.now() - begunAt) * 1e6) / count;
}

function search(sections: number, view: View, nsEach: number): void {
  const problem = vastProblem(sections);
  const size = spaceSize(problem.space);
  const begunAt = performance.now();
  const bounded = new BoundedSearch(problem, view);
  let isDone = false;
  while (!isDone && performance.now() - begunAt < LONGEST_MS) isDone = bounded.advance(4096);
  const ms = performance.now() - begunAt;
  const { evaluated, boxesOpen, boxesClosed } = bounded.state;
  report(`bounds, ${view.x} against ${view.y}${isDone ? '' : ', NOT ENDED'}`, {
    sections: size,
    seconds: ms / 1000,
    'of evaluating all on one core': ms / ((size * nsEach) / 1e6),
    evaluated,
    boxes: boxesClosed,
    'boxes left open': boxesOpen,
    front: bounded.found.length,
    'MB in use': process.memoryUsage().heapUsed / 1e6,
  });
}

const [x, y, sections] = process.argv.slice(2);
const isMeasure = (name: string | undefined) => MEASURE_IDS.find((id) => id === name);
const asked = isMeasure(x) && isMeasure(y) ? [{ x: isMeasure(x)!, y: isMeasure(y)! }] : USUAL;
const nsEach = nsASection();
for (const view of asked) search(Number(sections ?? 1e10), view, nsEach);
