import { useQuery } from '@tanstack/react-query';
import { useCallback, useMemo, useState } from 'react';
import type { Candidate, Run } from '#shared/contract/records.ts';
import type { View } from '#shared/sweep/problem.ts';
import type { ChartPin } from '#client/src/charts/front-chart-input.ts';
import { usePinCandidate } from '#client/src/features/inspector/pin-api.ts';
import type { SectionSource } from '#client/src/features/run/section-source.ts';
import { candidatesQuery, useWithdraw } from '#client/src/features/shortlist/api.ts';
import { messageOf } from '#client/src/lib/api-error.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { notify } from '#client/src/ui/toast.tsx';

/** What stands on a flag until the service has given the candidate its letter. */
const COMING = '…';

function useOwnCandidates(run: Run): readonly Candidate[] {
  const candidates = useQuery(candidatesQuery(run.projectId));
  return useMemo(
    () =>
      (candidates.data ?? []).filter(
        ({ runId, sectionIndex, state }) =>
          runId === run.id && sectionIndex !== null && state !== 'superseded',
      ),
    [candidates.data, run.id],
  );
}

/**
 * The sections of this run that are on the shortlist, and the way to put one there at once: its flag stands before the
 * service has answered, and a word takes it back.
 */
export function useRunPins(run: Run, view: View, source: SectionSource) {
  const own = useOwnCandidates(run);
  const mayPin = useMay('pin');
  const { mutate } = usePinCandidate(run.projectId);
  const { mutate: withdraw } = useWithdraw(run.projectId);
  const [coming, setComing] = useState<readonly number[]>([]);
  const { mark } = run.beam;

  const labels = useMemo(() => {
    const known = own.map(({ sectionIndex, label }) => [sectionIndex!, label] as const);
    return new Map([...coming.map((index) => [index, COMING] as const), ...known]);
  }, [own, coming]);

  const flags = useMemo(
    () =>
      [...labels].flatMap(([index, label]): ChartPin[] => {
        const { measures } = source.evaluatedAt(index).evaluation;
        const [x, y] = [measures[view.x], measures[view.y]];
        return x === null || y === null ? [] : [{ label, index, x, y }];
      }),
    [labels, source, view.x, view.y],
  );

  const pin = useCallback(
    (index: number) => {
      const settle = () => setComing((now) => now.filter((one) => one !== index));
      setComing((now) => [...now, index]);
      mutate(
        { beamId: run.beam.id, source: { kind: 'run', runId: run.id, index }, note: '' },
        {
          onSuccess: ({ id, label }) =>
            notify.done(`Pinned to ${mark} as candidate ${label}`, {
              words: 'Undo',
              act: () => withdraw(id, { onError: (error) => notify.failed(messageOf(error)) }),
            }),
          onError: (error) => notify.failed(messageOf(error)),
          onSettled: settle,
        },
      );
    },
    [mutate, withdraw, run.beam.id, run.id, mark],
  );
  return { own, labels, flags, pin: mayPin ? pin : null };
}
