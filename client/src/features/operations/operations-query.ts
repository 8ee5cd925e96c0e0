import { queryOptions } from '@tanstack/react-query';
import { call } from '#client/src/lib/api.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';

/** Often enough to see a shard go by, and no load to speak of. */
const ASK_AGAIN_MS = 1500;

export const operationsQuery = () =>
  queryOptions({
    queryKey: queryKeys.operations(),
    queryFn: ({ signal }) => call('getOperations', { signal }),
    refetchInterval: ASK_AGAIN_MS,
  });
