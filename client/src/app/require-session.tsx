import { useQuery } from '@tanstack/react-query';
import { lazy, Suspense } from 'react';
import { Navigate, Outlet, useLocation } from 'react-router-dom';
import { sessionQuery } from '#client/src/features/session/api.ts';
import { paths } from '#client/src/lib/paths.ts';
import { ReaderContext } from '#client/src/lib/reader-context.ts';
import { ErrorState } from '#client/src/ui/error-state.tsx';
import { PageBody } from '#client/src/ui/page-body.tsx';
import { RoutePending } from './route-pending.tsx';

/** Fetched as soon as the page stands, with the form library it needs: in the first script it would be 17 kB. */
const SessionExpiredDialog = lazy(async () => ({
  default: (await import('#client/src/features/session/session-expired-dialog.tsx')).SessionExpiredDialog,
}));

/** Everything inside needs a signed-in person; others are asked to sign in and brought back here. */
export function RequireSession() {
  const session = useQuery(sessionQuery());
  const { pathname, search } = useLocation();
  if (session.isPending) return <RoutePending />;
  if (session.isError)
    return (
      <PageBody>
        <ErrorState
          error={session.error}
          title="The service does not answer"
          onRetry={() => void session.refetch()}
        />
      </PageBody>
    );
  const reader = session.data.person;
  if (reader === null) return <Navigate to={paths.signIn(pathname + search)} replace />;
  return (
    <ReaderContext value={reader}>
      <Outlet />
      <Suspense>
        <SessionExpiredDialog />
      </Suspense>
    </ReaderContext>
  );
}
