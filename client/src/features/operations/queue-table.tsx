import type { QueueKind } from '#shared/contract/operations.ts';
import { formatWhole } from '#shared/print/format-quantity.ts';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { agoText, QUEUE_KIND_TEXT } from './work-words.ts';

export function QueueTable({ queue }: { readonly queue: readonly QueueKind[] }) {
  return (
    <TableFrame label="Queue" columnShares={[36, 14, 14, 14, 22]} minWidth="32rem" className="max-w-3xl">
      <thead>
        <tr>
          <th scope="col">Jobs</th>
          <th scope="col" className="figure">
            Waiting
          </th>
          <th scope="col" className="figure">
            In work
          </th>
          <th scope="col" className="figure">
            Given up
          </th>
          <th scope="col" className="figure">
            Longest wait
          </th>
        </tr>
      </thead>
      <tbody>
        {queue.map(({ kind, waiting, running, failed, oldestWaitingMs }) => (
          <tr key={kind}>
            <th scope="row" className="font-normal">
              {QUEUE_KIND_TEXT[kind]}
            </th>
            <td className="figure">{formatWhole(waiting)}</td>
            <td className="figure">{formatWhole(running)}</td>
            <td className={`figure ${failed > 0 ? 'text-fails' : ''}`}>{formatWhole(failed)}</td>
            <td className="figure">{agoText(oldestWaitingMs)}</td>
          </tr>
        ))}
      </tbody>
    </TableFrame>
  );
}
