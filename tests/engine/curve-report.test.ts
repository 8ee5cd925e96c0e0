import { describe, expect, it } from 'vitest';
import { CONCRETE_LAW_IDS, STEEL_LAW_IDS } from '#shared/engine/curve-choices.ts';
import { curveReportOf, secondOpinionReport } from '#shared/engine/curve-report.ts';
import { evaluateSection, type EvaluationContext } from '#shared/engine/evaluate.ts';
import { flexureAtUltimate } from '#shared/engine/flexure.ts';
import { momentCurvature } from '#shared/engine/moment-curvature.ts';
import { ruleSetOf } from '#shared/engine/rules/rule-set-of.ts';
import { secondOpinionOf } from '#shared/engine/second-opinion.ts';
import type { DesignBasis, SectionInput } from '#shared/engine/section.ts';
import { placeSteel } from '#shared/engine/steel-layout.ts';
import { METRIC_BASIS, metricSection, NO_DEMAND, NO_RULES } from '#shared/verification/layered-section.ts';
import { HOOPED } from './hooped-section.ts';
import { nonNull } from './non-null.ts';

const contextOf = (basis: Partial<DesignBasis> = {}): EvaluationContext => ({
  basis: { ...METRIC_BASIS, ...basis },
  demand: NO_DEMAND,
  rules: NO_RULES,
});
const reportOf = (basis: Partial<DesignBasis> = {}, section: SectionInput = HOOPED) =>
  nonNull(curveReportOf(section, contextOf(basis)));

describe('the report of a section’s curve', () => {
  it('is plain JSON with at most 120 points from the origin, in order, every mark but cracking and the corner among them', () => {
    for (const concreteLaw of CONCRETE_LAW_IDS)
      for (const steelLaw of STEEL_LAW_IDS) {
        const report = reportOf({ curve: { concreteLaw, steelLaw } });
        const curvatures = report.points.map((point) => point.curvaturePerMm);
        expect(JSON.parse(JSON.stringify(report))).toEqual(report);
        expect(curvatures[0]).toBe(0);
        expect(curvatures.length).toBeLessThanOrEqual(120);
        expect(curvatures).toEqual([...curvatures].sort((a, b) => a - b));
        for (const mark of report.marks)
          if (mark.id !== 'cracking' && mark.id !== 'bilinear-yield')
            expect(curvatures).toContain(mark.curvaturePerMm);
        for (const law of [report.concrete, report.core, report.steel])
          if (law) expect(`${law.name} ${law.formula} ${law.source}`).not.toMatch(/undefined|NaN/);
        expect(report.core !== null).toBe(concreteLaw.endsWith('confined'));
      }
  });

  it('lists μφ by every convention with its definition, and names the one held against the target', () => {
    const closed = evaluateSection(HOOPED, contextOf());
    const report = reportOf();
    const ids = report.ductility.map(({ id }) => id);
    expect(ids).toEqual([
      'closed-outermost-layer-deduct',
      'closed-centroid-deduct',
      'closed-outermost-layer-ignore',
      'closed-centroid-ignore',
      'curve-first-yield',
      'curve-bilinear',
    ]);
    expect(report.ductility.filter((line) => line.isMeasure)).toEqual([
      expect.objectContaining({
        id: 'closed-outermost-layer-deduct',
        value: closed.measures.curvatureDuctility,
      }),
    ]);
    for (const { value, curvatureYieldPerMm, curvatureUltimatePerMm, definition } of report.ductility) {
      expect(value).toBe(curvatureUltimatePerMm / nonNull(curvatureYieldPerMm));
      expect(definition.length).toBeGreaterThan(40);
    }
    const byCurve = reportOf({ ductilityMeasure: 'curve-bilinear' });
    expect(byCurve.ductility.filter((line) => line.isMeasure).map(({ id }) => id)).toEqual([
      'curve-bilinear',
    ]);
    const above = reportOf({ displacedConcrete: 'deduct-above-axis' }).ductility;
    expect(above.map(({ id }) => id)).toContain('closed-centroid-deduct-above-axis');
  });

  it('gives the plastic hinge a length of the cantilever, half of another span, and none without a span', () => {
    const hingeOf = (support: 'cantilever' | 'simple') =>
      nonNull(curveReportOf(HOOPED, { ...contextOf(), demand: { ...NO_DEMAND, spanMm: 4000, support } }))
        .hinge;
    const cantilever = nonNull(hingeOf('cantilever'));
    // 0.08 × 4000 + 0.022 × 420 × 25
    expect(cantilever.hingeLengthMm).toBeCloseTo(551, 9);
    expect(nonNull(hingeOf('simple')).hingeLengthMm).toBeCloseTo(391, 9);
    const { ductility } = reportOf();
    const mu = nonNull(ductility.find(({ id }) => id === 'curve-bilinear')?.value);
    const share = 551 / 4000;
    expect(cantilever.displacementDuctility).toBeCloseTo(1 + 3 * (mu - 1) * share * (1 - share / 2), 9);
    expect(reportOf().hinge).toBeNull();
  });

  it('is none where the bars cannot be placed', () => {
    const crowded: SectionInput = {
      ...HOOPED,
      widthMm: 150,
      reinforcement: { kind: 'bars', tension: [{ bar: '25', count: 9 }], compression: [] },
    };
    expect(curveReportOf(crowded, contextOf())).toBeNull();
    expect(secondOpinionReport(crowded, contextOf())).toBeNull();
  });
});

describe('the second opinion', () => {
  it('agrees on strength, curvatures and every mark by all laws', () => {
    for (const concreteLaw of CONCRETE_LAW_IDS)
      for (const steelLaw of STEEL_LAW_IDS) {
        const opinion = nonNull(secondOpinionReport(HOOPED, contextOf({ curve: { concreteLaw, steelLaw } })));
        expect(opinion.lines.filter((line) => !line.agrees)).toEqual([]);
        expect(opinion.agrees).toBe(true);
        for (const line of opinion.lines) expect(Math.abs(nonNull(line.difference))).toBeGreaterThan(0);
      }
  });

  it('does not agree with the curve of a section half a per cent stronger, and says that it knows no reason', () => {
    const section = metricSection({ b: 300, h: 500, d: 440, As: 1500, fc: 30, fy: 420 });
    const basis = METRIC_BASIS;
    const layout = nonNull(placeSteel(section, basis, 2).layout);
    const choices = { concreteLaw: 'hognestad', steelLaw: 'elastic-plastic' } as const;
    const flexure = flexureAtUltimate(section, layout, basis, ruleSetOf(basis));
    const curve = momentCurvature({ section, layout, arrangement: null, basis, choices });
    const peak = { ...curve.peak, momentNmm: 1.0055 * curve.peak.momentNmm };
    const of = { section, layout, basis, flexure, curve: { ...curve, peak } };
    const { lines, agrees } = secondOpinionOf(of);
    expect(agrees).toBe(false);
    expect(lines.filter((line) => !line.agrees).map(({ id, reason }) => [id, reason])).toEqual([
      ['peak', expect.stringContaining('no reason found')],
    ]);
    const stronger = { ...flexure, nominalMomentNmm: 1.0055 * flexure.nominalMomentNmm };
    const closed = secondOpinionOf({ ...of, curve, flexure: stronger }).lines.find((line) => !line.agrees);
    expect(closed?.id).toBe('closed-strength');
  });

  it('differs in whether a bar yields as a disagreement', () => {
    const section = metricSection({ b: 300, h: 500, d: 440, As: 1500, fc: 30, fy: 420 });
    const basis = METRIC_BASIS;
    const layout = nonNull(placeSteel(section, basis, 2).layout);
    const choices = { concreteLaw: 'hognestad', steelLaw: 'elastic-plastic' } as const;
    const flexure = flexureAtUltimate(section, layout, basis, ruleSetOf(basis));
    const curve = momentCurvature({ section, layout, arrangement: null, basis, choices });
    const { lines } = secondOpinionOf({
      section,
      layout,
      basis,
      flexure,
      curve: { ...curve, firstYield: null },
    });
    expect(lines.find((line) => line.id === 'first-yield')).toMatchObject({
      agrees: false,
      difference: null,
    });
  });
});
