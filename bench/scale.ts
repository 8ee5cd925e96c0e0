import { emptyChunk } from '#shared/sweep/chunk.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import { mergeChunks } from '#shared/sweep/merge.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import { spaceSize } from '#shared/sweep/space.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { startComputePool } from '#server/compute/pool.ts';
import { createCancelFlag, sweepInChunks } from '#server/compute/sweep-in-chunks.ts';
import { planShards } from '#server/jobs/plan-shards.ts';
import { OFFICE_PROBLEM } from '../tests/sweep/office-problem.ts';
import { report } from './report.ts';

/**
 * What a section costs, and what a process holds, from ten thousand sections to a hundred million: a special moment frame
 * with every check on, from the definition to the finished result.
 */
const VIEW: View = { x: 'steelKgPerM', y: 'curvatureDuctility' };
const MB = 1024;

/** So many widths between 350 and 550 mm and depths between 500 and 1,000 mm, on 2,640 sets and strengths. */
function frame(widths: number, depths: number): SweepProblem {
  return {
    ...OFFICE_PROBLEM,
    basis: { ...OFFICE_PROBLEM.basis, seismicSystem: 'special', skinBar: '12' },
    demand: { ...OFFICE_PROBLEM.demand, vuN: 250e3, spanMm: 7000, support: 'simple' },
    space: {
      ...OFFICE_PROBLEM.space,
      width: values(widths, 350, 550),
      depth: values(depths, 500, 1000),
      stirrups: [{ bar: '10', legs: 2, spacingMm: 300, isDesigned: true }],
    },
  };
}

const values = (count: number, from: number, to: number) => ({
  kind: 'list' as const,
  values: Array.from({ length: count }, (_, i) => from + ((i + 0.5) * (to - from)) / count),
});

const sizes: readonly (readonly [widths: number, depths: number])[] = [
  [1, 4],
  [2, 19],
  [6, 63],
  [20, 190],
  [80, 474],
];

const mostMB = () => process.resourceUsage().maxRSS / MB;

/** All there may be room for: the most a shard can hold for other views. */
const KEEP_ALL = { sections: 1e8, numbers: 1e8 };

/**
 * Five times ten to the seven on both threads of the service's own pool, which lives in this process as it does there; shard
 * by shard, each with what it keeps for other views.
 */
async function memory(view: View): Promise<void> {
  const problem = frame(56, 340);
  const pool = await startComputePool(2);
  let whole = emptyChunk();
  let keptMB = 0;
  for (const range of planShards({ from: 0, to: spaceSize(problem.space) })) {
    const { chunk, kept } = await sweepInChunks({
      ...{ pool, key: JSON.stringify(view), problem, view, cancelFlag: createCancelFlag() },
      ...range,
      keepRoom: KEEP_ALL,
    });
    whole = mergeChunks(whole, chunk);
    const bytes = kept?.frames.reduce((sum, { byteLength }) => sum + byteLength, 0) ?? 0;
    keptMB = Math.max(keptMB, bytes / MB / MB);
  }
  await pool.close();
  report(`memory, ${Object.values(view).join(', ')}`, {
    sections: whole.evaluated,
    'feasible, %': (100 * whole.feasible) / whole.evaluated,
    'points of the front': whole.front.length,
    'MB kept of a shard': keptMB,
    'MB at most, of 500': mostMB(),
  });
}

let firstNs = NaN;
for (const [widths, depths] of sizes) {
  const problem = frame(widths, depths);
  const size = spaceSize(problem.space);
  const rounds = size < 5e6 ? 5 : 1;
  const times = Array.from({ length: rounds }, () => {
    const start = process.cpuUsage();
    finishResult(problem, VIEW, sweepRange(prepareSweep(problem, VIEW), 0, size));
    const { user, system } = process.cpuUsage(start);
    return ((user + system) * 1000) / size;
  });
  const ns = Math.min(...times);
  if (size > 5e5 && !(firstNs > 0)) firstNs = ns;
  report(`${size.toLocaleString('en')} sections`, {
    'ns a section, definition to result': ns,
    'over that of a million': ns / firstNs,
    'MB at most': mostMB(),
  });
}
await memory({ x: 'steelKgPerM', y: 'curvatureDuctility' });
await memory({ x: 'depthMm', y: 'widthMm' });
await memory({ x: 'costPerM', y: 'depthMm', z: 'curvatureDuctility' });
