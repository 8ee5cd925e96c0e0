import { describe, expect, it } from 'vitest';
import { betterNeighbour, neighboursOf, rateShiftsOf } from '#client/src/study/neighbours.ts';
import { stepText } from '#client/src/study/step-text.ts';
import { stepsFrom } from '#client/src/study/steps.ts';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import type { Rates } from '#shared/engine/section.ts';
import { expandSpace, sectionAt } from '#shared/sweep/space.ts';
import { BASIS, DEFINITION, NO_RULES } from '../run/problem.ts';

const RATES: Rates = {
  currency: 'EUR',
  steelPerKg: 1.2,
  stirrupPerKg: 1.5,
  formworkPerM2: 40,
  concrete: [25, 30, 35].map((fcMPa) => ({ fcMPa, costPerM3: 110 + fcMPa, co2eKgPerM3: 250 })),
  steelCo2ePerKg: 0.7,
  lapShare: 0.08,
  wasteShare: 0.03,
};
const CONTEXT = {
  basis: { ...BASIS, rates: RATES },
  demand: DEFINITION.demand,
  rules: { ...NO_RULES, requireHangers: false },
};
const SPACE = expandSpace(DEFINITION.space, 'iso');
const SETTING = { units: 'si', standard: 'iso', space: SPACE } as const;
const INSIDE = SPACE.widthsMm.length - 2;

/** A section with a value on either side on every axis. */
const middle = Array.from({ length: SPACE.size }, (_, i) => i).find((i) => {
  const s = sectionAt(SPACE, i);
  return (
    s.widthMm === SPACE.widthsMm[INSIDE] &&
    s.depthMm === 550 &&
    s.fcMPa === 30 &&
    JSON.stringify(s.reinforcement) ===
      JSON.stringify({
        kind: 'bars',
        tension: [{ bar: '25', count: 4 }],
        compression: [{ bar: '16', count: 2 }],
      })
  );
})!;
const SECTION = sectionAt(SPACE, middle);

describe('sections one step away', () => {
  it('differ in one input each, and are the run’s own sections where they were swept', () => {
    for (const step of stepsFrom(SECTION, SETTING)) {
      const changed = (['widthMm', 'depthMm', 'fcMPa', 'reinforcement'] as const).filter(
        (key) => JSON.stringify(step.section[key]) !== JSON.stringify(SECTION[key]),
      );
      expect(changed).toHaveLength(1);
      if (step.index !== null) expect(sectionAt(SPACE, step.index)).toEqual(step.section);
    }
  });

  it('step by the range inside it, and as far again beyond its end, where nothing was swept', () => {
    const first = { ...SECTION, widthMm: SPACE.widthsMm[0]!, depthMm: SPACE.depthsMm.at(-1)! };
    const steps = stepsFrom(first, SETTING);
    const find = (input: string, direction: string) =>
      steps.find((step) => step.input === input && step.direction === direction)!;
    expect(find('width', 'less')).toMatchObject({ section: { widthMm: 200 }, index: null });
    expect(find('width', 'more').section.widthMm).toBe(300);
    expect(find('width', 'more').index).not.toBeNull();
    expect(find('depth', 'more')).toMatchObject({ section: { depthMm: 750 }, index: null });
  });

  it('count one bar and one size less and more, and never leave a beam without tension bars', () => {
    const texts = stepsFrom(SECTION, SETTING).map((step) => stepText(step, SECTION, 'si', 'f′c'));
    for (const text of ['bottom 4-25 → 3-25', 'bottom 4-25 → 4-28', 'top 2-16 → 2-18', 'b 350 → 400 mm'])
      expect(texts).toContain(text);
    const one = {
      ...SECTION,
      reinforcement: { kind: 'bars', tension: [{ bar: '6', count: 1 }], compression: [] },
    } as const;
    const groups = stepsFrom(one, { ...SETTING, space: null }).filter((step) => step.input === 'tension');
    expect(groups).toHaveLength(2);
  });

  it('are judged by the section’s own basis and demand', () => {
    for (const one of neighboursOf(SECTION, CONTEXT, SETTING)) {
      const evaluation = evaluateSection(one.section, CONTEXT);
      expect(one.meets).toBe(evaluation.meetsListedChecks);
      expect(one.values.costPerM).toBe(evaluation.measures.costPerM);
    }
  });

  it('name a better one only if it meets its checks and is cheaper', () => {
    const neighbours = neighboursOf(SECTION, CONTEXT, SETTING);
    const own = evaluateSection(SECTION, CONTEXT).measures.costPerM!;
    const better = betterNeighbour(neighbours, own, 'costPerM');
    const cheaper = neighbours.filter((one) => one.meets && one.values.costPerM! < own);
    expect(better?.values.costPerM ?? null).toBe(
      cheaper.length === 0 ? null : Math.min(...cheaper.map((one) => one.values.costPerM!)),
    );
    const failing = neighbours.map((one) => ({ ...one, meets: false }));
    expect(betterNeighbour(failing, own, 'costPerM')).toBeNull();
    expect(betterNeighbour(neighbours, null, 'costPerM')).toBeNull();
  });
});

describe('rates a quarter lower and higher', () => {
  it('change the cost by what the engine computes with the changed rate', () => {
    const evaluation = evaluateSection(SECTION, CONTEXT);
    const dearer = (rates: Partial<Rates>) =>
      evaluateSection(SECTION, { ...CONTEXT, basis: { ...BASIS, rates: { ...RATES, ...rates } } }).measures
        .costPerM! - evaluation.measures.costPerM!;
    const shifts = rateShiftsOf(evaluation);
    const of = (rate: string) => shifts.find((shift) => shift.rate === rate)!.byQuarter;
    expect(of('bars')).toBeCloseTo(dearer({ steelPerKg: 1.25 * 1.2 }), 6);
    expect(of('formwork')).toBeCloseTo(dearer({ formworkPerM2: 50 }), 6);
    expect(shifts.reduce((sum, shift) => sum + shift.shareOfCost, 0)).toBeCloseTo(1, 12);
  });

  it('say nothing where a rate is missing', () => {
    expect(rateShiftsOf(evaluateSection(SECTION, { ...CONTEXT, basis: BASIS }))).toEqual([]);
    const partly = { ...BASIS, rates: { ...RATES, formworkPerM2: null } };
    expect(rateShiftsOf(evaluateSection(SECTION, { ...CONTEXT, basis: partly }))).toEqual([]);
  });
});
