import { describe, expect, it } from 'vitest';
import { CONCRETE_LAW_IDS, type CurveChoices } from '#shared/engine/curve-choices.ts';
import { Tracer } from '#shared/engine/curve-trace.ts';
import { elasticSection } from '#shared/engine/elastic.ts';
import { momentCurvature } from '#shared/engine/moment-curvature.ts';
import { InvalidSectionError } from '#shared/engine/preconditions.ts';
import { ruleSetOf } from '#shared/engine/rules/rule-set-of.ts';
import type { DesignBasis, SectionInput } from '#shared/engine/section.ts';
import { placeSteel } from '#shared/engine/steel-layout.ts';
import { MM_PER_IN, MPA_PER_PSI } from '#shared/engine/units.ts';
import { METRIC_BASIS, metricSection, US_BASIS } from '#shared/verification/layered-section.ts';
import { HOOPED } from './hooped-section.ts';
import { nonNull } from './non-null.ts';

const PLAIN: CurveChoices = { concreteLaw: 'parabola-rectangle', steelLaw: 'elastic-plastic' };
const beam = { b: 300, h: 500, d: 440, As: 1500, fc: 30, fy: 420 };

function curveOf(section: SectionInput, choices: CurveChoices = PLAIN, basis: DesignBasis = METRIC_BASIS) {
  const { layout, arrangement } = placeSteel(section, basis, 2);
  return momentCurvature({ section, layout: nonNull(layout), arrangement, basis, choices });
}

describe('a curve against hand formulas', () => {
  it('singly reinforced, parabola–rectangle at 0.0035: mean 17/21 of f′c, resultant at 99/238 of c', () => {
    // 1 − (1/3)(2/3.5) = 17/21; 1 − G/(F ε) = 99/238 for n = 2
    const { ultimate, cause } = curveOf(metricSection(beam));
    const c = (1500 * 420) / (300 * 30 * (17 / 21));
    expect(cause).toBe('concrete-crushing');
    expect(ultimate.axisMm).toBeCloseTo(c, 6);
    expect(ultimate.curvaturePerMm).toBeCloseTo(0.0035 / c, 12);
    expect(ultimate.momentNmm / (1500 * 420 * (440 - (99 / 238) * c))).toBeCloseTo(1, 9);
  });

  it('first yield while concrete is nearly straight is that of the cracked elastic section', () => {
    const section = metricSection({ ...beam, As: 300, fc: 60 });
    const basis = METRIC_BASIS;
    const layout = nonNull(placeSteel(section, basis, 2).layout);
    const elastic = elasticSection(section, layout, basis, ruleSetOf(basis));
    // a curve that starts with the code's Ec
    const peakStrain = (2 * 60) / elastic.ecMPa;
    const { firstYield } = curveOf(section, { ...PLAIN, concreteLaw: 'hognestad', peakStrain });
    const closed = 420 / basis.esMPa / (440 - elastic.crackedAxisMm);
    expect(elastic.concreteStressShareAtYield).toBeLessThan(0.25);
    expect(nonNull(firstYield).curvaturePerMm / closed).toBeCloseTo(1, 1);
    expect(nonNull(firstYield).momentNmm / elastic.yieldMomentNmm).toBeCloseTo(1, 2);
  });

  it('cracks where the uncracked transformed section does', () => {
    const layout = nonNull(placeSteel(HOOPED, METRIC_BASIS, 2).layout);
    const elastic = elasticSection(HOOPED, layout, METRIC_BASIS, ruleSetOf(METRIC_BASIS));
    const peakStrain = (2 * 30) / elastic.ecMPa;
    const { cracking } = curveOf(HOOPED, { ...PLAIN, concreteLaw: 'hognestad', peakStrain });
    expect(nonNull(cracking).momentNmm / elastic.crackingMomentNmm).toBeCloseTo(1, 1.7);
    expect(nonNull(cracking).curvaturePerMm / elastic.crackingCurvaturePerMm).toBeCloseTo(1, 1.7);
  });

  it('with hardening steel the tension layer’s stress is the published branch at its strain', () => {
    const { ultimate } = curveOf(metricSection(beam), { ...PLAIN, steelLaw: 'strain-hardening' });
    const left = (0.12 - ultimate.tensionStrain) / (0.12 - 0.008);
    const stress = 1.25 * 420 - 0.25 * 420 * left ** 2;
    expect(ultimate.tensionStrain).toBeGreaterThan(0.008);
    expect(ultimate.axisMm).toBeCloseTo((1500 * stress) / (300 * 30 * (17 / 21)), 6);
  });

  it('the bilinear lines have the area of the curve, drawn forty times as finely', () => {
    for (const concreteLaw of CONCRETE_LAW_IDS) {
      const curve = curveOf(HOOPED, { ...PLAIN, concreteLaw });
      const { momentNmm, yieldCurvaturePerMm } = nonNull(curve.bilinear);
      const last = curve.ultimate.curvaturePerMm;
      const tracer = new Tracer(curve.model);
      // the midpoint rule on 1500 equal steps
      const step = last / 1500;
      let area = 0;
      for (let i = 0; i < 1500; i++) area += step * tracer.pointAt((i + 0.5) * step).momentNmm;
      const lines = momentNmm * (last - yieldCurvaturePerMm / 2);
      expect(Math.abs(lines / area - 1), concreteLaw).toBeLessThan(0.001);
      const { firstYield } = curve;
      expect(momentNmm / yieldCurvaturePerMm).toBeCloseTo(
        nonNull(firstYield).momentNmm / nonNull(firstYield).curvaturePerMm,
        0,
      );
    }
  });
});

describe('ends of a curve', () => {
  it('very light steel breaks before the concrete is crushed, and fails at the first crack', () => {
    const curve = curveOf(metricSection({ ...beam, As: 60 }));
    expect(curve.cause).toBe('bar-rupture');
    expect(curve.ultimate.tensionStrain).toBeCloseTo(0.12, 9);
    expect(curve.ultimate.topStrain).toBeLessThan(0.0035);
    expect(curve.failsAtCracking).toBe(true);
    expect(curve.ductility.byFirstYield.definition).toContain('bars break at 0.12');
    expect(curveOf(metricSection(beam)).failsAtCracking).toBe(false);
  });

  it('an over-reinforced section never yields: no first yield, no ductility, and it says why', () => {
    const { firstYield, bilinear, ductility, cause } = curveOf(metricSection({ ...beam, As: 6000 }));
    expect([firstYield, bilinear, ductility.byFirstYield.value, ductility.byBilinearYield.value]).toEqual([
      null,
      null,
      null,
      null,
    ]);
    expect(cause).toBe('concrete-crushing');
    expect(ductility.byFirstYield.definition).toContain('no bar reaches fy/Es');
  });

  it('a law that falls far ends the curve at four fifths of its peak', () => {
    const choices = { ...PLAIN, concreteLaw: 'kent-park', crushingStrain: 0.05 } as const;
    const { cause, ultimate, peak } = curveOf(metricSection({ ...beam, As: 3500, fc: 60 }), choices);
    expect(cause).toBe('moment-drop');
    expect(ultimate.momentNmm / peak.momentNmm).toBeCloseTo(0.8, 9);
    expect(ultimate.curvaturePerMm).toBeGreaterThan(peak.curvaturePerMm);
  });

  it('a confined core carries on past the cover to its own crushing strain, more ductile than without hoops', () => {
    for (const law of ['kent-park', 'mander'] as const) {
      const confined = curveOf(HOOPED, { ...PLAIN, concreteLaw: `${law}-confined` });
      const plain = curveOf(HOOPED, { ...PLAIN, concreteLaw: law });
      const core = confined.ultimate.topStrain - confined.ultimate.curvaturePerMm * confined.model.coreTopMm;
      expect(confined.cause).toBe('core-crushing');
      expect(core).toBeCloseTo(nonNull(confined.model.core).crushingStrain, 9);
      expect(confined.ultimate.topStrain).toBeGreaterThan(0.02);
      expect(confined.ductility.byFirstYield.value!).toBeGreaterThan(3 * plain.ductility.byFirstYield.value!);
    }
  });

  it('hoops that confine nothing, or none, leave the section unconfined and say so', () => {
    const choices = { ...PLAIN, concreteLaw: 'mander-confined' } as const;
    const none = curveOf({ ...HOOPED, stirrup: null }, choices);
    const wide = curveOf({ ...HOOPED, stirrup: { bar: '10', legs: 2, spacingMm: 500 } }, choices);
    expect(none.model.core).toBeNull();
    expect(none.model.confinementNote).toContain('no hoops');
    expect(wide.model.confinement?.effectiveness).toBe(0);
    expect(wide.model.confinementNote).toContain('ke = 0');
    const unconfined = curveOf(HOOPED, { ...PLAIN, concreteLaw: 'mander' });
    expect(wide.ultimate.momentNmm).toBeCloseTo(unconfined.ultimate.momentNmm, 3);
    expect(wide.cause).toBe('concrete-crushing');
  });
});

describe('edge cases of a curve', () => {
  it('compression bars below the axis pull at ultimate', () => {
    const { ultimate } = curveOf(metricSection({ ...beam, As: 300, d2: 60, As2: 400 }));
    expect(ultimate.axisMm).toBeLessThan(60);
  });

  it.each([2500, 12000])('f′c of %i psi gives a whole curve by every law', (psi) => {
    const section = metricSection({
      b: 12 * MM_PER_IN,
      h: 24 * MM_PER_IN,
      d: 21.5 * MM_PER_IN,
      As: 1200,
      fc: psi * MPA_PER_PSI,
      fy: 60000 * MPA_PER_PSI,
    });
    const hooped = { ...section, stirrup: { bar: '#4', legs: 2, spacingMm: 100 } };
    for (const concreteLaw of CONCRETE_LAW_IDS) {
      const curve = curveOf(hooped, { ...PLAIN, concreteLaw }, US_BASIS);
      expect(curve.points.length).toBeGreaterThan(20);
      for (const point of curve.points)
        for (const value of Object.values(point)) expect(Number.isFinite(value)).toBe(true);
      expect(curve.ductility.byBilinearYield.value, concreteLaw).toBeGreaterThan(2);
      expect(curve.equilibriumResidual).toBeLessThan(1e-9);
    }
  });

  it('draws the uncracked branch when asked: stiffer, up to the crack, then the cracked section from there', () => {
    const plain = curveOf(HOOPED);
    const drawn = curveOf(HOOPED, { ...PLAIN, hasTensionBeforeCracking: true });
    const at = drawn.points.indexOf(nonNull(drawn.cracking));
    expect(at).toBeGreaterThan(0);
    const [crack, after] = [drawn.points[at]!, drawn.points[at + 1]!];
    expect(after.curvaturePerMm).toBe(crack.curvaturePerMm);
    expect(after.momentNmm).toBeLessThan(crack.momentNmm);
    for (const point of drawn.points.slice(0, at))
      expect(point.momentNmm / point.curvaturePerMm).toBeGreaterThan(
        (2 * after.momentNmm) / after.curvaturePerMm,
      );
    expect(drawn.ultimate).toEqual(plain.ultimate);
    expect(drawn.ductility).toEqual(plain.ductility);
  });

  it('first yield at the centroid of two layers comes later than at the outermost, and the definition names it', () => {
    const section: SectionInput = {
      ...metricSection(beam),
      reinforcement: {
        kind: 'layers',
        layers: [
          { depthMm: 390, areaMm2: 700, face: 'tension' },
          { depthMm: 450, areaMm2: 900, face: 'tension' },
        ],
      },
    };
    const outermost = curveOf(section);
    const centroid = curveOf(section, PLAIN, { ...METRIC_BASIS, yieldCurvatureAt: 'centroid' });
    expect(nonNull(centroid.firstYield).curvaturePerMm).toBeGreaterThan(
      nonNull(outermost.firstYield).curvaturePerMm,
    );
    expect(centroid.ductility.byFirstYield.definition).toContain('centroid');
    expect(outermost.ductility.byFirstYield.definition).toContain('outermost tension layer');
  });

  it('yields too near its end for two lines of equal area: no bilinear ductility, and it says why', () => {
    const near = [3000, 3400, 3800, 4200, 4400, 4600, 4800, 5000].map((As) =>
      curveOf(metricSection({ ...beam, As })),
    );
    const late = near.filter((curve) => curve.firstYield && !curve.bilinear);
    expect(late.length).toBeGreaterThan(0);
    for (const { ductility } of late) {
      expect(ductility.byFirstYield.value).toBeLessThan(1.6);
      expect(ductility.byBilinearYield.value).toBeNull();
      expect(ductility.byBilinearYield.definition).toContain('too near the end');
    }
    for (const { bilinear, peak } of near)
      if (bilinear) expect(bilinear.momentNmm).toBeLessThanOrEqual(1.1 * peak.momentNmm);
  });

  it('deducts displaced concrete or ignores it, as the basis says: less compression, less ductility', () => {
    const ignoring = curveOf(HOOPED, PLAIN, { ...METRIC_BASIS, displacedConcrete: 'ignore' });
    expect(ignoring.ductility.byFirstYield.value!).toBeGreaterThan(
      curveOf(HOOPED).ductility.byFirstYield.value!,
    );
  });

  it.each([
    ['negative crushing strain', { crushingStrain: -0.003 }, 'crushingStrain', '-0.003'],
    ['NaN peak', { peakShare: NaN }, 'peakShare', 'NaN'],
    ['rupture before yield', { ruptureStrain: 0.001 }, 'ruptureStrain', '0.001'],
    ['steel that softens', { steelLaw: 'strain-hardening', strengthRatio: 0.9 }, 'strengthRatio', '0.9'],
  ] as const)('%s throws and names the value', (_, changes, key, value) => {
    let thrown: unknown;
    try {
      curveOf(HOOPED, { ...PLAIN, ...changes });
    } catch (error) {
      thrown = error;
    }
    expect(thrown).toBeInstanceOf(InvalidSectionError);
    expect((thrown as InvalidSectionError).path).toEqual(['choices', key]);
    expect((thrown as InvalidSectionError).message).toContain(value);
  });
});
