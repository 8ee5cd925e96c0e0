import { describe, expect, it } from 'vitest';
import { curveModel } from '#shared/engine/curve-model.ts';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import type { CheckId } from '#shared/engine/evaluation.ts';
import { fibreCurve } from '#shared/engine/fibre.ts';
import { largestSpanToDepth, tabledBarSpacingMm } from '#shared/engine/rules/en1992-service.ts';
import { EN_1992, en1992 } from '#shared/engine/rules/en1992.ts';
import type { NationalValues } from '#shared/engine/rules/national-values.ts';
import { ruleSetOf } from '#shared/engine/rules/rule-set-of.ts';
import type { DesignBasis, Demand, SectionInput, Stirrup } from '#shared/engine/section.ts';
import { placeSteel } from '#shared/engine/steel-layout.ts';
import { METRIC_BASIS, NO_DEMAND, NO_RULES } from '#shared/verification/layered-section.ts';

/** 300 × 550, 4-20 bottom, 2-16 top, links 10 at 150, cover 30: d = 550 − 30 − 10 − 10 = 500; C30, B500. */
const SECTION: SectionInput = {
  widthMm: 300,
  depthMm: 550,
  fcMPa: 30,
  fyMPa: 500,
  coverMm: 30,
  stirrup: { bar: '10', legs: 2, spacingMm: 150 },
  reinforcement: {
    kind: 'bars',
    tension: [{ bar: '20', count: 4 }],
    compression: [{ bar: '16', count: 2 }],
  },
};
const BASIS: DesignBasis = { ...METRIC_BASIS, ruleSet: 'en1992', fytMPa: 500, maxAggregateMm: 20 };

const evaluate = (
  change: Partial<SectionInput> = {},
  { basis = {}, demand = {} }: { basis?: Partial<DesignBasis>; demand?: Partial<Demand> } = {},
) =>
  evaluateSection(
    { ...SECTION, ...change },
    { basis: { ...BASIS, ...basis }, demand: { ...NO_DEMAND, ...demand }, rules: NO_RULES },
  );
const checkOf = (id: CheckId, ...args: Parameters<typeof evaluate>) =>
  evaluate(...args).checks.find((check) => check.id === id);

describe('materials of EN 1992-1-1 Table 3.1 and 3.1.7', () => {
  it('change at C50: as printed to it, and by their lines at C55 and C90', () => {
    const at = (fck: number) => [
      EN_1992.blockDepthFactor(fck),
      EN_1992.blockStressMPa(fck) / (fck / 1.5),
      EN_1992.crushingStrain(fck),
      EN_1992.largestAxisShare(fck)!,
    ];
    for (const fck of [12, 30, 50])
      at(fck).forEach((value, i) => expect(value).toBeCloseTo([0.8, 1, 0.0035, 0.448][i]!, 12));
    // εcu3 = 2.6 + 35 · 0.35⁴ ‰; x/d = 0.46/(1.25 (0.6 + 0.0014/εcu3))
    at(55).forEach((value, i) => expect(value).toBeCloseTo([0.7875, 0.975, 0.0031252, 0.35116][i]!, 5));
    at(90).forEach((value, i) => expect(value).toBeCloseTo([0.7, 0.8, 0.0026, 0.32324][i]!, 5));
  });

  it('stay as at C90 beyond it, so that no block vanishes', () => {
    expect(EN_1992.blockDepthFactor(120)).toBeCloseTo(0.7, 12);
    expect(EN_1992.blockStressMPa(120) / 80).toBeCloseTo(0.8, 12);
  });

  it.each([12, 50, 55, 90])('gives every check a number at C%d', (fcMPa) => {
    const { checks, flexure } = evaluate(
      { fcMPa },
      { demand: { muNmm: 150e6, ductilityTarget: 3, vuN: 100e3, spanMm: 6000, support: 'simple' } },
    );
    expect(flexure!.equilibriumResidual).toBeCloseTo(0, 12);
    for (const id of ['strength', 'axis-depth', 'least-steel', 'most-steel', 'shear', 'least-depth'] as const)
      expect(checks.find((check) => check.id === id)!.ratio).toBeGreaterThan(0);
  });
});

describe('strength by design values', () => {
  it('equals the moment of the internal forces, unreduced', () => {
    const { flexure } = evaluate();
    expect(flexure!.strengthReduction).toBe(1);
    expect(flexure!.designMomentNmm).toBe(flexure!.nominalMomentNmm);
    // 1256.64 mm² at fyd = 434.78 MPa
    expect(flexure!.layers[1]!.forceN / 1000).toBeCloseTo(546.36, 1);
  });

  it('is within 1 % of the parabola–rectangle law summed in strips, for light, doubly and heavily reinforced sections', () => {
    const sections: SectionInput[] = [
      SECTION,
      {
        ...SECTION,
        fcMPa: 25,
        reinforcement: {
          kind: 'layers',
          layers: [
            { depthMm: 500, areaMm2: 2400, face: 'tension' },
            { depthMm: 50, areaMm2: 1000, face: 'compression' },
          ],
        },
      },
      {
        ...SECTION,
        fcMPa: 50,
        reinforcement: { kind: 'layers', layers: [{ depthMm: 480, areaMm2: 3600, face: 'tension' }] },
      },
    ];
    for (const section of sections) {
      const { layout, arrangement } = placeSteel(section, BASIS, 2);
      const model = curveModel({
        section,
        layout: layout!,
        arrangement,
        basis: BASIS,
        choices: { concreteLaw: 'parabola-rectangle', steelLaw: 'elastic-plastic', peakShare: 1 / 1.5 },
      });
      const { ultimate, cause } = fibreCurve(model);
      const { flexure } = evaluate(section);
      expect(cause).toBe('concrete-crushing');
      expect(ultimate.topStrain).toBeCloseTo(0.0035, 5);
      expect(Math.abs(flexure!.designMomentNmm / ultimate.momentNmm - 1)).toBeLessThan(0.01);
    }
  });

  it('says that both curvatures take design values, and shows no letter of another code', () => {
    const { ductility, working, checks, notChecked } = evaluate(
      {},
      { demand: { muNmm: 150e6, ductilityTarget: 3, vuN: 100e3, spanMm: 8000, support: 'simple' } },
    );
    expect(ductility!.definition).toContain('design values η fcd and fyd in both curvatures');
    const text = JSON.stringify([working, checks, notChecked]);
    for (const letter of [/f′c/, /\bMu\b/, /\bVu\b/, /φMn/, /φVn/, /β1/, /\bfyt\b/, /ACI/])
      expect(text).not.toMatch(letter);
    for (const { symbol } of [{ symbol: 'MRd' }, { symbol: 'VRd' }, { symbol: 'fcd' }, { symbol: 'cot θ' }])
      expect(working.some((line) => line.symbol === symbol)).toBe(true);
  });
});

describe('shear with struts of a chosen slope', () => {
  const vRd = (stirrup: Stirrup | null, values: NationalValues = {}) =>
    checkOf('shear', { stirrup }, { basis: { nationalValues: values }, demand: { vuN: 1 } })!.capacity!;
  const links = (spacingMm: number): Stirrup => ({ bar: '10', legs: 2, spacingMm });

  it('carries VRd,s at the flattest strut while stirrups are light', () => {
    // 157.08 mm² at 434.78 MPa, z = 450, cot θ 2.5, s 300
    expect(vRd(links(300)) / 1000).toBeCloseTo((157.08 * 0.43478 * 450 * 2.5) / 300, 1);
  });

  it('never carries more than the struts at 45°, however close the stirrups', () => {
    // b z ν1 fcd/2 = 300 · 450 · 0.528 · 20/2
    expect(vRd(links(25)) / 1000).toBeCloseTo(712.8, 6);
    expect(vRd(links(25), { leastCot: 1.5 }) / 1000).toBeCloseTo(1425.6 / (1.5 + 1 / 1.5), 6);
  });

  it('falls as the spacing grows, and never below the concrete alone', () => {
    const strengths = [50, 100, 150, 250, 400, 900, 2000].map((s) => vRd(links(s)));
    strengths.slice(1).forEach((strength, i) => expect(strength).toBeLessThanOrEqual(strengths[i]!));
    // 0.12 · 1.6325 · (100 · 0.0083776 · 30)^⅓ · 300 · 500
    expect(strengths.at(-1)! / 1000).toBeCloseTo(86.07, 2);
    expect(vRd(null)).toBeGreaterThan(0);
  });

  it('asks every beam for stirrups, and ρw,min, 0.75 d and 600 mm of them', () => {
    const at = (stirrup: Stirrup | null, widthMm = 300) =>
      checkOf('stirrup-spacing', { stirrup, widthMm }, { demand: { vuN: 1 } })!;
    expect(at(null)).toMatchObject({ passes: false, reason: 'a beam has stirrups always' });
    expect(at(links(150)).capacity).toBe(375);
    // 4 · 78.54/(0.08 √30 · 1000/500)
    expect(at({ ...links(150), legs: 4 }, 1000).capacity).toBeCloseTo(314.159 / 0.876356, 2);
    // legs of a 700 web stand 630 − … apart: more than 0.75 d
    expect(at(links(150), 700)).toMatchObject({ passes: false });
  });
});

describe('serviceability without calculation', () => {
  it('interpolates Table 7.3N at the stress assumed in service', () => {
    // 0.6 · 434.78 = 260.87: 200 − 50 · 20.87/40
    expect(checkOf('crack-control')!.capacity).toBeCloseTo(173.913, 3);
    expect(tabledBarSpacingMm(100, 0.3)).toBe(300);
    expect(tabledBarSpacingMm(360.01, 0.3)).toBe(0);
    expect(tabledBarSpacingMm(281, 0.2)).toBe(0);
  });

  it('limits span over d without a step where ρ passes ρ0, with 0.8 for wide flanges and 7 m over long spans', () => {
    const at = (change: Partial<Parameters<typeof largestSpanToDepth>[0]>) =>
      largestSpanToDepth({
        ...{ spanMm: 6000, support: 'simple', fckMPa: 25, fykMPa: 500, rho: 0.005, rhoPrime: 0 },
        flangeToWeb: 1,
        ...change,
      });
    expect(at({})).toBeCloseTo(18.5, 9);
    expect(at({ rho: 0.005 + 1e-9 })).toBeCloseTo(18.5, 4);
    expect(at({ flangeToWeb: 3 })).toBeCloseTo(18.5, 9);
    expect(at({ flangeToWeb: 3.1 })).toBeCloseTo(14.8, 9);
    expect(at({ spanMm: 14000 })).toBeCloseTo(9.25, 9);
    // compression steel without end: ρ − ρ′ counts no less than ρ0
    expect(at({ rho: 0.01, rhoPrime: 0.02 })).toBeCloseTo(18.5 + (5 / 12) * 2, 9);
  });

  it('compares d, not h, with the span', () => {
    const check = checkOf('least-depth', {}, { demand: { spanMm: 6000, support: 'simple' } })!;
    expect(check.capacity).toBe(500);
    expect(check.clause).toContain('7.4.2');
  });
});

describe('bars and frames', () => {
  it('bends and gaps by the code: max(db, dg + 5, 20), 2 φ to 16 and 3.5 φ above, hooks of 5 φ and 10 φ in ductile frames', () => {
    expect([EN_1992.barGapMm(32, 20), EN_1992.barGapMm(20, 20), EN_1992.barGapMm(10, 10)]).toEqual([
      32, 25, 20,
    ]);
    expect([EN_1992.bendRadiusMm(16), EN_1992.bendRadiusMm(20)]).toEqual([32, 70]);
    expect([EN_1992.hookTailMm(8), EN_1992.hookTailMm(12)]).toEqual([50, 60]);
    expect(ruleSetOf({ ...BASIS, seismicSystem: 'dcm' }).hookTailMm(8)).toBe(80);
  });

  it('holds critical regions to the hoops of their class and to ρmax for the μφ asked', () => {
    const at = (seismicSystem: 'dcm' | 'dch', id: CheckId) =>
      checkOf(id, {}, { basis: { seismicSystem }, demand: { ductilityTarget: 8 } })!;
    // min(550/4, 24 · 10, 225 or 175, 8 or 6 times 16)
    expect(at('dcm', 'hoop-spacing').capacity).toBe(128);
    expect(at('dch', 'hoop-spacing').capacity).toBe(96);
    expect(at('dch', 'seismic-steel')).toMatchObject({ passes: false });
    expect(checkOf('seismic-width', { widthMm: 190 }, { basis: { seismicSystem: 'dch' } })!.passes).toBe(
      false,
    );
    expect(checkOf('seismic-width', {}, { basis: { seismicSystem: 'dcm' } })).toBeUndefined();
  });

  it('refuses a frame of another code, naming the field', () => {
    expect(() => evaluate({}, { basis: { seismicSystem: 'special' } })).toThrow(/no seismic system special/);
  });

  it('takes l0 of Figure 5.2 and half the clear distance for a flange, and its mean width in hogging', () => {
    const of = { shape: 't', webMm: 300, thicknessMm: 150, clearToNextWebMm: 2700, spanMm: 6000 } as const;
    const width = (change: object) =>
      EN_1992.effectiveFlangeMm({ ...of, face: 'compression', support: 'simple', ...change });
    // 0.2 · 1350 + 0.1 l0 a side
    expect(width({})).toBeCloseTo(300 + 2 * 870, 9);
    expect(width({ support: 'both-ends-continuous' })).toBeCloseTo(300 + 2 * 690, 9);
    expect(width({ shape: 'l' })).toBeCloseTo(300 + 870, 9);
    // 0.2 l0 governs over a support: l0 = 0.3 · 6000
    expect(width({ face: 'tension', support: 'both-ends-continuous' })).toBeCloseTo(300 + 2 * 360, 9);
    const flange = { shape: 't', face: 'tension', widthMm: 900, thicknessMm: 150 } as const;
    const mean = { widthMm: 300, depthMm: 600, flange, support: null };
    expect(EN_1992.leastSteelWidthMm(mean)).toBe(600);
  });
});

describe('national values', () => {
  it('take the place of the recommended ones, each alone', () => {
    const share = (values: NationalValues, fck = 30) =>
      en1992({ nationalValues: values }).largestAxisShare(fck);
    expect(share({ isPlasticAnalysis: true })).toBe(0.25);
    expect(share({ isPlasticAnalysis: true }, 55)).toBe(0.15);
    expect(share({ redistribution: 0.8 })).toBeCloseTo((0.8 - 0.44) / 1.25, 12);
    const { flexure } = evaluate({}, { basis: { nationalValues: { gammaS: 1 } } });
    expect(flexure!.layers[1]!.stressMPa).toBe(500);
  });

  it('are the recommended ones where nothing is said, and nothing to other codes', () => {
    const plain = evaluate();
    expect(evaluate({}, { basis: { nationalValues: {} } })).toEqual(plain);
    expect(evaluate({}, { basis: { nationalValues: null } })).toEqual(plain);
    const aci = evaluate({}, { basis: { ruleSet: 'aci318m-19', nationalValues: { gammaC: 1.2 } } });
    expect(aci).toEqual(evaluate({}, { basis: { ruleSet: 'aci318m-19' } }));
  });

  it.each<NationalValues>([
    { gammaC: 0 },
    { gammaS: NaN },
    { crackWidthMm: 0.25 },
    { leastCot: 0.8 },
    { mostCot: 0.9 },
  ])('refuses %o, naming the value', (nationalValues) => {
    const [name] = Object.keys(nationalValues);
    expect(() => evaluate({}, { basis: { nationalValues } })).toThrow(
      new RegExp(`National value ${name === 'leastCot' ? 'mostCot' : name}`),
    );
  });
});
