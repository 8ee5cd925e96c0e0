import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { call } from '#client/src/lib/api.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';

export const peopleQuery = () =>
  queryOptions({ queryKey: queryKeys.people(), queryFn: ({ signal }) => call('listPeople', { signal }) });

export function useSetMembers(projectId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (personIds: string[]) =>
      call('setMembers', { params: { id: projectId }, body: { personIds } }),
    onSuccess: (project) => client.setQueryData(queryKeys.project(projectId), project),
  });
}
