import type { ConcreteLawId } from '#shared/engine/curve-choices.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import type { SweepProblem } from '#shared/sweep/problem.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { OFFICE_PROBLEM } from '../tests/sweep/office-problem.ts';
import { costs, report } from './report.ts';

/** An office sweep of one width and three depths, with μφ off the full curve: every section that meets the other checks has one drawn. */
const COARSE: SweepProblem = {
  ...OFFICE_PROBLEM,
  space: {
    ...OFFICE_PROBLEM.space,
    width: { kind: 'list', values: [350] },
    depth: { kind: 'list', values: [500, 650, 800] },
  },
};
const LAWS: readonly ConcreteLawId[] = ['hognestad', 'parabola-rectangle', 'mander-confined'];

function sweep(name: string, problem: SweepProblem): void {
  const prepared = prepareSweep(problem, { x: 'steelKgPerM', y: 'curvatureDuctility' });
  const { size } = prepared.space;
  let asked = 0;
  const { best } = costs(3, () => {
    const { feasible, failedOnly } = sweepRange(prepared, 0, size);
    // ductility is the fourth check: alone it is failed by sections that were asked
    asked = feasible + failedOnly[3]!;
    return size;
  });
  report(name, {
    'sections a second and core': 1e9 / best,
    'curves, % of sections': (100 * asked) / size,
    'µs a section': best / 1000,
  });
}

sweep('closed path', COARSE);
for (const concreteLaw of LAWS)
  sweep(`full curve, ${concreteLaw}`, {
    ...COARSE,
    basis: {
      ...COARSE.basis,
      ductilityMeasure: 'curve-bilinear',
      curve: { concreteLaw, steelLaw: 'strain-hardening' },
    },
  });
