import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import { MM2_PER_IN2, MM_PER_IN, MPA_PER_KSI, N_PER_KIP } from '#shared/engine/units.ts';
import type { RuleSet } from '#shared/engine/rules/rule-set.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import { sectionAt } from '#shared/sweep/space.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { METRIC_BASIS, NO_DEMAND, NO_RULES, US_BASIS } from './layered-section.ts';

/** Published optimisation problems and closed-form optima, from cases/optimum-cases.json; each names its source. */
interface Optimum {
  readonly f: number;
  readonly As: number;
  readonly h: number;
  readonly b: number;
}
const CASES = JSON.parse(
  readFileSync(new URL('./cases/optimum-cases.json', import.meta.url), 'utf8'),
) as readonly {
  id: string;
  problem: { As: readonly number[] };
  optimum: Optimum;
  cases: readonly {
    Mn_kNm: number;
    b: number;
    fc: number;
    fy: number;
    dc: number;
    Cc: number;
    Cs: number;
    Cf: number;
    As: number;
    d: number;
    cost_per_m: number;
  }[];
  analytic_front_As_d: readonly (readonly [number, number])[];
}[];
const caseOf = (id: string) => CASES.find((c) => c.id === id)!;

const COST_AND_DEPTH: View = { x: 'costPerM', y: 'depthMm' };
const rates = {
  currency: 'units',
  steelPerKg: 0,
  stirrupPerKg: null,
  formworkPerM2: 0,
  concrete: [],
  steelCo2ePerKg: null,
  lapShare: 0,
  wasteShare: 0,
};

function frontOf(problem: SweepProblem, view: View, ruleChanges: Partial<RuleSet> = {}) {
  const plain = prepareSweep(problem, view);
  const prepared = { ...plain, ruleSet: { ...plain.ruleSet, ...ruleChanges } };
  const result = finishResult(problem, view, sweepRange(prepared, 0, prepared.space.size));
  return { prepared, result, sectionOf: (index: number) => sectionAt(prepared.space, index) };
}

describe('OPT-01 (Amir & Hasegawa 1989, restated by Gandomi, Yang & Alavi 2011; optimum re-found by exhaustive search)', () => {
  const { problem, optimum } = caseOf('OPT-01');
  const fcMPa = 5 * MPA_PER_KSI;
  const perFt = 1 / 0.3048;
  // 29.4 per in² of steel and 0.6 per in² of concrete over the span of 30 ft, as prices per kg and per m³ of one metre.
  const steelPerKg = (29.4 * perFt) / 30 / (MM2_PER_IN2 * 0.00785);
  const costPerM3 = ((0.6 * perFt) / 30) * (1e6 / MM2_PER_IN2);
  const basis = {
    ...US_BASIS,
    ruleSet: 'aci318-14' as const,
    rates: { ...rates, steelPerKg, concrete: [{ fcMPa, costPerM3, co2eKgPerM3: null }] },
  };
  const space: SweepProblem['space'] = {
    width: { kind: 'range', from: 5 * MM_PER_IN, to: 10 * MM_PER_IN, step: 0.05 * MM_PER_IN },
    depth: { kind: 'range', from: 28 * MM_PER_IN, to: 40 * MM_PER_IN, step: MM_PER_IN },
    fc: { kind: 'list', values: [fcMPa] },
    fy: { kind: 'list', values: [50 * MPA_PER_KSI] },
    cover: { kind: 'list', values: [38.1] },
    stirrups: [null],
    tension: { kind: 'areas', areasMm2: problem.As.map((a) => a * MM2_PER_IN2), at: { shareOfDepth: 0.2 } },
    compression: { kind: 'areas', areasMm2: [0], at: { offsetMm: 50 } },
  };
  const demand = { ...NO_DEMAND, muNmm: 6480 * N_PER_KIP * MM_PER_IN };
  const rules = { ...NO_RULES, maxDepthToWidth: 4 };

  it('is found by our sweep with areas as given', () => {
    // The problem predates the strain limits: φ is 0.9 throughout, and nothing bounds the steel.
    const { result, sectionOf } = frontOf({ space, basis, demand, rules }, COST_AND_DEPTH, {
      strengthReduction: () => 0.9,
      leastTensionStrain: () => 0,
    });
    const best = result.front[0]!;
    const section = sectionOf(best.index);
    const layer = section.reinforcement.kind === 'layers' ? section.reinforcement.layers[0]! : undefined;
    expect(section.widthMm / MM_PER_IN).toBeCloseTo(optimum.b, 9);
    expect(section.depthMm / MM_PER_IN).toBeCloseTo(optimum.h, 9);
    expect(layer!.areaMm2 / MM2_PER_IN2).toBeCloseTo(optimum.As, 9);
    expect((best.x / perFt) * 30).toBeCloseTo(optimum.f, 3);
  });

  it('entered as real bars, 8 No. 8 in two layers, is rejected with the width it would need', () => {
    const { widthMm, depthMm } = { widthMm: optimum.b * MM_PER_IN, depthMm: optimum.h * MM_PER_IN };
    const evaluation = evaluateSection(
      {
        widthMm,
        depthMm,
        fcMPa,
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
  const opt = caseOf('OPT-04');

  /** Fixed b, depth in 5 mm steps, steel in 1 mm² steps around the analytic optimum. */
  function sweep(given: (typeof opt.cases)[number], view: View, areas: readonly number[]) {
    const { b, fc, fy, dc, Cc, Cs, Cf, Mn_kNm } = given;
    return frontOf(
      {
        space: {
          width: { kind: 'list', values: [b] },
          depth: { kind: 'range', from: 350, to: 900, step: 5 },
          fc: { kind: 'list', values: [fc] },
          fy: { kind: 'list', values: [fy] },
          cover: { kind: 'list', values: [40] },
          stirrups: [null],
          tension: { kind: 'areas', areasMm2: areas, at: { offsetMm: dc } },
          compression: { kind: 'areas', areasMm2: [0], at: { offsetMm: 50 } },
        },
        basis: {
          ...METRIC_BASIS,
          rates: {
            ...rates,
            steelPerKg: Cs / 7850,
            formworkPerM2: Cf,
            concrete: [{ fcMPa: fc, costPerM3: Cc, co2eKgPerM3: null }],
          },
        },
        // tension-controlled sections are kept by the strain check, where φ = 0.9
        demand: { ...NO_DEMAND, muNmm: 0.9 * Mn_kNm * 1e6 },
        rules: NO_RULES,
      },
      view,
    );
  }
  const areasFrom = (low: number, high: number, step: number) =>
    Array.from({ length: Math.floor((high - low) / step) + 1 }, (_, i) => low + i * step);

  it('without formwork converges to the closed form as the step goes to 5 mm', () => {
    const given = opt.cases[0]!;
    const { result, sectionOf } = sweep(given, COST_AND_DEPTH, areasFrom(1000, 2200, 1));
    const best = result.front[0]!;
    expect(best.x).toBeGreaterThanOrEqual(given.cost_per_m * (1 - 1e-4));
    expect(best.x / given.cost_per_m).toBeCloseTo(1, 3);
    expect(Math.abs(sectionOf(best.index).depthMm - (given.d + given.dc))).toBeLessThan(25);
  });

  it('with formwork the optimum sits on the strain limit, as the case notes', () => {
    const given = opt.cases[1]!;
    const { result, sectionOf } = sweep(given, COST_AND_DEPTH, areasFrom(2000, 2600, 1));
    const best = result.front[0]!;
    // analytic bound: As about 2301, d 408.1, cost about 86.1; the grid lies at most one 5 mm step of depth above it
    expect(best.x).toBeGreaterThan(86.0);
    expect(best.x).toBeLessThan(86.1 + 0.005 * (given.Cc * 0.3 + 2 * given.Cf) + 0.01);
    expect(sectionOf(best.index).depthMm - given.dc).toBeLessThan(408.1 + 5);
    expect(sectionOf(best.index).depthMm - given.dc).toBeGreaterThanOrEqual(408);
  });

  it('the front of steel against depth is the analytic one: d within one 5 mm step at each printed As', () => {
    const given = opt.cases[0]!;
    const printed = opt.analytic_front_As_d;
    const { result, sectionOf } = sweep(given, { x: 'steelKgPerM', y: 'depthMm' }, areasFrom(1200, 2302, 1));
    for (const [As, d] of printed) {
      const reached = result.front
        .filter((p) => p.x <= As * 0.00785 * (1 + 1e-9))
        .map((p) => sectionOf(p.index).depthMm - given.dc);
      const least = Math.min(...reached);
      expect(least - d, `d at As = ${As}`).toBeGreaterThan(-0.1);
      expect(least - d, `d at As = ${As}`).toBeLessThanOrEqual(5);
    }
  });
});
