import { ApiError, messageOf } from '#client/src/lib/api-error.ts';
import { Button } from './button.tsx';

interface ErrorStateProps {
  readonly error: unknown;
  readonly onRetry?: () => void;
  /** What could not be done, e.g. `The beams could not be loaded`. */
  readonly title?: string;
}

/** What happened, the number to quote for it, and the way to try again. */
export function ErrorState({ error, onRetry, title = 'This could not be loaded' }: ErrorStateProps) {
  const requestId = error instanceof ApiError ? error.requestId : null;
  return (
    <div role="alert" className="grid max-w-prose gap-2 border-l-2 border-fails py-2 pl-4">
      <p className="font-semibold text-fails">{title}</p>
      <p>{messageOf(error)}</p>
      {requestId !== null && <p className="num text-xs text-muted">Request {requestId}</p>}
      {onRetry !== undefined && (
        <div className="mt-1">
          <Button onClick={onRetry}>Try again</Button>
        </div>
      )}
    </div>
  );
}
