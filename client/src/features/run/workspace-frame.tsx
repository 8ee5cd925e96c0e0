import type { ReactNode } from 'react';

interface WorkspaceFrameProps {
  readonly head: ReactNode;
  readonly space: ReactNode;
  readonly front: ReactNode;
  readonly section: ReactNode;
  readonly foot: ReactNode;
}

/**
 * The three columns of a run between its head and its foot. On a wide screen the columns scroll on their own and the
 * foot stays in sight; on a narrower one the section comes below the front; on a phone everything is one column, the
 * front first.
 */
export function WorkspaceFrame({ head, space, front, section, foot }: WorkspaceFrameProps) {
  // Positioned, so that words only a screen reader hears stay inside and do not lengthen the page.
  const column = 'relative min-w-0 px-4 py-4 sm:px-5 xl:overflow-y-auto';
  return (
    <div className="flex min-h-0 flex-1 flex-col xl:h-[calc(100dvh-46px)] xl:flex-none">
      {head}
      <div className="grid min-h-0 flex-1 grid-cols-1 lg:grid-cols-[17.5rem_minmax(0,1fr)] xl:grid-cols-[17rem_minmax(0,1fr)_24rem]">
        <div
          role="region"
          aria-label="Design space"
          tabIndex={0}
          className={`${column} order-3 border-t border-rule lg:order-1 lg:border-t-0 lg:border-r`}
        >
          {space}
        </div>
        <div role="region" aria-label="Front" tabIndex={0} className={`${column} order-1 lg:order-2`}>
          {front}
        </div>
        <div
          role="region"
          aria-label="Chosen section"
          tabIndex={0}
          className={`${column} order-2 border-t border-rule bg-sheet lg:order-3 lg:col-span-2 xl:col-span-1 xl:border-t-0 xl:border-l`}
        >
          {section}
        </div>
      </div>
      {foot}
    </div>
  );
}
