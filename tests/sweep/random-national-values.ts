import fc from 'fast-check';
import { TABLED_CRACK_WIDTHS_MM, type NationalValues } from '#shared/engine/rules/national-values.ts';

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });

/** Some national values set, others left to the recommended ones. */
export const randomNationalValues: fc.Arbitrary<NationalValues> = fc.record(
  {
    gammaC: between(1, 1.6),
    gammaS: between(1, 1.2),
    alphaCc: between(0.8, 1),
    alphaCcShear: between(0.8, 1),
    redistribution: between(0.8, 1),
    axisK1: between(0.3, 0.5),
    isPlasticAnalysis: fc.boolean(),
    shearConcrete: between(0.1, 0.2),
    strutReduction: between(0.5, 0.7),
    leastCot: between(1, 1.3),
    mostCot: between(1.5, 3),
    leastStirrups: between(0.06, 0.12),
    mostSteel: between(0.02, 0.05),
    gapOverAggregateMm: between(2, 8),
    crackWidthMm: fc.constantFrom(...TABLED_CRACK_WIDTHS_MM),
    serviceStressShare: between(0.4, 0.8),
  },
  { requiredKeys: [] },
);
