import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import { drawingExports } from '#client/src/drawing/drawing-exports.ts';
import { candidateQuery } from '#client/src/features/shortlist/api.ts';
import { CandidateFlag } from '#client/src/features/shortlist/candidate-flag.tsx';
import { CandidateSheet } from '#client/src/features/shortlist/candidate-sheet.tsx';
import { CommentsPanel } from '#client/src/features/shortlist/comments-panel.tsx';
import { StatePanel } from '#client/src/features/shortlist/state-panel.tsx';
import { takeoffExports } from '#client/src/features/shortlist/takeoff-exports.ts';
import { formatDate } from '#shared/print/format-quantity.ts';
import { paths } from '#client/src/lib/paths.ts';
import { useProject } from '#client/src/lib/project-context.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { addressExports } from '#client/src/ui/address-exports.ts';
import { ButtonLink } from '#client/src/ui/button.tsx';
import { ExportMenu } from '#client/src/ui/export-menu.tsx';
import { PageBody } from '#client/src/ui/page-body.tsx';
import { PageCrumbs } from '#client/src/ui/page-crumbs.tsx';
import { PageHeader } from '#client/src/ui/page-header.tsx';
import { LoadFailure } from '../load-failure.tsx';
import { RoutePending } from '../route-pending.tsx';

export function CandidatePage() {
  const project = useProject();
  const { candidateId = '' } = useParams();
  const query = useQuery(candidateQuery(candidateId));
  const hasMoney = useMay('see-rates');
  if (query.data === undefined)
    return query.isError ? (
      <LoadFailure error={query.error} what="candidate" onRetry={() => void query.refetch()} />
    ) : (
      <RoutePending />
    );
  const candidate = query.data;
  const { beam } = candidate;
  return (
    <PageBody>
      <PageCrumbs
        crumbs={[
          { label: 'Projects', to: paths.projects() },
          { label: project.name, to: paths.project(project.id) },
          { label: 'Shortlist', to: paths.project(project.id, 'shortlist') },
          { label: `Candidate ${candidate.label}` },
        ]}
      />
      <PageHeader
        title={
          <span className="flex items-center gap-3">
            <CandidateFlag label={candidate.label} isLarge />
            <span>
              <span className="sr-only">Candidate {candidate.label} for </span>
              {beam.mark}
            </span>
          </span>
        }
        lead={
          <>
            {[beam.location, `pinned by ${candidate.author.name} on ${formatDate(candidate.createdAt)}`]
              .filter((part) => part !== '')
              .join(', ')}
            {candidate.runId !== null && (
              <>
                {' from '}
                <Link to={paths.run(project.id, candidate.runId)} className="underline">
                  its run
                </Link>
              </>
            )}
          </>
        }
        actions={
          <>
            <ButtonLink to={paths.sheet(project.id, candidate.id)}>Calculation sheet</ButtonLink>
            <ExportMenu
              groups={[
                drawingExports({
                  section: candidate.snapshot.section,
                  evaluation: candidate.snapshot.evaluation,
                  standard: candidate.snapshot.basis.barStandard,
                  units: project.designBasis.units,
                  source: [project.number, beam.mark, 'candidate', candidate.label],
                }),
                takeoffExports(project, [candidate.id], 'this candidate'),
                addressExports(),
              ]}
            />
          </>
        }
      />
      {!candidate.isReproducedByCurrentEngine && (
        <p role="status" className="mb-5 max-w-prose border-l-2 border-near-mark py-1 pl-3 text-near">
          △ Today’s engine gives other numbers than the ones frozen here. The frozen ones are shown; evaluate
          the section again before relying on them.
        </p>
      )}
      {candidate.note !== '' && <p className="mb-6 max-w-prose whitespace-pre-wrap">{candidate.note}</p>}
      <div className="grid items-start grid-cols-[minmax(0,1fr)] gap-x-10 gap-y-8 lg:grid-cols-[minmax(0,1fr)_18rem]">
        <CandidateSheet candidate={candidate} units={project.designBasis.units} hasMoney={hasMoney} />
        <aside className="order-first grid gap-8 lg:order-none print:order-last lg:sticky lg:top-6">
          <StatePanel candidate={candidate} />
          <CommentsPanel candidate={candidate} />
        </aside>
      </div>
    </PageBody>
  );
}
