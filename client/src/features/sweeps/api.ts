import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { call } from '#client/src/lib/api.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';

export const sweepsQuery = (projectId: string) =>
  queryOptions({
    queryKey: queryKeys.sweeps(projectId),
    queryFn: ({ signal }) => call('listSweeps', { params: { id: projectId }, signal }),
    // A run under way is followed on its own page by events; here a glance every two seconds is enough.
    refetchInterval: (query) =>
      query.state.data?.some((sweep) =>
        sweep.runs.some((run) => run.state === 'queued' || run.state === 'running'),
      )
        ? 2000
        : false,
  });

export function useStartRun(projectId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (sweepId: string) => call('startRun', { params: { id: sweepId }, body: {} }),
    onSuccess: () => client.invalidateQueries({ queryKey: queryKeys.sweeps(projectId) }),
  });
}

export function useDeleteSweep(projectId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (sweepId: string) => call('deleteSweep', { params: { id: sweepId } }),
    onSuccess: () => client.invalidateQueries({ queryKey: queryKeys.project(projectId) }),
  });
}
