import { describe, expect, it } from 'vitest';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import type { Reinforcement, SectionInput } from '#shared/engine/section.ts';
import { sectionGeometry } from '#shared/drawing/section-geometry.ts';
import { spreadLabels } from '#shared/drawing/spread-labels.ts';
import { BASIS, NO_DEMAND, NO_RULES } from '../client/run/problem.ts';

const section = (reinforcement: Reinforcement, widthMm = 300): SectionInput => ({
  widthMm,
  depthMm: 500,
  fcMPa: 30,
  fyMPa: 420,
  coverMm: 40,
  stirrup: { bar: '10', legs: 2, spacingMm: 150 },
  reinforcement,
});
const drawn = (input: SectionInput) =>
  sectionGeometry(input, evaluateSection(input, { basis: BASIS, demand: NO_DEMAND, rules: NO_RULES }), 'iso');

const THREE_25: Reinforcement = {
  kind: 'bars',
  tension: [{ bar: '25', count: 3 }],
  compression: [{ bar: '16', count: 2 }],
};

describe('a section as it is drawn', () => {
  it('takes every bar from the engine’s own coordinates, inside the stirrup', () => {
    const geometry = drawn(section(THREE_25));
    expect(geometry.bars).toHaveLength(5);
    const { stirrup } = geometry;
    for (const bar of geometry.bars) {
      const inside = stirrup!.xMm + stirrup!.legThicknessMm / 2 - 1e-9;
      expect(bar.xMm - bar.radiusMm).toBeGreaterThanOrEqual(inside);
      expect(bar.xMm + bar.radiusMm).toBeLessThanOrEqual(300 - inside);
    }
  });

  it('places the stirrup’s legs at the cover', () => {
    const { stirrup } = drawn(section(THREE_25));
    expect(stirrup!.xMm - stirrup!.legThicknessMm / 2).toBeCloseTo(40, 9);
    expect(stirrup!.xMm + stirrup!.widthMm + stirrup!.legThicknessMm / 2).toBeCloseTo(260, 9);
  });

  it('measures the gaps the engine reports', () => {
    const input = section(THREE_25);
    const evaluation = evaluateSection(input, { basis: BASIS, demand: NO_DEMAND, rules: NO_RULES });
    const reported = evaluation.arrangement!.faces.find((face) => face.face === 'tension')!.clearGapMm!;
    const row = drawn(input).rows.find((one) => one.face === 'tension')!;
    const gaps = row.clearGaps.map((gap) => gap.toMm - gap.fromMm);
    expect(Math.min(...gaps)).toBeCloseTo(reported, 9);
    expect(row.groups).toEqual([{ bar: '25', count: 3 }]);
  });

  it('draws a plain layer as a band of the layer’s own area, centred at its depth', () => {
    const layers = [{ depthMm: 437.5, areaMm2: 1472.6, face: 'tension' as const }];
    const geometry = drawn(section({ kind: 'layers', layers }));
    const band = geometry.bands[0]!;
    expect(band.widthMm * band.heightMm).toBeCloseTo(1472.6, 9);
    expect(band.yMm + band.heightMm / 2).toBeCloseTo(437.5, 9);
    expect(geometry.bars).toEqual([]);
  });

  it('draws nothing but the outline, and knows why, where the bars do not fit', () => {
    const eight = { kind: 'bars', tension: [{ bar: '32', count: 12 }], compression: [] } as const;
    const geometry = drawn(section(eight, 200));
    expect(geometry.fits).toBe(false);
    expect(geometry.reason).not.toBe('');
    expect(geometry.bars).toEqual([]);
    expect(geometry.rows).toEqual([]);
  });
});

describe('labels beside a drawing', () => {
  it('keep their distance and their order', () => {
    const placed = spreadLabels([10, 11, 12, 90], 15, { low: 0, high: 200 });
    const gaps = placed.slice(1).map((y, k) => y - placed[k]!);
    for (const gap of gaps) expect(gap).toBeGreaterThanOrEqual(15 - 1e-9);
    expect(placed[3]).toBe(90);
  });

  it('stay where they are when nothing is near', () => {
    expect(spreadLabels([10, 50, 90], 15, { low: 0, high: 100 })).toEqual([10, 50, 90]);
  });

  it('move up from the lower edge together', () => {
    expect(spreadLabels([98, 99], 15, { low: 0, high: 100 })).toEqual([85, 100]);
  });
});
