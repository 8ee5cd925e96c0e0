import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import type { Run } from '#shared/contract/records.ts';
import { runQuery } from '#client/src/features/run/run-api.ts';
import { useProject } from '#client/src/lib/project-context.ts';
import { LoadFailure } from '../load-failure.tsx';
import { RoutePending } from '../route-pending.tsx';
import { RunWorkspace } from '../run-workspace.tsx';

/** One run of a sweep, live or long finished. */
export function RunPage() {
  const project = useProject();
  const { runId = '' } = useParams();
  const run = useQuery(runQuery(runId));
  if (run.data === undefined)
    return run.isError ? (
      <LoadFailure error={run.error} what="run" onRetry={() => void run.refetch()} />
    ) : (
      <RoutePending />
    );
  return <RunWorkspace key={runId} run={run.data satisfies Run} project={project} />;
}
