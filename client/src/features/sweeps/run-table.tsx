import { Link } from 'react-router-dom';
import type { RunSummary } from '#shared/contract/records.ts';
import { formatDate, formatDuration, formatWhole } from '#shared/print/format-quantity.ts';
import { paths } from '#client/src/lib/paths.ts';
import { runStateLabel } from '#client/src/lib/state-labels.ts';
import { StateTag } from '#client/src/ui/state-tag.tsx';
import { TableFrame } from '#client/src/ui/table-frame.tsx';

/** Run, state, sections, meet all checks, on the front, took, hash, started, difference. */
const SHARES = [7, 10, 12, 11, 9, 8, 16, 17, 10];

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
          <th scope="col">
            <span className={runs.length > 1 ? undefined : 'sr-only'}>Difference</span>
          </th>
        </tr>
      </thead>
      <tbody>
        {runs.map((run, k) => (
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
            <td className="whitespace-nowrap">
              <ToEarlier projectId={projectId} run={run} earlier={runs.slice(k + 1)} />
            </td>
          </tr>
        ))}
      </tbody>
    </TableFrame>
  );
}

interface ToEarlierProps {
  readonly projectId: string;
  readonly run: RunSummary;
  /** Runs before it, the latest first. */
  readonly earlier: readonly RunSummary[];
}

/** To what changed since the run before that has anything to show. */
function ToEarlier({ projectId, run, earlier }: ToEarlierProps) {
  const baseline = earlier.find(({ evaluated }) => evaluated > 0);
  if (baseline === undefined || run.evaluated === 0) return null;
  return (
    <Link
      to={paths.difference(projectId, run.id, baseline.id)}
      aria-label={`Run ${run.number} against run ${baseline.number}`}
      className="underline decoration-concrete-edge hover:decoration-current"
    >
      to run {baseline.number}
    </Link>
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
