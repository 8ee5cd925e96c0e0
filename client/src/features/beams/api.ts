import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { BeamInput } from '#shared/contract/records.ts';
import { call } from '#client/src/lib/api.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';

export const beamsQuery = (projectId: string) =>
  queryOptions({
    queryKey: queryKeys.beams(projectId),
    queryFn: ({ signal }) => call('listBeams', { params: { id: projectId }, signal }),
  });

/** Counts on the project and what is cached below it change with its beams. */
function useInvalidateProject(projectId: string) {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: queryKeys.project(projectId) });
}

export function useSaveBeam(projectId: string, beamId: string | null) {
  const invalidate = useInvalidateProject(projectId);
  return useMutation({
    mutationFn: (body: BeamInput) =>
      beamId === null
        ? call('createBeam', { params: { id: projectId }, body })
        : call('updateBeam', { params: { id: beamId }, body }),
    onSuccess: invalidate,
  });
}

export function useDeleteBeam(projectId: string) {
  const invalidate = useInvalidateProject(projectId);
  return useMutation({
    mutationFn: (beamId: string) => call('deleteBeam', { params: { id: beamId } }),
    onSuccess: invalidate,
  });
}
