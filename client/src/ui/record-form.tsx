import { useState, type ReactNode } from 'react';
import type { FieldValues, UseFormReturn } from 'react-hook-form';
import { placeIssues } from '#client/src/lib/form-issues.ts';
import { Button } from './button.tsx';
import { FormActions } from './form-actions.tsx';
import { FormError } from './form-error.tsx';
import { notify } from './toast.tsx';
import { useUnsavedGuard } from './use-unsaved-guard.tsx';

interface RecordFormProps<F extends FieldValues> {
  /** `form.formState.isDirty` is read here. */
  readonly form: UseFormReturn<F>;
  /** What is stored: undoing goes back to it. */
  readonly stored: F;
  readonly isReadOnly: boolean;
  readonly isSaving: boolean;
  readonly saveText: string;
  /** Told once it is saved. */
  readonly savedText: string;
  readonly onSave: (values: F) => Promise<unknown>;
  readonly children: ReactNode;
}

/** A long form over one stored record: saved as a whole, undone as a whole, and not left by mistake. */
export function RecordForm<F extends FieldValues>(props: RecordFormProps<F>) {
  const { form, stored, isReadOnly, isSaving, saveText, savedText, onSave, children } = props;
  const [failure, setFailure] = useState<string | null>(null);
  const { isDirty } = form.formState;
  const guard = useUnsavedGuard(isDirty);

  const submit = form.handleSubmit(async (values) => {
    setFailure(null);
    try {
      await onSave(values);
      form.reset(values);
      notify.done(savedText);
    } catch (error) {
      setFailure(placeIssues(error, form.setError, (path) => path.split('.')[0]! in values));
    }
  });

  return (
    <form onSubmit={(event) => void submit(event)} noValidate>
      <fieldset disabled={isReadOnly} className="min-w-0">
        {children}
      </fieldset>
      {!isReadOnly && (
        <FormActions isDirty={isDirty}>
          <Button look="solid" type="submit" isBusy={isSaving} disabled={!isDirty}>
            {saveText}
          </Button>
          {isDirty && (
            <Button look="text" onClick={() => form.reset(stored)}>
              Take back the changes
            </Button>
          )}
          <FormError message={failure} />
        </FormActions>
      )}
      {guard.element}
    </form>
  );
}
