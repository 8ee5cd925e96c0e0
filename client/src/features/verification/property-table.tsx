import type { TestedProperty } from '#shared/verification/properties.ts';
import { formatWhole } from '#shared/print/format-quantity.ts';
import { TableFrame } from '#client/src/ui/table-frame.tsx';

interface PropertyTableProps {
  readonly label: string;
  readonly properties: readonly TestedProperty[];
}

/** Statements the tests hold, and on how many of what. */
export function PropertyTable({ label, properties }: PropertyTableProps) {
  return (
    <TableFrame label={label} columnShares={[66, 34]} minWidth="30rem">
      <thead>
        <tr>
          <th scope="col">Statement</th>
          <th scope="col">Drawn at random</th>
        </tr>
      </thead>
      <tbody>
        {properties.map(({ statement, runs, of, atLeast }) => (
          <tr key={statement}>
            <th scope="row" className="font-normal">
              {statement}
            </th>
            <td>
              <span className="num">{formatWhole(runs)}</span> {of}
              {atLeast !== undefined && (
                <span className="text-muted">
                  , at least <span className="num">{formatWhole(atLeast.count)}</span> {atLeast.what}
                </span>
              )}
            </td>
          </tr>
        ))}
      </tbody>
    </TableFrame>
  );
}
