import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { OfficeStandardInput } from '#shared/contract/office-standard.ts';
import { call } from '#client/src/lib/api.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';

export const officeStandardsQuery = () =>
  queryOptions({
    queryKey: queryKeys.officeStandards(),
    queryFn: ({ signal }) => call('listOfficeStandards', { signal }),
  });

/** Over the standard of that id, or as a new one. */
export function useSaveOfficeStandard(id: string | null) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: OfficeStandardInput) =>
      id === null
        ? call('createOfficeStandard', { body })
        : call('updateOfficeStandard', { params: { id }, body }),
    onSuccess: () => client.invalidateQueries({ queryKey: queryKeys.officeStandards() }),
  });
}

export function useDeleteOfficeStandard() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (id: string) => call('deleteOfficeStandard', { params: { id } }),
    onSuccess: () => client.invalidateQueries({ queryKey: queryKeys.officeStandards() }),
  });
}
