import type { SheetRow, SheetTable } from '#shared/sheet/sheet.ts';
import { textRuns } from '#shared/sheet/text-runs.ts';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { OwnValueCell, type SheetReading } from './own-value-cell.tsx';
import { SymbolText } from './symbol-text.tsx';

interface RowsTableProps {
  readonly title: string;
  readonly table: SheetTable;
  readonly reading: SheetReading;
}

const prose = (text: string) => textRuns(text, { isProse: true });

/** Layers, checks or quantities: one numbered row each, with the own value for the column that is compared. */
export function RowsTable({ title, table, reading }: RowsTableProps) {
  return (
    <>
      {table.remarks.map((remark) => (
        <p key={remark} className="mb-1 text-xs text-muted">
          <SymbolText runs={prose(remark)} />
        </p>
      ))}
      <TableFrame label={title} minWidth="48rem">
        <thead>
          <tr>
            <th scope="col" className="figure">
              No.
            </th>
            {table.columns.map(({ label, isFigure }) => (
              <th key={label} scope="col" className={isFigure ? 'figure' : undefined}>
                <SymbolText runs={prose(label)} />
              </th>
            ))}
            <th scope="col" className="figure">
              Own <SymbolText runs={prose(table.comparedColumn)} />
            </th>
          </tr>
        </thead>
        <tbody>
          {table.rows.map((row) => (
            <tr key={row.id}>
              <td className="figure text-muted">{row.number}</td>
              {row.cells.map((text, i) => (
                <RowCell
                  key={i}
                  row={row}
                  text={text}
                  isFirst={i === 0}
                  isFigure={table.columns[i]!.isFigure}
                />
              ))}
              <td className="w-28 text-right">
                <OwnValueCell line={row} reading={reading} />
              </td>
            </tr>
          ))}
        </tbody>
      </TableFrame>
    </>
  );
}

interface RowCellProps {
  readonly row: SheetRow;
  readonly text: string;
  readonly isFirst: boolean;
  readonly isFigure: boolean;
}

function RowCell({ row, text, isFirst, isFigure }: RowCellProps) {
  if (row.passes !== undefined && (text === 'meets' || text === 'fails'))
    return (
      <td className={`font-semibold whitespace-nowrap ${row.passes ? 'text-meets' : 'text-fails'}`}>
        <span aria-hidden="true">{row.passes ? '✓' : '✕'}</span> {text}
      </td>
    );
  if (isFigure) return <td className="figure">{text}</td>;
  const Cell = isFirst ? 'th' : 'td';
  return (
    <Cell scope={isFirst ? 'row' : undefined} className="font-normal">
      <SymbolText runs={prose(text)} />
      {isFirst && row.note !== undefined && (
        <span className="block max-w-prose text-2xs text-muted">
          <SymbolText runs={prose(row.note)} />
        </span>
      )}
    </Cell>
  );
}
