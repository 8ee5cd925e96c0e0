import { type ReactNode } from 'react';
import { classNames } from '#client/src/lib/class-names.ts';

interface TableFrameProps {
  /** Names the table and its scrolling frame. */
  readonly label: string;
  readonly children: ReactNode;
  readonly className?: string;
  readonly maxHeight?: string;
  /** Shares of the width, %, one per column: tables below each other then keep one grid. */
  readonly columnShares?: readonly number[];
  /** Narrowest the table is squeezed to before it scrolls, e.g. `60rem`. */
  readonly minWidth?: string;
}

/** A table on hairlines; what is wider than the page scrolls inside this frame, also by keyboard. */
export function TableFrame(props: TableFrameProps) {
  const { label, children, className, maxHeight, columnShares, minWidth } = props;
  return (
    <div
      role="region"
      aria-label={label}
      tabIndex={0}
      className={classNames('relative overflow-x-auto', className ?? 'max-w-full')}
      style={maxHeight === undefined ? undefined : { maxHeight, overflowY: 'auto' }}
    >
      <table
        className={classNames('ledger', columnShares !== undefined && 'table-fixed')}
        aria-label={label}
        style={minWidth === undefined ? undefined : { minWidth }}
      >
        {columnShares !== undefined && (
          <colgroup>
            {columnShares.map((share, i) => (
              <col key={i} style={{ width: `${share}%` }} />
            ))}
          </colgroup>
        )}
        {children}
      </table>
    </div>
  );
}
