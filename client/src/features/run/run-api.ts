import { queryOptions, useMutation, useQuery, useQueryClient, type QueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { RUN_EVENTS_PATH } from '#shared/contract/endpoints.ts';
import {
  queuePositionSchema,
  viewEventSchema,
  type QueuePosition,
  type Run,
  type ViewEvent,
  type ViewProgress,
} from '#shared/contract/records.ts';
import { isSameView, type View } from '#shared/sweep/problem.ts';
import { call } from '#client/src/lib/api.ts';
import { messageOf } from '#client/src/lib/api-error.ts';
import { apiUrl } from '#client/src/lib/paths.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';
import { notify } from '#client/src/ui/toast.tsx';
import { createPartQueue } from './part-queue.ts';
import { isUnderWay, newerProgress, PaceWindow } from './view-progress.ts';

export const runQuery = (runId: string) =>
  queryOptions({
    queryKey: queryKeys.run(runId),
    queryFn: ({ signal }) => call('getRun', { params: { id: runId }, signal }),
  });

const viewKey = (runId: string, view: View) => queryKeys.view(runId, view.x, view.y, view.z ?? null);

/** A view the run already has is read; any other is opened, which queues its computation. */
async function fetchView(run: Run, view: View, signal: AbortSignal): Promise<ViewProgress> {
  const known = run.views.find((one) => isSameView(one.view, view));
  if (known !== undefined) return call('getView', { params: { id: run.id, viewId: known.viewId }, signal });
  return call('openView', { params: { id: run.id }, body: view, signal });
}

/** Events are what keeps a view current; asking again now and then is for networks that swallow them. */
const ASK_AGAIN_MS = 2500;

export function useView(run: Run | undefined, view: View | null) {
  const client = useQueryClient();
  return useQuery<ViewProgress>({
    queryKey: run === undefined || view === null ? ['view', 'none'] : viewKey(run.id, view),
    queryFn: async ({ signal, queryKey }) => {
      const answer = await fetchView(run!, view!, signal);
      return newerProgress(client.getQueryData<ViewProgress>(queryKey), answer) ?? answer;
    },
    enabled: run !== undefined && view !== null,
    staleTime: Infinity,
    // The same pair with or without a third measure is the same cloud and the same line: it stays while the other comes.
    placeholderData: (previous) =>
      previous?.view.x === view?.x && previous?.view.y === view?.y ? previous : undefined,
    structuralSharing: false,
    refetchInterval: (query) =>
      query.state.data !== undefined && isUnderWay(query.state.data.state) ? ASK_AGAIN_MS : false,
  });
}

function takeProgress(client: QueryClient, runId: string, progress: ViewEvent): void {
  const queryKey = viewKey(runId, progress.view);
  const next = newerProgress(client.getQueryData<ViewProgress>(queryKey), progress);
  if (next === undefined) void client.invalidateQueries({ queryKey, exact: true });
  else client.setQueryData<ViewProgress>(queryKey, next);
  if (!isUnderWay(progress.state))
    void client.invalidateQueries({ queryKey: queryKeys.run(runId), exact: true });
}

/** What the stream tells of a view besides its progress. */
export interface LiveView {
  readonly position: QueuePosition | null;
  /** Sections a second of late. */
  readonly perSecond: number | null;
}
const NOT_LIVE: LiveView = { position: null, perSecond: null };

export function useLiveView(runId: string, viewId: string): LiveView {
  const live = useQuery<LiveView>({
    queryKey: queryKeys.liveView(runId, viewId),
    queryFn: () => NOT_LIVE,
    initialData: NOT_LIVE,
    enabled: false,
  });
  return live.data;
}

/** Follows a run while something of it is under way; the browser reconnects and is told what it missed. */
export function useRunEvents(runId: string, isLive: boolean): void {
  const client = useQueryClient();
  useEffect(() => {
    if (!isLive) return;
    const source = new EventSource(apiUrl(RUN_EVENTS_PATH, { id: runId }));
    const paces = new Map<string, PaceWindow>();
    const tell = (viewId: string, live: Partial<LiveView>) =>
      client.setQueryData<LiveView>(queryKeys.liveView(runId, viewId), (known) => ({
        ...(known ?? NOT_LIVE),
        ...live,
      }));
    // All of it waits for the page to be idle: anything drawn meanwhile would start the drawing of a part over.
    const parts = createPartQueue((progress) => {
      const pace = paces.get(progress.viewId) ?? new PaceWindow();
      paces.set(progress.viewId, pace);
      tell(progress.viewId, { perSecond: pace.add(progress), position: null });
      takeProgress(client, runId, progress);
    });
    source.addEventListener('progress', (event) => {
      const parsed = viewEventSchema.safeParse(JSON.parse(String(event.data)));
      if (parsed.success) parts.add(parsed.data);
    });
    source.addEventListener('queue', (event) => {
      const parsed = queuePositionSchema.safeParse(JSON.parse(String(event.data)));
      if (parsed.success) tell(parsed.data.viewId, { position: parsed.data });
    });
    return () => {
      source.close();
      parts.close();
    };
  }, [client, runId, isLive]);
}

/** Takes a stopped run up again; its page follows it from then on. */
export function useResumeRun(runId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call('resumeRun', { params: { id: runId }, body: {} }),
    onSuccess: (run) => {
      client.setQueryData(queryKeys.run(runId), run);
      return client.invalidateQueries({ queryKey: queryKeys.run(runId) });
    },
    onError: (error) => notify.failed(messageOf(error)),
  });
}

export function useCancelRun(runId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => call('cancelRun', { params: { id: runId }, body: {} }),
    onSuccess: (run) => client.setQueryData(queryKeys.run(runId), run),
  });
}
