import { Dialog } from '#client/src/ui/dialog.tsx';
import { GO_TO } from './use-shortcuts.ts';

const ROWS = [
  ...GO_TO.map(({ key, name }) => ({ keys: ['g', key], name })),
  { keys: ['?'], name: 'This list' },
  { keys: ['Esc'], name: 'Close a dialog' },
];

export function ShortcutsDialog({
  isOpen,
  onClose,
}: {
  readonly isOpen: boolean;
  readonly onClose: () => void;
}) {
  return (
    <Dialog isOpen={isOpen} onClose={onClose} title="Keyboard shortcuts">
      <dl className="grid">
        {ROWS.map((row) => (
          <div
            key={row.name}
            className="flex items-baseline justify-between gap-4 border-t border-rule py-1.5"
          >
            <dt>{row.name}</dt>
            <dd className="flex gap-1.5">
              {row.keys.map((key) => (
                <kbd key={key} className="num min-w-6 border border-concrete-edge px-1.5 text-center">
                  {key}
                </kbd>
              ))}
            </dd>
          </div>
        ))}
      </dl>
      <p className="mt-3 text-xs text-muted">
        Letters work while no field is being typed in. Tab and the arrow keys reach everything else.
      </p>
    </Dialog>
  );
}
