import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isCurveMeasure } from '#shared/engine/curve-basis.ts';
import { CHECK_IDS } from '#shared/engine/evaluation.ts';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import { MEASURE_IDS } from '#shared/engine/measures.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import { sectionAt } from '#shared/sweep/space.ts';
import { sweepColumns } from '#shared/sweep/sweep-range.ts';
import { PROPERTIES } from '#shared/verification/properties.ts';
import { randomProblemByAnyMeasure } from './random-problems.ts';

const DUCTILITY = 1 << CHECK_IDS.indexOf('curvature-ductility');

describe('the hot loop and evaluateSection', () => {
  it(PROPERTIES['two-layers'].statement, () => {
    let compared = 0;
    let withNumbers = 0;
    fc.assert(
      fc.property(randomProblemByAnyMeasure, (problem) => {
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
          // off the full curve ductility is asked only of sections that meet every other check
          const isAsked = !isCurveMeasure(problem.basis) || (mask & ~DUCTILITY) === 0;
          const expected = isAsked ? mask : mask & ~DUCTILITY;
          if (expected !== columns.masks[index])
            differences.push(`${index}: checks ${expected}, ${columns.masks[index]}`);
          compared++;
          if (!evaluation.flexure) continue;
          withNumbers++;
          MEASURE_IDS.forEach((measure, i) => {
            const swept = columns.measures[index * MEASURE_IDS.length + i]!;
            const isKnown = isAsked || measure !== 'curvatureDuctility';
            const explained = isKnown ? (evaluation.measures[measure] ?? NaN) : NaN;
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
