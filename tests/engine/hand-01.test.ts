import { describe, expect, it } from 'vitest';
import { evaluateHandSection } from '#shared/verification/hand-worked-case.ts';

describe('HAND-01, 300 × 500 with 3-25 and 2-16', () => {
  const { geometry, flexure, elastic, ductility, checks, arrangement } = evaluateHandSection([
    { bar: '16', count: 2 },
  ]);

  it('places the bars at the printed depths and gap', () => {
    expect(geometry!.dMm).toBeCloseTo(437.5, 9);
    expect(geometry!.dPrimeMm).toBeCloseTo(58, 9);
    expect(geometry!.asMm2).toBeCloseTo(1472.6, 1);
    expect(geometry!.asPrimeMm2).toBeCloseTo(402.1, 1);
    expect(arrangement!.faces[0]!.clearGapMm).toBeCloseTo(62.5, 9);
  });

  it('gives the printed strength', () => {
    expect(flexure!.beta1).toBeCloseTo(0.8357, 4);
    expect(flexure!.neutralAxisMm).toBeCloseTo(86.05, 2);
    expect(flexure!.blockDepthMm).toBeCloseTo(71.91, 2);
    expect(-flexure!.layers[0]!.stressMPa).toBeCloseTo(195.6, 1);
    expect(flexure!.tensionStrain).toBeCloseTo(0.01225, 5);
    expect(flexure!.nominalMomentNmm / 1e6).toBeCloseTo(246.85, 2);
    expect(flexure!.strengthReduction).toBeCloseTo(0.9, 12);
    expect(flexure!.designMomentNmm / 1e6).toBeCloseTo(222.2, 1);
    expect(checks.find((check) => check.id === 'least-steel')!.demand).toBeCloseTo(437.5, 9);
  });

  it('gives the printed curvatures and ductility, and doubts the elastic picture', () => {
    expect(elastic!.ecMPa).toBeCloseTo(4700 * Math.sqrt(30), 9);
    expect(elastic!.modularRatio).toBeCloseTo(7.769, 3);
    expect(elastic!.crackedAxisMm).toBeCloseTo(144.2, 1);
    expect(elastic!.crackedInertiaMm4 / 1e6).toBeCloseTo(1304, 0);
    expect(ductility!.curvatureYieldPerMm * 1e6).toBeCloseTo(7.161, 3);
    expect(ductility!.curvatureUltimatePerMm * 1e5).toBeCloseTo(3.487, 2);
    expect(ductility!.curvatureDuctility).toBeCloseTo(4.87, 2);
    expect(elastic!.concreteStressShareAtYield).toBeCloseTo(0.89, 2);
    expect(elastic!.isElasticPictureDoubtful).toBe(true);
  });

  it('gives the printed variant without top steel', () => {
    const bare = evaluateHandSection([]);
    expect(bare.flexure!.blockDepthMm).toBeCloseTo(80.85, 2);
    expect(bare.flexure!.neutralAxisMm).toBeCloseTo(96.74, 2);
    expect(bare.flexure!.nominalMomentNmm / 1e6).toBeCloseTo(245.59, 2);
    expect(bare.flexure!.tensionStrain).toBeCloseTo(0.01057, 5);
    expect(bare.ductility!.curvatureDuctility).toBeCloseTo(4.27, 2);
  });

  it('does not fall for top steel assumed to yield: that would give c = 70.3 mm and μφ = 5.96', () => {
    expect(flexure!.layers[0]!.yields).toBe(false);
    expect(flexure!.neutralAxisMm).toBeGreaterThan(86);
    expect(ductility!.curvatureDuctility).toBeLessThan(4.9);
  });
});
