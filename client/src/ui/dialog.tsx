import { Dialog as Primitive } from 'radix-ui';
import { type ReactNode } from 'react';
import { classNames } from '#client/src/lib/class-names.ts';

interface DialogProps {
  readonly isOpen: boolean;
  readonly onClose: () => void;
  readonly title: string;
  /** One line below the title. */
  readonly description?: ReactNode;
  readonly children: ReactNode;
  readonly isWide?: boolean;
  /** Esc and a click outside do nothing: for a form whose loss would hurt. */
  readonly isSticky?: boolean;
}

/** A sheet laid on the page; focus goes in, stays in, and returns. */
export function Dialog(props: DialogProps) {
  const { isOpen, onClose, title, description, children, isWide = false, isSticky = false } = props;
  const hold = (event: Event) => {
    if (isSticky) event.preventDefault();
  };
  return (
    <Primitive.Root open={isOpen} onOpenChange={(isNowOpen) => !isNowOpen && onClose()}>
      <Primitive.Portal>
        <Primitive.Overlay className="fixed inset-0 z-40 bg-[color-mix(in_srgb,var(--paper)_55%,#0008)]" />
        <Primitive.Content
          onEscapeKeyDown={hold}
          onInteractOutside={hold}
          {...(description === undefined ? { 'aria-describedby': undefined } : {})}
          className={classNames(
            'fixed top-[8vh] left-1/2 z-50 max-h-[84vh] w-[calc(100vw-2rem)] -translate-x-1/2 overflow-y-auto border border-ink bg-sheet p-5 sm:p-6',
            isWide ? 'max-w-3xl' : 'max-w-md',
          )}
        >
          <div className="flex items-start justify-between gap-4">
            <Primitive.Title className="text-lg font-semibold">{title}</Primitive.Title>
            {!isSticky && (
              <Primitive.Close
                aria-label="Close"
                className="-mt-1 -mr-1 size-8 text-lg leading-none text-muted hover:text-ink"
              >
                ×
              </Primitive.Close>
            )}
          </div>
          {description !== undefined && (
            <Primitive.Description className="mt-1 text-sm text-muted">{description}</Primitive.Description>
          )}
          <div className="mt-4">{children}</div>
        </Primitive.Content>
      </Primitive.Portal>
    </Primitive.Root>
  );
}
