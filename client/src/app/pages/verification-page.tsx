import { useQuery } from '@tanstack/react-query';
import { ENGINE_VERSION } from '#shared/engine/version.ts';
import { bookQuery } from '#client/src/features/verification/book-query.ts';
import { VerificationBook } from '#client/src/features/verification/verification-book.tsx';
import { Button } from '#client/src/ui/button.tsx';
import { ErrorState } from '#client/src/ui/error-state.tsx';
import { PageBody } from '#client/src/ui/page-body.tsx';
import { PageCrumbs } from '#client/src/ui/page-crumbs.tsx';
import { PageHeader } from '#client/src/ui/page-header.tsx';
import { Skeleton } from '#client/src/ui/skeleton.tsx';

/** Every published case, computed where the reader sits. */
export function VerificationPage() {
  const book = useQuery(bookQuery());
  return (
    <PageBody>
      <PageCrumbs crumbs={[{ label: 'Verification book' }]} />
      <PageHeader
        title="Verification book"
        lead={
          <div className="grid max-w-prose gap-1">
            <p>
              Every published case the engine is held to, computed on this page, in this browser, by engine{' '}
              <span className="num text-ink">{ENGINE_VERSION}</span>.
            </p>
            <p className="text-sm">
              A case reproduced says that the method was followed, not that a design is fit. A licensed
              engineer verifies the design under the codes that apply at the site.
            </p>
          </div>
        }
        actions={<Button onClick={() => window.print()}>Print</Button>}
      />
      {book.isPending ? (
        <Skeleton lines={11} />
      ) : book.isError ? (
        <ErrorState
          error={book.error}
          title="The book could not be computed"
          onRetry={() => void book.refetch()}
        />
      ) : (
        <VerificationBook results={book.data} />
      )}
    </PageBody>
  );
}
