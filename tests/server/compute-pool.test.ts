import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { startComputePool, type ComputePool } from '#server/compute/pool.ts';
import { createCancelFlag, sweepInChunks } from '#server/compute/sweep-in-chunks.ts';
import type { SweepProblem } from '#shared/sweep/problem.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { spaceSize } from '#shared/sweep/space.ts';
import { DESIGN_BASIS, PRICE_BOOK, scaledSweep, SMALL_SWEEP } from '../support/office-project.ts';

const problemOf = ({ space, demand, rules }: typeof SMALL_SWEEP): SweepProblem => ({
  space,
  demand,
  rules,
  basis: { ...DESIGN_BASIS, rates: PRICE_BOOK },
});
/** Many ties: depth and width take few values. */
const VIEW = { x: 'depthMm', y: 'widthMm' } as const;

let one: ComputePool;
let two: ComputePool;

beforeAll(async () => {
  [one, two] = await Promise.all([startComputePool(1), startComputePool(2)]);
});
afterAll(() => Promise.all([one.close(), two.close()]));

describe('the result of a sweep', () => {
  const problem = problemOf(scaledSweep(12, 60));
  const sectionCount = spaceSize(problem.space);

  test.each([VIEW, SMALL_SWEEP.view, { x: 'costPerM', y: 'curvatureDuctility' } as const])(
    'by $x and $y is the same for one thread, two threads and any size of chunk',
    async (view) => {
      const expected = finishResult(problem, view, sweepRange(prepareSweep(problem, view), 0, sectionCount));
      expect(expected.feasible).toBeGreaterThan(1000);
      const sizes = [undefined, 977, 4096, sectionCount];
      for (const [threads, pool] of [one, two].entries())
        for (const chunkSections of sizes) {
          const swept = await sweepInChunks({
            pool,
            key: `${threads} ${view.x} ${view.y}`,
            problem,
            view,
            to: sectionCount,
            cancelFlag: createCancelFlag(),
            ...(chunkSections === undefined ? {} : { chunkSections }),
          });
          expect(swept.doneTo).toBe(sectionCount);
          expect(finishResult(problem, view, swept.chunk)).toEqual(expected);
        }
    },
  );
});

describe('a sweep that is stopped', () => {
  test('keeps its first part without a gap, and that part is what it would be by itself', async () => {
    const problem = problemOf(scaledSweep(200, 1801));
    const sectionCount = spaceSize(problem.space);
    const cancelFlag = createCancelFlag();
    const { chunk, doneTo } = await sweepInChunks({
      pool: two,
      key: 'stopped',
      problem,
      view: VIEW,
      to: sectionCount,
      cancelFlag,
      onProgress: () => Atomics.store(cancelFlag, 0, 1),
    });
    expect(doneTo).toBeGreaterThan(0);
    expect(doneTo).toBeLessThan(sectionCount / 4);
    expect(chunk).toEqual(sweepRange(prepareSweep(problem, VIEW), 0, doneTo));
  });

  test('does nothing when it is stopped before it begins', async () => {
    const cancelFlag = createCancelFlag();
    cancelFlag[0] = 1;
    const swept = await sweepInChunks({
      pool: two,
      key: 'never',
      problem: problemOf(SMALL_SWEEP),
      view: VIEW,
      to: 2880,
      cancelFlag,
    });
    expect(swept.doneTo).toBe(0);
  });
});

test('a problem the engine refuses fails its sweep, and the threads go on with the next', async () => {
  const problem = problemOf(SMALL_SWEEP);
  const broken = {
    ...problem,
    space: { ...problem.space, stirrups: [{ bar: '#99', legs: 2, spacingMm: 200 }] },
  };
  const task = { pool: two, view: VIEW, to: 2880 };
  await expect(
    sweepInChunks({ ...task, key: 'broken', problem: broken, cancelFlag: createCancelFlag() }),
  ).rejects.toThrow('#99');
  const swept = await sweepInChunks({ ...task, key: 'whole', problem, cancelFlag: createCancelFlag() });
  expect(swept.doneTo).toBe(2880);
});
