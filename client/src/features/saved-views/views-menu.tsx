import { DropdownMenu } from 'radix-ui';
import { useState } from 'react';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { SavedView } from '#shared/contract/saved-view.ts';
import { Button } from '#client/src/ui/button.tsx';
import { SaveViewDialog, type ShownNow } from './save-view-dialog.tsx';
import { isSameView, viewWords } from './view-search.ts';
import { ViewsDialog } from './views-dialog.tsx';

interface ViewsMenuProps {
  /** Those of this sweep, by name. */
  readonly views: readonly SavedView[];
  readonly shown: ShownNow;
  readonly units: UnitSystem;
  readonly maySave: boolean;
  readonly onOpen: (view: SavedView) => void;
}

const item =
  'flex cursor-pointer items-baseline gap-2 px-3 py-1.5 outline-none data-highlighted:bg-concrete data-highlighted:text-ink';

/** The saved views of the run's sweep, and the way to save what is shown. */
export function ViewsMenu({ views, shown, units, maySave, onOpen }: ViewsMenuProps) {
  const [dialog, setDialog] = useState<'save' | 'all' | null>(null);
  const close = () => setDialog(null);
  return (
    <>
      <DropdownMenu.Root modal={false}>
        <DropdownMenu.Trigger asChild>
          <Button>
            Views{views.length > 0 && <span className="num font-normal">{views.length}</span>}
            <span aria-hidden="true" className="text-2xs">
              ▾
            </span>
          </Button>
        </DropdownMenu.Trigger>
        <DropdownMenu.Content
          align="end"
          sideOffset={6}
          className="z-50 max-h-[70vh] max-w-[calc(100vw-2rem)] min-w-64 overflow-y-auto border border-ink bg-sheet py-1"
        >
          {views.length === 0 && (
            <DropdownMenu.Label className="max-w-64 px-3 py-1.5 text-sm text-muted">
              No saved views of this sweep yet.
            </DropdownMenu.Label>
          )}
          {views.map((view) => {
            const isShown = view.runId === shown.runId && isSameView(view.address, shown.address);
            return (
              <DropdownMenu.Item key={view.id} className={item} onSelect={() => onOpen(view)}>
                <span aria-hidden="true" className="inline-block w-3">
                  {isShown ? '●' : ''}
                </span>
                <span className="min-w-0">
                  <span className="block">
                    {view.name}
                    {isShown && <span className="sr-only">, shown now</span>}
                  </span>
                  <span className="block text-xs text-muted">
                    {viewWords(view, units)}
                    {view.runId !== shown.runId && `, from run ${view.runNumber}`}
                  </span>
                </span>
              </DropdownMenu.Item>
            );
          })}
          {maySave && (
            <>
              <DropdownMenu.Separator className="my-1 border-t border-rule" />
              <DropdownMenu.Item className={item} onSelect={() => setDialog('save')}>
                Save this view
              </DropdownMenu.Item>
              {views.length > 0 && (
                <DropdownMenu.Item className={item} onSelect={() => setDialog('all')}>
                  Rename, replace or delete
                </DropdownMenu.Item>
              )}
            </>
          )}
        </DropdownMenu.Content>
      </DropdownMenu.Root>
      {dialog === 'save' && <SaveViewDialog shown={shown} onClose={close} />}
      {dialog === 'all' && <ViewsDialog views={views} shown={shown} units={units} onClose={close} />}
    </>
  );
}
