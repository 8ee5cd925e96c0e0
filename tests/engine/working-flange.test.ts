import { describe, expect, it } from 'vitest';
import { evaluateSection } from '#shared/engine/evaluate.ts';
import {
  evaluateMetric,
  METRIC_BASIS,
  metricSection,
  NO_DEMAND,
  NO_RULES,
} from '#shared/verification/layered-section.ts';

describe('the working of a T', () => {
  const printed = { b: 300, bf: 1000, hf: 100, h: 600, d: 540, fc: 28, fy: 420 };
  const stepsOf = (As: number, slabAt: 'compression' | 'tension' = 'compression') => {
    const { working } = evaluateMetric({ ...printed, As, slabAt });
    return (id: string) => {
      const { formula, value, inputs } = working.find((one) => one.id === id)!;
      return {
        formula,
        value,
        ...Object.fromEntries(inputs.map((input) => [input.symbol, input.value])),
      } as {
        formula: string;
        value: number;
      } & Record<string, number>;
    };
  };

  it('of a block in the flange is that of a rectangle bf wide', () => {
    const step = stepsOf(1200);
    const C = step('concrete-force');
    expect(C.formula).toBe('0.85 f′c bf a');
    expect(C.value).toBeCloseTo(0.85 * C['f′c']! * C.bf! * C.a!, 3);
    expect(step('mn').formula).toBe('Σ T d − C a/2');
    const icr = step('icr');
    expect(icr.formula).toContain('bf (kd)³/3');
    expect(icr.value).toBeCloseTo(
      (icr.bf! * icr.kd! ** 3) / 3 + icr.n! * icr.A1! * (icr.d1! - icr.kd!) ** 2,
      -3,
    );
  });

  it('of a deeper block puts in b, bf and hf', () => {
    const step = stepsOf(6600);
    const C = step('concrete-force');
    expect(C.formula).toBe('0.85 f′c (b a + (bf − b) hf)');
    expect(C.value).toBeCloseTo(0.85 * C['f′c']! * (C.b! * C.a! + (C.bf! - C.b!) * C.hf!), 3);
    const mn = step('mn');
    expect(mn.formula).toBe('Σ T d − 0.85 f′c (b a²/2 + (bf − b) hf²/2)');
    const block = (mn.b! * mn.a! ** 2) / 2 + ((mn.bf! - mn.b!) * mn.hf! ** 2) / 2;
    expect(mn.value).toBeCloseTo(mn.T1! * mn.d1! - 0.85 * mn['f′c']! * block, 2);
    const icr = step('icr');
    expect(icr.formula).toContain('b (kd)³/3 + (bf − b) ((kd)³ − (kd − hf)³)/3');
  });

  it('counts a slab in tension in the uncracked section alone', () => {
    const step = stepsOf(2000, 'tension');
    expect(step('concrete-force').formula).toBe('0.85 f′c b a');
    expect(step('icr').formula).toContain('b (kd)³/3 +');
    const y = step('uncracked-axis');
    expect(y.formula).toContain('(bf − b) hf (h − hf/2)');
    const [slab, steel] = [(y.bf! - y.b!) * y.hf!, (y.n! - 1) * y.A1!];
    expect(y.value).toBeCloseTo(
      ((y.b! * y.h! ** 2) / 2 + slab * (y.h! - y.hf! / 2) + steel * y.d1!) / (y.b! * y.h! + slab + steel),
      9,
    );
  });

  it('says what the effective width follows from, with its clause', () => {
    const width = { kind: 'effective', clearToNextWebMm: 2000, spanMm: 6000 } as const;
    const flange = { shape: 'l', thicknessMm: 100, face: 'compression', width } as const;
    const { working } = evaluateSection(
      { ...metricSection({ ...printed, As: 2000 }), flange },
      { basis: METRIC_BASIS, demand: NO_DEMAND, rules: NO_RULES },
    );
    expect(working.find(({ id }) => id === 'flange-width')).toMatchObject({
      symbol: 'bf',
      formula: 'b + min(6 hf, sw/2, ln/12)',
      value: 800,
      clause: 'ACI 318M-19 Table 6.3.2.1',
    });
  });
});
