import { describe, expect, it } from 'vitest';
import { finishResult } from '#shared/sweep/finish.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import { spaceSize } from '#shared/sweep/space.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import { CHECK_IDS } from '#shared/engine/evaluation.ts';
import { checkSequence } from '#client/src/features/run/check-sequence.ts';
import { carriedOn, edgeFindings } from '#client/src/features/run/edge-findings.ts';
import { exploreKeys, snapValues } from '#client/src/features/run/explore-keys.ts';
import { thirdMeasure } from '#client/src/features/run/mark-scale.ts';
import { ladder, missedChecks } from '#client/src/features/run/missed-checks.ts';
import { movedRange, steppedValue, valueAt } from '#client/src/features/run/range-scale.ts';
import { findRows, rowsOf } from '#client/src/features/run/section-rows.ts';
import { createSectionSource } from '#client/src/features/run/section-source.ts';
import { BASIS, DEFINITION } from './problem.ts';

function sweep(definition: SweepDefinition) {
  const problem = { ...definition, basis: BASIS };
  const { view } = definition;
  const chunk = sweepRange(prepareSweep(problem, view), 0, spaceSize(definition.space));
  const source = createSectionSource({ definition, basis: BASIS });
  return { definition, source, result: finishResult(problem, view, chunk) };
}
const RUN = sweep(DEFINITION);

describe('why the rest fell out', () => {
  it('goes down from all sections to those that meet every check', () => {
    const counts = ladder(RUN.result).map(({ count }) => count);
    expect(counts[0]).toBe(RUN.result.evaluated);
    expect(counts.at(-1)).toBe(RUN.result.feasible);
    expect(counts).toEqual(counts.toSorted((a, b) => b - a));
  });

  it('asks one check after another: what each takes of what is left, down to those that meet all', () => {
    const { steps, feasible, evaluated } = checkSequence(RUN.result)!;
    expect(steps.map(({ check }) => check)).toEqual(
      CHECK_IDS.filter((check) => steps.some((step) => step.check === check)),
    );
    let left = evaluated;
    for (const step of steps) {
      expect(step.taken).toBeGreaterThan(0);
      expect(step.left).toBe(left - step.taken);
      left = step.left;
    }
    expect([left, feasible]).toEqual([RUN.result.feasible, RUN.result.feasible]);
    const fit = RUN.result.failures.find(({ check }) => check === 'bar-fit')!;
    expect(steps[0]).toMatchObject({ check: 'bar-fit', taken: fit.failed });
  });

  it('says nothing of an order that was not counted: an older result, or one by bounds', () => {
    const old = RUN.result.failures.map(({ failedFirst: _first, ...failure }) => failure);
    expect(checkSequence({ ...RUN.result, failures: old })).toBeNull();
    expect(checkSequence({ ...RUN.result, failures: [], feasible: null })).toBeNull();
  });

  it('gives with each check the best section that it alone keeps out, and by how much that misses', () => {
    const missed = missedChecks(RUN.result, RUN.source);
    expect(missed.map(({ failed }) => failed)).toEqual(
      missed.map(({ failed }) => failed).sort((a, b) => b - a),
    );
    const withNearest = missed.flatMap(({ check, nearest }) =>
      nearest === null ? [] : [{ check, ...nearest }],
    );
    expect(withNearest.length).toBeGreaterThan(1);
    for (const { check, result } of withNearest) {
      expect(result).toMatchObject({ id: check, passes: false });
      if (result!.ratio !== null) expect(result!.ratio).toBeGreaterThan(1);
    }
  });

  it('does not compare with a best where there is none', () => {
    const missed = missedChecks({ ...RUN.result, front: [] }, RUN.source);
    for (const { nearest } of missed) if (nearest !== null) expect(nearest.isBetter).toBeNull();
  });
});

describe('the end of a range', () => {
  /** A moment that asks for all the depth there is. */
  const HEAVY = { muNmm: 600e6, ductilityTarget: null, depthCapMm: null };

  it('is told where the best lies there, with the sweep that goes on', () => {
    const narrow = sweep({ ...DEFINITION, demand: HEAVY });
    const finding = edgeFindings(narrow.result, narrow.definition, narrow.source).find(
      ({ axis, end }) => axis === 'depth' && end === 'high',
    );
    expect(finding).toMatchObject({ value: 700, isBestThere: true });
    expect(finding!.extended!.definition.space.depth).toEqual({
      kind: 'range',
      from: 400,
      to: 850,
      step: 50,
    });
  });

  it('is left alone where a cap or a column draws the line, and where no section meets every check', () => {
    const capped = sweep({ ...DEFINITION, demand: { ...HEAVY, depthCapMm: 700 } });
    expect(capped.result.front.length).toBeGreaterThan(0);
    const told = edgeFindings(capped.result, capped.definition, capped.source);
    expect(told.some(({ axis, end }) => axis === 'depth' && end === 'high')).toBe(false);
    expect(edgeFindings({ ...RUN.result, front: [] }, DEFINITION, RUN.source)).toEqual([]);
  });

  it('is carried on by its own steps, a list by its last one, and not past what is built', () => {
    const bounds = { low: 100, high: 1000 };
    expect(carriedOn({ kind: 'list', values: [250, 300, 400] }, 'high', bounds)).toEqual({
      axis: { kind: 'list', values: [250, 300, 400, 500] },
      to: 500,
    });
    expect(carriedOn({ kind: 'range', from: 120, to: 900, step: 60 }, 'low', bounds)).toBeNull();
    expect(carriedOn({ kind: 'list', values: [300] }, 'high', bounds)).toBeNull();
  });
});

describe('a handle of a range', () => {
  const depth = { low: 400, high: 700, snap: [400, 450, 500, 550, 600, 650, 700] };
  const cost = { low: 100, high: 301, snap: null };

  it('comes to rest on a value of its axis, or on a number a person would type', () => {
    expect(valueAt(depth, 0.4, 'length', 'si')).toBe(500);
    expect(valueAt(cost, 1 / 3, 'ratio', 'si')).toBe(167);
    expect(valueAt(depth, 7, 'length', 'si')).toBe(700);
  });

  it('steps to the next value by key, and no further than the last', () => {
    expect(steppedValue(depth, { from: 500, steps: 1 }, 'length', 'si')).toBe(550);
    expect(steppedValue(depth, { from: 400, steps: -1 }, 'length', 'si')).toBe(400);
    expect(steppedValue(cost, { from: 200, steps: -5 }, 'ratio', 'si')).toBe(180);
  });

  it('opens its side at the end of the axis and never passes the other', () => {
    expect(movedRange({ low: 450, high: 600 }, 'high', 700, depth)).toEqual({ low: 450, high: null });
    expect(movedRange({ low: 450, high: 600 }, 'low', 650, depth)).toEqual({ low: 600, high: 600 });
  });

  it('has the axis’ own values to stop at where there are any', () => {
    const run = { definition: DEFINITION, basis: BASIS };
    const keys = exploreKeys(run, RUN.source.space, 'si');
    expect(keys).toContain('fc');
    expect(keys).not.toContain('fy');
    expect(keys).not.toContain('costPerM');
    expect(snapValues('fc', RUN.source.space, run)).toEqual([25, 30, 35]);
    expect(snapValues('steelKgPerM', RUN.source.space, run)).toBeNull();
  });
});

describe('a third measure on the marks', () => {
  it('runs from the front’s own least to its most', () => {
    const third = thirdMeasure(RUN.result.front, { key: 'depthMm', style: 'size' }, RUN.source)!;
    const depths = RUN.result.front.map(({ index }) => RUN.source.sectionAt(index).depthMm);
    expect([third.low, third.high]).toEqual([Math.min(...depths), Math.max(...depths)]);
    expect(Math.min(...third.scale.shares.map(Number))).toBeGreaterThanOrEqual(0);
    expect(Math.max(...third.scale.shares.map(Number))).toBeLessThanOrEqual(1);
  });

  it('says nothing where no section has it', () => {
    expect(thirdMeasure(RUN.result.front, { key: 'costPerM', style: 'tint' }, RUN.source)).toBeNull();
  });
});

it('finds rows by bars and size as they are printed, each of several words in it', () => {
  const rows = rowsOf(RUN.result.front, RUN.source);
  const bars = (words: string) => findRows(rows, words, 'si');
  expect(bars('')).toBe(rows);
  const [first] = rows;
  const size = `${first!.section.widthMm}x${first!.section.depthMm}`;
  expect(bars(size)).toContain(first);
  for (const row of bars('16, -25')) expect(JSON.stringify(row.section.reinforcement)).toMatch(/"25".*"16"/);
});
