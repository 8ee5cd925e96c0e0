import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { call } from '#client/src/lib/api.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';
import type { SweepInput } from './read-sweep-form.ts';

export const sweepQuery = (sweepId: string) =>
  queryOptions({
    queryKey: queryKeys.sweep(sweepId),
    queryFn: ({ signal }) => call('getSweep', { params: { id: sweepId }, signal }),
  });

/** Where a sweep is saved: over the one it came from, or as a new one on a beam. */
export type SweepGoal =
  { readonly kind: 'new'; readonly beamId: string } | { readonly kind: 'change'; readonly sweepId: string };

/** Saves; the caller goes on from there. */
export function useSaveSweep(projectId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ goal, input }: { readonly goal: SweepGoal; readonly input: SweepInput }) =>
      goal.kind === 'new'
        ? call('createSweep', { params: { id: goal.beamId }, body: input })
        : call('updateSweep', { params: { id: goal.sweepId }, body: input }),
    onSuccess: (sweep) => {
      client.setQueryData(sweepQuery(sweep.id).queryKey, sweep);
      void client.invalidateQueries({ queryKey: queryKeys.sweeps(projectId) });
    },
  });
}
