import { useQuery } from '@tanstack/react-query';
import { useNavigate, useParams } from 'react-router-dom';
import { officeStandardsQuery } from '#client/src/features/office-standards/api.ts';
import { StandardForm } from '#client/src/features/office-standards/standard-form.tsx';
import { paths } from '#client/src/lib/paths.ts';
import { useMay } from '#client/src/lib/reader-context.ts';
import { PageBody } from '#client/src/ui/page-body.tsx';
import { PageCrumbs } from '#client/src/ui/page-crumbs.tsx';
import { PageHeader } from '#client/src/ui/page-header.tsx';
import { LoadFailure } from '../load-failure.tsx';
import { RoutePending } from '../route-pending.tsx';
import { ForbiddenPage, NotFoundPage } from './not-found-page.tsx';

/** One standard of the office, or a new one. */
export function OfficeStandardPage() {
  const { standardId } = useParams();
  const navigate = useNavigate();
  const mayRead = useMay('see-standards');
  const mayEdit = useMay('set-standards');
  const standards = useQuery({ ...officeStandardsQuery(), enabled: mayRead });
  if (standardId === undefined ? !mayEdit : !mayRead) return <ForbiddenPage />;
  if (standards.data === undefined)
    return standards.isError ? (
      <LoadFailure error={standards.error} what="standard" onRetry={() => void standards.refetch()} />
    ) : (
      <RoutePending />
    );
  const standard = standards.data.find(({ id }) => id === standardId) ?? null;
  if (standardId !== undefined && standard === null) return <NotFoundPage what="standard" />;
  const title = standard?.name ?? 'New standard';
  return (
    <PageBody>
      <PageCrumbs crumbs={[{ label: 'Office standards', to: paths.officeStandards() }, { label: title }]} />
      <PageHeader
        title={title}
        lead={
          mayEdit ? 'What a new sweep is filled from. It forbids nothing.' : 'Set by an admin of the office.'
        }
      />
      <StandardForm
        key={standard?.updatedAt ?? 'new'}
        standard={standard}
        isReadOnly={!mayEdit}
        onSaved={() => void navigate(paths.officeStandards())}
      />
    </PageBody>
  );
}
