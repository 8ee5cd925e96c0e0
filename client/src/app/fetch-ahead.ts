import type { QueryClient } from '@tanstack/react-query';
import { projectQuery } from '#client/src/features/projects/api.ts';
import { sessionQuery } from '#client/src/features/session/api.ts';
import { call } from '#client/src/lib/api.ts';
import { queryKeys } from '#client/src/lib/query-keys.ts';

const ID = '[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12}';
const PROJECT_AND_RUN = new RegExp(`^/projects/(${ID})(?:/runs/(${ID})$)?`);

/**
 * Asks for what the page at an address will ask for, while its script is still on the way: who is signed in, then the
 * project and the run at once instead of one after the other. What fails here is asked for again by the page, which says so.
 */
export async function fetchAhead(client: QueryClient, pathname: string): Promise<void> {
  // Whoever was sent a link needs no session, and none is begun for them.
  if (pathname.startsWith('/shared/')) return;
  const session = await client.fetchQuery(sessionQuery()).catch(() => null);
  if (session === null || session.person === null) return;
  const [, projectId, runId] = PROJECT_AND_RUN.exec(pathname) ?? [];
  if (projectId !== undefined) void client.prefetchQuery(projectQuery(projectId));
  // Not the feature's own query, which would bring the whole of it into the first script.
  if (runId !== undefined)
    void client.prefetchQuery({
      queryKey: queryKeys.run(runId),
      queryFn: ({ signal }) => call('getRun', { params: { id: runId }, signal }),
    });
}
