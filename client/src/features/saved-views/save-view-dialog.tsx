import { useState } from 'react';
import type { ViewAddress } from '#shared/contract/saved-view.ts';
import { messageOf } from '#client/src/lib/api-error.ts';
import { errorsByField, issuesOf } from '#client/src/lib/field-errors.ts';
import { Button } from '#client/src/ui/button.tsx';
import { Dialog } from '#client/src/ui/dialog.tsx';
import { FormError } from '#client/src/ui/form-error.tsx';
import { TextField } from '#client/src/ui/text-field.tsx';
import { notify } from '#client/src/ui/toast.tsx';
import { useSaveView } from './api.ts';

/** Where what is shown now belongs to. */
export interface ShownNow {
  readonly projectId: string;
  readonly sweepId: string;
  readonly runId: string;
  readonly address: ViewAddress;
}

/** Gives what is shown now a name. */
export function SaveViewDialog({
  shown,
  onClose,
}: {
  readonly shown: ShownNow;
  readonly onClose: () => void;
}) {
  const save = useSaveView(shown.projectId);
  const [name, setName] = useState('');
  const [tried, setTried] = useState<string | null>(null);
  const taken = tried === name ? errorsByField(issuesOf(save.error)).get('name') : undefined;
  const missing = tried !== null && name.trim() === '' ? 'Name of the view is missing' : undefined;
  const submit = () => {
    setTried(name);
    if (name.trim() === '') return;
    const { sweepId, runId, address } = shown;
    save.mutate(
      { goal: { kind: 'new', sweepId }, input: { name, runId, address } },
      {
        onSuccess: (view) => {
          notify.done(`“${view.name}” is saved for everybody of the project`);
          onClose();
        },
      },
    );
  };
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title="Save this view"
      description="Measures, third measure, logarithmic axes, ranges, columns, band and the chosen section, kept with the sweep for everybody of the project."
    >
      <form
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          submit();
        }}
      >
        <TextField
          label="Name of the view"
          autoFocus
          maxLength={80}
          value={name}
          error={missing ?? taken}
          onChange={(event) => setName(event.target.value)}
        />
        <div className="mt-4 flex flex-wrap items-center gap-3">
          <Button look="solid" type="submit" isBusy={save.isPending}>
            Save view
          </Button>
          <Button onClick={onClose}>Cancel</Button>
          <FormError
            message={save.isError && taken === undefined && tried === name ? messageOf(save.error) : null}
          />
        </div>
      </form>
    </Dialog>
  );
}
