import { describe, expect, it } from 'vitest';
import { outlinePath } from '#shared/drawing/concrete-outline.ts';
import { LARGE_SHEET, largePlan } from '#shared/drawing/large-plan.ts';
import { sectionGeometry } from '#shared/drawing/section-geometry.ts';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import type { Flange, SectionInput } from '#shared/engine/section.ts';
import { steelText } from '#shared/print/section-text.ts';
import { BASIS, NO_DEMAND, NO_RULES } from '../client/run/problem.ts';

const WEB: SectionInput = {
  widthMm: 300,
  depthMm: 600,
  fcMPa: 30,
  fyMPa: 420,
  coverMm: 40,
  stirrup: { bar: '10', legs: 2, spacingMm: 150 },
  reinforcement: {
    kind: 'bars',
    tension: [{ bar: '25', count: 3 }],
    compression: [{ bar: '16', count: 2 }],
  },
};
const slab = (part: Partial<Flange>, widthMm: number): SectionInput => ({
  ...WEB,
  flange: {
    shape: 't',
    thicknessMm: 120,
    face: 'compression',
    width: { kind: 'given', widthMm },
    ...part,
  },
});
const drawn = (section: SectionInput) =>
  sectionGeometry(
    section,
    evaluateSection(section, { basis: BASIS, demand: NO_DEMAND, rules: NO_RULES }),
    'iso',
  );
const plan = (section: SectionInput) => largePlan(section, drawn(section), 'si');

/** Twice the area within a closed line of corners. */
const doubleArea = (points: readonly { xMm: number; yMm: number }[]) =>
  Math.abs(
    points.reduce((sum, a, i) => {
      const b = points[(i + 1) % points.length]!;
      return sum + a.xMm * b.yMm - b.xMm * a.yMm;
    }, 0),
  );

describe('a beam with its slab, as it is drawn', () => {
  it('stands on its web, the slab across the top, in sagging and in hogging', () => {
    for (const face of ['compression', 'tension'] as const) {
      const { outline, leftMm, rightMm } = drawn(slab({ face }, 500));
      expect([leftMm, rightMm]).toEqual([-100, 400]);
      expect(doubleArea(outline) / 2).toBeCloseTo(300 * 600 + 200 * 120, 6);
      expect(Math.max(...outline.filter((p) => p.xMm > 300).map((p) => p.yMm))).toBe(120);
    }
  });

  it('draws an L’s slab on one side only', () => {
    const { leftMm, rightMm, outline } = drawn(slab({ shape: 'l' }, 420));
    expect([leftMm, rightMm]).toEqual([0, 420]);
    expect(doubleArea(outline) / 2).toBeCloseTo(300 * 600 + 120 * 120, 6);
  });

  it('cuts a slab many webs wide by a break line, and still writes its whole width', () => {
    const section = slab({}, 2400);
    const { flange } = drawn(section);
    expect(flange).toMatchObject({ isCutLeft: true, isCutRight: true, widthMm: 2400 });
    expect(flange!.rightMm - flange!.leftMm).toBeLessThan(1000);
    expect(plan(section).labels.map(({ text }) => text)).toContain('bf 2,400');
  });

  it('puts the tension bars at the top in hogging, mirrored from the engine’s depths', () => {
    const section = slab({ face: 'tension' }, 900);
    const { rows, bars, neutralAxisMm } = drawn(section);
    const tension = rows.find((row) => row.face === 'tension')!;
    const sagging = drawn(slab({}, 900)).rows.find((row) => row.face === 'tension')!;
    expect(tension.yMm).toBeCloseTo(600 - sagging.yMm, 9);
    expect(Math.min(...bars.map((bar) => bar.yMm))).toBeCloseTo(tension.yMm, 9);
    expect(steelText(section, 'si')).toBe('3-25 top, 2-16 bottom');

    const { at, strokes } = plan(section);
    const axis = strokes.find((stroke) => stroke.isAxis)!;
    const y = Number(/^M \S+ (\S+)/.exec(axis.path)![1]);
    expect((y - at.yPx) / at.pxPerMm).toBeCloseTo(600 - neutralAxisMm!, 6);
  });

  it('keeps every label on its sheet, apart from its neighbours beside the web', () => {
    for (const [shape, face, widthMm] of [
      ['t', 'compression', 2400],
      ['t', 'tension', 2400],
      ['l', 'compression', 800],
      ['l', 'tension', 450],
    ] as const) {
      const { labels } = plan(slab({ shape, face }, widthMm));
      for (const label of labels) {
        expect(label.xPx).toBeGreaterThan(0);
        expect(label.xPx).toBeLessThan(LARGE_SHEET.width);
        expect(label.yPx).toBeGreaterThan(0);
        expect(label.yPx).toBeLessThan(LARGE_SHEET.height);
      }
      const beside = labels.filter((label) => label.anchor === 'start' && !/^(hf|cover)/.test(label.text));
      expect(new Set(beside.map((label) => label.xPx)).size).toBe(1);
    }
  });

  it('is the rectangle where the slab is no wider than the web', () => {
    const at = { xPx: 0, yPx: 0, pxPerMm: 1 };
    expect(outlinePath(drawn(slab({}, 300)).outline, at)).toBe(outlinePath(drawn(WEB).outline, at));
  });
});
