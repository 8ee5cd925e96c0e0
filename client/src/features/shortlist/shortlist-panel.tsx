import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Candidate } from '#shared/contract/records.ts';
import { usePageActions } from '#client/src/lib/page-actions.ts';
import { paths } from '#client/src/lib/paths.ts';
import { useProject } from '#client/src/lib/project-context.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { useSearchValue } from '#client/src/lib/use-search-value.ts';
import { addressExports } from '#client/src/ui/address-exports.ts';
import { Button, ButtonLink } from '#client/src/ui/button.tsx';
import { EmptyState } from '#client/src/ui/empty-state.tsx';
import { ErrorState } from '#client/src/ui/error-state.tsx';
import { ExportMenu } from '#client/src/ui/export-menu.tsx';
import { Skeleton } from '#client/src/ui/skeleton.tsx';
import { candidatesQuery } from './api.ts';
import { CandidateList } from './candidate-list.tsx';
import { ComparePanel } from './compare-panel.tsx';
import { groupByBeam } from './group-by-beam.ts';
import { COMPARE_MAX, readSelection, toggleSelection } from './selection.ts';
import { ShareDialog } from './share-dialog.tsx';
import { takeoffExports } from './takeoff-exports.ts';

export function ShortlistPanel() {
  const project = useProject();
  const candidates = useQuery(candidatesQuery(project.id));
  if (candidates.isPending) return <Skeleton lines={8} />;
  if (candidates.isError)
    return (
      <ErrorState
        error={candidates.error}
        title="The shortlist could not be loaded"
        onRetry={() => void candidates.refetch()}
      />
    );
  if (candidates.data.length === 0)
    return (
      <EmptyState
        title="Nothing pinned yet"
        action={<ButtonLink to={paths.project(project.id, 'sweeps')}>To the sweeps</ButtonLink>}
      >
        Open a run, pick a section on its front and pin it. It is kept here with everything it was computed
        from.
      </EmptyState>
    );
  return <Shortlist candidates={candidates.data} />;
}

function Shortlist({ candidates }: { readonly candidates: readonly Candidate[] }) {
  const project = useProject();
  const { designBasis } = project;
  const hasMoney = useMay('see-rates');
  const mayShare = useMay('share');
  const [isSharing, setSharing] = useState(false);
  usePageActions(mayShare ? [{ name: 'Share the shortlist', act: () => setSharing(true) }] : []);
  const ids = candidates.map((candidate) => candidate.id);
  const [selected, setSelected] = useSearchValue('compare', (text) => readSelection(text, ids));
  const tallestMm = Math.max(...candidates.map((candidate) => candidate.snapshot.section.depthMm));
  const beams = groupByBeam(candidates);
  const chosen = selected.map((id) => candidates.find((candidate) => candidate.id === id)!);
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-8">
      <div className="flex flex-wrap items-baseline justify-between gap-3">
        <p className="text-muted">
          {selected.length === 0
            ? `Tick two to ${COMPARE_MAX} candidates to see them side by side.`
            : `${selected.length} of at most ${COMPARE_MAX} ticked.`}
        </p>
        <span className="flex gap-3">
          {selected.length > 0 && (
            <Button look="text" onClick={() => setSelected(null)}>
              Untick all
            </Button>
          )}
          <ExportMenu groups={[takeoffExports(project, selected), addressExports()]} />
          {mayShare && <Button onClick={() => setSharing(true)}>Share the shortlist</Button>}
        </span>
      </div>
      {beams.map((group) => (
        <section key={group[0]!.beam.id} aria-label={`Beam ${group[0]!.beam.mark}`}>
          <h2 className="text-lg font-semibold">
            {group[0]!.beam.mark}{' '}
            <span className="text-base font-normal text-muted">{group[0]!.beam.location}</span>
          </h2>
          <CandidateList
            candidates={group}
            units={designBasis.units}
            selected={selected}
            onToggle={(id) => setSelected(toggleSelection(selected, id))}
            tallestMm={tallestMm}
            hasMoney={hasMoney}
          />
        </section>
      ))}
      <ComparePanel candidates={chosen} units={designBasis.units} hasMoney={hasMoney} />
      {isSharing && <ShareDialog onClose={() => setSharing(false)} />}
    </div>
  );
}
