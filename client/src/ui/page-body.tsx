import { type ReactNode } from 'react';

/** Margins of an ordinary page. Workspaces that fill the window do without. */
export function PageBody({
  children,
  isNarrow = false,
}: {
  readonly children: ReactNode;
  readonly isNarrow?: boolean;
}) {
  return (
    <div
      className={`mx-auto w-full px-4 py-6 sm:px-6 lg:px-8 print:p-0 ${isNarrow ? 'max-w-3xl' : 'max-w-[90rem]'}`}
    >
      {children}
    </div>
  );
}
