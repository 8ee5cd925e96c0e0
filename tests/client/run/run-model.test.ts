import { describe, expect, it } from 'vitest';
import type { ViewProgress } from '#shared/contract/records.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { spaceSize } from '#shared/sweep/space.ts';
import type { ViewResult } from '#shared/sweep/result.ts';
import { rulerMarks } from '#client/src/features/run/axis-ruler-model.ts';
import { bandWithin } from '#shared/sweep/band-within.ts';
import { checkWords } from '#client/src/features/run/check-words.ts';
import { columnDecimals } from '#client/src/features/run/column-decimals.ts';
import { pricesOfChecks } from '#client/src/features/run/price-of-checks.ts';
import {
  filtersPart,
  logPart,
  orderPart,
  askedView,
  readRunAddress,
  viewPart,
  windowPart,
  withMeasure,
} from '#client/src/features/run/run-address.ts';
import { createSectionSource } from '#client/src/features/run/section-source.ts';
import { sortRows } from '#client/src/features/run/section-rows.ts';
import { stripScale } from '#client/src/features/run/strip-scale.ts';
import { newerProgress, PaceWindow, paceOf } from '#client/src/features/run/view-progress.ts';
import { BASIS, DEFINITION } from './problem.ts';

const PROBLEM = { ...DEFINITION, basis: BASIS };
const { view } = DEFINITION;

function swept(): ViewResult {
  const whole = sweepRange(prepareSweep(PROBLEM, view), 0, spaceSize(DEFINITION.space));
  return finishResult(PROBLEM, view, whole);
}
const RESULT = swept();
const SOURCE = createSectionSource({ definition: DEFINITION, basis: BASIS });

describe('sections computed again in the browser', () => {
  it('have exactly the two measures the run found them by', () => {
    expect(RESULT.front.length).toBeGreaterThan(3);
    for (const point of RESULT.front) {
      const { measures, meetsListedChecks } = SOURCE.evaluatedAt(point.index).evaluation;
      expect(measures.steelKgPerM).toBe(point.x);
      expect(measures.curvatureDuctility).toBe(point.y);
      expect(meetsListedChecks).toBe(true);
    }
  });

  it('are computed once', () => {
    const { index } = RESULT.front[0]!;
    expect(SOURCE.evaluatedAt(index)).toBe(SOURCE.evaluatedAt(index));
  });
});

describe('the near-best band', () => {
  it('holds what lies within its share of the best, and nothing else', () => {
    const best = RESULT.front[0]!.x;
    const narrow = bandWithin(RESULT, 0.05);
    expect(narrow.length).toBeGreaterThan(0);
    expect(narrow).toEqual(RESULT.band.filter((point) => point.x <= best * 1.05 + 1e-6));
    expect(bandWithin(RESULT, 0.1)).toHaveLength(RESULT.band.length);
  });

  it('is empty at no width, and where nothing meets every check', () => {
    expect(bandWithin(RESULT, 0)).toEqual([]);
    expect(bandWithin({ ...RESULT, front: [] }, 0.1)).toEqual([]);
  });

  it('goes down from the best where more is better', () => {
    const upward = {
      view: { x: 'curvatureDuctility', y: 'steelKgPerM' },
      front: [{ index: 1, x: 10, y: 1, tieCount: 1, ties: [1] }],
      band: [
        { index: 1, x: 10, y: 1 },
        { index: 2, x: 9.6, y: 1 },
        { index: 3, x: 9.1, y: 1 },
      ],
    } as const;
    expect(bandWithin(upward, 0.05).map((point) => point.index)).toEqual([1, 2]);
  });
});

describe('what a check costs', () => {
  it('names only checks whose removal improves the leading measure, the dearest first', () => {
    const prices = pricesOfChecks(RESULT);
    expect(prices.length).toBeGreaterThan(0);
    const best = RESULT.front[0]!.x;
    for (const price of prices) {
      expect(price.without).toBeLessThan(best);
      const { evaluation } = SOURCE.evaluatedAt(price.index);
      expect(evaluation.checks.filter((check) => !check.passes).map((check) => check.id)).toEqual([
        price.check,
      ]);
    }
    expect(prices.map((price) => price.without)).toEqual(
      prices.map((price) => price.without).sort((a, b) => a - b),
    );
  });

  it('names the nearest sections where nothing meets every check', () => {
    const prices = pricesOfChecks({ ...RESULT, front: [] });
    expect(prices.length).toBeGreaterThan(0);
    for (const price of prices) expect(price.best).toBeNull();
  });

  it('says in the reader’s units what was asked', () => {
    expect(checkWords('curvature-ductility', DEFINITION, { units: 'si', currency: null })).toBe('μφ ≥ 4');
    expect(checkWords('depth-cap', DEFINITION, { units: 'us', currency: null })).toBe('h ≤ 25.59 in');
    expect(checkWords('bar-fit', DEFINITION, { units: 'si', currency: null })).toBe('the bar fit');
  });
});

describe('the ruler of an axis', () => {
  const frame = { widthPx: 236, insetPx: 12, barPx: 24, labelPitchPx: 30 };

  it('stands the largest share highest and marks every value in its place', () => {
    const marks = rulerMarks(RESULT.axisCounts!.depth, frame);
    expect(marks.map((mark) => mark.value)).toEqual([400, 450, 500, 550, 600, 650, 700]);
    expect(Math.max(...marks.map((mark) => mark.heightPx))).toBeCloseTo(frame.barPx, 9);
    expect(marks[0]!.xPx).toBe(frame.insetPx);
    expect(marks.at(-1)!.xPx).toBe(frame.widthPx - frame.insetPx);
  });

  it('keeps a bar for a value that a single section uses', () => {
    const marks = rulerMarks(
      [
        { value: 1, feasible: 1, evaluated: 1_000_000 },
        { value: 2, feasible: 900_000, evaluated: 1_000_000 },
      ],
      frame,
    );
    expect(marks[0]!.heightPx).toBeGreaterThan(1);
  });

  it('stands nothing before the first part of a run, and copes with one value', () => {
    expect(rulerMarks([{ value: 300, feasible: 0, evaluated: 0 }], frame)[0]).toMatchObject({
      heightPx: 0,
      share: 0,
      xPx: 118,
      isLabelled: true,
    });
  });

  it('leaves labels out that would touch', () => {
    const counts = Array.from({ length: 60 }, (_, k) => ({ value: k, feasible: 1, evaluated: 2 }));
    const labelled = rulerMarks(counts, frame).filter((mark) => mark.isLabelled);
    const pitches = labelled.slice(1).map((mark, k) => mark.xPx - labelled[k]!.xPx);
    expect(Math.min(...pitches)).toBeGreaterThanOrEqual(frame.labelPitchPx);
  });
});

describe('the address of a run', () => {
  const first = { x: 'steelKgPerM', y: 'curvatureDuctility' } as const;
  const read = (text: string) => readRunAddress(new URLSearchParams(text), first);

  it('gives view, section and band', () => {
    expect(read('x=costPerM&y=depthMm&i=42&band=2.5')).toMatchObject({
      view: { x: 'costPerM', y: 'depthMm' },
      index: 42,
      bandShare: 0.025,
    });
  });

  it('gives back all that was written into it', () => {
    const filters = { depthMm: { low: 500, high: 609.6 }, costPerM: { low: null, high: 300 } };
    const window = { x: { low: 10, high: 20 }, y: { low: 4, high: 9 } };
    const parts = {
      ...logPart(true, true),
      ...windowPart(window),
      ...filtersPart(filters),
      ...orderPart({ key: 'depthMm', isDescending: true }),
    };
    const written = new URLSearchParams(
      Object.entries(parts).flatMap(([key, value]) => (value === null ? [] : [[key, value]])),
    );
    expect(read(written.toString())).toMatchObject({
      filters,
      window,
      isXLog: true,
      isYLog: true,
      order: { key: 'depthMm', isDescending: true },
    });
  });

  it('drops the enlarged part with the axes it was of, and keeps the ranges', () => {
    expect(viewPart({ x: 'costPerM', y: 'depthMm' })).toMatchObject({ zx: null, zy: null });
    expect(Object.keys(viewPart({ x: 'costPerM', y: 'depthMm' }))).not.toContain('f');
  });

  it('falls back where it makes no sense', () => {
    expect(read('x=beauty&y=depthMm&i=-1&band=x')).toEqual(read(''));
    expect(read('x=depthMm&y=depthMm&i=1e9&band=400')).toEqual({ ...read(''), bandShare: 0.1 });
    expect(read('by=beauty&as=song&zx=9~1&zy=1~2&f=depthMm:9~1;hue:1~2&show=off&sort=a b')).toEqual(read(''));
    expect(read('').bandShare).toBe(0.05);
  });

  it('asks for the front in three measures where the third is a measure that no axis shows', () => {
    const asked = (text: string) => askedView(read(text));
    expect(asked('by=depthMm&in=3')).toEqual({ ...first, z: 'depthMm' });
    for (const text of ['by=depthMm', 'in=3', 'by=fc&in=3', 'by=steelKgPerM&in=3', 'by=depthMm&in=three'])
      expect(asked(text)).toEqual(first);
  });

  it('swaps the measures when one side takes the other’s', () => {
    expect(withMeasure(first, 'x', 'curvatureDuctility')).toEqual({
      x: 'curvatureDuctility',
      y: 'steelKgPerM',
    });
    expect(withMeasure(first, 'y', 'depthMm')).toEqual({ x: 'steelKgPerM', y: 'depthMm' });
  });
});

describe('answers and events that overtake each other', () => {
  const progress = (sequence: number, changes: Partial<ViewProgress> = {}): ViewProgress => ({
    viewId: 'v',
    sequence,
    view,
    state: 'running',
    evaluated: 100,
    feasible: 0,
    sectionCount: 1000,
    search: null,
    elapsedMs: 100,
    result: null,
    message: null,
    ...changes,
  });

  it('never take a view back to an earlier state', () => {
    const finished = progress(9, { state: 'finished', evaluated: 1000 });
    expect(newerProgress(finished, progress(8))).toBe(finished);
    expect(newerProgress(progress(8), finished)).toEqual(finished);
  });

  it('take a resumed view back to work, even with less done than was shown', () => {
    const resumed = progress(6, { state: 'queued', evaluated: 40 });
    expect(newerProgress(progress(5, { state: 'cancelled' }), resumed)).toEqual(resumed);
  });

  it('keep the result that an event does not repeat, and ask for one they do not know', () => {
    const { result: _result, ...event } = progress(4, { evaluated: 200 });
    const known = progress(3, { result: RESULT });
    expect(newerProgress(known, event)).toEqual({ ...event, result: RESULT });
    expect(newerProgress(undefined, event)).toBeUndefined();
    expect(newerProgress({ ...known, viewId: 'another' }, event)).toBeUndefined();
  });

  it('tell the time left from the pace so far, or of late', () => {
    const quarter = progress(2, { evaluated: 250 });
    expect(paceOf(quarter)).toEqual({ share: 0.25, perSecond: 2500, leftMs: 300 });
    expect(paceOf(quarter, 5000)).toEqual({ share: 0.25, perSecond: 5000, leftMs: 150 });
    expect(paceOf(quarter, 0).leftMs).toBeNull();
    expect(paceOf(progress(1, { evaluated: 0 }))).toEqual({ share: 0, perSecond: null, leftMs: null });
  });

  it('know the pace of late from a second of work on, and begin anew when a worker was lost', () => {
    const pace = new PaceWindow();
    const told = [0, 900, 2000, 9000, 10_000].map((elapsedMs) =>
      pace.add({ elapsedMs, evaluated: elapsedMs < 9000 ? elapsedMs : 20_000 + elapsedMs }),
    );
    expect(told).toEqual([null, null, 1000, (27_000 / 7000) * 1000, 3500]);
    expect(pace.add({ elapsedMs: 10_100, evaluated: 500 })).toBeNull();
  });
});

describe('the strip and the table', () => {
  const rows = RESULT.front.map((point) => ({
    ...SOURCE.evaluatedAt(point.index),
    tieCount: point.tieCount,
  }));

  it('draws all sections at one scale, the deepest filling the height', () => {
    const sections = rows.map((row) => row.section);
    const { pxPerMm, cellPx } = stripScale(sections, 130);
    expect(Math.max(...sections.map((section) => section.depthMm * pxPerMm))).toBeCloseTo(130, 9);
    for (const section of sections) expect(section.widthMm * pxPerMm).toBeLessThan(cellPx);
  });

  it('keeps the front’s order until a column is chosen, then orders by it both ways', () => {
    expect(sortRows(rows, null)).toBe(rows);
    const up = sortRows(rows, { key: 'curvatureDuctility', isDescending: false });
    const values = up.map((row) => row.evaluation.measures.curvatureDuctility!);
    expect(values).toEqual(values.toSorted((a, b) => a - b));
    const down = sortRows(rows, { key: 'tension', isDescending: true });
    const areas = down.map((row) => row.evaluation.geometry!.asMm2);
    expect(areas).toEqual(areas.toSorted((a, b) => b - a));
  });

  it('puts unknown values last whichever way it is ordered', () => {
    const blank = rows.map((row, k) =>
      k === 0
        ? row
        : {
            ...row,
            evaluation: { ...row.evaluation, measures: { ...row.evaluation.measures, costPerM: k } },
          },
    );
    for (const isDescending of [true, false])
      expect(sortRows(blank, { key: 'costPerM', isDescending }).at(-1)).toBe(rows[0]);
  });

  it('gives a whole column the decimals its largest number takes', () => {
    expect(columnDecimals([8.07, 13.57])).toBe(2);
    expect(columnDecimals([89.2, 108.8])).toBe(1);
    expect(columnDecimals([0.99])).toBe(3);
    expect(columnDecimals([12_000])).toBe(0);
    expect(columnDecimals([null])).toBe(0);
  });
});
