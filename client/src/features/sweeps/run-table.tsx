import { Link } from 'react-router-dom';
import type { RunSummary } from '#shared/contract/records.ts';
import { formatDate, formatDuration, formatWhole } from '#shared/print/format-quantity.ts';
import { paths } from '#client/src/lib/paths.ts';
import { runStateLabel } from '#client/src/lib/state-labels.ts';
import { StateTag } from '#client/src/ui/state-tag.tsx';
import { TableFrame } from '#client/src/ui/table-frame.tsx';

/** Run, state, sections, meet all checks, on the front, took, hash, started. */
const SHARES = [8, 11, 12, 12, 10, 9, 18, 20];

interface RunTableProps {
  readonly projectId: string;
  readonly sweepName: string;
  readonly runs: readonly RunSummary[];
}

export function RunTable({ projectId, sweepName, runs }: RunTableProps) {
  return (
    <TableFrame label={`Runs of ${sweepName}`} columnShares={SHARES} minWidth="60rem">
      <thead>
        <tr>
          <th scope="col">Run</th>
          <th scope="col">State</th>
          <th scope="col" className="figure">
            Sections
          </th>
          <th scope="col" className="figure">
            Meet all checks
          </th>
          <th scope="col" className="figure">
            On the front
          </th>
          <th scope="col" className="figure">
            Took
          </th>
          <th scope="col">Hash</th>
          <th scope="col">Started</th>
        </tr>
      </thead>
      <tbody>
        {runs.map((run) => (
          <tr key={run.id} className="hover:bg-sheet">
            <th scope="row" className="whitespace-nowrap">
              <Link
                to={paths.run(projectId, run.id)}
                className="font-semibold underline decoration-concrete-edge"
              >
                Run {run.number}
              </Link>
            </th>
            <td>
              <StateTag {...runStateLabel(run.state)} />
            </td>
            <td className="figure">
              {run.evaluated === run.sectionCount || run.method === 'bounds'
                ? formatWhole(run.sectionCount)
                : `${formatWhole(run.evaluated)} of ${formatWhole(run.sectionCount)}`}
              {run.method === 'bounds' && (
                <span className="block text-xs text-muted">
                  by bounds, {formatWhole(run.evaluated)} evaluated
                </span>
              )}
            </td>
            <td className="figure">{feasibleText(run)}</td>
            <td className="figure">{run.state === 'queued' ? '' : formatWhole(run.frontCount)}</td>
            <td className="figure">{run.elapsedMs === null ? '' : formatDuration(run.elapsedMs)}</td>
            <td className="num whitespace-nowrap text-muted">{run.hash ?? ''}</td>
            <td className="whitespace-nowrap text-muted">
              {formatDate(run.createdAt)}, {run.startedBy.name}
            </td>
          </tr>
        ))}
      </tbody>
    </TableFrame>
  );
}

const feasibleText = (run: RunSummary): string =>
  run.state === 'queued'
    ? ''
    : run.feasible === null
      ? 'not counted'
      : run.feasible === 0
        ? 'none'
        : formatWhole(run.feasible);
