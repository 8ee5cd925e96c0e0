import { z } from 'zod';
import { MEASURE_IDS } from '../engine/measures.ts';
import type { AxisDefinition, SpaceDefinition, SteelSetsDefinition, View } from '../sweep/problem.ts';
import { RUN_METHODS } from '../sweep/run-method.ts';
import {
  bounded,
  coverMmSchema,
  depthMmSchema,
  fcMPaSchema,
  fyMPaSchema,
  steelAreaSchema,
  widthMmSchema,
} from './numbers.ts';
import {
  barCountNumberSchema,
  barDesignationSchema,
  barGroupSchema,
  demandSchema,
  flangeIssues,
  flangeSchema,
  stirrupSchema,
  userRulesSchema,
} from './section-input.ts';

/** Longest axis accepted: finer than any bar or form is cut, and it keeps a typing slip from filling memory. */
export const MAX_AXIS_VALUES = 2000;

const axisSchema = (label: string, value: z.ZodType<number>) =>
  z.discriminatedUnion('kind', [
    z
      .object({
        kind: z.literal('range'),
        from: value,
        to: value,
        step: z
          .number({ error: `${label}: the step must be a number` })
          .refine(Number.isFinite, `${label}: the step must be a number`)
          .refine((v) => v > 0, `${label}: the step must be more than zero`),
      })
      .superRefine((range, ctx) => {
        if (range.from > range.to)
          ctx.addIssue({ code: 'custom', path: ['to'], message: `${label}: the end is below the start` });
        else if (range.step > 0 && (range.to - range.from) / range.step > MAX_AXIS_VALUES)
          ctx.addIssue({
            code: 'custom',
            path: ['step'],
            message: `${label}: the step makes more than ${MAX_AXIS_VALUES} values`,
          });
      }),
    z.object({
      kind: z.literal('list'),
      values: z
        .array(value)
        .min(1, `${label}: enter at least one value`)
        .max(MAX_AXIS_VALUES, `${label}: at most ${MAX_AXIS_VALUES} values`),
    }),
  ]) satisfies z.ZodType<AxisDefinition>;

const steelSetsSchema = (label: string, isEmptyAllowed: boolean) =>
  z
    .discriminatedUnion('kind', [
      z.object({
        kind: z.literal('bars'),
        sizes: z.array(barDesignationSchema).max(20, `${label}: at most 20 sizes`),
        counts: z.array(barCountNumberSchema).max(60, `${label}: at most 60 counts`),
        none: z.boolean(),
        mixed: z
          .array(barGroupSchema.min(1, `${label}: an empty group`))
          .max(200, `${label}: at most 200 groups`)
          .optional(),
      }),
      z.object({
        kind: z.literal('areas'),
        areasMm2: z
          .array(steelAreaSchema(`${label}: area`))
          .min(1, `${label}: enter at least one area`)
          .max(5000, `${label}: at most 5000 areas`),
        // Steel at no distance from its face would lie in it.
        at: z.union([
          z.object({ offsetMm: bounded('Distance from the face', 1, 2000, 'mm') }),
          z.object({ shareOfDepth: bounded('Share of h', 0.001, 0.5, '') }),
        ]),
      }),
    ])
    .superRefine((sets, ctx) => {
      if (sets.kind === 'bars' && sets.none && !isEmptyAllowed)
        ctx.addIssue({
          code: 'custom',
          path: ['none'],
          message: `${label}: a beam needs steel at this face`,
        });
      if (sets.kind !== 'bars' || (isEmptyAllowed && sets.none) || sets.mixed?.length) return;
      if (sets.sizes.length === 0)
        ctx.addIssue({ code: 'custom', path: ['sizes'], message: `${label}: choose at least one size` });
      if (sets.counts.length === 0)
        ctx.addIssue({ code: 'custom', path: ['counts'], message: `${label}: enter at least one count` });
    }) satisfies z.ZodType<SteelSetsDefinition>;

/** The end of an axis; of a range the one that was typed, which no value of it passes. */
function endOf(axis: AxisDefinition, end: 'least' | 'most'): number {
  if (axis.kind === 'range') return end === 'least' ? axis.from : axis.to;
  return end === 'least' ? Math.min(...axis.values) : Math.max(...axis.values);
}

const spaceSchema = z
  .object({
    width: axisSchema('Width b', widthMmSchema),
    depth: axisSchema('Depth h', depthMmSchema),
    fc: axisSchema('Concrete strength f′c', fcMPaSchema),
    fy: axisSchema('Yield strength fy', fyMPaSchema),
    cover: axisSchema('Clear cover', coverMmSchema),
    stirrups: z
      .array(stirrupSchema.nullable())
      .min(1, 'Choose a stirrup, or none')
      .max(20, 'At most 20 stirrup choices'),
    tension: steelSetsSchema('Tension bars', false),
    compression: steelSetsSchema('Compression bars', true),
    flange: flangeSchema.nullable().optional(),
  })
  .superRefine((space, ctx) => {
    if (space.flange) {
      const beside = { widestWebMm: endOf(space.width, 'most'), leastDepthMm: endOf(space.depth, 'least') };
      for (const issue of flangeIssues(space.flange, beside)) ctx.addIssue({ code: 'custom', ...issue });
    }
    const { tension, compression } = space;
    const hasBars =
      compression.kind === 'bars' && (compression.counts.length > 0 || compression.mixed?.length);
    if (tension.kind === 'areas' && hasBars)
      ctx.addIssue({
        code: 'custom',
        path: ['compression'],
        message: 'Tension steel given as areas needs compression steel as areas, or none',
      });
    if (tension.kind === 'bars' && compression.kind === 'areas')
      ctx.addIssue({
        code: 'custom',
        path: ['compression'],
        message: 'Tension bars need compression bars, or none',
      });
    if (tension.kind === 'areas' && tension.areasMm2.some((area) => area <= 0))
      ctx.addIssue({
        code: 'custom',
        path: ['tension', 'areasMm2'],
        message: 'Tension steel needs an area above zero',
      });
  }) satisfies z.ZodType<SpaceDefinition>;

const viewSchema = z
  .object({ x: z.enum(MEASURE_IDS), y: z.enum(MEASURE_IDS) })
  .refine((view) => view.x !== view.y, {
    path: ['y'],
    message: 'Choose two different measures',
  }) satisfies z.ZodType<View>;

/** What a run is looked at through: a pair as above, and a third measure where a front in three is asked for. */
export const openedViewSchema = z
  .object({
    x: z.enum(MEASURE_IDS),
    y: z.enum(MEASURE_IDS),
    z: z.enum(MEASURE_IDS).nullable().optional(),
  })
  .superRefine(({ x, y, z: third }, ctx) => {
    if (x === y) ctx.addIssue({ code: 'custom', path: ['y'], message: 'Choose two different measures' });
    if (third === x || third === y)
      ctx.addIssue({ code: 'custom', path: ['z'], message: 'Choose a third measure beside the other two' });
  }) satisfies z.ZodType<View>;

/** What a saved sweep holds; the basis and rates join it when a run is frozen. */
export const sweepDefinitionSchema = z.object({
  space: spaceSchema,
  demand: demandSchema,
  rules: userRulesSchema,
  view: viewSchema,
  /** How it is run; left out, by bounds only where it is too large to evaluate every section. */
  method: z.enum(RUN_METHODS).optional(),
});
export type SweepDefinition = z.infer<typeof sweepDefinitionSchema>;
