import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { priceBookSchema, type PriceBook, type UnitSystem } from '#shared/contract/design-basis.ts';
import { placeIssues } from '#client/src/lib/form-issues.ts';
import { unitLabel } from '#shared/print/units.ts';
import { Button } from '#client/src/ui/button.tsx';
import { FieldGroup } from '#client/src/ui/field-group.tsx';
import { FormActions } from '#client/src/ui/form-actions.tsx';
import { FormError } from '#client/src/ui/form-error.tsx';
import { FormNumberField } from '#client/src/ui/form-number-field.tsx';
import { TextField } from '#client/src/ui/text-field.tsx';
import { notify } from '#client/src/ui/toast.tsx';
import { useUnsavedGuard } from '#client/src/ui/use-unsaved-guard.tsx';
import { useSetPriceBook } from './api.ts';
import { MixTable } from './mix-table.tsx';

interface PriceBookFormProps {
  readonly projectId: string;
  readonly priceBook: PriceBook;
  readonly units: UnitSystem;
  readonly isReadOnly: boolean;
}

export function PriceBookForm({ projectId, priceBook, units, isReadOnly }: PriceBookFormProps) {
  const save = useSetPriceBook(projectId);
  const [failure, setFailure] = useState<string | null>(null);
  const form = useForm<PriceBook>({ resolver: zodResolver(priceBookSchema), defaultValues: priceBook });
  const { control, register } = form;
  const { errors, isDirty } = form.formState;
  const guard = useUnsavedGuard(isDirty);
  const currency = useWatch({ control, name: 'currency' });
  const money = (kind: 'money-per-mass' | 'money-per-surface') => `${currency}${unitLabel(kind, units)}`;

  const submit = form.handleSubmit(async (values) => {
    setFailure(null);
    try {
      await save.mutateAsync(values);
      form.reset(values);
      notify.done('Price book saved. Pinned candidates keep the rates they were pinned with.');
    } catch (error) {
      setFailure(placeIssues(error, form.setError, (path) => path.split('.')[0]! in values));
    }
  });

  return (
    <form onSubmit={(event) => void submit(event)} noValidate>
      <p className="mb-4 max-w-prose text-muted">
        A rate left blank is not known: costs that need it stay blank too. Nothing is ever taken as zero
        unless 0 is typed.
      </p>
      <fieldset disabled={isReadOnly} className="min-w-0">
        <FieldGroup title="Where the rates come from">
          <TextField label="Currency" error={errors.currency?.message} {...register('currency')} />
          <TextField
            className="xl:col-span-2"
            label="Source"
            hint="Quotation, index or own records, with their date."
            error={errors.source?.message}
            {...register('source')}
          />
        </FieldGroup>
        <FieldGroup
          title="Steel and formwork"
          lead="Supplied, cut, bent and fixed; formwork per surface in contact."
        >
          <FormNumberField
            control={control}
            name="steelPerKg"
            kind="money-per-mass"
            units={units}
            unitText={money('money-per-mass')}
            label="Longitudinal bars"
          />
          <FormNumberField
            control={control}
            name="stirrupPerKg"
            kind="money-per-mass"
            units={units}
            unitText={money('money-per-mass')}
            label="Stirrups"
          />
          <FormNumberField
            control={control}
            name="formworkPerM2"
            kind="money-per-surface"
            units={units}
            unitText={money('money-per-surface')}
            label="Formwork"
          />
          <FormNumberField
            control={control}
            name="lapShare"
            kind="percent"
            units={units}
            label="Laps"
            hint="Added to the net steel."
          />
          <FormNumberField
            control={control}
            name="wasteShare"
            kind="percent"
            units={units}
            label="Waste"
            hint="Added to net steel and laps."
          />
          <FormNumberField
            control={control}
            name="steelCo2ePerKg"
            kind="co2e-per-mass"
            units={units}
            label="Carbon factor of steel"
            hint="Production stages A1–A3."
          />
        </FieldGroup>
        <FieldGroup title="Concrete mixes" lead="Matched to a section by its f′c, exactly.">
          <MixTable control={control} units={units} currency={currency} isReadOnly={isReadOnly} />
        </FieldGroup>
      </fieldset>
      {!isReadOnly && (
        <FormActions isDirty={isDirty}>
          <Button look="solid" type="submit" isBusy={save.isPending} disabled={!isDirty}>
            Save price book
          </Button>
          {isDirty && (
            <Button look="text" onClick={() => form.reset(priceBook)}>
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
