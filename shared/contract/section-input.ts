import { z } from 'zod';
import {
  FACES,
  FLANGE_SHAPES,
  SUPPORTS,
  type Demand,
  type Flange,
  type SectionInput,
  type Stirrup,
  type UserRules,
} from '../engine/section.ts';
import {
  bounded,
  coverMmSchema,
  depthMmSchema,
  fcMPaSchema,
  fyMPaSchema,
  momentNmmSchema,
  nonEmptyText,
  shearNSchema,
  spanMmSchema,
  steelAreaSchema,
  widthMmSchema,
} from './numbers.ts';

const wholeCount = (label: string, low: number, high: number) =>
  z
    .number({ error: `${label} must be a whole number` })
    .int(`${label} must be a whole number`)
    .min(low, `${label} must be at least ${low}`)
    .max(high, `${label} must be at most ${high}`);

export const barDesignationSchema = nonEmptyText('Bar size', 8);
export const barCountNumberSchema = wholeCount('Number of bars', 1, 60);

export const barGroupSchema = z
  .array(z.object({ bar: barDesignationSchema, count: barCountNumberSchema }))
  .max(2, 'A face takes at most two bar sizes');

export const stirrupSchema = z.object({
  bar: barDesignationSchema,
  legs: wholeCount('Stirrup legs', 2, 12),
  spacingMm: bounded('Stirrup spacing', 25, 2000, 'mm'),
  isDesigned: z.boolean().optional(),
}) satisfies z.ZodType<Stirrup>;

const reinforcementSchema = z.discriminatedUnion('kind', [
  z.object({ kind: z.literal('bars'), tension: barGroupSchema, compression: barGroupSchema }),
  z.object({
    kind: z.literal('layers'),
    layers: z
      .array(
        z.object({
          depthMm: bounded('Layer depth', 0, 5000, 'mm'),
          areaMm2: steelAreaSchema('Layer area'),
          face: z.enum(FACES),
        }),
      )
      .min(1, 'Enter at least one layer of steel')
      .max(20, 'A section takes at most 20 layers'),
  }),
]);

/** A slab's width is that to the next beams at most; the limit catches slips of unit. */
const flangeWidthMmSchema = bounded('Flange width', 50, 20_000, 'mm');

export const flangeSchema = z.object({
  shape: z.enum(FLANGE_SHAPES, { error: 'Choose a T or an L' }),
  thicknessMm: bounded('Flange thickness', 20, 2000, 'mm'),
  face: z.enum(FACES, { error: 'Choose the face the slab lies at' }),
  width: z.discriminatedUnion('kind', [
    z.object({ kind: z.literal('given'), widthMm: flangeWidthMmSchema }),
    z.object({
      kind: z.literal('effective'),
      clearToNextWebMm: bounded('Clear distance to the next web', 50, 50_000, 'mm'),
      spanMm: spanMmSchema,
      support: z.enum(SUPPORTS).optional(),
    }),
  ]),
}) satisfies z.ZodType<Flange>;

/** What is wrong between a slab and the webs and depths it goes with; the messages name the field. */
export function flangeIssues(
  flange: Flange,
  { widestWebMm, leastDepthMm }: { readonly widestWebMm: number; readonly leastDepthMm: number },
): { path: string[]; message: string }[] {
  const { thicknessMm, width } = flange;
  return [
    ...(thicknessMm >= leastDepthMm
      ? [{ path: ['flange', 'thicknessMm'], message: 'The flange must be thinner than the depth h' }]
      : []),
    ...(width.kind === 'given' && width.widthMm < widestWebMm
      ? [{ path: ['flange', 'width', 'widthMm'], message: 'The flange must be as wide as the web, or wider' }]
      : []),
  ];
}

export const sectionInputSchema = z
  .object({
    widthMm: widthMmSchema,
    depthMm: depthMmSchema,
    fcMPa: fcMPaSchema,
    fyMPa: fyMPaSchema,
    coverMm: coverMmSchema,
    stirrup: stirrupSchema.nullable(),
    reinforcement: reinforcementSchema,
    flange: flangeSchema.nullable().optional(),
  })
  .superRefine((section, ctx) => {
    if (section.flange) {
      const beside = { widestWebMm: section.widthMm, leastDepthMm: section.depthMm };
      for (const issue of flangeIssues(section.flange, beside)) ctx.addIssue({ code: 'custom', ...issue });
    }
    if (section.reinforcement.kind !== 'layers') return;
    section.reinforcement.layers.forEach((layer, i) => {
      if (layer.depthMm >= section.depthMm)
        ctx.addIssue({
          code: 'custom',
          path: ['reinforcement', 'layers', i, 'depthMm'],
          message: 'The layer lies outside the section: its depth must be less than h',
        });
    });
  }) satisfies z.ZodType<SectionInput>;

export const demandSchema = z.object({
  muNmm: momentNmmSchema.nullable(),
  ductilityTarget: bounded('Ductility target μφ', 0, 100, '').nullable(),
  depthCapMm: depthMmSchema.nullable(),
  vuN: shearNSchema.nullable().optional(),
  spanMm: spanMmSchema.nullable().optional(),
  support: z.enum(SUPPORTS).nullable().optional(),
}) satisfies z.ZodType<Demand>;

/** The rules one by one; how they go together is asked by `userRulesSchema`. */
export const userRulesObjectSchema = z.object({
  minDepthToWidth: bounded('Least h/b', 0.1, 20, '').nullable(),
  maxDepthToWidth: bounded('Largest h/b', 0.1, 20, '').nullable(),
  maxLayers: wholeCount('Layers', 1, 4),
  oneSizePerFace: z.boolean(),
  excludedBars: z.array(barDesignationSchema).max(40),
  columnWidthMm: widthMmSchema.nullable(),
  minCompressionShare: bounded('Least A′s/As', 0, 1, '').nullable(),
  requireHangers: z.boolean(),
});

export const userRulesSchema = userRulesObjectSchema.superRefine((rules, ctx) => {
  const { minDepthToWidth: low, maxDepthToWidth: high } = rules;
  if (low !== null && high !== null && low > high)
    ctx.addIssue({
      code: 'custom',
      path: ['maxDepthToWidth'],
      message: 'Largest h/b is below the least h/b',
    });
}) satisfies z.ZodType<UserRules>;
