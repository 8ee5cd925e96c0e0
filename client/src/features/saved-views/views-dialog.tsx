import { useState } from 'react';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { SavedView } from '#shared/contract/saved-view.ts';
import { formatDate } from '#shared/print/format-quantity.ts';
import { messageOf } from '#client/src/lib/api-error.ts';
import { Button } from '#client/src/ui/button.tsx';
import { Dialog } from '#client/src/ui/dialog.tsx';
import { FormError } from '#client/src/ui/form-error.tsx';
import { TextField } from '#client/src/ui/text-field.tsx';
import { notify } from '#client/src/ui/toast.tsx';
import { useDeleteView, useSaveView } from './api.ts';
import type { ShownNow } from './save-view-dialog.tsx';
import { viewWords } from './view-search.ts';

interface ViewsDialogProps {
  readonly views: readonly SavedView[];
  readonly shown: ShownNow;
  readonly units: UnitSystem;
  readonly onClose: () => void;
}

interface RowProps extends Omit<ViewsDialogProps, 'views' | 'onClose'> {
  readonly view: SavedView;
}

function Rename({
  view,
  projectId,
  onDone,
}: {
  readonly view: SavedView;
  readonly projectId: string;
  readonly onDone: () => void;
}) {
  const save = useSaveView(projectId);
  const [name, setName] = useState(view.name);
  const { runId, address } = view;
  return (
    <form
      noValidate
      className="flex flex-wrap items-end gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        save.mutate(
          { goal: { kind: 'change', viewId: view.id }, input: { name, runId, address } },
          { onSuccess: onDone },
        );
      }}
    >
      <TextField
        className="min-w-48 flex-1"
        label={`New name of ${view.name}`}
        autoFocus
        maxLength={80}
        value={name}
        error={save.isError ? messageOf(save.error) : null}
        onChange={(event) => setName(event.target.value)}
      />
      <Button type="submit" isBusy={save.isPending} disabled={name.trim() === ''}>
        Rename
      </Button>
      <Button look="text" onClick={onDone}>
        Cancel
      </Button>
    </form>
  );
}

function Row({ view, shown, units }: RowProps) {
  const [isRenaming, setRenaming] = useState(false);
  const [isDoomed, setDoomed] = useState(false);
  const save = useSaveView(shown.projectId);
  const remove = useDeleteView(shown.projectId);
  const { runId, address } = shown;
  const replace = () =>
    save.mutate(
      { goal: { kind: 'change', viewId: view.id }, input: { name: view.name, runId, address } },
      { onSuccess: () => notify.done(`“${view.name}” now shows what is shown here`) },
    );
  return (
    <li className="grid gap-1.5 border-t border-rule py-3">
      {isRenaming ? (
        <Rename view={view} projectId={shown.projectId} onDone={() => setRenaming(false)} />
      ) : (
        <p className="flex flex-wrap items-baseline gap-x-3">
          <span className="font-semibold">{view.name}</span>
          <span className="text-sm text-muted">{viewWords(view, units)}</span>
        </p>
      )}
      <p className="text-xs text-muted">
        Saved on run {view.runNumber} by {view.createdBy.name}, {formatDate(view.createdAt)}
      </p>
      {view.mayChange && !isRenaming && (
        <div className="flex flex-wrap items-baseline gap-x-4 gap-y-1 text-sm">
          <Button look="text" aria-label={`Rename ${view.name}`} onClick={() => setRenaming(true)}>
            Rename
          </Button>
          <Button look="text" isBusy={save.isPending} aria-label={`Replace ${view.name}`} onClick={replace}>
            Replace with what is shown now
          </Button>
          {isDoomed ? (
            <>
              <Button look="danger" isBusy={remove.isPending} onClick={() => remove.mutate(view.id)}>
                Delete for everybody
              </Button>
              <Button look="text" onClick={() => setDoomed(false)}>
                Keep it
              </Button>
            </>
          ) : (
            <Button look="text" aria-label={`Delete ${view.name}`} onClick={() => setDoomed(true)}>
              Delete
            </Button>
          )}
          <FormError
            message={remove.isError ? messageOf(remove.error) : save.isError ? messageOf(save.error) : null}
          />
        </div>
      )}
    </li>
  );
}

/** Every view of a sweep, to rename, replace or delete those that are one's to change. */
export function ViewsDialog({ views, onClose, ...rest }: ViewsDialogProps) {
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title="Saved views of this sweep"
      description="Changed by whoever made them, the project’s lead or an admin."
      isWide
    >
      {views.length === 0 ? (
        <p className="text-muted">None is left.</p>
      ) : (
        <ul className="grid">
          {views.map((view) => (
            <Row key={view.id} view={view} {...rest} />
          ))}
        </ul>
      )}
    </Dialog>
  );
}
