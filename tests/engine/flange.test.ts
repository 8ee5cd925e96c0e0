import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import { momentCurvature } from '#shared/engine/moment-curvature.ts';
import { InvalidSectionError } from '#shared/engine/preconditions.ts';
import {
  DISPLACED_CONCRETE,
  FACES,
  FLANGE_SHAPES,
  type DesignBasis,
  type Flange,
  type Layer,
  type SectionInput,
} from '#shared/engine/section.ts';
import { placeSteel } from '#shared/engine/steel-layout.ts';
import {
  evaluateMetric,
  METRIC_BASIS,
  metricSection,
  NO_DEMAND,
  NO_RULES,
} from '#shared/verification/layered-section.ts';
import { PROPERTIES } from '#shared/verification/properties.ts';
import { nonNull } from './non-null.ts';

const ACI_CODES = ['aci318-19', 'aci318m-19', 'aci318-14', 'aci318m-14'] as const;
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });

/** A web of any steel in one to four layers, and the slab beside it. */
const drawn = fc.record({
  widthMm: between(150, 800),
  depthMm: between(250, 1500),
  fcMPa: between(17.2, 82.7),
  fyMPa: between(250, 690),
  layers: fc.array(fc.tuple(between(0.04, 0.96), between(0.0005, 0.02)), { minLength: 1, maxLength: 4 }),
  overhangShare: between(0.05, 6),
  thicknessShare: between(0.04, 0.4),
  shape: fc.constantFrom(...FLANGE_SHAPES),
});
type Drawn = typeof drawn extends fc.Arbitrary<infer T> ? T : never;

function webOf({ layers, widthMm, depthMm, fcMPa, fyMPa }: Drawn): SectionInput {
  const deepest = Math.max(...layers.map(([depth]) => depth));
  const steel = layers.map(([depth, ratio]): Layer => ({
    depthMm: depth * depthMm,
    areaMm2: ratio * widthMm * depthMm,
    face: depth === deepest ? 'tension' : 'compression',
  }));
  const reinforcement = { kind: 'layers', layers: steel } as const;
  return { widthMm, depthMm, fcMPa, fyMPa, coverMm: 40, stirrup: null, reinforcement };
}

const withFlange = (section: SectionInput, flange: Omit<Flange, 'width'>, widthMm: number): SectionInput => ({
  ...section,
  flange: { ...flange, width: { kind: 'given', widthMm } },
});

const evaluated = (section: SectionInput, basis: Partial<DesignBasis> = {}) =>
  evaluateSection(section, { basis: { ...METRIC_BASIS, ...basis }, demand: NO_DEMAND, rules: NO_RULES });

const curveOf = (section: SectionInput) => {
  const { layout, arrangement } = placeSteel(section, METRIC_BASIS, 2);
  const choices = { concreteLaw: 'hognestad', steelLaw: 'elastic-plastic' } as const;
  return momentCurvature({ section, layout: nonNull(layout), arrangement, basis: METRIC_BASIS, choices });
};

describe('a flange', () => {
  const same = PROPERTIES['flange-of-web'];
  it(same.statement, () => {
    fc.assert(
      fc.property(
        drawn,
        fc.constantFrom(...FACES),
        fc.constantFrom(...DISPLACED_CONCRETE),
        (d, face, displacedConcrete) => {
          const web = webOf(d);
          const thicknessMm = d.thicknessShare * d.depthMm;
          const t = withFlange(web, { shape: 't', thicknessMm, face }, d.widthMm);
          // the slab's height is not formed: of the rectangle's sides the design basis takes the same off
          const rectangle = evaluated(web, { displacedConcrete, slabMm: thicknessMm });
          const flanged = evaluated(t, { displacedConcrete });
          for (const part of ['flexure', 'elastic', 'ductility', 'measures', 'quantities', 'checks'] as const)
            expect(flanged[part]).toEqual(rectangle[part]);
        },
      ),
      { numRuns: same.runs, seed: same.seed },
    );
  });

  it('as wide as the web leaves the moment–curvature curve as it is, at either face', () => {
    const web = metricSection({ b: 300, h: 600, d: 540, As: 2400, d2: 60, As2: 600, fc: 30, fy: 420 });
    for (const face of FACES) {
      const t = withFlange(web, { shape: 'l', thicknessMm: 120, face }, 300);
      expect(curveOf(t).points).toEqual(curveOf(web).points);
    }
  });

  const wider = PROPERTIES['flange-width'];
  it(wider.statement, () => {
    fc.assert(
      fc.property(drawn, between(1.01, 2), (d, by) => {
        const at = (share: number) =>
          withFlange(
            webOf(d),
            { shape: d.shape, thicknessMm: d.thicknessShare * d.depthMm, face: 'compression' },
            (1 + share) * d.widthMm,
          );
        const [less, more] = [d.overhangShare, d.overhangShare * by].map((share) =>
          evaluated(at(share), { displacedConcrete: 'ignore' }),
        );
        if (!less!.flexure || !more!.flexure) return;
        expect(more!.flexure.nominalMomentNmm).toBeGreaterThan(less!.flexure.nominalMomentNmm * (1 - 1e-12));
        expect(more!.flexure.neutralAxisMm).toBeLessThan(less!.flexure.neutralAxisMm * (1 + 1e-12));
        expect(nonNull(more!.elastic).crackedAxisMm).toBeLessThan(
          nonNull(less!.elastic).crackedAxisMm * (1 + 1e-12),
        );
      }),
      { numRuns: wider.runs, seed: wider.seed },
    );
  });

  const hogging = PROPERTIES['flange-hogging'];
  it(hogging.statement, () => {
    fc.assert(
      fc.property(drawn, (d) => {
        const web = webOf(d);
        const flange = {
          shape: d.shape,
          thicknessMm: d.thicknessShare * d.depthMm,
          face: 'tension',
        } as const;
        const t = evaluated(withFlange(web, flange, (1 + d.overhangShare) * d.widthMm));
        const rectangle = evaluated(web);
        expect(t.flexure).toEqual(rectangle.flexure);
        expect(t.ductility).toEqual(rectangle.ductility);
        if (!t.elastic || !rectangle.elastic) return;
        expect(t.elastic.crackedInertiaMm4).toBe(rectangle.elastic.crackedInertiaMm4);
        expect(t.elastic.crackingMomentNmm).toBeGreaterThan(rectangle.elastic.crackingMomentNmm);
      }),
      { numRuns: hogging.runs, seed: hogging.seed },
    );
  });

  it('block exactly at the soffit of the flange: strength and axis run on from one part to the other', () => {
    const at = (share: number) => {
      const T = 0.85 * 28 * 1000 * 100 * share;
      return nonNull(
        evaluateMetric({ b: 300, bf: 1000, hf: 100, h: 600, d: 540, As: T / 420, fc: 28, fy: 420 }).flexure,
      );
    };
    const [under, exact, over] = [at(1 - 1e-9), at(1), at(1 + 1e-9)];
    expect(exact.blockDepthMm).toBeCloseTo(100, 9);
    expect(exact.concreteForceN).toBeCloseTo(0.85 * 28 * 1000 * 100, 3);
    for (const key of ['neutralAxisMm', 'nominalMomentNmm'] as const) {
      expect(under[key] / exact[key]).toBeCloseTo(1, 8);
      expect(over[key] / exact[key]).toBeCloseTo(1, 8);
    }
  });

  it('block deeper than the flange: the overhang pushes at its own middle, the web below it', () => {
    const flexure = nonNull(
      evaluateMetric({ b: 300, bf: 1000, hf: 100, h: 600, d: 540, As: 6600, fc: 28, fy: 420 }).flexure,
    );
    const [T, overhang] = [6600 * 420, 0.85 * 28 * 700 * 100];
    const a = (T - overhang) / (0.85 * 28 * 300);
    expect(a).toBeGreaterThan(100);
    expect(flexure.blockDepthMm).toBeCloseTo(a, 9);
    expect(flexure.nominalMomentNmm).toBeCloseTo(overhang * 490 + (T - overhang) * (540 - a / 2), 3);
    // taken for a rectangle as wide as the flange it would be stronger
    const wide = nonNull(evaluateMetric({ b: 1000, h: 600, d: 540, As: 6600, fc: 28, fy: 420 }).flexure);
    expect(wide.nominalMomentNmm).toBeGreaterThan(flexure.nominalMomentNmm);
  });

  it('top bars in the flange: the concrete they displace is that of the block, whichever part they lie in', () => {
    const printed = { b: 300, bf: 900, hf: 80, h: 600, d: 540, As: 7000, fc: 30, fy: 420 };
    for (const d2 of [50, 110]) {
      const { layers, neutralAxisMm } = nonNull(evaluateMetric({ ...printed, d2, As2: 800 }).flexure);
      const stress = Math.max(-420, 200000 * 0.003 * (d2 / neutralAxisMm - 1));
      expect(layers[0]!.displacedConcreteDeducted).toBe(true);
      expect(layers[0]!.forceN).toBeCloseTo(800 * (stress + 0.85 * 30), 6);
    }
  });
});

describe('equilibrium with a flange', () => {
  /** Unbalanced force at a trial axis, written anew: the block is every fibre above a, as wide as the section is there. */
  function unbalanced(section: SectionInput, c: number, displaced: string, beta1: number): number {
    if (section.reinforcement.kind !== 'layers' || section.flange?.width.kind !== 'given')
      throw new Error('layers');
    const sigma = 0.85 * section.fcMPa;
    const a = beta1 * c;
    const { thicknessMm, width } = section.flange;
    const area =
      a <= thicknessMm
        ? width.widthMm * a
        : width.widthMm * thicknessMm + section.widthMm * (a - thicknessMm);
    return section.reinforcement.layers.reduce((force, { depthMm, areaMm2 }) => {
      const stress = Math.max(-section.fyMPa, Math.min(section.fyMPa, 200000 * 0.003 * (1 - depthMm / c)));
      const isDeducted = displaced !== 'ignore' && depthMm < (displaced === 'deduct' ? a : c);
      return force + areaMm2 * (stress - (isDeducted ? sigma : 0));
    }, sigma * area);
  }

  it('of the cracked elastic section: first moments about its axis cancel, the slab as so many thin strips', () => {
    for (const As of [800, 2000, 6600]) {
      const { elastic } = evaluateMetric({ b: 300, bf: 1000, hf: 100, h: 600, d: 540, As, fc: 28, fy: 420 });
      const { crackedAxisMm: kd, modularRatio: n } = nonNull(elastic);
      let pushed = 0;
      for (let i = 0; i < 20_000; i++) {
        const y = ((i + 0.5) / 20_000) * kd;
        pushed += (y < 100 ? 1000 : 300) * (kd - y) * (kd / 20_000);
      }
      expect(pushed / (n * As * (540 - kd))).toBeCloseTo(1, 3);
    }
  });

  const property = PROPERTIES['flange-equilibrium'];
  it(property.statement, () => {
    let deep = 0;
    fc.assert(
      fc.property(
        drawn,
        fc.constantFrom(...DISPLACED_CONCRETE),
        fc.constantFrom(...ACI_CODES),
        (d, displacedConcrete, ruleSet) => {
          const flange = {
            shape: d.shape,
            thicknessMm: d.thicknessShare * d.depthMm,
            face: 'compression',
          } as const;
          const section = withFlange(webOf(d), flange, (1 + d.overhangShare) * d.widthMm);
          const { flexure } = evaluated(section, { displacedConcrete, ruleSet });
          if (!flexure) return;
          const c = flexure.neutralAxisMm;
          if (flexure.blockDepthMm > flange.thicknessMm) deep++;
          expect(Math.abs(flexure.equilibriumResidual)).toBeLessThan(1e-9);
          const at = (axis: number) => unbalanced(section, axis, displacedConcrete, flexure.beta1);
          expect(Math.abs(at(c * (1 + 1e-13))) / flexure.concreteForceN).toBeLessThan(1e-6);
          // the deepest axis: compression wins everywhere below it
          let least = Infinity;
          for (let i = 1; i <= 60; i++)
            least = Math.min(least, at(c * (1 + 1e-7) + (i / 60) * 2 * d.depthMm));
          expect(least).toBeGreaterThan(0);
          if (displacedConcrete !== 'ignore') return;
          let [low, high] = [1e-6, 4 * d.depthMm];
          for (let i = 0; i < 100; i++) {
            const mid = (low + high) / 2;
            if (at(mid) > 0) high = mid;
            else low = mid;
          }
          expect(c / high).toBeCloseTo(1, 10);
        },
      ),
      { numRuns: property.runs, seed: property.seed },
    );
    expect(deep).toBeGreaterThanOrEqual(property.atLeast.count);
  });
});

describe('least steel with a flange', () => {
  const t = { b: 300, bf: 1000, hf: 100, h: 600, d: 540, As: 1200, fc: 28, fy: 420 };
  const leastOf = (printed: Parameters<typeof metricSection>[0], demand: Partial<typeof NO_DEMAND>) =>
    evaluateSection(metricSection(printed), {
      basis: METRIC_BASIS,
      demand: { ...NO_DEMAND, ...demand },
      rules: NO_RULES,
    }).checks.find((check) => check.id === 'least-steel')!.demand!;
  const cantilever = { spanMm: 3000, support: 'cantilever' } as const;

  it('counts the web, and for a cantilever with the slab in tension the lesser of bf and 2 b', () => {
    const web = leastOf(t, {});
    expect(leastOf({ ...t, slabAt: 'tension' }, {})).toBe(web);
    expect(leastOf(t, cantilever)).toBe(web);
    expect(leastOf({ ...t, slabAt: 'tension' }, cantilever)).toBeCloseTo(2 * web, 9);
    expect(leastOf({ ...t, bf: 400, slabAt: 'tension' }, cantilever)).toBeCloseTo((4 / 3) * web, 9);
  });

  it('is waived from 4/3 of the steel that the T requires, whether or not its block stays in the flange', () => {
    for (const As of [300, 400]) {
      const strength = nonNull(evaluateMetric({ ...t, As }).flexure).designMomentNmm;
      expect(leastOf(t, { muNmm: strength })).toBeCloseTo((4 / 3) * As, 6);
    }
    const thin = { ...t, hf: 2, As: 350 };
    const { blockDepthMm, designMomentNmm } = nonNull(evaluateMetric(thin).flexure);
    expect(blockDepthMm).toBeGreaterThan(2);
    expect(leastOf(thin, { muNmm: designMomentNmm })).toBeCloseTo((4 / 3) * 350, 6);
  });
});

describe('quantities with a flange', () => {
  const web = metricSection({ b: 300, h: 600, d: 540, As: 1200, fc: 28, fy: 420 });
  const formwork = (shape: 't' | 'l') =>
    evaluated(withFlange(web, { shape, thicknessMm: 150, face: 'compression' }, 900), { slabMm: 100 })
      .quantities;

  it('forms soffit and two sides below the slab, of an L one side whole, and counts the web’s concrete through it', () => {
    expect(formwork('t').formworkM2PerM).toBeCloseTo(0.3 + 2 * 0.45, 12);
    expect(formwork('l').formworkM2PerM).toBeCloseTo(0.3 + 0.45 + 0.6, 12);
    expect(formwork('t').concreteM3PerM).toBeCloseTo(0.3 * 0.6, 12);
  });
});

describe('what is not checked of a flange', () => {
  it('names the slab’s own design, bars over a slab in tension, and an L bent sideways', () => {
    const web = metricSection({ b: 300, h: 600, d: 540, As: 1200, fc: 28, fy: 420 });
    const of = (shape: 't' | 'l', face: 'tension' | 'compression') =>
      evaluated(withFlange(web, { shape, thicknessMm: 100, face }, 900)).notChecked.join('; ');
    expect(evaluated(web).notChecked.join('; ')).not.toContain('slab');
    expect(of('t', 'compression')).toContain('shear between web and slab');
    expect(of('t', 'compression')).not.toContain('spread over the slab');
    expect(of('l', 'tension')).toMatch(/spread over the slab.*sideways bending of an L/);
  });
});

describe('a broken flange', () => {
  const web = metricSection({ b: 300, h: 600, d: 540, As: 1200, fc: 28, fy: 420 });
  it.each([
    [{ thicknessMm: 600 }, 900, ['flange', 'thicknessMm']],
    [{ thicknessMm: NaN }, 900, ['flange', 'thicknessMm']],
    [{ thicknessMm: 0 }, 900, ['flange', 'thicknessMm']],
    [{ thicknessMm: 100 }, 299, ['flange', 'width', 'widthMm']],
    [{ thicknessMm: 100 }, Infinity, ['flange', 'width', 'widthMm']],
  ] as const)('%j with bf %d throws and names the value', (change, widthMm, path) => {
    const section = withFlange(web, { shape: 't', face: 'compression', ...change }, widthMm);
    expect(() => evaluated(section)).toThrow(InvalidSectionError);
    try {
      evaluated(section);
    } catch (error) {
      expect((error as InvalidSectionError).path).toEqual(path);
    }
  });
});
