import { queryOptions, useMutation, useQuery, useQueryClient, type QueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { RUN_EVENTS_PATH } from '#shared/contract/endpoints.ts';
import { viewProgressSchema, type Run, type ViewProgress } from '#shared/contract/records.ts';
import type { View } from '#shared/sweep/problem.ts';
import { call } from '#client/src/lib/api.ts';
import { apiUrl } from '#client/src/lib/paths.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';
import { createPartQueue } from './part-queue.ts';
import { isUnderWay, newerProgress } from './view-progress.ts';

export const runQuery = (runId: string) =>
  queryOptions({
    queryKey: queryKeys.run(runId),
    queryFn: ({ signal }) => call('getRun', { params: { id: runId }, signal }),
  });

const viewKey = (runId: string, view: View) => queryKeys.view(runId, view.x, view.y);

/** A view the run already has is read; any other is opened, which queues its computation. */
async function fetchView(run: Run, view: View, signal: AbortSignal): Promise<ViewProgress> {
  const known = run.views.find((one) => one.view.x === view.x && one.view.y === view.y);
  if (known !== undefined) return call('getView', { params: { id: run.id, viewId: known.viewId }, signal });
  return call('openView', { params: { id: run.id }, body: view, signal });
}

/** Events are what keeps a view current; asking again now and then is for networks that swallow them. */
const ASK_AGAIN_MS = 2500;

export function useView(run: Run | undefined, view: View | null) {
  const client = useQueryClient();
  return useQuery({
    queryKey: run === undefined || view === null ? ['view', 'none'] : viewKey(run.id, view),
    queryFn: async ({ signal, queryKey }) => {
      const answer = await fetchView(run!, view!, signal);
      return newerProgress(client.getQueryData<ViewProgress>(queryKey), answer);
    },
    enabled: run !== undefined && view !== null,
    staleTime: Infinity,
    structuralSharing: false,
    refetchInterval: (query) =>
      query.state.data !== undefined && isUnderWay(query.state.data.state) ? ASK_AGAIN_MS : false,
  });
}

function takeProgress(client: QueryClient, runId: string, progress: ViewProgress): void {
  const key = viewKey(runId, progress.view);
  client.setQueryData<ViewProgress>(key, (known) => newerProgress(known, progress));
  if (!isUnderWay(progress.state))
    void client.invalidateQueries({ queryKey: queryKeys.run(runId), exact: true });
}

/** Follows a run while something of it is under way; the browser reconnects and is told what it missed. */
export function useRunEvents(runId: string, isLive: boolean): void {
  const client = useQueryClient();
  useEffect(() => {
    if (!isLive) return;
    const source = new EventSource(apiUrl(RUN_EVENTS_PATH, { id: runId }));
    const parts = createPartQueue((progress) => takeProgress(client, runId, progress));
    source.addEventListener('progress', (event) => {
      const parsed = viewProgressSchema.safeParse(JSON.parse(String(event.data)));
      if (parsed.success) parts.add(parsed.data);
    });
    return () => {
      source.close();
      parts.close();
    };
  }, [client, runId, isLive]);
}

export function useCancelRun(runId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call('cancelRun', { params: { id: runId }, body: {} }),
    onSuccess: (run) => client.setQueryData(queryKeys.run(runId), run),
  });
}
