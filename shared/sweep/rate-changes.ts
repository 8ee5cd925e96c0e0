import type { Rates } from '../engine/section.ts';

/** Rates a ranking may be asked to change by some per cent; what a section costs and weighs in carbon follows from them. */
export const RATE_KEYS = [
  'steel',
  'stirrups',
  'concrete',
  'formwork',
  'steelCarbon',
  'concreteCarbon',
] as const;
export type RateKey = (typeof RATE_KEYS)[number];

/** Per cent more or less of each rate; what is left out stays. */
export type RateChanges = Partial<Readonly<Record<RateKey, number>>>;

export const LEAST_CHANGE = -90;
export const MOST_CHANGE = 400;

/** Rates with each changed by its per cent; a missing one stays missing. */
export function changedRates(rates: Rates, changes: RateChanges): Rates {
  const change = (rate: number | null, key: RateKey): number | null => {
    const percent = changes[key] ?? 0;
    return rate === null || percent === 0 ? rate : rate * (1 + percent / 100);
  };
  return {
    ...rates,
    steelPerKg: change(rates.steelPerKg, 'steel'),
    stirrupPerKg: change(rates.stirrupPerKg, 'stirrups'),
    formworkPerM2: change(rates.formworkPerM2, 'formwork'),
    concrete: rates.concrete.map((mix) => ({
      ...mix,
      costPerM3: change(mix.costPerM3, 'concrete'),
      co2eKgPerM3: change(mix.co2eKgPerM3, 'concreteCarbon'),
    })),
    steelCo2ePerKg: change(rates.steelCo2ePerKg, 'steelCarbon'),
  };
}
