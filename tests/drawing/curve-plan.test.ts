import { describe, expect, it } from 'vitest';
import { CURVE_SHEET, curvePlan, type PlottedCurve } from '#shared/drawing/curve-plan.ts';

const curve = (scale: number, marks: PlottedCurve['marks'] = []): PlottedCurve => ({
  label: '',
  points: [
    { curvaturePerMm: 0, momentNmm: 0 },
    { curvaturePerMm: 6e-6, momentNmm: 300e6 * scale },
    { curvaturePerMm: 60e-6, momentNmm: 310e6 * scale },
  ],
  marks,
  corner: null,
});
const pointsOf = (path: string) =>
  path
    .slice(2)
    .split(' L ')
    .map((pair) => pair.split(' ').map(Number) as [number, number]);

describe('a moment–curvature plot', () => {
  it('starts at the origin and keeps every point within its frame, also of the highest of several', () => {
    const { curves } = curvePlan({ curves: [curve(1), curve(0.4)], levels: [], units: 'si' });
    for (const { path } of curves) {
      const points = pointsOf(path);
      expect(points[0]).toEqual([CURVE_SHEET.left, CURVE_SHEET.height - CURVE_SHEET.bottom]);
      for (const [x, y] of points) {
        expect(x).toBeLessThanOrEqual(CURVE_SHEET.width - CURVE_SHEET.right);
        expect(y).toBeGreaterThanOrEqual(CURVE_SHEET.top);
      }
    }
  });

  it('draws the same curve whatever the units, and says the units', () => {
    const [si, us] = (['si', 'us'] as const).map((units) =>
      curvePlan({ curves: [curve(1)], levels: [], units }),
    );
    expect(us!.curves[0]!.path).toBe(si!.curves[0]!.path);
    expect([si!.yTitle, us!.yTitle]).toEqual(['Moment M, kN·m', 'Moment M, kip·ft']);
  });

  it('puts ticks where their numbers are', () => {
    const { xTicks, curves } = curvePlan({ curves: [curve(1)], levels: [], units: 'si' });
    const [end] = pointsOf(curves[0]!.path).at(-1)!;
    const last = xTicks.find(({ text }) => text === '60')!;
    expect(last.atPx).toBeCloseTo(end, 1);
  });

  it('makes room for a demand above the curve', () => {
    const { levels } = curvePlan({
      curves: [curve(1)],
      levels: [{ label: 'Mu', momentNmm: 900e6 }],
      units: 'si',
    });
    expect(levels[0]!.yPx).toBeGreaterThanOrEqual(CURVE_SHEET.top);
  });

  it('numbers marks that lie together together', () => {
    const at = (curvaturePerMm: number, momentNmm: number) => ({ curvaturePerMm, momentNmm });
    const marks = [at(6e-6, 300e6), at(6.1e-6, 305e6), at(60e-6, 310e6)];
    const { curves } = curvePlan({ curves: [curve(1, marks)], levels: [], units: 'si' });
    expect(curves[0]!.numbers.map(({ text }) => text)).toEqual(['1, 2', '3']);
  });

  it('draws an empty frame for no curve', () => {
    const { curves, xTicks } = curvePlan({ curves: [], levels: [], units: 'us' });
    expect(curves).toEqual([]);
    expect(xTicks).toEqual([{ atPx: CURVE_SHEET.left, text: '0' }]);
  });
});
