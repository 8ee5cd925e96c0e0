import { Fragment } from 'react';
import type { WorkingLine } from '#shared/sheet/sheet.ts';
import { symbolAndAmount } from '#shared/sheet/text-runs.ts';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { LineFormula } from './line-formula.tsx';
import { OwnValueCell, type SheetReading } from './own-value-cell.tsx';
import { SymbolText } from './symbol-text.tsx';

interface WorkingLinesTableProps {
  readonly title: string;
  readonly lines: readonly WorkingLine[];
  readonly reading: SheetReading;
}

/** Steps of the working: formula, numbers put in, result, own value, clause. */
export function WorkingLinesTable({ title, lines, reading }: WorkingLinesTableProps) {
  return (
    <TableFrame label={title} columnShares={[4, 31, 32, 12, 10, 11]} minWidth="56rem">
      <thead>
        <tr>
          <th scope="col" className="figure">
            No.
          </th>
          <th scope="col">Formula</th>
          <th scope="col">Numbers put in</th>
          <th scope="col" className="figure">
            Result
          </th>
          <th scope="col" className="figure">
            Own value
          </th>
          <th scope="col">Clause</th>
        </tr>
      </thead>
      <tbody>
        {lines.map((line) => (
          <tr key={line.id}>
            <td className="figure text-muted">{line.number}</td>
            <th scope="row" className="font-normal">
              <LineFormula line={line} />
            </th>
            <td className="num">
              {line.inputs.map(({ symbol, text }, i) => (
                <Fragment key={`${i}-${symbol}`}>
                  {i > 0 && ', '}
                  <span className="whitespace-nowrap">
                    <SymbolText runs={symbolAndAmount(symbol, text)} />
                  </span>
                </Fragment>
              ))}
            </td>
            <td className="figure font-semibold">{line.result}</td>
            <td className="text-right">
              <OwnValueCell line={line} reading={reading} />
            </td>
            <td className="text-2xs text-muted">{line.clause}</td>
          </tr>
        ))}
      </tbody>
    </TableFrame>
  );
}
