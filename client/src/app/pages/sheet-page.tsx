import { useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';
import { useParams } from 'react-router-dom';
import type { Candidate } from '#shared/contract/records.ts';
import { buildSheet } from '#shared/sheet/build-sheet.ts';
import { sheetPdfUrl, sheetValuesQuery } from '#client/src/features/calculation-sheet/api.ts';
import { SheetDocument } from '#client/src/features/calculation-sheet/sheet-document.tsx';
import { candidateQuery } from '#client/src/features/shortlist/api.ts';
import { paths } from '#client/src/lib/paths.ts';
import { useProject } from '#client/src/lib/project-context.ts';
import { useReader } from '#client/src/lib/reader-context.ts';
import { Button, FileLink } from '#client/src/ui/button.tsx';
import { PageBody } from '#client/src/ui/page-body.tsx';
import { PageCrumbs } from '#client/src/ui/page-crumbs.tsx';
import { PageHeader } from '#client/src/ui/page-header.tsx';
import { LoadFailure } from '../load-failure.tsx';
import { RoutePending } from '../route-pending.tsx';

/** A candidate's calculation sheet, for whoever checks it line by line. */
export function SheetPage() {
  const { candidateId = '' } = useParams();
  const query = useQuery(candidateQuery(candidateId));
  if (query.data === undefined)
    return query.isError ? (
      <LoadFailure error={query.error} what="candidate" onRetry={() => void query.refetch()} />
    ) : (
      <RoutePending />
    );
  return <SheetOf candidate={query.data} />;
}

function SheetOf({ candidate }: { readonly candidate: Candidate }) {
  const project = useProject();
  const reader = useReader();
  const { units } = project.designBasis;
  const own = useQuery(sheetValuesQuery(candidate.id));
  const sheet = useMemo(() => buildSheet({ project, units, candidate }), [project, units, candidate]);
  const papers = units === 'us' ? (['letter', 'a4'] as const) : (['a4', 'letter'] as const);
  return (
    <PageBody>
      <PageCrumbs
        crumbs={[
          { label: 'Projects', to: paths.projects() },
          { label: project.name, to: paths.project(project.id) },
          { label: 'Shortlist', to: paths.project(project.id, 'shortlist') },
          { label: `Candidate ${candidate.label}`, to: paths.candidate(project.id, candidate.id) },
          { label: 'Calculation sheet' },
        ]}
      />
      <PageHeader
        title={sheet.title}
        lead={sheet.subtitle}
        actions={
          <>
            {papers.map((paper) => (
              <FileLink key={paper} href={sheetPdfUrl(candidate.id, paper)}>
                PDF, {paper === 'a4' ? 'A4' : 'Letter'}
              </FileLink>
            ))}
            <Button onClick={() => window.print()}>Print</Button>
          </>
        }
      />
      {own.isError && (
        <p role="alert" className="mb-4 text-sm text-fails">
          ✕ The checker’s own values could not be loaded.{' '}
          <Button look="text" onClick={() => void own.refetch()}>
            Try again
          </Button>
        </p>
      )}
      {own.data?.mayWrite && (
        <p className="mb-5 max-w-prose text-sm text-muted print:hidden">
          Type what you get beside each line; it is kept when you leave the field. Marking the candidate as
          checked, or approving it, records your values as they stand then.
        </p>
      )}
      <SheetDocument
        sheet={sheet}
        evaluation={candidate.snapshot.evaluation}
        standard={candidate.snapshot.basis.barStandard}
        // The fields take up what was saved once it has arrived.
        key={own.data === undefined ? 'loading' : 'loaded'}
        reading={{
          candidateId: candidate.id,
          units,
          readerId: reader.id,
          values: own.data?.values ?? [],
          mayWrite: own.data?.mayWrite ?? false,
        }}
      />
    </PageBody>
  );
}
