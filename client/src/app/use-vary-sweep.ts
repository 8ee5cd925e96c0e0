import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useLocation, useNavigate } from 'react-router-dom';
import type { Run } from '#shared/contract/records.ts';
import type { SweepVariation } from '#client/src/features/run/edge-offers.tsx';
import { sweepQuery, useSaveSweep } from '#client/src/features/sweep-form/sweep-api.ts';
import { useStartRun } from '#client/src/features/sweeps/api.ts';
import { carriedSearch } from '#client/src/lib/carried-search.ts';
import { messageOf } from '#client/src/lib/api-error.ts';
import { paths } from '#client/src/lib/paths.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';
import { notify } from '#client/src/ui/toast.tsx';

/**
 * Runs a sweep with something changed. The sweep itself takes the change where it still is what was run; where someone has
 * changed it since, a new one is made beside it, so that no one's work is overwritten.
 */
export function useVarySweep(run: Run) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const { search } = useLocation();
  const save = useSaveSweep(run.projectId);
  const start = useStartRun(run.projectId);
  return useMutation({
    mutationFn: async ({ definition, words }: SweepVariation) => {
      const sweep = await client.fetchQuery({ ...sweepQuery(run.sweepId), staleTime: 0 });
      const isAsRun = JSON.stringify(sweep.definition) === JSON.stringify(run.definition);
      const goal = isAsRun
        ? ({ kind: 'change', sweepId: sweep.id } as const)
        : ({ kind: 'new', beamId: run.beam.id } as const);
      const name = isAsRun ? sweep.name : `${sweep.name}, ${words}`.slice(0, 120);
      const saved = await save.mutateAsync({ goal, input: { name, definition } });
      return start.mutateAsync(saved.id);
    },
    onSuccess: (started, { words }) => {
      client.setQueryData(queryKeys.run(started.id), started);
      notify.done(`Run ${started.number} with ${words}`);
      void navigate(paths.run(run.projectId, started.id) + carriedSearch(search));
    },
    onError: (error) => notify.failed(messageOf(error)),
  });
}
