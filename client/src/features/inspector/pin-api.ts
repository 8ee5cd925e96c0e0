import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { PinInput } from '#shared/contract/records.ts';
import { call } from '#client/src/lib/api.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';

export function usePinCandidate(projectId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: PinInput) => call('pinCandidate', { params: { id: projectId }, body }),
    onSuccess: (candidate) => {
      client.setQueryData(queryKeys.candidate(candidate.id), candidate);
      // Counts on the project and its beams change too; their keys lie below the project's.
      return client.invalidateQueries({ queryKey: queryKeys.project(projectId) });
    },
  });
}
