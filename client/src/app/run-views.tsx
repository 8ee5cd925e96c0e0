import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import type { Run } from '#shared/contract/records.ts';
import type { SavedView } from '#shared/contract/saved-view.ts';
import { placeOfSection } from '#shared/sweep/section-index.ts';
import { runQuery } from '#client/src/features/run/run-api.ts';
import { createSectionSource } from '#client/src/features/run/section-source.ts';
import type { useRunView } from '#client/src/features/run/use-run-view.ts';
import { savedViewsQuery } from '#client/src/features/saved-views/api.ts';
import { keptAddress } from '#client/src/features/saved-views/view-search.ts';
import { ViewsMenu } from '#client/src/features/saved-views/views-menu.tsx';
import { messageOf } from '#client/src/lib/api-error.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { notify } from '#client/src/ui/toast.tsx';

interface RunViewsProps {
  readonly run: Run;
  readonly state: ReturnType<typeof useRunView>;
}

/** The address of a view in this run: the chosen section is looked up by what it is, since indices are a run's own. */
function useAddressHere(run: Run, { source }: RunViewsProps['state']) {
  const client = useQueryClient();
  return async ({
    runId,
    address,
  }: SavedView): Promise<{ address: Record<string, string>; isSectionLost: boolean }> => {
    const { i, ...rest } = address;
    if (runId === run.id || i === undefined) return { address, isSectionLost: false };
    const there = createSectionSource(await client.fetchQuery(runQuery(runId)));
    const index = Number(i);
    const place = index < there.size ? placeOfSection(source.space, there.sectionAt(index)) : null;
    return place?.kind === 'inside'
      ? { address: { ...rest, i: String(place.index) }, isSectionLost: false }
      : { address: rest, isSectionLost: true };
  };
}

/** Saved views of the run's sweep: what is shown now can be kept, and what was kept is shown again, here. */
export function RunViews({ run, state }: RunViewsProps) {
  const { view, selected, address, reader } = state;
  const [params, setParams] = useSearchParams();
  const maySave = useMay('save-views');
  const views = useQuery(savedViewsQuery(run.projectId));
  const addressHere = useAddressHere(run, state);
  const own = useMemo(
    () => views.data?.filter(({ sweepId }) => sweepId === run.sweepId) ?? [],
    [views.data, run.sweepId],
  );
  const shown = {
    projectId: run.projectId,
    sweepId: run.sweepId,
    runId: run.id,
    address: keptAddress(params, {
      x: view.x,
      y: view.y,
      band: String(Math.round(address.bandShare * 1e4) / 100),
      i: selected === null ? null : String(selected.index),
    }),
  };
  const open = (chosen: SavedView) =>
    void addressHere(chosen).then(
      ({ address: here, isSectionLost }) => {
        setParams(here, { preventScrollReset: true });
        if (isSectionLost)
          notify.done(`The section chosen on run ${chosen.runNumber} is not in this run’s ranges`);
      },
      (error: unknown) => notify.failed(messageOf(error)),
    );
  return <ViewsMenu views={own} shown={shown} units={reader.units} maySave={maySave} onOpen={open} />;
}
