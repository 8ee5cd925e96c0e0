import { z } from 'zod';
import { idSchema, nonEmptyText } from './numbers.ts';

/** More than any page writes; both keep a view from being used as a store. */
const MOST_PARTS = 40;
const LONGEST_PART = 2000;

/**
 * What a run's address says beside the run: measures, third, logarithmic axes, filters, columns, band, selection. What each part
 * means is the page's own business: it reads an address that anyone may have typed, and takes what makes no sense as not there.
 */
export const viewAddressSchema = z
  .record(
    z.string().regex(/^[a-z]{1,12}$/, 'A part of an address is named in small letters'),
    z.string().max(LONGEST_PART, `A part of the address is longer than ${LONGEST_PART} characters`),
  )
  .refine((address) => Object.keys(address).length <= MOST_PARTS, `At most ${MOST_PARTS} parts`);
export type ViewAddress = z.infer<typeof viewAddressSchema>;

export const savedViewInputSchema = z.object({
  name: nonEmptyText('Name of the view', 80),
  /** The run it was seen on; the chosen section is one of that run's. */
  runId: idSchema,
  address: viewAddressSchema,
});
export type SavedViewInput = z.infer<typeof savedViewInputSchema>;

/** A way of looking at the runs of a sweep, kept under a name for everybody of the project. */
export const savedViewSchema = savedViewInputSchema.extend({
  id: idSchema,
  sweepId: idSchema,
  runNumber: z.number(),
  createdBy: z.object({ id: idSchema, name: z.string() }),
  createdAt: z.iso.datetime(),
  /** Whether the reader may rename, replace or delete it. */
  mayChange: z.boolean(),
});
export type SavedView = z.infer<typeof savedViewSchema>;
