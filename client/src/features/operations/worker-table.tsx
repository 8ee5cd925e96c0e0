import type { WorkerProcess } from '#shared/contract/operations.ts';
import { formatDate, formatWhole } from '#shared/print/format-quantity.ts';
import { EmptyState } from '#client/src/ui/empty-state.tsx';
import { StateTag } from '#client/src/ui/state-tag.tsx';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { agoText, rateText, workerKindText, workerLabel } from './work-words.ts';

/** Worker, state, heartbeat, threads, rate, sections, shards, failed, engine, since. */
const SHARES = [18, 9, 9, 7, 11, 13, 8, 7, 7, 11];

export function WorkerTable({ workers }: { readonly workers: readonly WorkerProcess[] }) {
  if (workers.length === 0)
    return (
      <EmptyState title="No worker has been seen">
        Runs wait until one begins: npm run worker, with DATABASE_URL.
      </EmptyState>
    );
  return (
    <TableFrame label="Workers" columnShares={SHARES} minWidth="72rem">
      <thead>
        <tr>
          <th scope="col">Worker</th>
          <th scope="col">State</th>
          <th scope="col" className="figure">
            Heartbeat
          </th>
          <th scope="col" className="figure">
            Threads
          </th>
          <th scope="col" className="figure">
            Million a second
          </th>
          <th scope="col" className="figure">
            Sections
          </th>
          <th scope="col" className="figure">
            Shards
          </th>
          <th scope="col" className="figure">
            Failed
          </th>
          <th scope="col" className="pl-6">
            Engine
          </th>
          <th scope="col">Since</th>
        </tr>
      </thead>
      <tbody>
        {workers.map((worker) => (
          <tr key={worker.id} className={worker.end === null ? '' : 'text-muted'}>
            <th scope="row" className="font-normal">
              <span className="font-semibold">{worker.host}</span> <span className="num">{worker.pid}</span>
              <span className="block text-sm text-muted">{workerKindText(worker)}</span>
            </th>
            <td>
              <StateTag {...workerLabel(worker)} />
            </td>
            <td className="figure">{worker.end === null ? `${agoText(worker.silentMs)} ago` : ''}</td>
            <td className="figure">{worker.threads}</td>
            <td className="figure">{worker.end === null ? rateText(worker.sectionsPerSecond) : ''}</td>
            <td className="figure">{formatWhole(worker.sectionsDone)}</td>
            <td className="figure">{formatWhole(worker.shardsDone)}</td>
            <td className={`figure ${worker.shardsFailed > 0 ? 'text-fails' : ''}`}>
              {formatWhole(worker.shardsFailed)}
            </td>
            <td className="num pl-6">{worker.engineVersion}</td>
            <td className="whitespace-nowrap text-muted">{formatDate(worker.startedAt, true)}</td>
          </tr>
        ))}
      </tbody>
    </TableFrame>
  );
}
