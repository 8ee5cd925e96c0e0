import { useRouteError } from 'react-router-dom';
import { ErrorState } from '#client/src/ui/error-state.tsx';
import { PageBody } from '#client/src/ui/page-body.tsx';

/** A page that could not be drawn, or whose script could not be fetched after an update of the service. */
export function RouteError() {
  const error = useRouteError();
  return (
    <PageBody>
      <ErrorState
        error={error}
        title="This page could not be shown"
        onRetry={() => window.location.reload()}
      />
    </PageBody>
  );
}
