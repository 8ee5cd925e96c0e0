import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import type { SharedShortlist } from '#shared/contract/records.ts';
import { sharedShortlistQuery } from '#client/src/features/shortlist/api.ts';
import { CandidateFlag } from '#client/src/features/shortlist/candidate-flag.tsx';
import { CandidateSheet } from '#client/src/features/shortlist/candidate-sheet.tsx';
import { CompareTable } from '#client/src/features/shortlist/compare-table.tsx';
import { groupByBeam } from '#client/src/features/shortlist/group-by-beam.ts';
import { COMPARE_MAX } from '#client/src/features/shortlist/selection.ts';
import { ApiError } from '#client/src/lib/api-error.ts';
import { candidateStateLabel } from '#client/src/lib/state-labels.ts';
import { Button } from '#client/src/ui/button.tsx';
import { EmptyState } from '#client/src/ui/empty-state.tsx';
import { ErrorState } from '#client/src/ui/error-state.tsx';
import { PageBody } from '#client/src/ui/page-body.tsx';
import { PageCrumbs } from '#client/src/ui/page-crumbs.tsx';
import { PageHeader } from '#client/src/ui/page-header.tsx';
import { Skeleton } from '#client/src/ui/skeleton.tsx';
import { StateTag } from '#client/src/ui/state-tag.tsx';
import { Wordmark } from '#client/src/ui/wordmark.tsx';

/** The shortlist for readers who have a link and no account: no rates, no comments. */
export function SharedPage() {
  const { token = '' } = useParams();
  const shared = useQuery(sharedShortlistQuery(token));
  return (
    <>
      <header className="flex min-h-[46px] items-center justify-between border-b border-ink px-4 sm:px-6 lg:px-8">
        <Wordmark />
        <span className="text-sm text-muted">Shared shortlist</span>
      </header>
      <main>
        <PageBody>
          {shared.isPending ? (
            <Skeleton lines={8} />
          ) : shared.isError ? (
            <SharedFailure error={shared.error} onRetry={() => void shared.refetch()} />
          ) : (
            <SharedBody shared={shared.data} />
          )}
        </PageBody>
      </main>
    </>
  );
}

function SharedFailure({ error, onRetry }: { readonly error: unknown; readonly onRetry: () => void }) {
  const isGone = error instanceof ApiError && (error.code === 'not-found' || error.code === 'invalid-input');
  return isGone ? (
    <PageHeader
      title="This link no longer works"
      lead="It has expired, was revoked, or was not copied whole. Ask whoever sent it for a new one."
    />
  ) : (
    <ErrorState error={error} title="The shortlist could not be loaded" onRetry={onRetry} />
  );
}

function SharedBody({ shared }: { readonly shared: SharedShortlist }) {
  const beams = groupByBeam(shared.candidates);
  return (
    <>
      <PageCrumbs crumbs={[{ label: `${shared.projectName}, shortlist` }]} />
      <PageHeader
        title={shared.projectName}
        lead={<span className="num">{shared.projectNumber}</span>}
        actions={<Button onClick={() => window.print()}>Print</Button>}
      />
      {shared.candidates.length === 0 && (
        <EmptyState title="Nothing on the shortlist yet">
          The office has not pinned a section so far.
        </EmptyState>
      )}
      <div className="grid grid-cols-[minmax(0,1fr)] gap-12">
        {beams.map((group) => (
          <section
            key={group[0]!.beam.id}
            aria-label={`Beam ${group[0]!.beam.mark}`}
            className="grid grid-cols-[minmax(0,1fr)] gap-6"
          >
            <h2 className="border-b border-ink pb-1 text-xl font-semibold">
              {group[0]!.beam.mark}{' '}
              <span className="text-base font-normal text-muted">{group[0]!.beam.location}</span>
            </h2>
            {group.length >= 2 && (
              <CompareTable
                label={`Candidates side by side, ${group[0]!.beam.mark}`}
                candidates={group.slice(0, COMPARE_MAX)}
                units={shared.units}
                baselineId={null}
                hasMoney={false}
              />
            )}
            {group.map((candidate) => (
              <details
                key={candidate.id}
                open={group.length === 1}
                className="border-t border-rule pt-3 print:break-before-page"
              >
                <summary className="flex flex-wrap items-center gap-3 py-1">
                  <CandidateFlag label={candidate.label} />
                  <span className="font-semibold">Calculation of candidate {candidate.label}</span>
                  <StateTag {...candidateStateLabel(candidate.state)} />
                </summary>
                <div className="pt-4">
                  <CandidateSheet candidate={candidate} units={shared.units} hasMoney={false} />
                </div>
              </details>
            ))}
          </section>
        ))}
      </div>
    </>
  );
}
