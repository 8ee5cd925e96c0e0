import { type ReactNode } from 'react';
import { classNames } from '#client/src/lib/class-names.ts';

/** Foot of a long form: in sight from the first change on, wherever on the page it was made. */
export function FormActions({
  isDirty,
  children,
}: {
  readonly isDirty: boolean;
  readonly children: ReactNode;
}) {
  return (
    <div
      className={classNames(
        'flex flex-wrap items-center gap-4 border-t border-ink bg-paper py-3 print:hidden',
        isDirty && 'sticky bottom-0 z-10',
      )}
    >
      {children}
    </div>
  );
}
