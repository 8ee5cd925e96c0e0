import { useQuery } from '@tanstack/react-query';
import { useState, type ReactNode } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import type { Sweep } from '#shared/contract/records.ts';
import { messageOf } from '#client/src/lib/api-error.ts';
import { formatDate } from '#shared/print/format-quantity.ts';
import { paths } from '#client/src/lib/paths.ts';
import { useProject } from '#client/src/lib/project-context.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { Button, ButtonLink } from '#client/src/ui/button.tsx';
import { ConfirmDialog } from '#client/src/ui/confirm-dialog.tsx';
import { EmptyState } from '#client/src/ui/empty-state.tsx';
import { ErrorState } from '#client/src/ui/error-state.tsx';
import { FormError } from '#client/src/ui/form-error.tsx';
import { Skeleton } from '#client/src/ui/skeleton.tsx';
import { sweepsQuery, useDeleteSweep, useStartRun } from './api.ts';
import { RunTable } from './run-table.tsx';

interface SweepsPanelProps {
  /** What else belongs under a sweep's runs. */
  readonly below: (sweep: Sweep) => ReactNode;
}

export function SweepsPanel({ below }: SweepsPanelProps) {
  const project = useProject();
  const sweeps = useQuery(sweepsQuery(project.id));
  const [doomed, setDoomed] = useState<Sweep | null>(null);
  if (sweeps.isPending) return <Skeleton lines={8} />;
  if (sweeps.isError)
    return (
      <ErrorState
        error={sweeps.error}
        title="The sweeps could not be loaded"
        onRetry={() => void sweeps.refetch()}
      />
    );
  if (sweeps.data.length === 0)
    return (
      <EmptyState
        title="No sweeps yet"
        action={<ButtonLink to={paths.project(project.id, 'beams')}>To the beams</ButtonLink>}
      >
        A sweep is made for a beam: choose one and give the ranges to search.
      </EmptyState>
    );
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-8">
      {sweeps.data.map((sweep) => (
        <SweepEntry key={sweep.id} sweep={sweep} below={below(sweep)} onDelete={() => setDoomed(sweep)} />
      ))}
      {doomed !== null && <DeleteSweepDialog sweep={doomed} onClose={() => setDoomed(null)} />}
    </div>
  );
}

interface SweepEntryProps {
  readonly sweep: Sweep;
  readonly below: ReactNode;
  readonly onDelete: () => void;
}

function SweepEntry({ sweep, below, onDelete }: SweepEntryProps) {
  const navigate = useNavigate();
  const start = useStartRun(sweep.projectId);
  const mayRun = useMay('run-sweeps');
  const run = () =>
    start.mutate(sweep.id, { onSuccess: (started) => void navigate(paths.run(sweep.projectId, started.id)) });
  return (
    <section aria-label={sweep.name} className="border-t border-ink pt-3 first:border-t-0 first:pt-0">
      <div className="mb-2 flex flex-wrap items-baseline gap-x-4 gap-y-1">
        <h2 className="text-lg font-semibold">
          <Link to={paths.sweep(sweep.projectId, sweep.id)} className="hover:underline">
            {sweep.name}
          </Link>
        </h2>
        <p className="text-muted">
          Beam {sweep.beamMark}, changed {formatDate(sweep.updatedAt)}
        </p>
        {mayRun && (
          <div className="ml-auto flex items-baseline gap-3">
            <Button look="text" onClick={onDelete} aria-label={`Delete ${sweep.name}`}>
              Delete
            </Button>
            <ButtonLink
              look="text"
              to={`${paths.newSweep(sweep.projectId, sweep.beamId)}?from=${sweep.id}`}
              aria-label={`Duplicate ${sweep.name}`}
            >
              Duplicate
            </ButtonLink>
            <ButtonLink
              look="text"
              to={paths.sweep(sweep.projectId, sweep.id)}
              aria-label={`Ranges of ${sweep.name}`}
            >
              Ranges
            </ButtonLink>
            <Button isBusy={start.isPending} onClick={run} aria-label={`Run ${sweep.name}`}>
              Run
            </Button>
          </div>
        )}
      </div>
      <FormError message={start.isError ? messageOf(start.error) : null} />
      {sweep.runs.length === 0 ? (
        <p className="py-1 text-muted">{mayRun ? 'Not run yet. Run it to see its front.' : 'Not run yet.'}</p>
      ) : (
        <RunTable projectId={sweep.projectId} sweepName={sweep.name} runs={sweep.runs} />
      )}
      {below}
    </section>
  );
}

function DeleteSweepDialog({ sweep, onClose }: { readonly sweep: Sweep; readonly onClose: () => void }) {
  const remove = useDeleteSweep(sweep.projectId);
  return (
    <ConfirmDialog
      isOpen
      onClose={onClose}
      onConfirm={() => remove.mutate(sweep.id, { onSuccess: onClose })}
      title={`Delete the sweep ${sweep.name}?`}
      description="Its runs go with it. Candidates pinned from them stay in the shortlist."
      confirmLabel="Delete sweep"
      isBusy={remove.isPending}
      error={remove.error}
    />
  );
}
