import { z } from 'zod';
import { findBar } from '../engine/bars.ts';
import { CONCRETE_LAW_IDS, STEEL_LAW_IDS, type CurveChoices } from '../engine/curve-choices.ts';
import { ruleSetOf } from '../engine/rules/rule-set-of.ts';
import { seismicSystemsOf } from '../engine/seismic.ts';
import {
  BAR_STANDARDS,
  BEND_ALLOWANCES,
  DISPLACED_CONCRETE,
  DUCTILITY_MEASURES,
  RULE_SET_IDS,
  SEISMIC_SYSTEMS,
  YIELD_CURVATURE_AT,
  type DesignBasis,
  type Rates,
} from '../engine/section.ts';
import { nationalValuesSchema } from './national-values.ts';
import { bounded, coverMmSchema, fcMPaSchema, fyMPaSchema, nonEmptyText } from './numbers.ts';

export const UNIT_SYSTEMS = ['us', 'si'] as const;
/** What people type and read; storage is SI always. */
export type UnitSystem = (typeof UNIT_SYSTEMS)[number];

const rate = (label: string) => bounded(label, 0, 1e9, '').nullable();

export const ratesSchema = z.object({
  currency: nonEmptyText('Currency', 8),
  steelPerKg: rate('Steel rate'),
  stirrupPerKg: rate('Stirrup rate'),
  formworkPerM2: rate('Formwork rate'),
  concrete: z
    .array(
      z.object({
        fcMPa: fcMPaSchema,
        costPerM3: rate('Concrete rate'),
        co2eKgPerM3: rate('Concrete carbon factor'),
      }),
    )
    .max(40, 'A price book holds at most 40 mixes'),
  steelCo2ePerKg: rate('Steel carbon factor'),
  lapShare: bounded('Laps', 0, 1, ''),
  wasteShare: bounded('Waste', 0, 1, ''),
}) satisfies z.ZodType<Rates>;

/** A price book: the engine's rates and where they come from. */
export const priceBookSchema = ratesSchema.extend({
  source: nonEmptyText('Source of the rates', 500),
});
export type PriceBook = z.infer<typeof priceBookSchema>;

/** Laws of the full curve; what is left out takes its law's own value. The limits catch slips and keep a law whole: a bar breaks after it hardens. */
const curveChoicesSchema = z
  .object({
    concreteLaw: z.enum(CONCRETE_LAW_IDS, { error: 'Choose a concrete law' }),
    steelLaw: z.enum(STEEL_LAW_IDS, { error: 'Choose a steel law' }),
    peakShare: bounded('Peak stress over f′c', 0.5, 1.2, '').optional(),
    peakStrain: bounded('Strain at peak stress', 0.001, 0.01, '').optional(),
    crushingStrain: bounded('Crushing strain', 0.002, 0.1, '').optional(),
    ruptureStrain: bounded('Rupture strain of bars', 0.02, 0.3, '').optional(),
    strengthRatio: bounded('fu over fy', 1, 2, '').optional(),
    hardeningStrain: bounded('Strain at the start of hardening', 0.001, 0.015, '').optional(),
    hoopYieldMPa: fyMPaSchema.optional(),
    hoopRuptureStrain: bounded('Rupture strain of hoops', 0.02, 0.3, '').optional(),
    hasTensionBeforeCracking: z.boolean().optional(),
  })
  .superRefine(({ peakStrain, crushingStrain }, context) => {
    if (peakStrain !== undefined && crushingStrain !== undefined && crushingStrain < peakStrain)
      context.addIssue({
        code: 'custom',
        path: ['crushingStrain'],
        message: 'Concrete is crushed beyond its peak: enter a strain above that of the peak',
      });
  }) satisfies z.ZodType<CurveChoices>;

/** What decides numbers, without the rates: those live in the price book and are joined when a run is frozen. */
export const engineBasisSchema = z.object({
  ruleSet: z.enum(RULE_SET_IDS, { error: 'Choose a design code' }),
  barStandard: z.enum(BAR_STANDARDS, { error: 'Choose a bar standard' }),
  esMPa: bounded('Steel modulus Es', 150000, 250000, 'MPa'),
  maxAggregateMm: bounded('Largest aggregate', 4, 80, 'mm'),
  bendAllowance: z.enum(BEND_ALLOWANCES),
  displacedConcrete: z.enum(DISPLACED_CONCRETE),
  yieldCurvatureAt: z.enum(YIELD_CURVATURE_AT),
  fytMPa: fyMPaSchema,
  slabMm: bounded('Slab thickness', 0, 2000, 'mm'),
  seismicSystem: z.enum(SEISMIC_SYSTEMS, { error: 'Choose a seismic system, or none' }).optional(),
  skinBar: nonEmptyText('Skin bar', 8).nullable().optional(),
  stirrupStepMm: bounded('Step of stirrup spacings', 1, 300, 'mm').optional(),
  leastStirrupSpacingMm: bounded('Closest stirrups', 25, 600, 'mm').optional(),
  barOversize: bounded('Outside of a bar over its name', 1, 1.3, '').optional(),
  ductilityMeasure: z.enum(DUCTILITY_MEASURES, { error: 'Choose a ductility measure' }).optional(),
  curve: curveChoicesSchema.optional(),
  nationalValues: nationalValuesSchema.nullable().optional(),
}) satisfies z.ZodType<Omit<DesignBasis, 'rates'>>;

/** A project's design basis: the engine's part, units, and the values a new sweep starts from. */
export const designBasisSchema = engineBasisSchema.extend({
  units: z.enum(UNIT_SYSTEMS, { error: 'Choose units' }),
  fyMPa: fyMPaSchema,
  coverMm: coverMmSchema,
});
export type ProjectDesignBasis = z.infer<typeof designBasisSchema>;

/** A design basis as it is saved: its parts must go together. */
export const savedDesignBasisSchema = designBasisSchema.superRefine((basis, ctx) => {
  const { seismicSystem = 'none', skinBar, barStandard } = basis;
  const rules = ruleSetOf(basis);
  if (!seismicSystemsOf(rules).includes(seismicSystem))
    ctx.addIssue({
      code: 'custom',
      path: ['seismicSystem'],
      message: `${rules.title} knows no such seismic system`,
    });
  if (skinBar && !findBar(barStandard, skinBar))
    ctx.addIssue({
      code: 'custom',
      path: ['skinBar'],
      message: `The bar standard lists no bar ${skinBar}`,
    });
});

export const fullBasisSchema = engineBasisSchema.extend({
  rates: ratesSchema.nullable(),
}) satisfies z.ZodType<DesignBasis>;
