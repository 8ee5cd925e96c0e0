import { describe, expect, it } from 'vitest';
import { boxAt, cloudBoxes, type CloudInput } from '#client/src/charts/cloud-boxes.ts';

const axis = {
  title: '',
  unit: '',
  direction: 'less',
  perSi: 0.5,
  isLog: false,
  formatTick: String,
} as const;
const input: CloudInput = {
  x: axis,
  y: { ...axis, perSi: 1 },
  xExtent: { min: 0, max: 20, step: 5 },
  yExtent: { min: 0, max: 10, step: 5 },
  frame: { width: 240, height: 140, left: 20, right: 20, top: 20, bottom: 20 },
  cells: [
    { x0: 20, x1: 40, y0: 2, y1: 4, count: 12 },
    { x0: 20, x1: 40, y0: 6, y1: 8, count: 1200 },
  ],
};

describe('the cloud', () => {
  it('lies where its sections do, in the unit of the axes', () => {
    const [low] = cloudBoxes(input);
    expect(low).toMatchObject({ x: 120, y: 80, count: 12 });
    expect(low!.width).toBeCloseTo(99.4, 6);
    expect(low!.height).toBeCloseTo(19.4, 6);
  });

  it('shows more sections in stronger ink, and one alone still', () => {
    const [few, many] = cloudBoxes(input);
    expect(many!.opacity).toBeGreaterThan(few!.opacity);
    expect(few!.opacity).toBeGreaterThan(0.1);
  });

  it('is as wide on a logarithmic axis as its logarithms are apart, and leaves out what has none', () => {
    const [box] = cloudBoxes({
      ...input,
      x: { ...axis, isLog: true },
      xExtent: { min: 0, max: 2, step: 0 },
      cells: [
        { x0: 2, x1: 20, y0: 2, y1: 4, count: 1 },
        { x0: 0, x1: 2, y0: 2, y1: 4, count: 1 },
      ],
    });
    expect(box!.x).toBeCloseTo(20, 6);
    expect(box!.width).toBeCloseTo(99.4, 6);
  });

  it('tells the number of sections under the pointer, and none beside it', () => {
    const boxes = cloudBoxes(input);
    expect(boxAt(boxes, 150, 90)?.count).toBe(12);
    expect(boxAt(boxes, 60, 90)).toBeUndefined();
    expect(cloudBoxes({ ...input, cells: [] })).toEqual([]);
  });
});
