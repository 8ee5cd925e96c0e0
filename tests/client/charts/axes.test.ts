import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fitExtent, nextExtent } from '#client/src/charts/axis-extent.ts';
import { chartLimits } from '#client/src/charts/chart-limits.ts';
import type { ChartAxis } from '#client/src/charts/front-chart-input.ts';
import { frontSteps } from '#client/src/charts/front-steps.ts';
import { nearestMark } from '#client/src/charts/nearest-mark.ts';

const axis = (direction: 'less' | 'more'): ChartAxis => ({
  title: 'Steel',
  unit: 'kg/m',
  direction,
  perSi: 1,
  isLog: false,
  formatTick: String,
});

describe('the extent of an axis', () => {
  it('holds its values between round ends', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e4, max: 1e4, noNaN: true }),
        fc.double({ min: 1e-3, max: 1e4, noNaN: true }),
        (low, span) => {
          const extent = fitExtent(low, low + span, 6);
          expect(extent.min).toBeLessThanOrEqual(low + extent.step * 1e-6);
          expect(extent.max).toBeGreaterThanOrEqual(low + span - extent.step * 1e-6);
          expect((extent.max - extent.min) / extent.step).toBeLessThanOrEqual(9);
        },
      ),
    );
  });

  it('gives room around a single value', () => {
    const extent = fitExtent(6, 6, 6);
    expect(extent.min).toBeLessThan(6);
    expect(extent.max).toBeGreaterThan(6);
  });

  it('stays while a run grows inside it, and follows once something lies outside', () => {
    const kept = { min: 0, max: 10, step: 2 };
    expect(nextExtent(kept, { min: 2, max: 8, step: 1 })).toBe(kept);
    expect(nextExtent(kept, { min: 2, max: 12, step: 2 })).toEqual({ min: 2, max: 12, step: 2 });
  });

  it('is fitted anew when the drawing would sit in a corner of it', () => {
    expect(nextExtent({ min: 0, max: 10, step: 2 }, { min: 0, max: 2, step: 0.5 }).max).toBe(2);
  });

  it('always shows the whole front, the pins and the target', () => {
    const limits = chartLimits(axis('less'), axis('more'), {
      cells: [{ x0: 10, x1: 11, y0: 1, y1: 2, count: 1000 }],
      front: [
        { index: 1, x: 10, y: 2, tieCount: 1, ties: [1] },
        { index: 2, x: 40, y: 9, tieCount: 1, ties: [2] },
      ],
      pins: [{ index: 3, label: 'A', x: 55, y: 3 }],
      target: { axis: 'y', value: 12 },
    });
    expect(limits.x.max).toBeGreaterThanOrEqual(55);
    expect(limits.y.max).toBeGreaterThanOrEqual(12);
  });

  it('leaves the last tenth of the cloud, far from any trade-off, off the axis', () => {
    const limits = chartLimits(axis('less'), axis('more'), {
      cells: [
        { x0: 10, x1: 20, y0: 1, y1: 2, count: 95 },
        { x0: 900, x1: 1000, y0: 1, y1: 2, count: 5 },
      ],
      front: [{ index: 1, x: 10, y: 2, tieCount: 1, ties: [1] }],
      pins: [],
      target: null,
    });
    expect(limits.x.max).toBeLessThan(100);
  });
});

describe('the stepped front', () => {
  it('keeps the first y until the next mark is reached', () => {
    const corners = frontSteps(
      [
        { x: 1, y: 2 },
        { x: 3, y: 5 },
      ],
      { x: 10, y: 0 },
    );
    expect(corners).toEqual([
      { x: 1, y: 0 },
      { x: 1, y: 2 },
      { x: 3, y: 2 },
      { x: 3, y: 5 },
      { x: 10, y: 5 },
    ]);
  });

  it('is nothing without a mark', () => {
    expect(frontSteps([], { x: 1, y: 1 })).toEqual([]);
  });
});

describe('a click on the chart', () => {
  const plot = {
    frame: { width: 240, height: 140, left: 20, right: 20, top: 20, bottom: 20 },
    xExtent: { min: 0, max: 10, step: 1 },
    yExtent: { min: 0, max: 10, step: 1 },
  };
  const marks = [
    { index: 7, x: 5, y: 5 },
    { index: 8, x: 5.5, y: 5 },
  ];

  it('picks the nearest real section within reach', () => {
    expect(nearestMark(marks, { xPx: 119, yPx: 72 }, plot)?.index).toBe(7);
    expect(nearestMark(marks, { xPx: 128, yPx: 72 }, plot)?.index).toBe(8);
  });

  it('picks nothing far from every mark', () => {
    expect(nearestMark(marks, { xPx: 30, yPx: 30 }, plot)).toBeUndefined();
  });
});
