import { queryOptions } from '@tanstack/react-query';
import { call } from '#client/src/lib/api.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';

/** While somebody types a sweep, the runs of others begin and end. */
const ASK_AGAIN_MS = 10_000;

export const runningLoadQuery = () =>
  queryOptions({
    queryKey: queryKeys.runningLoad(),
    queryFn: ({ signal }) => call('getRunningLoad', { signal }),
    staleTime: 0,
    refetchInterval: ASK_AGAIN_MS,
  });
