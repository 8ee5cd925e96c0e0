import { describe, expect, it } from 'vitest';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import { MM_PER_IN, MPA_PER_KSI } from '#shared/engine/units.ts';
import { computeCase } from '#shared/verification/book.ts';
import { flexuralOptimumProblem, sweepClosedForm } from '#shared/verification/optimum-cases.ts';
import { getCase } from '#shared/verification/topics.ts';

describe('OPT-01 (Amir & Hasegawa 1989, restated by Gandomi, Yang & Alavi 2011; optimum re-found by exhaustive search)', () => {
  const { inputs, expected } = getCase('OPT-01');
  const optimum = expected as { f: number; As: number; h: number; b: number };

  it('is found by our sweep with areas as given', () => {
    const { comparisons } = computeCase(getCase('OPT-01'));
    const { f, As, h, b } = Object.fromEntries(comparisons.map(({ name, computed }) => [name, computed]));
    expect(b).toBeCloseTo(optimum.b, 9);
    expect(h).toBeCloseTo(optimum.h, 9);
    expect(As).toBeCloseTo(optimum.As, 9);
    expect(f).toBeCloseTo(optimum.f, 3);
  });

  it('entered as real bars, 8 No. 8 in two layers, is rejected with the width it would need', () => {
    const { basis, demand, rules } = flexuralOptimumProblem(inputs);
    const evaluation = evaluateSection(
      {
        widthMm: optimum.b * MM_PER_IN,
        depthMm: optimum.h * MM_PER_IN,
        fcMPa: 5 * MPA_PER_KSI,
        fyMPa: 50 * MPA_PER_KSI,
        coverMm: 1.5 * MM_PER_IN,
        stirrup: { bar: '#3', legs: 2, spacingMm: 203.2 },
        reinforcement: {
          kind: 'bars',
          tension: [{ bar: '#8', count: 8 }],
          compression: [{ bar: '#4', count: 2 }],
        },
      },
      { basis: { ...basis, bendAllowance: 'corner-in-bend' }, demand, rules: { ...rules, maxLayers: 2 } },
    );
    expect(8 * 0.79).toBeCloseTo(optimum.As, 9);
    const fit = evaluation.checks.find((check) => check.id === 'bar-fit')!;
    // by hand: 2 (1.5 + 0.375 + 0.75) + 3 × 1.0 + 3 × 1.0 = 11.25 in for four in a layer
    expect(fit.passes).toBe(false);
    expect(fit.demand! / MM_PER_IN).toBeCloseTo(11.25, 9);
    expect(evaluation.meetsListedChecks).toBe(false);
    expect(evaluation.flexure).toBeNull();
  });
});

describe('OPT-04 (closed form derived from the rectangular block; no outside source)', () => {
  const { inputs, expected } = getCase('OPT-04');
  const { without, withFormwork, frontDMm } = sweepClosedForm(inputs);
  const { Cc, Cf_with, b } = inputs as { Cc: number; Cf_with: number; b: number };

  it('without formwork converges to the closed form as the step goes to 5 mm', () => {
    const cost = expected.cost_without_formwork as number;
    expect(without.cost).toBeGreaterThanOrEqual(cost * (1 - 1e-4));
    expect(without.cost / cost).toBeCloseTo(1, 3);
    // the closed form's own depth, as the case notes
    expect(Math.abs(without.dMm - 582.4)).toBeLessThan(25);
  });

  it('with formwork the optimum sits on the strain limit, as the case notes', () => {
    // analytic bound: As about 2301, d 408.1, cost about 86.1; the grid lies at most one 5 mm step of depth above it
    expect(withFormwork.cost).toBeGreaterThan(86.0);
    expect(withFormwork.cost).toBeLessThan(86.1 + 0.005 * ((Cc * b) / 1000 + 2 * Cf_with) + 0.01);
    expect(withFormwork.dMm).toBeLessThan(408.1 + 5);
    expect(withFormwork.dMm).toBeGreaterThanOrEqual(408);
  });

  it('the front of steel against depth is the analytic one: d within one 5 mm step at each printed As', () => {
    const printed = expected.front_d as readonly number[];
    expect(frontDMm).toHaveLength(printed.length);
    printed.forEach((d, i) => {
      const As = (inputs.front_As as readonly number[])[i]!;
      expect(frontDMm[i]! - d, `d at As = ${As}`).toBeGreaterThan(-0.1);
      expect(frontDMm[i]! - d, `d at As = ${As}`).toBeLessThanOrEqual(5);
    });
  });
});
