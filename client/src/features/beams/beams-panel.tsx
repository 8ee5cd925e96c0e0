import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { codeSymbols } from '#shared/print/code-symbols.ts';
import type { Beam } from '#shared/contract/records.ts';
import { usePageActions } from '#client/src/lib/page-actions.ts';
import { useProject } from '#client/src/lib/project-context.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { Button } from '#client/src/ui/button.tsx';
import { ConfirmDialog } from '#client/src/ui/confirm-dialog.tsx';
import { EmptyState } from '#client/src/ui/empty-state.tsx';
import { ErrorState } from '#client/src/ui/error-state.tsx';
import { Skeleton } from '#client/src/ui/skeleton.tsx';
import { beamsQuery, useDeleteBeam } from './api.ts';
import { BeamDialog } from './beam-dialog.tsx';
import { BeamTable } from './beam-table.tsx';

export function BeamsPanel() {
  const project = useProject();
  const beams = useQuery(beamsQuery(project.id));
  const mayEdit = useMay('edit-beams');
  const maySweep = useMay('run-sweeps');
  const [edited, setEdited] = useState<Beam | 'new' | null>(null);
  const [doomed, setDoomed] = useState<Beam | null>(null);
  usePageActions(mayEdit ? [{ name: 'Add a beam', act: () => setEdited('new') }] : []);
  const addButton = mayEdit ? (
    <Button look="solid" onClick={() => setEdited('new')}>
      Add a beam
    </Button>
  ) : null;

  if (beams.isPending) return <Skeleton lines={8} />;
  if (beams.isError)
    return (
      <ErrorState
        error={beams.error}
        title="The beams could not be loaded"
        onRetry={() => void beams.refetch()}
      />
    );
  return (
    <>
      {beams.data.length === 0 ? (
        <EmptyState title="No beams yet" action={addButton}>
          {mayEdit
            ? 'Add the first: its mark, span, count, and what it must carry. Sweeps are made for a beam.'
            : 'An engineer of the project adds them.'}
        </EmptyState>
      ) : (
        <>
          <BeamTable
            beams={beams.data}
            units={project.designBasis.units}
            symbols={codeSymbols(project.designBasis.ruleSet)}
            onEdit={setEdited}
            onDelete={setDoomed}
            mayEdit={mayEdit}
            maySweep={maySweep}
          />
          {addButton !== null && <div className="mt-5">{addButton}</div>}
        </>
      )}
      {edited !== null && (
        <BeamDialog
          key={edited === 'new' ? 'new' : edited.id}
          beam={edited === 'new' ? null : edited}
          onClose={() => setEdited(null)}
        />
      )}
      {doomed !== null && <DeleteBeamDialog beam={doomed} onClose={() => setDoomed(null)} />}
    </>
  );
}

function DeleteBeamDialog({ beam, onClose }: { readonly beam: Beam; readonly onClose: () => void }) {
  const remove = useDeleteBeam(beam.projectId);
  const sweeps = beam.sweepCount === 1 ? 'its sweep' : `its ${beam.sweepCount} sweeps`;
  return (
    <ConfirmDialog
      isOpen
      onClose={onClose}
      onConfirm={() => remove.mutate(beam.id, { onSuccess: onClose })}
      title={`Delete beam ${beam.mark}?`}
      description={
        beam.sweepCount === 0 ? 'It has no sweeps.' : `It goes together with ${sweeps} and their runs.`
      }
      confirmLabel="Delete beam"
      isBusy={remove.isPending}
      error={remove.error}
    />
  );
}
