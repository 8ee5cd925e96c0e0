import { Link } from 'react-router-dom';
import type { RunSummary } from '#shared/contract/records.ts';
import { formatDate, formatDuration, formatWhole } from '#client/src/lib/format-quantity.ts';
import { paths } from '#client/src/lib/paths.ts';
import { runStateLabel } from '#client/src/lib/state-labels.ts';
import { StateTag } from '#client/src/ui/state-tag.tsx';
import { TableFrame } from '#client/src/ui/table-frame.tsx';

/** The runs of a sweep, the newest first; each keeps the definition it was started with. */
export function SweepRuns({
  projectId,
  runs,
}: {
  readonly projectId: string;
  readonly runs: readonly RunSummary[];
}) {
  return (
    <section className="mt-4 border-t border-ink pt-2">
      <h2 className="pb-2 text-sm font-semibold">Runs</h2>
      <TableFrame label="Runs of this sweep">
        <thead>
          <tr>
            <th scope="col">Run</th>
            <th scope="col">State</th>
            <th scope="col" className="figure">
              Evaluated
            </th>
            <th scope="col" className="figure">
              Meet every check
            </th>
            <th scope="col" className="figure">
              On the front
            </th>
            <th scope="col" className="figure">
              Time
            </th>
            <th scope="col">Started</th>
          </tr>
        </thead>
        <tbody>
          {runs
            .toSorted((a, b) => b.number - a.number)
            .map((run) => (
              <tr key={run.id}>
                <th scope="row">
                  <Link to={paths.run(projectId, run.id)} className="underline">
                    Run {run.number}
                  </Link>
                </th>
                <td>
                  <StateTag {...runStateLabel(run.state)} />
                </td>
                <td className="figure">{formatWhole(run.evaluated)}</td>
                <td className="figure">{formatWhole(run.feasible)}</td>
                <td className="figure">{formatWhole(run.frontCount)}</td>
                <td className="figure">{run.elapsedMs === null ? '' : formatDuration(run.elapsedMs)}</td>
                <td>
                  {formatDate(run.createdAt, true)}, {run.startedBy.name}
                </td>
              </tr>
            ))}
        </tbody>
      </TableFrame>
    </section>
  );
}
