import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { CHECK_IDS } from '#shared/engine/evaluation.ts';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import { MEASURE_IDS } from '#shared/engine/measures.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import { sectionAt } from '#shared/sweep/space.ts';
import { sweepColumns } from '#shared/sweep/sweep-range.ts';
import { PROPERTIES } from '#shared/verification/properties.ts';
import { randomProblem } from './random-problems.ts';

describe('the hot loop and evaluateSection', () => {
  it(PROPERTIES['two-layers'].statement, () => {
    let compared = 0;
    let withNumbers = 0;
    fc.assert(
      fc.property(randomProblem, (problem) => {
        const prepared = prepareSweep(problem, { x: 'steelKgPerM', y: 'curvatureDuctility' });
        const { size } = prepared.space;
        const columns = sweepColumns(prepared, 0, size);
        const differences: string[] = [];
        for (let index = 0; index < size; index++) {
          const evaluation = evaluateSection(sectionAt(prepared.space, index), problem);
          const mask = evaluation.checks.reduce(
            (bits, check) => (check.passes ? bits : bits | (1 << CHECK_IDS.indexOf(check.id))),
            0,
          );
          if (mask !== columns.masks[index])
            differences.push(`${index}: checks ${mask}, ${columns.masks[index]}`);
          compared++;
          if (!evaluation.flexure) continue;
          withNumbers++;
          MEASURE_IDS.forEach((measure, i) => {
            const swept = columns.measures[index * MEASURE_IDS.length + i]!;
            const explained = evaluation.measures[measure] ?? NaN;
            if (!Object.is(swept, explained)) differences.push(`${index}: ${measure} ${swept}, ${explained}`);
          });
        }
        expect(differences).toEqual([]);
      }),
      { numRuns: PROPERTIES['two-layers'].runs, seed: PROPERTIES['two-layers'].seed },
    );
    expect(compared).toBeGreaterThanOrEqual(PROPERTIES['two-layers'].atLeast.count);
    expect(withNumbers).toBeGreaterThan(5_000);
  });
});
