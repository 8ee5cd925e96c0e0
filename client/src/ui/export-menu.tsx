import { DropdownMenu } from 'radix-ui';
import { useState } from 'react';
import { messageOf } from '#client/src/lib/api-error.ts';
import { Button, type ButtonLook } from './button.tsx';
import { notify } from './toast.tsx';

export interface ExportItem {
  readonly label: string;
  /** A second line: how many, or why it cannot be had. */
  readonly note?: string;
  readonly isUnavailable?: boolean;
  readonly run: () => Promise<unknown> | void;
}

export interface ExportGroup {
  readonly name: string;
  readonly items: readonly ExportItem[];
}

interface ExportMenuProps {
  readonly groups: readonly ExportGroup[];
  readonly look?: ButtonLook;
  readonly words?: string;
}

const ITEM =
  'grid cursor-pointer px-3 py-1 outline-none data-disabled:cursor-default data-disabled:text-muted data-highlighted:bg-concrete data-highlighted:text-ink';

/** Files and addresses to take away, by what they are of. The button is busy until the file is there. */
export function ExportMenu({ groups, look = 'line', words = 'Export' }: ExportMenuProps) {
  const [isBusy, setBusy] = useState(false);
  const act = (item: ExportItem) => {
    const work = item.run();
    if (work === undefined) return;
    setBusy(true);
    work.catch((error: unknown) => notify.failed(messageOf(error))).finally(() => setBusy(false));
  };
  return (
    <DropdownMenu.Root modal={false}>
      <DropdownMenu.Trigger asChild>
        <Button look={look} isBusy={isBusy} className="print:hidden">
          {words}
          <span aria-hidden="true" className="text-2xs text-muted">
            ▾
          </span>
        </Button>
      </DropdownMenu.Trigger>
      <DropdownMenu.Content
        align="end"
        sideOffset={6}
        collisionPadding={8}
        className="z-50 max-h-[var(--radix-dropdown-menu-content-available-height)] min-w-60 overflow-y-auto border border-ink bg-sheet py-1 text-base"
      >
        {groups.map(({ name, items }, i) => (
          <DropdownMenu.Group
            key={name}
            aria-label={name}
            className={i > 0 ? 'mt-1 border-t border-rule pt-1' : ''}
          >
            <DropdownMenu.Label className="px-3 py-1 text-xs text-muted">{name}</DropdownMenu.Label>
            {items.map((item) => (
              <DropdownMenu.Item
                key={item.label}
                className={ITEM}
                disabled={item.isUnavailable === true}
                onSelect={() => act(item)}
              >
                {item.label}
                {item.note !== undefined && <span className="text-xs text-muted">{item.note}</span>}
              </DropdownMenu.Item>
            ))}
          </DropdownMenu.Group>
        ))}
      </DropdownMenu.Content>
    </DropdownMenu.Root>
  );
}
