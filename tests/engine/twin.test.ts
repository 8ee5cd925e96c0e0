import { describe, expect, it } from 'vitest';
import { evaluateSection, type EvaluationContext } from '#shared/engine/evaluate.ts';
import { twinOf } from '#shared/engine/twin.ts';
import type { DesignBasis } from '#shared/engine/section.ts';
import { METRIC_BASIS, NO_DEMAND, NO_RULES } from '#shared/verification/layered-section.ts';
import { HOOPED } from './hooped-section.ts';
import { nonNull } from './non-null.ts';

const contextOf = (basis: Partial<DesignBasis> = {}): EvaluationContext => ({
  basis: { ...METRIC_BASIS, bendAllowance: 'corner-in-bend', ...basis },
  demand: NO_DEMAND,
  rules: { ...NO_RULES, requireHangers: true },
});

describe('the singly reinforced twin of HAND-01', () => {
  it('has the strength and ductility of the printed variant without top steel', () => {
    const { section, twin } = nonNull(twinOf(HOOPED, contextOf()));
    expect(section.nominalMomentNmm / 1e6).toBeCloseTo(246.85, 2);
    expect(section.curvatureDuctility).toBeCloseTo(4.87, 2);
    expect(twin.nominalMomentNmm / 1e6).toBeCloseTo(245.59, 2);
    expect(twin.neutralAxisMm).toBeCloseTo(96.74, 2);
    expect(twin.tensionStrain).toBeCloseTo(0.01057, 5);
    expect(twin.curvatureDuctility).toBeCloseTo(4.27, 2);
    expect([section.asMm2, section.asPrimeMm2, twin.asPrimeMm2]).toEqual([twin.asMm2, expect.any(Number), 0]);
  });

  it('agrees with the evaluation of both, by the curve too where that is the measure', () => {
    const { reinforcement } = HOOPED;
    if (reinforcement.kind !== 'bars') throw new Error('bars were expected');
    const bare = { ...HOOPED, reinforcement: { ...reinforcement, compression: [] } };
    for (const ductilityMeasure of ['closed', 'curve-first-yield', 'curve-bilinear'] as const) {
      const context = contextOf({ ductilityMeasure });
      const compared = nonNull(twinOf(HOOPED, context));
      [HOOPED, bare].forEach((one, i) => {
        const { flexure, ductility, measures } = evaluateSection(one, context);
        const values = [compared.section, compared.twin][i]!;
        expect(values.designMomentNmm).toBe(flexure!.designMomentNmm);
        expect(values.curvatureYieldPerMm).toBe(ductility!.curvatureYieldPerMm);
        expect(values.curvatureUltimatePerMm).toBe(ductility!.curvatureUltimatePerMm);
        expect(values.curveDuctility ?? values.curvatureDuctility).toBe(measures.curvatureDuctility);
        expect(values.curveDuctility === null).toBe(ductilityMeasure === 'closed');
      });
    }
  });

  it('is none where there is no compression steel, or none can be placed', () => {
    const none = { ...HOOPED.reinforcement, compression: [] } as typeof HOOPED.reinforcement;
    expect(twinOf({ ...HOOPED, reinforcement: none }, contextOf())).toBeNull();
    expect(twinOf({ ...HOOPED, widthMm: 100 }, contextOf())).toBeNull();
  });
});
