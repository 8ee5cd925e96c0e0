import { expect, test } from 'vitest';
import { selectSections, type SelectQuery } from '#server/compute/select-sections.ts';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import { isWithinFilters, type RangeFilters } from '#shared/sweep/range-filters.ts';
import { expandSpace, sectionAt } from '#shared/sweep/space.ts';
import { DESIGN_BASIS, PRICE_BOOK, SMALL_SWEEP } from '../support/office-project.ts';

const { units: _units, fyMPa: _fy, coverMm: _cover, ...basis } = DESIGN_BASIS;
const problem = { ...SMALL_SWEEP, basis: { ...basis, rates: PRICE_BOOK } };

const ask = (query: Partial<SelectQuery>) =>
  selectSections({
    problem,
    view: { x: 'costPerM', y: 'depthMm' },
    list: 'all',
    bandShare: 0.05,
    filters: {},
    most: 10_000,
    ...query,
  });

/** Every section judged one by one, by the layer that explains. */
const JUDGED = (() => {
  const space = expandSpace(problem.space, basis.barStandard);
  return Array.from({ length: space.size }, (_, index) => {
    const section = sectionAt(space, index);
    return { index, section, evaluation: evaluateSection(section, problem) };
  }).filter(({ evaluation }) => evaluation.meetsListedChecks);
})();

const RANGES: readonly RangeFilters[] = [
  {},
  { depthMm: { low: 500, high: 650 }, fc: { low: null, high: 28 } },
  { costPerM: { low: null, high: 120 }, curvatureDuctility: { low: 8, high: null } },
  {
    tensionSteel: { low: 1200, high: 2000 },
    compressionSteel: { low: 1, high: null },
    barCount: { low: 5, high: 8 },
  },
  { cover: { low: 40, high: 40 }, fy: { low: 500, high: null } },
];

test.each(RANGES)('sections within %o are those that one finds by looking at each', (filters) => {
  const expected = JUDGED.filter((section) => isWithinFilters(section, filters));
  const { count, sections } = ask({ filters });
  expect(count).toBe(expected.length);
  const costOf = new Map(JUDGED.map(({ index, evaluation }) => [index, evaluation.measures.costPerM!]));
  expect(sections!.map(({ index }) => index)).toEqual(
    expected.map(({ index }) => index).toSorted((a, b) => costOf.get(a)! - costOf.get(b)! || a - b),
  );
});

test('more than a file takes are counted, and none is kept', () => {
  expect(ask({ most: JUDGED.length })).toMatchObject({ count: JUDGED.length });
  expect(ask({ most: JUDGED.length - 1 })).toEqual({ count: JUDGED.length, sections: null });
});

test('a section without the leading measure comes last in the whole list and is in no band or front', () => {
  const concrete = PRICE_BOOK.concrete.map((mix) => (mix.fcMPa === 35 ? { ...mix, costPerM3: null } : mix));
  const dear = { ...problem, basis: { ...problem.basis, rates: { ...PRICE_BOOK, concrete } } };
  const unpriced = new Set(JUDGED.filter(({ section }) => section.fcMPa === 35).map(({ index }) => index));
  const all = ask({ problem: dear }).sections!.map(({ index }) => unpriced.has(index));
  expect(all).toEqual(all.toSorted());
  expect(all.filter(Boolean)).toHaveLength(unpriced.size);
  for (const list of ['band', 'front'] as const) {
    const { sections, count } = ask({ problem: dear, list });
    expect(count).toBeGreaterThan(0);
    expect(sections!.some(({ index }) => unpriced.has(index))).toBe(false);
  }
  const none = PRICE_BOOK.concrete.map((mix) => ({ ...mix, costPerM3: null }));
  const nothing = { ...problem, basis: { ...problem.basis, rates: { ...PRICE_BOOK, concrete: none } } };
  expect(ask({ problem: nothing, list: 'band' })).toEqual({ count: 0, sections: [] });
});
