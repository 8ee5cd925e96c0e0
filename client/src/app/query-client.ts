import { QueryClient } from '@tanstack/react-query';
import { ApiError } from '#client/src/lib/api-error.ts';

/** A refusal is an answer and is not asked for again; a service that cannot be reached or stumbles is, twice. */
const isWorthRepeating = (error: unknown): boolean =>
  error instanceof ApiError && (error.code === 'offline' || error.status >= 500);

export const createQueryClient = () =>
  new QueryClient({
    defaultOptions: {
      queries: {
        staleTime: 10_000,
        retry: (count, error) => count < 2 && isWorthRepeating(error),
        retryDelay: (attempt) => 400 * 2 ** attempt,
      },
      mutations: { retry: false },
    },
  });
