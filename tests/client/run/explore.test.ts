import { describe, expect, it } from 'vitest';
import { MEASURE_DIRECTION } from '#shared/engine/measures.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import { nonDominated } from '#shared/sweep/front.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import { spaceSize } from '#shared/sweep/space.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { cutColumns, nearestSection, type Cut, type CutQuery } from '#client/src/features/run/cut.ts';
import { EXPLORE_KEYS, exploreValue } from '#shared/sweep/explore-axis.ts';
import { FeasibleColumns } from '#client/src/features/run/feasible-columns.ts';
import { FeasibleDesk } from '#client/src/features/run/feasible-desk.ts';
import type { FeasibleAnswer, FeasibleRequest } from '#client/src/features/run/feasible-worker.ts';
import { isWithinFilters, type RangeFilters } from '#shared/sweep/range-filters.ts';
import { createSectionSource } from '#client/src/features/run/section-source.ts';
import { BASIS, DEFINITION } from './problem.ts';

const PROBLEM = { ...DEFINITION, basis: BASIS };
const { view } = DEFINITION;
const SIZE = spaceSize(DEFINITION.space);
const RESULT = finishResult(PROBLEM, view, sweepRange(prepareSweep(PROBLEM, view), 0, SIZE));
const SOURCE = createSectionSource({ definition: DEFINITION, basis: BASIS });

function judged(): FeasibleColumns {
  const columns = new FeasibleColumns(PROBLEM, view, BASIS.barStandard);
  for (let from = 0; from < SIZE; from = columns.advance(from));
  return columns;
}
const COLUMNS = judged();
const ALL = Array.from({ length: SIZE }, (_, index) => SOURCE.evaluatedAt(index)).filter(
  ({ evaluation }) => evaluation.meetsListedChecks,
);

const query = (filters: RangeFilters = {}, more: Partial<CutQuery> = {}): CutQuery => ({
  view,
  filters,
  window: null,
  keys: [],
  ...more,
});

describe('the sections judged again in the browser', () => {
  it('are those the run counted, with every value a section has', () => {
    expect([...COLUMNS.index]).toEqual(ALL.map(({ index }) => index));
    expect(ALL).toHaveLength(RESULT.feasible!);
    for (const key of EXPLORE_KEYS) {
      const column = COLUMNS.column(key);
      ALL.forEach((section, at) => {
        const value = exploreValue(section, key);
        if (value === null) expect(column[at], key).toBeNaN();
        else expect(column[at], key).toBeCloseTo(value, 6);
      });
    }
  });

  it('give the run’s own front and band where no range is set', () => {
    const cut = cutColumns(COLUMNS, query());
    expect(cut.front).toEqual(RESULT.front);
    expect(cut.band).toEqual(RESULT.band);
    expect(cut.count).toBe(RESULT.feasible);
    for (const axis of ['width', 'depth', 'fc'] as const)
      expect(cut.axisCounts[axis]).toEqual(RESULT.axisCounts![axis].map(({ feasible }) => feasible));
  });

  it('give the front of what lies within ranges, not what is left of the whole front', () => {
    const filters: RangeFilters = {
      depthMm: { low: null, high: 600 },
      fc: { low: 30, high: null },
      curvatureDuctility: { low: 4.5, high: 9 },
    };
    const kept = ALL.filter((section) => isWithinFilters(section, filters));
    const points = kept.map(({ index, evaluation }) => ({
      index,
      x: evaluation.measures[view.x]!,
      y: evaluation.measures[view.y]!,
    }));
    const cut = cutColumns(COLUMNS, query(filters));
    expect(kept.length).toBeGreaterThan(10);
    expect(cut.count).toBe(kept.length);
    expect(cut.front).toEqual(nonDominated(points, { x: 1, y: -1 }));
    const survivors = RESULT.front.filter(({ index }) => kept.some((section) => section.index === index));
    expect(cut.front.length).toBeGreaterThan(survivors.length);
  });

  it('give the front in three measures of what lies within ranges', () => {
    const filters: RangeFilters = { depthMm: { low: null, high: 600 } };
    const inThree = { ...view, z: 'depthMm' } as const;
    const kept = ALL.filter((section) => isWithinFilters(section, filters)).map(({ evaluation }) =>
      [view.x, view.y, inThree.z].map(
        (id) => (MEASURE_DIRECTION[id] === 'less' ? 1 : -1) * evaluation.measures[id]!,
      ),
    );
    const isBeaten = (p: number[]) =>
      kept.some((q) => q.every((value, k) => value <= p[k]!) && q.some((value, k) => value < p[k]!));
    const expected = new Set(kept.filter((p) => !isBeaten(p)).map(String));
    const cut = cutColumns(COLUMNS, query(filters, { view: inThree }));
    expect(expected.size).toBeGreaterThan(cut.front.length);
    expect(cut.inThree!.count).toBe(expected.size);
    expect(cut.inThree!.points.map(({ x, y, z }) => String([x, -y, z]))).toEqual(
      expect.arrayContaining([...expected]),
    );
  });

  it('come to nothing where nothing lies within', () => {
    const cut = cutColumns(COLUMNS, query({ depthMm: { low: 10_000, high: null } }));
    expect(cut).toMatchObject({ count: 0, front: [], band: [], isBandCut: false });
  });
});

describe('the cloud of what is shown', () => {
  const [xs, ys] = [COLUMNS.measure(view.x), COLUMNS.measure(view.y)];
  const ends = (values: Float64Array) => ({ low: Math.min(...values), high: Math.max(...values) });
  const windowOf = (isLog: boolean, x = ends(xs)) => ({
    x: { ...x, isLog, cells: 17 },
    y: { ...ends(ys), isLog, cells: 9 },
  });
  const counted = ({ density }: Cut) => density!.reduce((sum, cell) => sum + cell.count, 0);

  it('counts every section once, those on the outermost values too, on even and logarithmic axes', () => {
    for (const isLog of [false, true])
      expect(counted(cutColumns(COLUMNS, query({}, { window: windowOf(isLog) })))).toBe(RESULT.feasible);
  });

  it('counts what is enlarged in cells that hold it', () => {
    const { low, high } = ends(xs);
    const part = { low: low + (high - low) / 3, high: low + (high - low) / 2 };
    const cut = cutColumns(COLUMNS, query({}, { window: windowOf(false, part) }));
    const inside = [...xs].filter((x) => x >= part.low && x <= part.high).length;
    expect(inside).toBeGreaterThan(0);
    expect(counted(cut)).toBe(inside);
    for (const { x0, x1 } of cut.density!) {
      expect(x0).toBeGreaterThanOrEqual(part.low - 1e-9);
      expect(x1).toBeLessThanOrEqual(part.high + 1e-9);
    }
  });

  it('spreads each value over its own least and most', () => {
    const filters: RangeFilters = { widthMm: { low: null, high: 300 } };
    const { spreads, count } = cutColumns(
      COLUMNS,
      query(filters, { keys: ['steelKgPerM', 'compressionSteel'] }),
    );
    for (const spread of Object.values(spreads)) {
      expect(spread.all.reduce((a, b) => a + b)).toBe(RESULT.feasible);
      expect(spread.within.reduce((a, b) => a + b)).toBe(count);
    }
    expect(spreads.steelKgPerM).toMatchObject(ends(COLUMNS.measure('steelKgPerM')));
  });

  it('is picked from: the section nearest on screen, within reach and within the ranges', () => {
    const aim = { x: xs[5]! + 0.02, y: ys[5]! };
    const pick = { view, filters: {}, at: aim, perPx: { x: 0.01, y: 0.01 }, isLog: { x: false, y: false } };
    const found = nearestSection(COLUMNS, { ...pick, reachPx: 24 })!;
    const away = (at: number) => Math.hypot(xs[at]! - aim.x, ys[at]! - aim.y);
    const least = Math.min(...Array.from(xs, (_, at) => away(at)));
    expect(away(COLUMNS.index.indexOf(found))).toBe(least);
    expect(nearestSection(COLUMNS, { ...pick, at: { x: 1e6, y: 0 }, reachPx: 24 })).toBeNull();
    const filters: RangeFilters = { widthMm: { low: 1e4, high: null } };
    expect(nearestSection(COLUMNS, { ...pick, filters, reachPx: 24 })).toBeNull();
  });
});

describe('questions to the thread', () => {
  function desk() {
    const sent: FeasibleRequest[] = [];
    const answered: CutQuery[] = [];
    let take: (answer: FeasibleAnswer) => void = () => undefined;
    const opened = new FeasibleDesk(
      {
        postMessage: (request) => sent.push(request),
        terminate: () => undefined,
        listen: (listener) => {
          take = listener;
        },
      },
      { onOpened: () => undefined, onTooMany: () => undefined, onCut: (_, of) => answered.push(of) },
    );
    return { opened, sent, answered, answer: (message: FeasibleAnswer) => take(message) };
  }
  const CUT = cutColumns(COLUMNS, query());
  const [first, second, third] = [1, 2, 3].map((low) => query({ depthMm: { low, high: null } })) as [
    CutQuery,
    CutQuery,
    CutQuery,
  ];

  it('wait until the sections are there, go one at a time, and only the newest waits', () => {
    const { opened, sent, answered, answer } = desk();
    opened.cut(first);
    expect(sent).toEqual([]);
    answer({ kind: 'opened', count: 3 });
    opened.cut(second);
    opened.cut(third);
    expect(sent.map((request) => request.kind === 'cut' && request.query)).toEqual([first]);
    answer({ kind: 'cut', id: 1, cut: CUT });
    answer({ kind: 'cut', id: 2, cut: CUT });
    expect(answered).toEqual([first, third]);
  });

  it('are answered with no section when the desk closes, or before there is any', async () => {
    const { opened, answer } = desk();
    const pick = {
      view,
      filters: {},
      at: { x: 0, y: 0 },
      perPx: { x: 1, y: 1 },
      isLog: { x: false, y: false },
      reachPx: 9,
    };
    expect(await opened.pick(pick)).toBeNull();
    answer({ kind: 'opened', count: 3 });
    const asked = opened.pick(pick);
    opened.close();
    expect(await asked).toBeNull();
  });
});
