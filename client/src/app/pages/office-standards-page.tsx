import { useQuery } from '@tanstack/react-query';
import { officeStandardsQuery } from '#client/src/features/office-standards/api.ts';
import { StandardList } from '#client/src/features/office-standards/standard-list.tsx';
import { paths } from '#client/src/lib/paths.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { ButtonLink } from '#client/src/ui/button.tsx';
import { EmptyState } from '#client/src/ui/empty-state.tsx';
import { ErrorState } from '#client/src/ui/error-state.tsx';
import { PageBody } from '#client/src/ui/page-body.tsx';
import { PageCrumbs } from '#client/src/ui/page-crumbs.tsx';
import { PageHeader } from '#client/src/ui/page-header.tsx';
import { Skeleton } from '#client/src/ui/skeleton.tsx';
import { ForbiddenPage } from './not-found-page.tsx';

/** What the office builds: read by whoever designs, set by an admin. */
export function OfficeStandardsPage() {
  return useMay('see-standards') ? <Standards /> : <ForbiddenPage />;
}

function Standards() {
  const standards = useQuery(officeStandardsQuery());
  const mayEdit = useMay('set-standards');
  const add = <ButtonLink to={paths.newOfficeStandard()}>New standard</ButtonLink>;
  return (
    <PageBody>
      <PageCrumbs crumbs={[{ label: 'Office standards' }]} />
      <PageHeader
        title="Office standards"
        lead="Bars kept, mixes ordered, steps beams are formed in and the ranges usually searched: what a new sweep is filled from."
        actions={mayEdit && standards.data !== undefined && standards.data.length > 0 ? add : undefined}
      />
      {standards.data !== undefined ? (
        standards.data.length === 0 ? (
          <EmptyState title="No standards yet" action={mayEdit ? add : undefined}>
            {mayEdit
              ? 'Enter the bars and mixes the office uses, and every new sweep begins with them.'
              : 'An admin enters them. Until then a new sweep begins with ranges of common practice.'}
          </EmptyState>
        ) : (
          <StandardList standards={standards.data} mayEdit={mayEdit} />
        )
      ) : standards.isError ? (
        <ErrorState
          error={standards.error}
          title="The standards could not be loaded"
          onRetry={() => void standards.refetch()}
        />
      ) : (
        <Skeleton lines={10} />
      )}
    </PageBody>
  );
}
