import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { BodyOf } from '#shared/contract/endpoints.ts';
import { call } from '#client/src/lib/api.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';

export const sessionQuery = () =>
  queryOptions({
    queryKey: queryKeys.session(),
    queryFn: ({ signal }) => call('getSession', { signal }),
    staleTime: Infinity,
  });

export function useSignIn() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyOf<'signIn'>) => call('signIn', { body }),
    onSuccess: (session) => {
      const before = client.getQueryData(sessionQuery().queryKey);
      client.setQueryData(sessionQuery().queryKey, session);
      // Someone else may see other things: nothing read for the one before is kept.
      if (before?.person && before.person.id !== session.person?.id)
        void client.invalidateQueries({ predicate: (query) => query.queryKey[0] !== 'session' });
    },
  });
}

export function useSignOut() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call('signOut', {}),
    onSuccess: (session) => {
      client.setQueryData(sessionQuery().queryKey, session);
      client.removeQueries({ predicate: (query) => query.queryKey[0] !== 'session' });
    },
  });
}
