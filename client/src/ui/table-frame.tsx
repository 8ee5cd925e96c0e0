import { type ReactNode } from 'react';
import { classNames } from '#client/src/lib/class-names.ts';

interface TableFrameProps {
  /** Names the table and its scrolling frame. */
  readonly label: string;
  readonly children: ReactNode;
  readonly className?: string;
  readonly maxHeight?: string;
}

/** A table on hairlines; what is wider than the page scrolls inside this frame, also by keyboard. */
export function TableFrame({ label, children, className, maxHeight }: TableFrameProps) {
  return (
    <div
      role="region"
      aria-label={label}
      tabIndex={0}
      className={classNames('max-w-full overflow-x-auto', className)}
      style={maxHeight === undefined ? undefined : { maxHeight, overflowY: 'auto' }}
    >
      <table className="ledger" aria-label={label}>
        {children}
      </table>
    </div>
  );
}
