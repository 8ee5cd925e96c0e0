import { describe, expect, it } from 'vitest';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import type { CheckId } from '#shared/engine/evaluation.ts';
import type { BarGroup, Demand, RuleSetId, SectionInput, Stirrup } from '#shared/engine/section.ts';
import { METRIC_BASIS, NO_DEMAND, NO_RULES } from '#shared/verification/layered-section.ts';

/** Checks of detailing and shear on 300 × 500, 3-25 bottom, f′c 30, fy 420, cover 40; numbers by hand in the comments. */
interface Change {
  readonly stirrup?: Stirrup | null;
  readonly tension?: BarGroup;
  readonly compression?: BarGroup;
  readonly demand?: Partial<Demand>;
  readonly ruleSet?: RuleSetId;
  readonly widthMm?: number;
}

function checkOf(id: CheckId, change: Change = {}) {
  const section: SectionInput = {
    widthMm: change.widthMm ?? 300,
    depthMm: 500,
    fcMPa: 30,
    fyMPa: 420,
    coverMm: 40,
    stirrup: change.stirrup === undefined ? { bar: '10', legs: 2, spacingMm: 150 } : change.stirrup,
    reinforcement: {
      kind: 'bars',
      tension: change.tension ?? [{ bar: '25', count: 3 }],
      compression: change.compression ?? [{ bar: '16', count: 2 }],
    },
  };
  const evaluation = evaluateSection(section, {
    basis: { ...METRIC_BASIS, ruleSet: change.ruleSet ?? 'aci318m-19' },
    demand: { ...NO_DEMAND, ...change.demand },
    rules: NO_RULES,
  });
  return evaluation.checks.find((check) => check.id === id);
}

describe('crack control', () => {
  it('takes the centre spacing nearest the face against min(380 280/fs − 2.5 cc, 300 280/fs) = 255', () => {
    // 300 − 2 (40 + 10 + 12.5) = 175 between the outer centres, two spaces
    expect(checkOf('crack-control')).toMatchObject({ passes: true, demand: 87.5 });
    expect(checkOf('crack-control')!.capacity).toBeCloseTo(255, 9);
  });

  it('fails two bars far apart in a wide beam', () => {
    // 450 − 125 = 325 > 255
    expect(checkOf('crack-control', { widthMm: 450, tension: [{ bar: '25', count: 2 }] })).toMatchObject({
      passes: false,
      demand: 325,
    });
  });
});

describe('ties of compression bars', () => {
  it('hold at 16 bar diameters: 256 for a 16', () => {
    const at = (spacingMm: number) =>
      checkOf('compression-ties', { stirrup: { bar: '10', legs: 2, spacingMm } });
    expect(at(256)).toMatchObject({ passes: true, capacity: 256 });
    expect(at(257)).toMatchObject({ passes: false });
  });

  it('are bounded by the least side of the section', () => {
    const compression = [{ bar: '25', count: 2 }];
    expect(checkOf('compression-ties', { compression })).toMatchObject({ capacity: 300 });
  });

  it('need stirrups of No. 3 (9.5 mm) at least, and there must be some', () => {
    expect(checkOf('compression-ties', { stirrup: { bar: '8', legs: 2, spacingMm: 100 } })).toMatchObject({
      passes: false,
      demand: 9.5,
      capacity: 8,
    });
    expect(checkOf('compression-ties', { stirrup: null })).toMatchObject({ passes: false, capacity: null });
    expect(checkOf('compression-ties', { stirrup: null, compression: [] })).toBeUndefined();
  });
});

describe('shear', () => {
  const vu = (kN: number) => ({ demand: { vuN: kN * 1000 } });

  it('adds Vc = 0.17 √f′c b d and Vs = Av fyt d/s', () => {
    // Vc = 0.17 · 5.4772 · 300 · 437.5 = 122.21 kN; Vs = 157.08 · 420 · 437.5/150 = 192.42 kN; φ 0.75
    const check = checkOf('shear', vu(200))!;
    expect(check.capacity! / 1000).toBeCloseTo(0.75 * (122.21 + 192.42), 1);
    expect(check.passes).toBe(true);
    expect(checkOf('shear', vu(240))!.passes).toBe(false);
  });

  it('is not asked without Vu', () => {
    expect(checkOf('shear')).toBeUndefined();
    expect(checkOf('stirrup-spacing')).toBeUndefined();
  });

  it('falls by the size effect where there are no stirrups, in the 2019 edition only', () => {
    // no stirrup: d = 447.5; λs = √(2/(1 + 447.5/250)) = 0.8467; ρ = 1472.6/134250 = 0.010969, cube root 0.22219
    // 0.66 · 0.8467 · 0.22219 · 5.4772 · 134250 = 91.30 kN; 0.17 √f′c b d = 125.00 kN
    const bare = { ...vu(50), stirrup: null, compression: [] };
    expect(checkOf('shear', bare)!.capacity! / 1000).toBeCloseTo(0.75 * 91.3, 1);
    expect(checkOf('shear', { ...bare, ruleSet: 'aci318m-14' })!.capacity! / 1000).toBeCloseTo(
      0.75 * 125.0,
      1,
    );
  });

  it('counts stirrups up to 0.66 √f′c b d, so a small section cannot be saved by more of them', () => {
    // stirrups of 12: d = 435.5, Vc = 0.17 · 5.4772 · 130650 = 121.65 kN
    const capacity = (spacingMm: number) =>
      checkOf('shear', { ...vu(600), stirrup: { bar: '12', legs: 4, spacingMm } })!.capacity! / 1000;
    expect(capacity(40)).toBeCloseTo(0.75 * (121.65 + (0.66 / 0.17) * 121.65), 0);
    expect(capacity(30)).toBe(capacity(40));
  });

  it('asks for stirrups from φ 0.083 √f′c b d on: 45.77 kN', () => {
    const spacing = (kN: number, stirrup: Stirrup | null) =>
      checkOf('stirrup-spacing', { ...vu(kN), stirrup, compression: [] })!;
    expect(spacing(45.7, null).passes).toBe(true);
    expect(spacing(45.8, null)).toMatchObject({ passes: false, reason: 'Vu asks for stirrups' });
  });

  it('limits the spacing to d/2, to d/4 where the stirrups carry much, and to Av,min', () => {
    const limit = (kN: number) => checkOf('stirrup-spacing', vu(kN))!.capacity!;
    expect(limit(150)).toBeCloseTo(437.5 / 2, 9);
    // Vs = 300/0.75 − 122.21 = 277.8 > 0.33 √f′c b d = 237.2
    expect(limit(300)).toBeCloseTo(437.5 / 4, 9);
    // Av,min/s = 0.35 · 300/420 = 0.25: one 6 mm stirrup, 56.5 mm², reaches 226 mm, above d/2; 1200 wide, 56.5 mm
    const wide = checkOf('stirrup-spacing', {
      ...vu(600),
      widthMm: 1200,
      stirrup: { bar: '6', legs: 2, spacingMm: 50 },
    })!;
    expect(wide.passes).toBe(false);
    expect(wide.reason).toContain('across the width');
  });
});

describe('least depth', () => {
  it('is span over 16, 18.5, 21 or 8, times 0.4 + fy/700', () => {
    const least = (support: Demand['support']) =>
      checkOf('least-depth', { demand: { spanMm: 8000, support } })!.demand!;
    expect(least('simple')).toBeCloseTo(500, 9);
    expect(least('one-end-continuous')).toBeCloseTo(8000 / 18.5, 9);
    expect(least('both-ends-continuous')).toBeCloseTo(8000 / 21, 9);
    expect(least('cantilever')).toBeCloseTo(1000, 9);
    expect(checkOf('least-depth', { demand: { spanMm: 8000 } })).toBeUndefined();
  });
});

describe('the working', () => {
  it('writes shear, crack control and least depth out where they are asked, with the values the checks use', () => {
    const section: SectionInput = {
      widthMm: 300,
      depthMm: 500,
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
    const { working, checks } = evaluateSection(section, {
      basis: METRIC_BASIS,
      demand: { ...NO_DEMAND, vuN: 150e3, spanMm: 7000, support: 'simple' },
      rules: NO_RULES,
    });
    const valueOf = (id: string) => working.find((line) => line.id === id)!.value;
    const checkOf = (id: CheckId) => checks.find((check) => check.id === id)!;
    expect(valueOf('phi-vn')).toBe(checkOf('shear').capacity);
    expect(valueOf('vc') / 1000).toBeCloseTo(122.21, 1);
    expect(valueOf('vs') / 1000).toBeCloseTo(192.42, 1);
    expect(valueOf('stirrup-spacing')).toBe(checkOf('stirrup-spacing').capacity);
    expect(valueOf('crack-spacing')).toBe(checkOf('crack-control').capacity);
    expect(valueOf('least-depth')).toBe(checkOf('least-depth').demand);
  });
});
