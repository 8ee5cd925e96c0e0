import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { FailuresList } from '#client/src/features/operations/failures-list.tsx';
import { operationsQuery } from '#client/src/features/operations/operations-query.ts';
import { OperationsSummary } from '#client/src/features/operations/operations-summary.tsx';
import { QueueTable } from '#client/src/features/operations/queue-table.tsx';
import { ShardsTable } from '#client/src/features/operations/shards-table.tsx';
import { ViewsTable } from '#client/src/features/operations/views-table.tsx';
import { WorkerTable } from '#client/src/features/operations/worker-table.tsx';
import { useMay } from '#client/src/lib/reader-context.ts';
import { ErrorState } from '#client/src/ui/error-state.tsx';
import { PageBody } from '#client/src/ui/page-body.tsx';
import { PageCrumbs } from '#client/src/ui/page-crumbs.tsx';
import { PageHeader } from '#client/src/ui/page-header.tsx';
import { Skeleton } from '#client/src/ui/skeleton.tsx';
import { ForbiddenPage } from './not-found-page.tsx';

function Part({ title, children }: { readonly title: string; readonly children: ReactNode }) {
  return (
    <section className="border-t border-ink pt-2 pb-7">
      <h2 className="pb-2 text-sm font-semibold">{title}</h2>
      {children}
    </section>
  );
}

/** How the service computes at this moment: for whoever runs it. */
export function OperationsPage() {
  return useMay('operate') ? <Operations /> : <ForbiddenPage />;
}

function Operations() {
  const operations = useQuery(operationsQuery());
  return (
    <PageBody>
      <PageCrumbs crumbs={[{ label: 'Workers and queue' }]} />
      <PageHeader
        title="Workers and queue"
        lead="What computes the runs of the office, what waits, and what went wrong."
      />
      {operations.data === undefined ? (
        operations.isError ? (
          <ErrorState
            error={operations.error}
            title="The state of the service could not be loaded"
            onRetry={() => void operations.refetch()}
          />
        ) : (
          <Skeleton lines={14} />
        )
      ) : (
        <>
          {operations.isError && (
            <p role="status" className="mb-4 border-l-2 border-near-mark py-1 pl-3 text-sm">
              The service does not answer at the moment; this is how it was last.
            </p>
          )}
          <div className="pb-7">
            <OperationsSummary {...operations.data} />
          </div>
          <Part title="Workers">
            <WorkerTable workers={operations.data.workers} />
          </Part>
          <Part title="Queue">
            <QueueTable queue={operations.data.queue} />
          </Part>
          <Part title="Runs under way">
            <ViewsTable views={operations.data.views} />
          </Part>
          <Part title="Shards in work">
            <ShardsTable shards={operations.data.shards} workers={operations.data.workers} />
          </Part>
          <Part title="Failures">
            <FailuresList failures={operations.data.failures} />
          </Part>
        </>
      )}
    </PageBody>
  );
}
