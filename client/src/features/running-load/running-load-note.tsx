import { useQuery } from '@tanstack/react-query';
import type { RunningLoad } from '#shared/contract/operations.ts';
import { formatWhole } from '#shared/print/format-quantity.ts';
import { runningLoadQuery } from './running-load-query.ts';

const shareText = ({ sections, limit }: RunningLoad['own']): string =>
  `${formatWhole(sections)} of ${formatWhole(limit)}`;

/** How many sections are under way and how many may be, for whoever is about to start a run. */
export function RunningLoadNote() {
  const load = useQuery(runningLoadQuery());
  // Nothing to act on: the service refuses what is too much, and says so.
  if (load.data === undefined) return <div className="min-h-10 basis-full" />;
  return (
    <dl className="grid min-h-10 basis-full gap-0.5 text-xs text-muted">
      <div className="flex justify-between gap-4">
        <dt>Your sections under way</dt>
        <dd className="num text-right">{shareText(load.data.own)}</dd>
      </div>
      <div className="flex justify-between gap-4">
        <dt>The office’s</dt>
        <dd className="num text-right">{shareText(load.data.office)}</dd>
      </div>
    </dl>
  );
}
