import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { UNIT_SYSTEMS } from '#shared/contract/design-basis.ts';
import { projectInputSchema, type Project } from '#shared/contract/records.ts';
import { ruleSetLabel, barStandardLabel } from '#shared/print/basis-labels.ts';
import { placeIssues } from '#client/src/lib/form-issues.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { Button } from '#client/src/ui/button.tsx';
import { FormError } from '#client/src/ui/form-error.tsx';
import { KeyValue } from '#client/src/ui/key-value.tsx';
import { SegmentedControl } from '#client/src/ui/segmented-control.tsx';
import { TextField } from '#client/src/ui/text-field.tsx';
import { useUnsavedGuard } from '#client/src/ui/use-unsaved-guard.tsx';
import { useCreateProject } from './api.ts';
import { BASIS_PRESETS } from './basis-presets.ts';

const UNIT_NAME = { us: 'US', si: 'SI' } as const;

export function NewProjectForm({ onCreated }: { readonly onCreated: (project: Project) => void }) {
  const create = useCreateProject();
  const [failure, setFailure] = useState<string | null>(null);
  const form = useForm({
    resolver: zodResolver(projectInputSchema),
    defaultValues: { name: '', number: '', designBasis: BASIS_PRESETS.us },
  });
  const { errors, isDirty } = form.formState;
  const guard = useUnsavedGuard(isDirty);
  const basis = useWatch({ control: form.control, name: 'designBasis' });

  const submit = form.handleSubmit(async (values) => {
    setFailure(null);
    try {
      const project = await create.mutateAsync(values);
      guard.release();
      onCreated(project);
    } catch (error) {
      setFailure(placeIssues(error, form.setError, (path) => path in values));
    }
  });

  return (
    <form onSubmit={(event) => void submit(event)} noValidate className="grid max-w-xl gap-5">
      <TextField
        label="Project number"
        hint="As your office files it. It prints on every sheet."
        error={errors.number?.message}
        autoFocus
        {...form.register('number')}
      />
      <TextField label="Project name" error={errors.name?.message} {...form.register('name')} />
      <SegmentedControl
        legend="Units"
        isLegendShown
        options={UNIT_SYSTEMS.map((value) => ({ value, label: UNIT_NAME[value] }))}
        value={basis.units}
        onChange={(units) => form.setValue('designBasis', BASIS_PRESETS[units], { shouldDirty: true })}
      />
      <section aria-label="Design basis to start from">
        <h2 className="mb-1 text-sm font-medium">Starts from this design basis</h2>
        <KeyValue
          items={[
            { label: 'Code', value: ruleSetLabel(basis.ruleSet), isNumber: false },
            { label: 'Bars', value: barStandardLabel(basis.barStandard), isNumber: false },
            { label: 'Yield strength fy', value: formatQuantity(basis.fyMPa, 'stress', basis.units) },
            { label: 'Clear cover', value: formatQuantity(basis.coverMm, 'length', basis.units) },
            {
              label: 'Largest aggregate',
              value: formatQuantity(basis.maxAggregateMm, 'length', basis.units),
            },
          ]}
        />
        <p className="mt-2 text-xs text-muted">
          You can change all of it on the project’s design basis, before or after the first sweep.
        </p>
      </section>
      <FormError message={failure} />
      <div>
        <Button look="solid" type="submit" isBusy={create.isPending}>
          Create project
        </Button>
      </div>
      {guard.element}
    </form>
  );
}
