import type { ViewFailure } from '#shared/contract/operations.ts';
import { formatDate } from '#shared/print/format-quantity.ts';
import { EmptyState } from '#client/src/ui/empty-state.tsx';
import { RunLink } from './run-link.tsx';

/** Runs of the last week that were given up, and why. */
export function FailuresList({ failures }: { readonly failures: readonly ViewFailure[] }) {
  if (failures.length === 0) return <EmptyState title="No run has failed within the last week" />;
  return (
    <ul className="grid max-w-3xl">
      {failures.map((failure) => (
        <li key={failure.viewId} className="border-t border-rule py-2">
          <p className="flex flex-wrap justify-between gap-x-6">
            <RunLink {...failure} />
            <span className="text-muted">{formatDate(failure.failedAt, true)}</span>
          </p>
          <p className="text-sm text-fails">{failure.message}</p>
        </li>
      ))}
    </ul>
  );
}
