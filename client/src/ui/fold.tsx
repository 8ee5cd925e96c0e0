import { useState, type ReactNode } from 'react';

interface FoldProps {
  readonly title: ReactNode;
  /** A word of what is inside, beside the title. */
  readonly note?: ReactNode;
  readonly isOpen?: boolean;
  readonly children: ReactNode;
}

/** A part that can be folded away; what is inside is made when it is opened first, and kept from then on. Paper has what is open. */
export function Fold({ title, note, isOpen = false, children }: FoldProps) {
  const [wasOpened, setOpened] = useState(isOpen);
  return (
    <details
      className="border-t border-ink print:not-open:hidden"
      open={isOpen}
      onToggle={(event) => setOpened((was) => was || event.currentTarget.open)}
    >
      <summary className="py-2 text-sm font-semibold">
        {title}
        {note !== undefined && <span className="ml-2 font-normal text-muted">{note}</span>}
      </summary>
      <div className="pb-4">{(wasOpened || isOpen) && children}</div>
    </details>
  );
}
