import { emptyChunk } from '#shared/sweep/chunk.ts';
import { FrontBuilder } from '#shared/sweep/front.ts';
import { FrontInThreeBuilder } from '#shared/sweep/front-in-three.ts';
import { mergeChunks } from '#shared/sweep/merge.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { OFFICE_PROBLEM } from '../tests/sweep/office-problem.ts';
import { costs, report } from './report.ts';

/** A fixed sequence of pseudo-random numbers below 1 (linear congruential, Numerical Recipes' constants). */
function random(): () => number {
  let state = 20261201;
  return () => (state = (Math.imul(state, 1664525) + 1013904223) >>> 0) / 2 ** 32;
}

const SHAPES = {
  /** Even in a cube: a front of some hundred. */
  cube: (next: () => number) => [next(), next(), next()],
  /** In a thin layer over a slope on which no two beat each other: a front of thousands. */
  slope: (next: () => number) => {
    const [x, y] = [next(), next()];
    return [x, y, 2 - x - y + 0.3 * next()];
  },
} as const;

for (const [name, draw] of Object.entries(SHAPES)) {
  for (const count of [1e4, 1e5, 1e6]) {
    const next = random();
    const points = Float64Array.from({ length: 3 * count });
    for (let i = 0; i < count; i++) points.set(draw(next), 3 * i);
    let length = 0;
    const inThree = costs(3, () => {
      const front = new FrontInThreeBuilder();
      for (let i = 0; i < count; i++) front.add(points[3 * i]!, points[3 * i + 1]!, points[3 * i + 2]!, i);
      length = front.finish().x.length;
      return count;
    });
    const inTwo = costs(3, () => {
      const front = new FrontBuilder();
      for (let i = 0; i < count; i++) front.add(points[3 * i]!, points[3 * i + 1]!, i);
      return count;
    });
    report(`${name}, ${count.toLocaleString('en')} points`, {
      'ns a point in three': inThree.best,
      'on the front': length,
      'ns a point in two': inTwo.best,
    });
  }
}

/** About 1.6 million sections, a ninth of which meet every check. */
const OFFICE: SweepProblem = {
  ...OFFICE_PROBLEM,
  space: { ...OFFICE_PROBLEM.space, depth: { kind: 'range', from: 400, to: 800, step: 3.25 } },
};
const PAIR: View = { x: 'steelKgPerM', y: 'curvatureDuctility' };
const VIEWS: readonly (readonly [string, View])[] = [
  ['in two', PAIR],
  ['and cost', { ...PAIR, z: 'costPerM' }],
  ['and depth', { ...PAIR, z: 'depthMm' }],
  ['and strength', { ...PAIR, z: 'designStrengthNmm' }],
];
const CHUNK = 2 ** 18;
for (const [name, view] of VIEWS) {
  const prepared = prepareSweep(OFFICE, view);
  const { size } = prepared.space;
  const ends = Array.from({ length: Math.ceil(size / CHUNK) }, (_, i) => i * CHUNK);
  const sweep = () => ends.map((from) => sweepRange(prepared, from, Math.min(size, from + CHUNK)));
  const chunks = sweep();
  const { best } = costs(5, () => {
    sweep();
    return size;
  });
  const merge = costs(5, () => {
    chunks.reduce(mergeChunks, emptyChunk());
    return chunks.length;
  });
  report(`office sweep by steel, μφ ${name}`, {
    'ns a section': best,
    'µs to join a chunk': merge.best / 1000,
    'on the front': chunks.reduce(mergeChunks, emptyChunk()).frontInThree?.x.length ?? 0,
  });
}
