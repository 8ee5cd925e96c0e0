import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { SavedViewInput } from '#shared/contract/saved-view.ts';
import { call } from '#client/src/lib/api.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';

export const savedViewsQuery = (projectId: string) =>
  queryOptions({
    queryKey: queryKeys.savedViews(projectId),
    queryFn: ({ signal }) => call('listSavedViews', { params: { id: projectId }, signal }),
  });

/** A new view of a sweep, or another name or address for one there is. */
export type ViewGoal =
  { readonly kind: 'new'; readonly sweepId: string } | { readonly kind: 'change'; readonly viewId: string };

export function useSaveView(projectId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ goal, input }: { readonly goal: ViewGoal; readonly input: SavedViewInput }) =>
      goal.kind === 'new'
        ? call('createSavedView', { params: { id: goal.sweepId }, body: input })
        : call('updateSavedView', { params: { id: goal.viewId }, body: input }),
    onSuccess: () => client.invalidateQueries({ queryKey: queryKeys.savedViews(projectId) }),
  });
}

export function useDeleteView(projectId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (viewId: string) => call('deleteSavedView', { params: { id: viewId } }),
    onSuccess: () => client.invalidateQueries({ queryKey: queryKeys.savedViews(projectId) }),
  });
}
