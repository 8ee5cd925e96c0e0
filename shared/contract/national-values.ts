import { z } from 'zod';
import { TABLED_CRACK_WIDTHS_MM, type NationalValues } from '../engine/rules/national-values.ts';
import { bounded } from './numbers.ts';

const value = (label: string, low: number, high: number, unit = '') =>
  bounded(label, low, high, unit).optional();

/** Values of EN 1992-1-1 that a national annex sets; bounds are generous, to catch slips. */
export const nationalValuesSchema = z
  .object({
    gammaC: value('γc', 1, 2),
    gammaS: value('γs', 1, 1.5),
    alphaCc: value('αcc', 0.5, 1),
    alphaCcShear: value('αcc of the struts', 0.5, 1),
    redistribution: value('Redistribution δ', 0.7, 1),
    axisK1: value('k1', 0.1, 0.6),
    axisK3: value('k3', 0.1, 0.65),
    axisK2: value('k2', 0.5, 2),
    isPlasticAnalysis: z.boolean().optional(),
    shearConcrete: value('CRd,c γc', 0.05, 0.4),
    shearFloor: value('vmin coefficient', 0.005, 0.1),
    strutReduction: value('ν1 coefficient', 0.3, 1),
    leastCot: value('Least cot θ', 1, 2.5),
    mostCot: value('Largest cot θ', 1, 3),
    leastStirrups: value('ρw,min coefficient', 0.02, 0.3),
    stirrupSpacingShare: value('Stirrup spacing over d', 0.1, 1),
    legSpacingShare: value('Leg spacing over d', 0.1, 2),
    legSpacingMm: value('Leg spacing', 50, 2000, 'mm'),
    leastSteel: value('As,min coefficient', 0.05, 1),
    leastSteelFloor: value('As,min/(b d)', 0.0001, 0.01),
    mostSteel: value('As,max/Ac', 0.01, 0.1),
    tieDiameters: value('Tie spacing in bar diameters', 5, 30),
    gapDiameters: value('Clear gap in bar diameters', 0.5, 3),
    gapOverAggregateMm: value('Clear gap over the aggregate', 0.1, 30, 'mm'),
    crackWidthMm: z
      .literal(TABLED_CRACK_WIDTHS_MM, { error: 'Choose a crack width of 0.2, 0.3 or 0.4 mm' })
      .optional(),
    serviceStressShare: value('Service stress over fyd', 0.1, 1),
  })
  .superRefine(({ leastCot = 1, mostCot = 2.5 }, ctx) => {
    if (leastCot > mostCot)
      ctx.addIssue({ code: 'custom', path: ['mostCot'], message: 'The largest cot θ is below the least' });
  }) satisfies z.ZodType<NationalValues>;
