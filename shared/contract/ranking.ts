import { z } from 'zod';
import { EXPLORE_KEYS } from '../sweep/explore-axis.ts';
import { LEAST_CHANGE, MOST_CHANGE, RATE_KEYS } from '../sweep/rate-changes.ts';
import type { ViewResult } from '../sweep/result.ts';
import { ratesSchema } from './design-basis.ts';
import { bounded } from './numbers.ts';
import { openedViewSchema } from './sweep-definition.ts';

const RATE_BASES = ['run', 'today'] as const;
export type RateBase = (typeof RATE_BASES)[number];

const end = z.number({ error: 'A range ends at a number' }).refine(Number.isFinite).nullable();

/** What a run's sections are ranked by instead of its own view at its own rates. */
export const rankingInputSchema = z.object({
  view: openedViewSchema,
  rates: z.object({
    /** The run's own, or the price book of the project as it is now. */
    base: z.enum(RATE_BASES, { error: 'Choose the rates of the run, or the price book of today' }),
    /** Per cent more or less of each. */
    changes: z.partialRecord(z.enum(RATE_KEYS), bounded('Change of a rate', LEAST_CHANGE, MOST_CHANGE, '%')),
  }),
  /** Both ends belong to a range; null leaves that side open. At the rates asked for. */
  filters: z.partialRecord(z.enum(EXPLORE_KEYS), z.object({ low: end, high: end })),
  /** Width of the near-best band, share of the best. */
  bandShare: bounded('Band', 0, 0.1, ''),
});
export type RankingInput = z.infer<typeof rankingInputSchema>;

const placeSchema = z.object({ x: z.number(), y: z.number() });

/**
 * A ranking that is not a run: worked out from the run's sections for whoever asks, and kept nowhere. `result` is what a run
 * at these rates would give, but for the best sections without each check, which only a sweep finds.
 */
export const rankingSchema = z.object({
  rates: ratesSchema.nullable(),
  result: z.custom<ViewResult>((v) => typeof v === 'object' && v !== null),
  /** Sections within the filters, and of these the ones within the band; exact, however many. */
  count: z.number(),
  bandCount: z.number(),
  /** Who comes first at the run's own rates, with its measures there and at the rates asked for; null for nobody. */
  runWinner: z.object({ index: z.number(), atRunRates: placeSchema, atTheseRates: placeSchema }).nullable(),
  /** Whether the same section comes first at both. */
  isSameWinner: z.boolean(),
  tookMs: z.number(),
});
export type Ranking = z.infer<typeof rankingSchema>;
