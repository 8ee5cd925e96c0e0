import type { SheetColumn, SheetRow, SheetTable } from '#shared/sheet/sheet.ts';
import { textRuns } from '#shared/sheet/text-runs.ts';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { OwnValueCell, type SheetReading } from './own-value-cell.tsx';
import { SymbolText } from './symbol-text.tsx';

interface RowsTableProps {
  readonly title: string;
  readonly table: SheetTable;
  readonly reading: SheetReading;
  /** Narrowest it is squeezed to before it scrolls. */
  readonly minWidth?: string;
}

const prose = (text: string) => textRuns(text, { isProse: true });

/** What holds for every row of a table. */
export function Remarks({ remarks }: Pick<SheetTable, 'remarks'>) {
  return remarks.map((remark) => (
    <p key={remark} className="mb-1 max-w-[68rem] text-xs text-muted print:mb-0.5 print:max-w-none">
      <SymbolText runs={prose(remark)} />
    </p>
  ));
}

/** Layers, checks or quantities: one numbered row each, with the own value for the column that is compared. */
export function RowsTable({ title, table, reading, minWidth = '48rem' }: RowsTableProps) {
  return (
    <TableFrame label={title} minWidth={minWidth}>
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
          {table.comparedColumn !== null && (
            <th scope="col" className="figure">
              Own <SymbolText runs={prose(table.comparedColumn)} />
            </th>
          )}
        </tr>
      </thead>
      <tbody>
        {table.rows.map((row) => (
          <tr key={row.id}>
            <td className="figure text-muted">{row.number}</td>
            {row.cells.map((text, i) => (
              <RowCell key={i} row={row} text={text} isFirst={i === 0} column={table.columns[i]!} />
            ))}
            {table.comparedColumn !== null && (
              <td className="w-28 text-right">
                <OwnValueCell line={row} reading={reading} />
              </td>
            )}
          </tr>
        ))}
      </tbody>
    </TableFrame>
  );
}

interface RowCellProps {
  readonly row: SheetRow;
  readonly text: string;
  readonly isFirst: boolean;
  readonly column: SheetColumn;
}

function RowCell({ row, text, isFirst, column }: RowCellProps) {
  if (column.isVerdict === true && row.passes !== undefined)
    return (
      <td className={`font-semibold whitespace-nowrap ${row.passes ? 'text-meets' : 'text-fails'}`}>
        <span aria-hidden="true">{row.passes ? '✓' : '✕'}</span> {text}
      </td>
    );
  const weight = row.isStrong === true ? 'font-semibold' : 'font-normal';
  if (column.isFigure) return <td className={`figure ${weight}`}>{text}</td>;
  const Cell = isFirst ? 'th' : 'td';
  return (
    <Cell scope={isFirst ? 'row' : undefined} className={weight}>
      <SymbolText runs={prose(text)} />
      {isFirst && row.note !== undefined && row.note !== '' && (
        <span className="block max-w-prose text-2xs font-normal text-muted print:max-w-none">
          <SymbolText runs={prose(row.note)} />
        </span>
      )}
    </Cell>
  );
}
