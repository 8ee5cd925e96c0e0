import { z } from 'zod';

/** The flat catalogue of everything the service refuses with. */
export const ERROR_CODES = [
  'invalid-input',
  'unauthenticated',
  'wrong-credentials',
  'csrf',
  'forbidden',
  'not-found',
  'conflict',
  'too-many-sections',
  'too-many-requests',
  'internal',
] as const;
export type ErrorCode = (typeof ERROR_CODES)[number];

/** One thing wrong with the input; `path` points at the field in the body, e.g. `['space', 'width', 'to']`. */
export const issueSchema = z.object({
  path: z.array(z.union([z.string(), z.number()])),
  message: z.string(),
});
export type Issue = z.infer<typeof issueSchema>;

export const errorBodySchema = z.object({
  error: z.object({
    code: z.enum(ERROR_CODES),
    message: z.string(),
    issues: z.array(issueSchema),
    requestId: z.string(),
  }),
});
export type ErrorBody = z.infer<typeof errorBodySchema>;
