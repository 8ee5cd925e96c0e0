import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { PriceBook } from '#shared/contract/design-basis.ts';
import { call } from '#client/src/lib/api.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';

export function useSetPriceBook(projectId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: PriceBook) => call('setPriceBook', { params: { id: projectId }, body }),
    onSuccess: (project) => {
      client.setQueryData(queryKeys.project(projectId), project);
      void client.invalidateQueries({ queryKey: queryKeys.candidates(projectId) });
    },
  });
}
