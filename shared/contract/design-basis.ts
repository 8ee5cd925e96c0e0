import { z } from 'zod';
import {
  BAR_STANDARDS,
  BEND_ALLOWANCES,
  DISPLACED_CONCRETE,
  RULE_SET_IDS,
  YIELD_CURVATURE_AT,
  type DesignBasis,
  type Rates,
} from '../engine/section.ts';
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
}) satisfies z.ZodType<Omit<DesignBasis, 'rates'>>;

/** A project's design basis: the engine's part, units, and the values a new sweep starts from. */
export const designBasisSchema = engineBasisSchema.extend({
  units: z.enum(UNIT_SYSTEMS, { error: 'Choose units' }),
  fyMPa: fyMPaSchema,
  coverMm: coverMmSchema,
});
export type ProjectDesignBasis = z.infer<typeof designBasisSchema>;

export const fullBasisSchema = engineBasisSchema.extend({
  rates: ratesSchema.nullable(),
}) satisfies z.ZodType<DesignBasis>;
