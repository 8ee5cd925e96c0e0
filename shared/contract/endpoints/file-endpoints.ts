import { z } from 'zod';
import { MEASURE_IDS } from '../../engine/measures.ts';
import { filterEntries, readFilters, type RangeFilters } from '../../sweep/range-filters.ts';
import { idSchema } from '../numbers.ts';

/** Files that the service writes. They are fetched as links, so what is asked for stands in the address. */
export const TABLE_FORMATS = ['csv', 'xlsx'] as const;
export type TableFormat = (typeof TABLE_FORMATS)[number];

export const byIdAndFormat = z.object({ id: idSchema, format: z.enum(TABLE_FORMATS) });

/** Sections of a run as a table. */
export const SECTIONS_FILE_PATH = '/runs/:id/sections.:format';

/** Sections in one file at most: each is judged anew with all its checks, ten to twenty seconds for so many. */
export const MOST_ROWS_IN_FILE = 100_000;

export const SECTION_LISTS = ['front', 'band', 'all'] as const;
export type SectionList = (typeof SECTION_LISTS)[number];

const rangesSchema = z
  .string()
  .max(2000, 'These are more ranges than there are measures')
  .default('')
  .transform((text, context): RangeFilters => {
    const filters = readFilters(text);
    // One that could not be read must not be left out in silence: more would be handed over than was asked for.
    if (filterEntries(filters).length !== text.split(';').filter(Boolean).length)
      context.addIssue({ code: 'custom', message: 'A range reads measure:from~to, as depthMm:500~700' });
    return filters;
  });

/** Named as in the address of the run's page. */
export const sectionsFileQuerySchema = z.object({
  list: z.enum(SECTION_LISTS, { error: `List must be ${SECTION_LISTS.join(', ')}` }).default('front'),
  /** The view whose front is meant; the run's own without it. */
  x: z.enum(MEASURE_IDS, { error: 'x must be a measure' }).optional(),
  y: z.enum(MEASURE_IDS, { error: 'y must be a measure' }).optional(),
  /** With it the front is the one in three measures. */
  z: z.enum(MEASURE_IDS, { error: 'z must be a measure' }).optional(),
  /** Width of the near-best band, per cent of the best. */
  band: z.coerce.number({ error: 'The band is a number of per cent' }).min(0).max(10).default(5),
  /** Ranges, `depthMm:500~700;costPerM:~90` in stored (SI) units. */
  f: rangesSchema,
});

/** Takeoff of pinned sections, side by side. */
export const TAKEOFF_FILE_PATH = '/projects/:id/takeoff.:format';

export const MOST_OPTIONS_IN_FILE = 60;

export const takeoffFileQuerySchema = z.object({
  /** Ids of the candidates, comma between; all that stand without it. */
  pins: z
    .string()
    .max(40 * MOST_OPTIONS_IN_FILE, `At most ${MOST_OPTIONS_IN_FILE} candidates`)
    .default('')
    .transform((text) => text.split(',').filter(Boolean))
    .pipe(z.array(idSchema)),
});
