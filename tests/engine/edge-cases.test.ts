import { describe, expect, it } from 'vitest';
import { evaluateSection, type EvaluationContext } from '#shared/engine/evaluate.ts';
import { InvalidSectionError } from '#shared/engine/preconditions.ts';
import type { SectionInput } from '#shared/engine/section.ts';
import { MM_PER_IN, MPA_PER_PSI } from '#shared/engine/units.ts';
import {
  evaluateMetric,
  evaluateUs,
  METRIC_BASIS,
  metricSection,
  NO_DEMAND,
  NO_RULES,
  US_BASIS,
} from '#shared/verification/layered-section.ts';
import { nonNull } from './non-null.ts';

const context: EvaluationContext = { basis: METRIC_BASIS, demand: NO_DEMAND, rules: NO_RULES };
const beam = { b: 300, h: 500, d: 440, As: 1500, fc: 30, fy: 420 };

const withBars = (tension: number, widthMm: number): SectionInput => ({
  widthMm,
  depthMm: 500,
  fcMPa: 30,
  fyMPa: 420,
  coverMm: 40,
  stirrup: null,
  reinforcement: { kind: 'bars', tension: [{ bar: '25', count: tension }], compression: [] },
});

describe('edge cases at ultimate', () => {
  it('compression bars below the neutral axis are in tension and change sign', () => {
    const flexure = nonNull(evaluateMetric({ ...beam, As: 300, d2: 60, As2: 400 }).flexure);
    expect(flexure.neutralAxisMm).toBeLessThan(60);
    expect(flexure.layers[0]!.stressMPa).toBeGreaterThan(0);
    expect(flexure.layers[0]!.displacedConcreteDeducted).toBe(false);
  });

  it('an upper tension layer may still be elastic while the lower one yields', () => {
    const section: SectionInput = {
      ...metricSection(beam),
      reinforcement: {
        kind: 'layers',
        layers: [
          { depthMm: 240, areaMm2: 1500, face: 'tension' },
          { depthMm: 450, areaMm2: 1800, face: 'tension' },
        ],
      },
    };
    const { layers } = nonNull(evaluateSection(section, context).flexure);
    expect(layers.map((layer) => layer.yields)).toEqual([false, true]);
  });

  it('an over-reinforced section does not yield: εt below fy/Es, φ 0.65, and the strain check fails', () => {
    const { flexure, checks } = evaluateMetric({ ...beam, As: 6000 });
    expect(nonNull(flexure).tensionStrain).toBeLessThan(0.0021);
    expect(nonNull(flexure).layers[0]!.yields).toBe(false);
    expect(nonNull(flexure).strengthReduction).toBe(0.65);
    expect(checks.find((check) => check.id === 'tension-strain')!.passes).toBe(false);
  });

  it('very light steel gives a small block, a large ductility, and fails the least steel', () => {
    const { flexure, ductility, checks } = evaluateMetric({ ...beam, As: 60 });
    expect(nonNull(flexure).blockDepthMm).toBeCloseTo((60 * 420) / (0.85 * 30 * 300), 9);
    expect(nonNull(ductility).curvatureDuctility).toBeGreaterThan(50);
    expect(checks.find((check) => check.id === 'least-steel')!.passes).toBe(false);
  });

  it.each([
    [2500, 0.85],
    [12000, 0.65],
  ])('f′c of %i psi takes β1 = %f', (psi, beta1) => {
    const { evaluation, a, c } = evaluateUs({ b: 12, d: 20, As: 2, fc: psi, fy: 60000 });
    expect(evaluation.flexure!.beta1).toBe(beta1);
    expect(a / c).toBeCloseTo(beta1, 12);
  });

  it('least steel is waived at 4/3 of the required steel, and not a little below it', () => {
    const demand = { ...NO_DEMAND, muNmm: 25e6 };
    // As for 25 kN·m by hand: a = d − √(d² − 2 Mu/(φ 0.85 f′c b)), As = 0.85 f′c b a/fy
    const a = 440 - Math.sqrt(440 ** 2 - (2 * 25e6) / (0.9 * 0.85 * 30 * 300));
    const waived = ((4 / 3) * 0.85 * 30 * 300 * a) / 420;
    const passes = (As: number) =>
      evaluateSection(metricSection({ ...beam, As }), { ...context, demand }).checks.find(
        (c) => c.id === 'least-steel',
      )!.passes;
    expect(waived).toBeLessThan(440);
    expect(passes(waived * 1.0001)).toBe(true);
    expect(passes(waived * 0.9999)).toBe(false);
  });

  it('least steel asks for the lesser of As,min and 4/3 of the required steel, also where it is not met', () => {
    // 300 × 500, 2-12, f′c 30, fy 420, d 444, Mu 30 kN·m, by hand: As,req = 8087 (1 − √0.95579) = 180.8; × 4/3 = 241.0
    const { checks } = evaluateSection(metricSection({ ...beam, d: 444, As: 226.2 }), {
      ...context,
      demand: { ...NO_DEMAND, muNmm: 30e6 },
    });
    const least = checks.find((c) => c.id === 'least-steel')!;
    expect(least.passes).toBe(false);
    expect(least.demand).toBeCloseTo(241.0, 1);
    expect(least.ratio).toBeCloseTo(1.066, 3);
  });

  it('β1 of the metric books steps to 0.65 at 55 MPa, the US one follows the line to 8000 psi', () => {
    const beta1 = (fcMPa: number, ruleSet: 'aci318-19' | 'aci318m-19') =>
      evaluateMetric({ ...beam, fc: fcMPa }, { ruleSet }).flexure!.beta1;
    expect(beta1(54.9, 'aci318m-19')).toBeCloseTo(0.85 - (0.05 * 26.9) / 7, 12);
    expect(beta1(55, 'aci318m-19')).toBe(0.65);
    expect(beta1(55, 'aci318-19')).toBeCloseTo(0.85 - 0.05 * (55 / MPA_PER_PSI / 1000 - 4), 12);
  });
});

describe('sections that cannot be built', () => {
  it('one bar cannot stand alone at a face', () => {
    const { arrangement, flexure, meetsListedChecks } = evaluateSection(withBars(1, 300), context);
    expect(arrangement!.fits).toBe(false);
    expect(arrangement!.reason).toContain('1 bar at the tension face');
    expect(flexure).toBeNull();
    expect(meetsListedChecks).toBe(false);
  });

  it('a width too narrow for any bar is data with the width it would need', () => {
    const { checks, measures } = evaluateSection(withBars(4, 120), context);
    const fit = checks.find((check) => check.id === 'bar-fit')!;
    // two layers of two: 2 × 40 + 2 × 25 + a gap of max(25, 25, 4/3 × 19) = 25.33
    expect(fit).toMatchObject({ passes: false, demand: expect.closeTo(155.333, 3) as number });
    expect(measures.curvatureDuctility).toBeNull();
    expect(measures.steelKgPerM).toBeCloseTo(4 * 3.853, 9);
  });

  it('groups that meet in a shallow section are rejected with the depth needed', () => {
    const section: SectionInput = {
      ...withBars(4, 300),
      depthMm: 150,
      reinforcement: {
        kind: 'bars',
        tension: [{ bar: '25', count: 4 }],
        compression: [{ bar: '25', count: 2 }],
      },
    };
    const { arrangement } = evaluateSection(section, context);
    expect(arrangement!.reason).toContain('meet');
    expect(arrangement!.depthNeededMm).toBeCloseTo(2 * (40 + 25) + 25, 9);
  });

  it('a single group keeps the cover and the stirrup at the far face: 2-25 in h = 76 needs 125', () => {
    const section: SectionInput = {
      ...withBars(2, 300),
      depthMm: 76,
      stirrup: { bar: '10', legs: 2, spacingMm: 150 },
    };
    const { checks, flexure } = evaluateSection(section, context);
    expect(checks.find((check) => check.id === 'bar-fit')).toMatchObject({
      passes: false,
      demand: 140,
      capacity: 76,
    });
    expect(flexure).toBeNull();
    // 140 = 2 (40 + 10 + 20), the stirrup itself; the bars alone need 75 + 50 = 125
    expect(evaluateSection(section, context).arrangement!.depthNeededMm).toBeCloseTo(125, 9);
  });

  it('a stirrup that cannot be bent inside its cover fails, with plain layers too, and weighs nothing less than zero', () => {
    const section: SectionInput = {
      ...metricSection({ b: 100, h: 100, d: 80, As: 200, fc: 30, fy: 420 }),
      coverMm: 200,
      stirrup: { bar: '10', legs: 4, spacingMm: 25 },
    };
    const { meetsListedChecks, quantities } = evaluateSection(section, context);
    expect(meetsListedChecks).toBe(false);
    expect(quantities.steel.every((line) => line.kgPerM >= 0)).toBe(true);
  });

  it('no tension steel at all gives no strength and meets nothing', () => {
    const section: SectionInput = {
      ...withBars(4, 300),
      reinforcement: { kind: 'bars', tension: [], compression: [] },
    };
    const evaluation = evaluateSection(section, context);
    expect(evaluation.flexure).toBeNull();
    expect(evaluation.meetsListedChecks).toBe(false);
    expect(evaluation.checks.find((check) => check.id === 'bar-fit')).toMatchObject({
      passes: false,
      reason: 'no steel at the tension face',
    });
  });
});

describe('broken preconditions throw and name the value', () => {
  const valid = metricSection(beam);
  it.each([
    ['negative width', { ...valid, widthMm: -300 }, ['widthMm'], '-300'],
    ['NaN depth', { ...valid, depthMm: NaN }, ['depthMm'], 'NaN'],
    ['infinite strength', { ...valid, fcMPa: Infinity }, ['fcMPa'], 'Infinity'],
    ['zero yield strength', { ...valid, fyMPa: 0 }, ['fyMPa'], '0'],
    [
      'unknown bar',
      {
        ...withBars(3, 300),
        reinforcement: { kind: 'bars', tension: [{ bar: '#99', count: 3 }], compression: [] },
      },
      ['reinforcement', 'tension', 0, 'bar'],
      '#99',
    ],
    ['half a bar', withBars(2.5, 300), ['reinforcement', 'tension', 0, 'count'], '2.5'],
    [
      'a layer below the soffit',
      metricSection({ ...beam, d: 510 }),
      ['reinforcement', 'layers', 0, 'depthMm'],
      '510',
    ],
  ] as const)('%s', (_, section, path, value) => {
    let thrown: unknown;
    try {
      evaluateSection(section, context);
    } catch (error) {
      thrown = error;
    }
    expect(thrown).toBeInstanceOf(InvalidSectionError);
    expect((thrown as InvalidSectionError).path).toEqual(path);
    expect((thrown as InvalidSectionError).message).toContain(value);
  });
});

describe('US and SI', () => {
  it('of the same section agree: inches and psi against the same numbers typed in millimetres', () => {
    const us = evaluateUs({ b: 12, h: 20, d: 17.5, As: 3.16, fc: 4000, fy: 60000 }).evaluation;
    const si = evaluateSection(
      metricSection({
        b: 304.8,
        h: 508,
        d: 444.5,
        As: 3.16 * 645.16,
        fc: 4000 * MPA_PER_PSI,
        fy: 60000 * MPA_PER_PSI,
      }),
      { ...context, basis: US_BASIS },
    );
    expect(si.flexure!.nominalMomentNmm / us.flexure!.nominalMomentNmm).toBeCloseTo(1, 12);
    expect(si.ductility!.curvatureDuctility / us.ductility!.curvatureDuctility).toBeCloseTo(1, 12);
  });

  it('rule sets differ only by their rounded coefficients: least steel 0.249 against 0.25 √f′c', () => {
    const leastOf = (ruleSet: 'aci318-19' | 'aci318m-19') =>
      evaluateMetric({ ...beam, fc: 40 }, { ruleSet }).checks.find((check) => check.id === 'least-steel')!
        .demand!;
    expect(leastOf('aci318m-19') / leastOf('aci318-19')).toBeCloseTo(0.25 / (3 * Math.sqrt(MPA_PER_PSI)), 6);
    expect(MM_PER_IN).toBe(25.4);
  });
});
