import type { PriceBook } from '#shared/contract/design-basis.ts';

/** Nothing known yet: every rate blank, no uplift that nobody asked for. */
export const EMPTY_PRICE_BOOK: PriceBook = {
  currency: 'USD',
  source: '',
  steelPerKg: null,
  stirrupPerKg: null,
  formworkPerM2: null,
  concrete: [],
  steelCo2ePerKg: null,
  lapShare: 0,
  wasteShare: 0,
};
