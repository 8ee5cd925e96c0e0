import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  boxedExtents,
  heldExtents,
  movedExtents,
  windowExtents,
  windowOf,
  zoomedExtents,
} from '#client/src/charts/chart-window.ts';
import { mixColours } from '#client/src/charts/mix-colours.ts';
import { plotTicks } from '#client/src/charts/plot-axis.ts';

const FRAME = { width: 240, height: 140, left: 20, right: 20, top: 20, bottom: 20 };
const side = (min: number, max: number) => ({ min, max, step: 0 });
const WHOLE = { x: side(0, 100), y: side(0, 10) };

describe('what is shown of the chart', () => {
  it('keeps the place it is enlarged about, and comes back when it is reduced as much', () => {
    const about = { x: 0.25, y: 0.5 };
    const close = zoomedExtents(WHOLE, 0.5, about);
    expect(close).toEqual({ x: side(12.5, 62.5), y: side(2.5, 7.5) });
    expect(zoomedExtents(close, 2, about)).toEqual(WHOLE);
  });

  it('is what a box was drawn around, whichever corner it was begun at, cut to the drawing', () => {
    const wanted = { x: side(50, 100), y: side(5, 10) };
    expect(
      boxedExtents(WHOLE, FRAME, [
        { xPx: 120, yPx: 70 },
        { xPx: 900, yPx: -5 },
      ]),
    ).toEqual(wanted);
    expect(
      boxedExtents(WHOLE, FRAME, [
        { xPx: 900, yPx: -5 },
        { xPx: 120, yPx: 70 },
      ]),
    ).toEqual(wanted);
  });

  it('moves by shares of itself', () => {
    expect(movedExtents(WHOLE, { x: 0.1, y: -0.5 })).toEqual({ x: side(10, 110), y: side(-5, 5) });
  });

  it('is the whole again once nothing is enlarged, and never so small that digits run out', () => {
    expect(heldExtents(zoomedExtents(WHOLE, 1.2), WHOLE, WHOLE)).toBeNull();
    const tiny = zoomedExtents(WHOLE, 1e-5);
    expect(heldExtents(tiny, WHOLE, WHOLE)).toBe(WHOLE);
  });

  it('goes into the address in stored units and comes back, along even and logarithmic axes', () => {
    const scales = { x: { perSi: 0.5, isLog: true }, y: { perSi: 2, isLog: false } };
    const extents = { x: side(0.5, 1.5), y: side(-4, 9) };
    const back = windowExtents(windowOf(extents, scales), scales)!;
    expect(back.x.min).toBeCloseTo(0.5, 9);
    expect(back.x.max).toBeCloseTo(1.5, 9);
    expect(back.y).toEqual(extents.y);
  });

  it('is nothing where an address asks for zero on a logarithmic axis', () => {
    const scales = { x: { perSi: 1, isLog: true }, y: { perSi: 1, isLog: false } };
    expect(windowExtents({ x: { low: 0, high: 5 }, y: { low: 1, high: 2 } }, scales)).toBeNull();
  });
});

describe('the ticks of an axis', () => {
  it('lie within it, ascending, at least two and never many', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -3, max: 4, noNaN: true }),
        fc.double({ min: 0.05, max: 5, noNaN: true }),
        fc.boolean(),
        (min, span, isLog) => {
          const ticks = plotTicks(side(min, min + span), isLog, 6);
          expect(ticks.length).toBeGreaterThanOrEqual(2);
          expect(ticks.length).toBeLessThan(24);
          expect(ticks).toEqual([...new Set(ticks)].sort((a, b) => a - b));
          expect(ticks[0]).toBeGreaterThanOrEqual(min - 1e-6);
          expect(ticks.at(-1)).toBeLessThanOrEqual(min + span + 1e-6);
        },
      ),
    );
  });

  it('are those of the step the axis was fitted with', () => {
    expect(plotTicks({ min: 0, max: 15, step: 5 }, false, 6)).toEqual([0, 5, 10, 15]);
  });
});

it('mixes colours from one end to the other', () => {
  expect(mixColours('#000000', '#ffffff', 0)).toBe('#000000');
  expect(mixColours('#000', '#fff', 0.5)).toBe('#808080');
  expect(mixColours('#102030', '#fff', 1)).toBe('#ffffff');
});
