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

/** Value of every measure of one section; null where an input for it (a rate, a demand) is missing. */
export type Measures = Readonly<Record<MeasureId, number | null>>;
