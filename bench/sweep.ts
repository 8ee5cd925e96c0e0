import { availableParallelism } from 'node:os';
import { emptyChunk } from '#shared/sweep/chunk.ts';
import { nonDominated } from '#shared/sweep/front.ts';
import { mergeChunks } from '#shared/sweep/merge.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import { spaceSize } from '#shared/sweep/space.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { startComputePool } from '#server/compute/pool.ts';
import { createCancelFlag, sweepInChunks } from '#server/compute/sweep-in-chunks.ts';
import { OFFICE_PROBLEM } from '../tests/sweep/office-problem.ts';
import { median, report } from './report.ts';

const VIEW: View = { x: 'steelKgPerM', y: 'curvatureDuctility' };

/** The office sweep with finer depths: about 1.6 million sections, a third of which cannot fit. */
const OFFICE: SweepProblem = {
  ...OFFICE_PROBLEM,
  space: { ...OFFICE_PROBLEM.space, depth: { kind: 'range', from: 400, to: 800, step: 3.25 } },
};
/** Wide sections whose bars all fit, so that every section runs every check. */
const ALL_FIT: SweepProblem = {
  ...OFFICE,
  space: { ...OFFICE.space, width: { kind: 'range', from: 700, to: 900, step: 50 } },
  rules: { ...OFFICE.rules, minDepthToWidth: null },
};

/** Shear, stirrup spacing and least depth too. */
const WITH_SHEAR: SweepProblem = {
  ...ALL_FIT,
  demand: { ...ALL_FIT.demand, depthCapMm: 790, vuN: 250e3, spanMm: 7000, support: 'simple' },
};

/** Every check there is: stirrups designed for each section, in a special moment frame that few of these widths suit. */
const EVERY_CHECK: SweepProblem = {
  ...WITH_SHEAR,
  basis: { ...WITH_SHEAR.basis, seismicSystem: 'special', skinBar: '12' },
  space: {
    ...WITH_SHEAR.space,
    stirrups: [{ bar: '10', legs: 4, spacingMm: 300, isDesigned: true }],
  },
};

/** The same so deep that every section has skin steel. */
const DEEP: SweepProblem = {
  ...EVERY_CHECK,
  demand: { ...EVERY_CHECK.demand, depthCapMm: null },
  space: { ...EVERY_CHECK.space, depth: { kind: 'range', from: 910, to: 1310, step: 3.25 } },
};

/** Every check there is where an office would look for such a beam: some in twenty meet all of them. */
const FRAME: SweepProblem = {
  ...EVERY_CHECK,
  demand: { ...EVERY_CHECK.demand, depthCapMm: null },
  space: {
    ...EVERY_CHECK.space,
    width: { kind: 'range', from: 350, to: 550, step: 50 },
    depth: { kind: 'range', from: 500, to: 900, step: 3.25 },
    stirrups: [{ bar: '10', legs: 2, spacingMm: 300, isDesigned: true }],
  },
};
const DEEP_FRAME: SweepProblem = {
  ...FRAME,
  demand: { ...FRAME.demand, muNmm: 600e6, spanMm: 9000 },
  space: { ...FRAME.space, depth: DEEP.space.depth },
};
/** As few depths to a row as an office asks for: what is done once a row weighs most. */
const SHORT_ROWS: SweepProblem = {
  ...FRAME,
  space: {
    ...FRAME.space,
    width: { kind: 'range', from: 300, to: 700, step: 10 },
    depth: OFFICE_PROBLEM.space.depth,
  },
};
const EUROCODE: SweepProblem = {
  ...FRAME,
  basis: { ...FRAME.basis, ruleSet: 'en1992', seismicSystem: 'dcm' },
};

let ofEverySetNs = NaN;

function hotLoop(name: string, problem: SweepProblem): void {
  const prepared = prepareSweep(problem, VIEW);
  const { size } = prepared.space;
  let feasible = 0;
  let cannotFit = 0;
  const { nsEach } = median(7, () => {
    const chunk = sweepRange(prepared, 0, size);
    feasible = chunk.feasible;
    cannotFit = chunk.failed[0]!;
    return size;
  });
  if (problem === ALL_FIT) ofEverySetNs = nsEach;
  report(name, {
    sections: size,
    'ns a section': nsEach,
    'over every set fits': nsEach / ofEverySetNs,
    'million a second and core': 1000 / nsEach,
    'cannot fit, %': (100 * cannotFit) / size,
    'feasible, %': (100 * feasible) / size,
  });
}

hotLoop('hot loop, every bar set fits', ALL_FIT);
hotLoop('office sweep', OFFICE);
hotLoop('every set, Vu, span and support', WITH_SHEAR);
hotLoop('and designed stirrups, special frame', EVERY_CHECK);
hotLoop('and skin steel', DEEP);
hotLoop('special frame, every check on', FRAME);
hotLoop('the same with skin steel', DEEP_FRAME);
hotLoop('the same in rows of 17 depths', SHORT_ROWS);
hotLoop('EN 1992, class DCM, every check on', EUROCODE);

const prepared = prepareSweep(OFFICE, VIEW);
const { size } = prepared.space;
const chunkSize = 1 << 17;
const sweptNs = median(3, () => {
  sweepRange(prepared, 0, size);
  return size;
}).nsEach;
const chunks = Array.from({ length: Math.ceil(size / chunkSize) }, (_, i) =>
  sweepRange(prepared, i * chunkSize, Math.min(size, (i + 1) * chunkSize)),
);
const merge = median(7, () => {
  for (let i = 0; i < 20; i++) chunks.reduce(mergeChunks, emptyChunk());
  return 20 * chunks.length;
});
report('merge', {
  'µs a chunk': merge.nsEach / 1000,
  'share of its sweep, %': (100 * merge.nsEach) / (chunkSize * sweptNs),
});

/** A fixed sequence of pseudo-random points (linear congruential, Numerical Recipes' constants). */
function points(count: number) {
  let state = 20261201;
  const next = () => (state = (Math.imul(state, 1664525) + 1013904223) >>> 0) / 2 ** 32;
  return Array.from({ length: count }, (_, index) => ({ index, x: next(), y: next() }));
}
for (const count of [1e4, 1e5, 1e6]) {
  const cloud = points(count);
  const { nsEach } = median(3, () => {
    nonDominated(cloud, { x: 1, y: 1 });
    return count;
  });
  report(`front of ${count.toLocaleString('en')} points`, { 'ns a point': nsEach });
}

/** By the clock, the two pools taking turns so that whatever else the machine does meets both. */
async function threads(problem: SweepProblem): Promise<void> {
  const pools = [await startComputePool(1), await startComputePool(2)];
  const best = pools.map(() => Infinity);
  for (let round = 0; round < 7; round++)
    for (const [i, pool] of pools.entries()) {
      const start = performance.now();
      await sweepInChunks({
        ...{ pool, key: 'bench', problem, view: VIEW, cancelFlag: createCancelFlag() },
        to: spaceSize(problem.space),
      });
      best[i] = Math.min(best[i]!, performance.now() - start);
    }
  for (const pool of pools) await pool.close();
  report('threads', {
    'times as fast with 2 as with 1': best[0]! / best[1]!,
    cores: availableParallelism(),
  });
}
await threads({
  ...FRAME,
  space: { ...FRAME.space, width: { kind: 'range', from: 350, to: 550, step: 10 } },
});
