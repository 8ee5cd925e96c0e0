import type { ViewUnderWay } from '#shared/contract/operations.ts';
import { formatDuration, formatNumber, formatWhole } from '#shared/print/format-quantity.ts';
import { runStateLabel } from '#client/src/lib/state-labels.ts';
import { EmptyState } from '#client/src/ui/empty-state.tsx';
import { StateTag } from '#client/src/ui/state-tag.tsx';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { RunLink } from './run-link.tsx';

const shareText = ({ evaluated, provenUnnecessary, sectionCount }: ViewUnderWay): string =>
  `${formatNumber(sectionCount === 0 ? 0 : ((evaluated + provenUnnecessary) / sectionCount) * 100, 3, true)} %`;

/** Runs, and views opened of them, that are not done yet. */
export function ViewsTable({ views }: { readonly views: readonly ViewUnderWay[] }) {
  if (views.length === 0) return <EmptyState title="No run is under way" />;
  return (
    <TableFrame label="Runs under way" columnShares={[30, 17, 12, 16, 8, 9, 8]} minWidth="60rem">
      <thead>
        <tr>
          <th scope="col">Run</th>
          <th scope="col">By</th>
          <th scope="col">State</th>
          <th scope="col" className="figure">
            Sections
          </th>
          <th scope="col" className="figure">
            Done
          </th>
          <th scope="col" className="figure">
            Shards
          </th>
          <th scope="col" className="figure">
            Took
          </th>
        </tr>
      </thead>
      <tbody>
        {views.map((view) => (
          <tr key={view.viewId}>
            <th scope="row" className="font-normal">
              <RunLink {...view} />
            </th>
            <td>{view.startedBy}</td>
            <td>
              {view.isCancelling ? (
                <StateTag word="Stopping" mark="struck" tone="near" />
              ) : (
                <StateTag {...runStateLabel(view.state)} />
              )}
            </td>
            <td className="figure">{formatWhole(view.sectionCount)}</td>
            <td className="figure">{shareText(view)}</td>
            <td className="figure">
              {view.method === 'bounds' ? 'by bounds' : `${view.shardsDone} of ${view.shards}`}
            </td>
            <td className="figure">{formatDuration(view.elapsedMs)}</td>
          </tr>
        ))}
      </tbody>
    </TableFrame>
  );
}
