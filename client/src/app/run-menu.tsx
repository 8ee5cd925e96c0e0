import { useQuery } from '@tanstack/react-query';
import { DropdownMenu } from 'radix-ui';
import { useState } from 'react';
import { Link, useLocation } from 'react-router-dom';
import type { Run } from '#shared/contract/records.ts';
import { sweepsQuery } from '#client/src/features/sweeps/api.ts';
import { carriedSearch } from '#client/src/lib/carried-search.ts';
import { paths } from '#client/src/lib/paths.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { Button } from '#client/src/ui/button.tsx';
import { useVarySweep } from './use-vary-sweep.ts';

const item =
  'flex cursor-pointer items-baseline gap-2 px-3 py-1.5 outline-none data-highlighted:bg-concrete data-highlighted:text-ink';

/** So many runs of this sweep, and of other sweeps of the beam, are offered here; the rest on the page of the difference. */
const MOST_OFFERED = 4;

function OtherRuns({ run }: { readonly run: Run }) {
  const sweeps = useQuery(sweepsQuery(run.projectId));
  const told = (sweeps.data ?? [])
    .filter(({ beamId }) => beamId === run.beam.id)
    .flatMap(({ id, name, runs }) => runs.map((one) => ({ ...one, isOwn: id === run.sweepId, name })))
    .filter(({ id, evaluated }) => id !== run.id && evaluated > 0);
  const offered = [true, false].flatMap((isOwn) =>
    told.filter((one) => one.isOwn === isOwn).slice(0, MOST_OFFERED),
  );
  if (offered.length === 0)
    return (
      <DropdownMenu.Label className="max-w-64 px-3 py-1.5 text-sm text-muted">
        {sweeps.isPending ? 'Looking for other runs' : 'No other run for this beam to set it against.'}
      </DropdownMenu.Label>
    );
  return offered.map(({ id, number, isOwn, name }) => (
    <DropdownMenu.Item key={id} className={item} asChild>
      <Link to={paths.difference(run.projectId, run.id, id)}>
        <span>
          Set against run {number}
          {!isOwn && <span className="block text-xs text-muted">of {name}</span>}
        </span>
      </Link>
    </DropdownMenu.Item>
  ));
}

/** What can be made of a run: run as it was again, varied in a sweep of its own, set against another. */
export function RunMenu({ run }: { readonly run: Run }) {
  const mayRun = useMay('run-sweeps');
  const { search } = useLocation();
  const vary = useVarySweep(run);
  const [isOpen, setOpen] = useState(false);
  return (
    <DropdownMenu.Root modal={false} open={isOpen} onOpenChange={setOpen}>
      <DropdownMenu.Trigger asChild>
        <Button isBusy={vary.isPending}>
          More
          <span aria-hidden="true" className="text-2xs">
            ▾
          </span>
        </Button>
      </DropdownMenu.Trigger>
      <DropdownMenu.Content
        align="end"
        sideOffset={6}
        className="z-50 min-w-56 border border-ink bg-sheet py-1"
      >
        {mayRun && (
          <>
            <DropdownMenu.Item
              className={item}
              onSelect={() => vary.mutate({ definition: run.definition, words: 'the same ranges' })}
            >
              <span>
                Run it again
                <span className="block text-xs text-muted">
                  the same ranges; basis, rates and engine of today
                </span>
              </span>
            </DropdownMenu.Item>
            <DropdownMenu.Item className={item} asChild>
              <Link
                to={`${paths.newSweep(run.projectId, run.beam.id)}?run=${run.id}`}
                state={{ runSearch: carriedSearch(search, ['x', 'y']) }}
              >
                Vary it in a new sweep
              </Link>
            </DropdownMenu.Item>
            <DropdownMenu.Separator className="my-1 border-t border-rule" />
          </>
        )}
        {isOpen && <OtherRuns run={run} />}
      </DropdownMenu.Content>
    </DropdownMenu.Root>
  );
}
