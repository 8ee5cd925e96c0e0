import { Dialog } from '#client/src/ui/dialog.tsx';
import { GO_TO } from './use-shortcuts.ts';
import { RUN_KEYS } from './use-run-shortcuts.ts';

interface Shortcut {
  readonly keys: readonly string[];
  readonly name: string;
}

const EVERYWHERE: readonly Shortcut[] = [
  { keys: ['Ctrl', 'K'], name: 'Go to anything by name, or do it (⌘ K)' },
  ...GO_TO.map(({ key, name }) => ({ keys: ['g', key], name })),
  { keys: ['?'], name: 'This list' },
  { keys: ['Esc'], name: 'Close a dialog' },
];

function ShortcutList({ title, rows }: { readonly title: string; readonly rows: readonly Shortcut[] }) {
  return (
    <section>
      <h3 className="pb-1 text-xs font-semibold text-muted">{title}</h3>
      <dl className="grid">
        {rows.map((row) => (
          <div
            key={row.name}
            className="flex items-baseline justify-between gap-4 border-t border-rule py-1.5"
          >
            <dt>{row.name}</dt>
            <dd className="flex shrink-0 gap-1.5">
              {row.keys.map((key) => (
                <kbd key={key} className="num min-w-6 border border-concrete-edge px-1.5 text-center">
                  {key}
                </kbd>
              ))}
            </dd>
          </div>
        ))}
      </dl>
    </section>
  );
}

export function ShortcutsDialog({
  isOpen,
  onClose,
}: {
  readonly isOpen: boolean;
  readonly onClose: () => void;
}) {
  return (
    <Dialog isOpen={isOpen} onClose={onClose} title="Keyboard shortcuts">
      <div className="grid gap-4">
        <ShortcutList title="Everywhere" rows={EVERYWHERE} />
        <ShortcutList title="On a run" rows={RUN_KEYS} />
      </div>
      <p className="mt-3 text-xs text-muted">
        Letters work while no field is being typed in. Tab and the arrow keys reach everything else.
      </p>
    </Dialog>
  );
}
