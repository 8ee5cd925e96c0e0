import { TableFrame } from '#client/src/ui/table-frame.tsx';
import type { InputDifferences } from './input-differences.ts';

interface InputsTableProps {
  readonly differences: readonly InputDifferences[];
  readonly names: readonly [string, string];
}

/** What went into the two runs otherwise, group by group. */
export function InputsTable({ differences, names }: InputsTableProps) {
  if (differences.length === 0)
    return (
      <p className="text-muted">
        Nothing that went into them differs: the same ranges, demand, rules, basis, rates and engine.
      </p>
    );
  return (
    <TableFrame label="What went into the runs" minWidth="36rem" columnShares={[28, 36, 36]}>
      <thead>
        <tr>
          <th scope="col">Input</th>
          {names.map((name) => (
            <th key={name} scope="col">
              {name}
            </th>
          ))}
        </tr>
      </thead>
      {differences.map(({ group, rows }) => (
        <tbody key={group}>
          <tr>
            <th scope="rowgroup" colSpan={3} className="pt-4! font-semibold">
              {group}
            </th>
          </tr>
          {rows.map(({ label, before, after }) => (
            <tr key={label}>
              <th scope="row" className="font-normal">
                {label}
              </th>
              <td className="num text-muted">{before ?? 'no such input'}</td>
              <td className="num">{after ?? 'no such input'}</td>
            </tr>
          ))}
        </tbody>
      ))}
    </TableFrame>
  );
}
