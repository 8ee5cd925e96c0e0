import { errorBodySchema, type ErrorCode, type Issue } from '#shared/contract/errors.ts';

/** The service refused, or could not be reached (`offline`). */
export class ApiError extends Error {
  readonly code: ErrorCode | 'offline';
  readonly status: number;
  readonly issues: readonly Issue[];
  readonly requestId: string | null;

  constructor(fields: {
    code: ErrorCode | 'offline';
    message: string;
    status: number;
    issues?: readonly Issue[];
    requestId?: string | null;
  }) {
    super(fields.message);
    this.name = 'ApiError';
    this.code = fields.code;
    this.status = fields.status;
    this.issues = fields.issues ?? [];
    this.requestId = fields.requestId ?? null;
  }
}

/** Reads the service's error body; an answer in any other form (a proxy's page) becomes a plain `internal`. */
export async function apiErrorOf(response: Response): Promise<ApiError> {
  const body = errorBodySchema.safeParse(await response.json().catch(() => null));
  if (body.success) return new ApiError({ ...body.data.error, status: response.status });
  return new ApiError({
    code: 'internal',
    message: `The service answered with an error (${response.status}).`,
    status: response.status,
  });
}

export const messageOf = (error: unknown): string =>
  error instanceof Error ? error.message : 'Something went wrong.';
