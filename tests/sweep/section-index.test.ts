import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { placeOfSection, sectionKey } from '#shared/sweep/section-index.ts';
import { expandSpace, sectionAt } from '#shared/sweep/space.ts';
import { OFFICE_PROBLEM } from './office-problem.ts';
import { randomProblem } from './random-problems.ts';

describe('the place of a section in a space', () => {
  it('is that of the very section: found again from its inputs, in any space', () => {
    fc.assert(
      fc.property(
        randomProblem,
        fc.double({ min: 0, max: 1, maxExcluded: true, noNaN: true }),
        (problem, share) => {
          const space = expandSpace(problem.space, problem.basis.barStandard);
          const section = sectionAt(space, Math.floor(share * space.size));
          const place = placeOfSection(space, section);
          if (place.kind === 'outside') throw new Error(`outside at ${place.axes.join(', ')}`);
          expect(sectionKey(sectionAt(space, place.index))).toBe(sectionKey(section));
        },
      ),
      { numRuns: 300, seed: 20_260_301 },
    );
  });

  it('names the axes that do not have its value', () => {
    const space = expandSpace(OFFICE_PROBLEM.space, OFFICE_PROBLEM.basis.barStandard);
    const section = sectionAt(space, 12_345);
    const other = { ...section, depthMm: section.depthMm + 1, coverMm: section.coverMm + 3 };
    expect(placeOfSection(space, other)).toEqual({ kind: 'outside', axes: ['cover', 'depth'] });
    const slab = {
      shape: 't',
      thicknessMm: 100,
      face: 'compression',
      width: { kind: 'given', widthMm: 2000 },
    } as const;
    expect(placeOfSection(space, { ...section, flange: slab })).toEqual({ kind: 'outside', axes: [] });
  });
});
