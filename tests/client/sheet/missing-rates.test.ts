import { describe, expect, it } from 'vitest';
import type { Rates } from '#shared/engine/section.ts';
import { missingFactors, missingRates } from '#client/src/sheet/missing-rates.ts';

const COMPLETE: Rates = {
  currency: 'XTS',
  steelPerKg: 2,
  stirrupPerKg: 2,
  formworkPerM2: 0,
  concrete: [{ fcMPa: 27.579, costPerM3: 190, co2eKgPerM3: 300 }],
  steelCo2ePerKg: 0.9,
  lapShare: 0,
  wasteShare: 0,
};

describe('what a cost is waiting for', () => {
  it('is nothing when every rate is there; a rate of zero is a rate', () => {
    expect(missingRates(COMPLETE, 27.58)).toEqual([]);
    expect(missingFactors(COMPLETE, 27.58)).toEqual([]);
  });

  it('names the mix when no line of the price book has its f′c', () => {
    expect(missingRates(COMPLETE, 34.47)).toEqual(['rate of concrete of this strength']);
    expect(missingFactors(COMPLETE, 34.47)).toEqual(['carbon factor of concrete of this strength']);
  });

  it('names each rate left blank', () => {
    const blank: Rates = { ...COMPLETE, steelPerKg: null, stirrupPerKg: null, formworkPerM2: null };
    expect(missingRates(blank, 27.58)).toEqual([
      'rate of longitudinal bars',
      'rate of stirrups',
      'rate of formwork',
    ]);
  });

  it('says so when there is no price book at all', () => {
    expect(missingRates(null, 30)).toEqual(['no price book']);
  });
});
