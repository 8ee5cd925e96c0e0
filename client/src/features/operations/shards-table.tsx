import type { RunningShard, WorkerProcess } from '#shared/contract/operations.ts';
import { formatWhole } from '#shared/print/format-quantity.ts';
import { EmptyState } from '#client/src/ui/empty-state.tsx';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { RunLink } from './run-link.tsx';
import { agoText } from './work-words.ts';

interface ShardsTableProps {
  readonly shards: readonly RunningShard[];
  readonly workers: readonly WorkerProcess[];
}

/** Shards somebody has in work. */
export function ShardsTable({ shards, workers }: ShardsTableProps) {
  if (shards.length === 0) return <EmptyState title="No shard is in work" />;
  const nameOf = (id: string | null): string => {
    const worker = workers.find((one) => one.id === id);
    return worker === undefined ? 'a worker that is gone' : `${worker.host} ${worker.pid}`;
  };
  return (
    <TableFrame label="Shards in work" columnShares={[34, 22, 26, 18]} minWidth="48rem">
      <thead>
        <tr>
          <th scope="col">Run</th>
          <th scope="col">Worker</th>
          <th scope="col" className="figure">
            Sections
          </th>
          <th scope="col" className="figure">
            In work for
          </th>
        </tr>
      </thead>
      <tbody>
        {shards.map((shard) => (
          <tr key={`${shard.viewId} ${shard.from}`}>
            <th scope="row" className="font-normal">
              <RunLink {...shard} />
            </th>
            <td>{nameOf(shard.processId)}</td>
            <td className="figure">
              {formatWhole(shard.evaluated)} of {formatWhole(shard.to - shard.from)}
            </td>
            <td className="figure">{agoText(shard.heldMs)}</td>
          </tr>
        ))}
      </tbody>
    </TableFrame>
  );
}
