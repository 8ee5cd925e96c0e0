import { ApiError } from '#client/src/lib/api-error.ts';
import { ErrorState } from '#client/src/ui/error-state.tsx';
import { PageBody } from '#client/src/ui/page-body.tsx';
import { ForbiddenPage, NotFoundPage } from './pages/not-found-page.tsx';

interface LoadFailureProps {
  readonly error: unknown;
  /** `project`, `candidate`, … */
  readonly what: string;
  readonly onRetry: () => void;
}

/** A page whose main thing did not arrive: unknown, not for this reader, or worth another try. */
export function LoadFailure({ error, what, onRetry }: LoadFailureProps) {
  if (error instanceof ApiError && (error.code === 'not-found' || error.code === 'invalid-input'))
    return <NotFoundPage what={what} />;
  if (error instanceof ApiError && error.code === 'forbidden') return <ForbiddenPage />;
  return (
    <PageBody>
      <ErrorState error={error} title={`The ${what} could not be loaded`} onRetry={onRetry} />
    </PageBody>
  );
}
