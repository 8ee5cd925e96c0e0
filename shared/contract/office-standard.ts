import { z } from 'zod';
import { findBar } from '../engine/bars.ts';
import { BAR_STANDARDS, type BarStandard } from '../engine/section.ts';
import { UNIT_SYSTEMS } from './design-basis.ts';
import { bounded, depthMmSchema, fcMPaSchema, idSchema, nonEmptyText, widthMmSchema } from './numbers.ts';
import {
  barCountNumberSchema,
  barDesignationSchema,
  stirrupSchema,
  userRulesObjectSchema,
} from './section-input.ts';

const sizesSchema = (label: string) =>
  z
    .array(barDesignationSchema)
    .min(1, `${label}: choose at least one size`)
    .max(20, `${label}: at most 20 sizes`);
const countsSchema = (label: string) =>
  z
    .array(barCountNumberSchema)
    .min(1, `${label}: enter at least one count`)
    .max(60, `${label}: at most 60 counts`);

/** Ranges an office usually searches for one kind of beam. */
const usualRangesSchema = z
  .object({
    name: nonEmptyText('Kind of beam', 60),
    leastWidthMm: widthMmSchema,
    mostWidthMm: widthMmSchema,
    leastDepthMm: depthMmSchema,
    mostDepthMm: depthMmSchema,
    tensionCounts: countsSchema('Bars at the tension face'),
    /** Empty for beams built without any there. */
    compressionCounts: z
      .array(barCountNumberSchema)
      .max(60, 'Bars at the compression face: at most 60 counts'),
  })
  .superRefine((ranges, ctx) => {
    const ends = [
      ['leastWidthMm', 'mostWidthMm', 'width'],
      ['leastDepthMm', 'mostDepthMm', 'depth'],
    ] as const;
    for (const [low, high, word] of ends)
      if (ranges[low] > ranges[high])
        ctx.addIssue({ code: 'custom', path: [high], message: `The largest ${word} is below the least` });
  });
export type UsualRanges = z.infer<typeof usualRangesSchema>;

const increment = (label: string) => bounded(label, 1, 1000, 'mm');

/** What the office builds, for projects of one bar standard in one system of units: the presets of a sweep. */
export const officeStandardInputSchema = z
  .object({
    name: nonEmptyText('Name of the standard', 80),
    units: z.enum(UNIT_SYSTEMS, { error: 'Choose units' }),
    barStandard: z.enum(BAR_STANDARDS, { error: 'Choose a bar standard' }),
    bars: z.object({
      tension: sizesSchema('Bars at the tension face'),
      compression: sizesSchema('Bars at the compression face'),
      stirrups: z
        .array(stirrupSchema)
        .min(1, 'Enter at least one stirrup')
        .max(20, 'At most 20 stirrup choices'),
    }),
    mixesMPa: z.array(fcMPaSchema).min(1, 'Enter at least one strength').max(40, 'At most 40 mixes'),
    increments: z.object({ widthMm: increment('Step of b'), depthMm: increment('Step of h') }),
    rules: userRulesObjectSchema.pick({
      minDepthToWidth: true,
      maxDepthToWidth: true,
      maxLayers: true,
      oneSizePerFace: true,
      minCompressionShare: true,
      requireHangers: true,
    }),
    ranges: z
      .array(usualRangesSchema)
      .min(1, 'Enter the ranges of one kind of beam')
      .max(20, 'At most 20 kinds'),
  })
  .superRefine((standard, ctx) => {
    for (const issue of unknownBars(standard)) ctx.addIssue({ code: 'custom', ...issue });
    const { minDepthToWidth: low, maxDepthToWidth: high } = standard.rules;
    if (low !== null && high !== null && low > high)
      ctx.addIssue({
        code: 'custom',
        path: ['rules', 'maxDepthToWidth'],
        message: 'Largest h/b is below the least h/b',
      });
    const names = standard.ranges.map(({ name }) => name.toLowerCase());
    names.forEach((name, i) => {
      if (names.indexOf(name) < i)
        ctx.addIssue({
          code: 'custom',
          path: ['ranges', i, 'name'],
          message: 'Another kind of beam has this name',
        });
    });
  });
export type OfficeStandardInput = z.infer<typeof officeStandardInputSchema>;

function unknownBars({
  bars,
  barStandard,
}: {
  readonly bars: { tension: string[]; compression: string[]; stirrups: { bar: string }[] };
  readonly barStandard: BarStandard;
}) {
  const named = [
    ...bars.tension.map((bar, i) => ({ bar, path: ['bars', 'tension', i] })),
    ...bars.compression.map((bar, i) => ({ bar, path: ['bars', 'compression', i] })),
    ...bars.stirrups.map(({ bar }, i) => ({ bar, path: ['bars', 'stirrups', i, 'bar'] })),
  ];
  return named
    .filter(({ bar }) => findBar(barStandard, bar) === undefined)
    .map(({ bar, path }) => ({ path, message: `The bar standard lists no bar ${bar}` }));
}

export const officeStandardSchema = z.object({
  ...officeStandardInputSchema.shape,
  id: idSchema,
  updatedBy: z.object({ id: idSchema, name: z.string() }),
  updatedAt: z.iso.datetime(),
});
export type OfficeStandard = z.infer<typeof officeStandardSchema>;
