import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { projectInputSchema } from '#shared/contract/records.ts';
import { placeIssues } from '#client/src/lib/form-issues.ts';
import { useProject } from '#client/src/lib/project-context.ts';
import { Button } from '#client/src/ui/button.tsx';
import { Dialog } from '#client/src/ui/dialog.tsx';
import { FormError } from '#client/src/ui/form-error.tsx';
import { TextField } from '#client/src/ui/text-field.tsx';
import { useRenameProject } from './api.ts';

const renameSchema = projectInputSchema.pick({ name: true, number: true });

export function RenameProjectDialog({ onClose }: { readonly onClose: () => void }) {
  const project = useProject();
  const rename = useRenameProject(project.id);
  const [failure, setFailure] = useState<string | null>(null);
  const form = useForm({
    resolver: zodResolver(renameSchema),
    defaultValues: { name: project.name, number: project.number },
  });
  const { errors, isDirty } = form.formState;
  const submit = form.handleSubmit(async (values) => {
    setFailure(null);
    try {
      await rename.mutateAsync(values);
      onClose();
    } catch (error) {
      setFailure(placeIssues(error, form.setError, (path) => path in values));
    }
  });
  return (
    <Dialog isOpen onClose={onClose} title="Name and number" isSticky={isDirty}>
      <form onSubmit={(event) => void submit(event)} noValidate className="grid gap-4">
        <TextField label="Project number" error={errors.number?.message} {...form.register('number')} />
        <TextField label="Project name" error={errors.name?.message} {...form.register('name')} />
        <FormError message={failure} />
        <div className="flex flex-wrap gap-3">
          <Button look="solid" type="submit" isBusy={rename.isPending}>
            Save
          </Button>
          <Button onClick={onClose}>Cancel</Button>
        </div>
      </form>
    </Dialog>
  );
}
