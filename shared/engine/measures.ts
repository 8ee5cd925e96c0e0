/** The measures a section can be compared by; the closed vocabulary of every chart axis, front and table. */
export const MEASURE_IDS = [
  'steelKgPerM',
  'costPerM',
  'co2eKgPerM',
  'depthMm',
  'widthMm',
  'concreteM3PerM',
  'formworkM2PerM',
  'curvatureDuctility',
  'designStrengthNmm',
  'utilisation',
  'barCount',
] as const;
export type MeasureId = (typeof MEASURE_IDS)[number];

export const DIRECTIONS = ['less', 'more'] as const;
export type Direction = (typeof DIRECTIONS)[number];

/** Which way is better. Utilisation Mu/φMn: less leaves more in reserve. */
export const MEASURE_DIRECTION: Readonly<Record<MeasureId, Direction>> = {
  steelKgPerM: 'less',
  costPerM: 'less',
  co2eKgPerM: 'less',
  depthMm: 'less',
  widthMm: 'less',
  concreteM3PerM: 'less',
  formworkM2PerM: 'less',
  curvatureDuctility: 'more',
  designStrengthNmm: 'more',
  utilisation: 'less',
  barCount: 'less',
};

/**
 * Rounds an amount to 1e-9 of its unit. Equal amounts summed in another order differ in the last bit (3-25M and 5-20M both
 * weigh 11.775 kg/m), and a front must see them as equal.
 */
export const onGrid = (amount: number) => Math.round(amount * 1e9) / 1e9;

/** Value of every measure of one section; null where an input for it (a rate, a demand) is missing. */
export type Measures = Readonly<Record<MeasureId, number | null>>;
