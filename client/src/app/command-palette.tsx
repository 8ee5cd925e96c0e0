import { Command } from 'cmdk';
import { Dialog } from 'radix-ui';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import type { PageAction } from '#client/src/lib/page-actions.ts';
import { paths } from '#client/src/lib/paths.ts';
import { type PaletteEntry, usePaletteGroups } from './palette-entries.ts';
import { paletteRank } from './palette-rank.ts';

interface CommandPaletteProps {
  readonly onClose: () => void;
  /** What can be done on every page. */
  readonly everywhere: readonly PageAction[];
}

/** Everything by name: type, choose with the arrow keys, Enter. */
export function CommandPalette({ onClose, everywhere }: CommandPaletteProps) {
  const [typed, setTyped] = useState('');
  const found = usePaletteGroups(everywhere)
    .map(({ title, entries }) => {
      const ranked = entries
        .map((entry) => ({ entry, score: paletteRank(typed, entry) }))
        .filter(({ score }) => score > 0)
        .sort((a, b) => b.score - a.score);
      return { title, entries: ranked.map(({ entry }) => entry), score: ranked[0]?.score ?? 0 };
    })
    .filter(({ entries }) => entries.length > 0);
  if (typed.trim() !== '') found.sort((a, b) => b.score - a.score);
  const navigate = useNavigate();
  const elsewhere: PaletteEntry = {
    id: 'elsewhere',
    name: 'All projects',
    note: 'what is in another project is found from within it',
    act: () => void navigate(paths.projects()),
  };
  const choose = (entry: PaletteEntry) => {
    onClose();
    entry.act();
  };
  return (
    <Dialog.Root open onOpenChange={(isOpen) => !isOpen && onClose()}>
      <Dialog.Portal>
        <Dialog.Overlay className="fixed inset-0 z-40 bg-[color-mix(in_srgb,var(--paper)_55%,#0008)]" />
        <Dialog.Content
          aria-describedby={undefined}
          className="fixed top-[10vh] left-1/2 z-50 w-[calc(100vw-2rem)] max-w-xl -translate-x-1/2 border border-ink bg-sheet"
        >
          <Dialog.Title className="sr-only">Go to, or do</Dialog.Title>
          <Command shouldFilter={false} loop label="Go to, or do">
            <Command.Input
              value={typed}
              onValueChange={setTyped}
              placeholder="A project, beam, sweep, run, candidate or action"
              className="h-12 w-full border-b border-ink bg-transparent px-4 text-base outline-none placeholder:text-muted"
            />
            {found.length === 0 && (
              <p role="status" className="px-4 pt-4 text-muted">
                Nothing here is called “{typed.trim()}”.
              </p>
            )}
            <Command.List className="max-h-[60vh] overflow-y-auto py-2">
              {found.length === 0 && <Line entry={elsewhere} onChoose={choose} />}
              {found.map(({ title, entries }) => (
                <Command.Group
                  key={title}
                  heading={title}
                  className="[&_[cmdk-group-heading]]:px-4 [&_[cmdk-group-heading]]:pt-2 [&_[cmdk-group-heading]]:pb-1 [&_[cmdk-group-heading]]:text-xs [&_[cmdk-group-heading]]:font-semibold [&_[cmdk-group-heading]]:text-muted"
                >
                  {entries.map((entry) => (
                    <Line key={entry.id} entry={entry} onChoose={choose} />
                  ))}
                </Command.Group>
              ))}
            </Command.List>
          </Command>
        </Dialog.Content>
      </Dialog.Portal>
    </Dialog.Root>
  );
}

function Line({
  entry,
  onChoose,
}: {
  readonly entry: PaletteEntry;
  readonly onChoose: (entry: PaletteEntry) => void;
}) {
  const { id, name, note, keys = [] } = entry;
  return (
    <Command.Item
      value={id}
      onSelect={() => onChoose(entry)}
      className="group flex cursor-pointer items-baseline gap-3 px-4 py-1.5 data-[selected=true]:bg-concrete data-[selected=true]:text-ink"
    >
      <span>{name}</span>
      {note !== undefined && note !== '' && (
        <span className="truncate text-sm text-muted group-data-[selected=true]:text-ink">{note}</span>
      )}
      <span className="ml-auto flex shrink-0 gap-1">
        {keys.map((key) => (
          <kbd key={key} className="num text-muted group-data-[selected=true]:text-ink">
            {key}
          </kbd>
        ))}
      </span>
    </Command.Item>
  );
}
