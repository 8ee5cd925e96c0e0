import { describe, expect, it } from 'vitest';
import { elasticPlastic, strainHardening, type SteelLaw } from '#shared/engine/steel-laws.ts';

const GRADE = { fyMPa: 420, esMPa: 200000 };

describe('laws of reinforcing steel', () => {
  it('elastic–plastic: 300 MPa at 0.0015, fy beyond 0.0021, the same in compression', () => {
    const law = elasticPlastic(GRADE);
    expect([0.0015, 0.01, -0.0015, -0.01].map((e) => law.stress(e))).toEqual([300, 420, -300, -420]);
    expect([0.001, 0.01].map((e) => law.tangent(e))).toEqual([200000, 0]);
  });

  it('strain-hardening by Priestley, Seible and Calvi’s Grade 60 (memory): fy (1.5 − 0.5 ((0.12 − ε)/0.112)²)', () => {
    const law = strainHardening({ ...GRADE, strengthRatio: 1.5 });
    for (const strain of [0.009, 0.03, 0.06, 0.1, 0.12])
      expect(law.stress(strain)).toBeCloseTo(420 * (1.5 - 0.5 * ((0.12 - strain) / 0.112) ** 2), 9);
    expect([0.001, 0.004, 0.008].map((e) => law.stress(e))).toEqual([200, 420, 420]);
    expect(law.stress(0.12)).toBeCloseTo(630, 9);
  });

  it('an exponent other than two keeps fy at the start, fu at the end, and Mander’s slope at the start of hardening', () => {
    const law = strainHardening({ ...GRADE, exponent: 5 });
    expect(law.stress(0.0080001)).toBeCloseTo(420, 1);
    expect(law.stress(0.12)).toBeCloseTo(525, 9);
    // P = Esh (εsu − εsh)/(fu − fy)
    expect(law.tangent(0.0080001)).toBeCloseTo((5 * 105) / 0.112, 0);
  });

  it.each<[string, SteelLaw]>([
    ['elastic–plastic', elasticPlastic(GRADE)],
    ['strain-hardening', strainHardening(GRADE)],
    ['strain-hardening, exponent 4', strainHardening({ ...GRADE, exponent: 4 })],
    ['strong steel without a flat', strainHardening({ fyMPa: 1700, esMPa: 200000 })],
  ])('%s: odd, never falling to rupture, its tangent the slope of its stress', (_, law) => {
    let before = 0;
    for (let i = 1; i < 400; i++) {
      const strain = (i / 400) * law.ruptureStrain;
      const stress = law.stress(strain);
      expect(stress).toBeGreaterThanOrEqual(before);
      expect(law.stress(-strain)).toBe(-stress);
      before = stress;
      if (law.kinkStrains.some((kink) => Math.abs(kink - strain) < 1e-6)) continue;
      const slope = (law.stress(strain + 1e-8) - law.stress(strain - 1e-8)) / 2e-8;
      expect(Math.abs(slope - law.tangent(strain))).toBeLessThan(1);
    }
  });
});
