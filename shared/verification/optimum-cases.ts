import { MM2_PER_IN2, MM_PER_IN, MPA_PER_KSI, N_PER_KIP } from '#shared/engine/units.ts';
import type { RuleSet } from '#shared/engine/rules/rule-set.ts';
import { finishResult } from '#shared/sweep/finish.ts';
import { prepareSweep } from '#shared/sweep/prepared-sweep.ts';
import type { SweepProblem, View } from '#shared/sweep/problem.ts';
import { sectionAt } from '#shared/sweep/space.ts';
import { sweepRange } from '#shared/sweep/sweep-range.ts';
import { METRIC_BASIS, NO_DEMAND, NO_RULES, US_BASIS } from './layered-section.ts';
import { listOf, type ComputeCase, type PublishedCase } from './published-case.ts';

const COST_AND_DEPTH: View = { x: 'costPerM', y: 'depthMm' };
const STEEL_AND_DEPTH: View = { x: 'steelKgPerM', y: 'depthMm' };
const FT_PER_M = 1 / 0.3048;
const SPAN_FT = 30;

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
  const { front } = finishResult(problem, view, sweepRange(prepared, 0, prepared.space.size));
  return front.map(({ index, x, y }) => ({ x, y, section: sectionAt(prepared.space, index) }));
}

/** OPT-01 as a sweep, but for its strain limits. */
export function flexuralOptimumProblem(raw: PublishedCase['inputs']): SweepProblem {
  const fcMPa = 5 * MPA_PER_KSI;
  // 29.4 per in² of steel and 0.6 per in² of concrete over the span of 30 ft, as prices per kg and per m³ of one metre.
  const steelPerKg = (29.4 * FT_PER_M) / SPAN_FT / (MM2_PER_IN2 * 0.00785);
  const costPerM3 = ((0.6 * FT_PER_M) / SPAN_FT) * (1e6 / MM2_PER_IN2);
  const areasMm2 = listOf<number>(raw, 'As').map((area) => area * MM2_PER_IN2);
  return {
    space: {
      width: { kind: 'range', from: 5 * MM_PER_IN, to: 10 * MM_PER_IN, step: 0.05 * MM_PER_IN },
      depth: { kind: 'range', from: 28 * MM_PER_IN, to: 40 * MM_PER_IN, step: MM_PER_IN },
      fc: { kind: 'list', values: [fcMPa] },
      fy: { kind: 'list', values: [50 * MPA_PER_KSI] },
      cover: { kind: 'list', values: [38.1] },
      stirrups: [null],
      tension: { kind: 'areas', areasMm2, at: { shareOfDepth: 0.2 } },
      compression: { kind: 'areas', areasMm2: [0], at: { offsetMm: 50 } },
    },
    basis: {
      ...US_BASIS,
      ruleSet: 'aci318-14',
      rates: { ...rates, steelPerKg, concrete: [{ fcMPa, costPerM3, co2eKgPerM3: null }] },
    },
    demand: { ...NO_DEMAND, muNmm: 6480 * N_PER_KIP * MM_PER_IN },
    rules: { ...NO_RULES, maxDepthToWidth: 4 },
  };
}

/** Inputs of OPT-04: mm, MPa, prices per m³ of concrete and of steel. */
interface ClosedForm {
  readonly Mn_kNm: number;
  readonly b: number;
  readonly fc: number;
  readonly fy: number;
  readonly dc: number;
  readonly Cc: number;
  readonly Cs: number;
}

/** The front of OPT-04 with formwork at `formworkPerM2`: fixed b, depth in 5 mm steps, the steel areas given. */
function closedFormFront(given: ClosedForm, formworkPerM2: number, areasMm2: readonly number[], view: View) {
  const { b, fc, fy, dc, Cc, Cs, Mn_kNm } = given;
  return frontOf(
    {
      space: {
        width: { kind: 'list', values: [b] },
        depth: { kind: 'range', from: 350, to: 900, step: 5 },
        fc: { kind: 'list', values: [fc] },
        fy: { kind: 'list', values: [fy] },
        cover: { kind: 'list', values: [40] },
        stirrups: [null],
        tension: { kind: 'areas', areasMm2, at: { offsetMm: dc } },
        compression: { kind: 'areas', areasMm2: [0], at: { offsetMm: 50 } },
      },
      basis: {
        ...METRIC_BASIS,
        rates: {
          ...rates,
          steelPerKg: Cs / 7850,
          formworkPerM2,
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

/** 1 mm² steps of steel. */
const areasFrom = (low: number, high: number) => Array.from({ length: high - low + 1 }, (_, i) => low + i);

/** What a sweep finds for OPT-04: costs per m, effective depths mm. */
export function sweepClosedForm(raw: PublishedCase['inputs']) {
  const given = raw as unknown as ClosedForm;
  const formwork = raw.Cf_with as number;
  const without = closedFormFront(given, 0, areasFrom(1000, 2200), COST_AND_DEPTH)[0]!;
  const withFormwork = closedFormFront(given, formwork, areasFrom(2000, 2600), COST_AND_DEPTH)[0]!;
  const front = closedFormFront(given, 0, areasFrom(1200, 2302), STEEL_AND_DEPTH);
  const depthOf = ({ section }: { section: { depthMm: number } }) => section.depthMm - given.dc;
  const leastDepthWith = (areaMm2: number) =>
    Math.min(...front.filter(({ x }) => x <= areaMm2 * 0.00785 * (1 + 1e-9)).map(depthOf));
  return {
    without: { cost: without.x, dMm: depthOf(without) },
    withFormwork: { cost: withFormwork.x, dMm: depthOf(withFormwork) },
    frontDMm: listOf<number>(raw, 'front_As').map(leastDepthWith),
  };
}

export const OPTIMUM_CASES: Readonly<Record<string, ComputeCase>> = {
  'OPT-01': (_, raw) => {
    // The problem predates the strain limits: φ is 0.9 throughout, and nothing bounds the steel.
    const best = frontOf(flexuralOptimumProblem(raw), COST_AND_DEPTH, {
      strengthReduction: () => 0.9,
      leastTensionStrain: () => 0,
    })[0]!;
    const { reinforcement, widthMm, depthMm } = best.section;
    const steelMm2 = reinforcement.kind === 'layers' ? reinforcement.layers[0]!.areaMm2 : NaN;
    return {
      f: (best.x / FT_PER_M) * SPAN_FT,
      As: steelMm2 / MM2_PER_IN2,
      h: depthMm / MM_PER_IN,
      b: widthMm / MM_PER_IN,
    };
  },
  'OPT-04': (_, raw) => {
    const { without, withFormwork, frontDMm } = sweepClosedForm(raw);
    return {
      cost_without_formwork: without.cost,
      cost_with_formwork: withFormwork.cost,
      d_with_formwork: withFormwork.dMm,
      front_d: frontDMm,
    };
  },
};
