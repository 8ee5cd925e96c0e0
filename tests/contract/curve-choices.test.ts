import { describe, expect, it } from 'vitest';
import { engineBasisSchema } from '#shared/contract/design-basis.ts';
import { curveChoicesOf } from '#shared/engine/curve-basis.ts';
import { curveReportOf } from '#shared/engine/curve-report.ts';
import { METRIC_BASIS, NO_DEMAND, NO_RULES } from '#shared/verification/layered-section.ts';
import { HOOPED } from '../engine/hooped-section.ts';

describe('the curve’s laws in a design basis', () => {
  const parse = (curve: unknown) =>
    engineBasisSchema.safeParse({ ...METRIC_BASIS, ductilityMeasure: 'curve-bilinear', curve });
  const laws = { concreteLaw: 'mander-confined', steelLaw: 'strain-hardening' };

  it('may be left out, the code’s own taken then', () => {
    const { curve, ductilityMeasure, ...basis } = engineBasisSchema.parse(METRIC_BASIS);
    expect([curve, ductilityMeasure]).toEqual([undefined, undefined]);
    expect(curveChoicesOf({ ...basis, rates: null })).toEqual({
      concreteLaw: 'hognestad',
      steelLaw: 'elastic-plastic',
    });
  });

  it('are refused by name where they are no laws or out of range', () => {
    const messages = (curve: unknown) => parse(curve).error?.issues.map(({ path }) => path.join('.'));
    expect(messages({ ...laws, concreteLaw: 'glass' })).toEqual(['curve.concreteLaw']);
    expect(messages({ ...laws, strengthRatio: 0.9 })).toEqual(['curve.strengthRatio']);
    expect(messages({ ...laws, peakStrain: 0.003, crushingStrain: 0.002 })).toEqual(['curve.crushingStrain']);
    expect(messages({ ...laws, peakStrain: 0.003, crushingStrain: 0.004 })).toBeUndefined();
  });

  it('never break the engine at the ends of their ranges', () => {
    const ends = {
      peakShare: [0.5, 1.2],
      peakStrain: [0.001, 0.0019],
      crushingStrain: [0.002, 0.1],
      ruptureStrain: [0.02, 0.3],
      strengthRatio: [1, 2],
      hardeningStrain: [0.001, 0.015],
      hoopYieldMPa: [200, 700],
      hoopRuptureStrain: [0.02, 0.3],
    };
    for (const concreteLaw of ['hognestad', 'kent-park-confined', 'mander', 'mander-confined'] as const)
      for (const [key, values] of Object.entries(ends))
        for (const value of values) {
          const parsed = parse({ ...laws, concreteLaw, [key]: value });
          expect(parsed.success).toBe(true);
          const basis = { ...METRIC_BASIS, ...parsed.data, rates: null };
          const report = curveReportOf(HOOPED, { basis, demand: NO_DEMAND, rules: NO_RULES });
          expect(report!.marks.every((mark) => mark.curvaturePerMm > 0 && mark.momentNmm > 0)).toBe(true);
          expect(report!.equilibriumResidual).toBeLessThan(1e-9);
        }
  });
});
