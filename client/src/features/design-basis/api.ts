import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { BodyOf } from '#shared/contract/endpoints.ts';
import { call } from '#client/src/lib/api.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';

export function useSetDesignBasis(projectId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: BodyOf<'setDesignBasis'>) =>
      call('setDesignBasis', { params: { id: projectId }, body }),
    onSuccess: (project) => {
      client.setQueryData(queryKeys.project(projectId), project);
      void client.invalidateQueries({ queryKey: queryKeys.projects() });
    },
  });
}
