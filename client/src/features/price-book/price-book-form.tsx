import { zodResolver } from '@hookform/resolvers/zod';
import { useForm, useWatch } from 'react-hook-form';
import { priceBookSchema, type PriceBook, type UnitSystem } from '#shared/contract/design-basis.ts';
import { unitLabel } from '#shared/print/units.ts';
import { FieldGroup } from '#client/src/ui/field-group.tsx';
import { FormNumberField } from '#client/src/ui/form-number-field.tsx';
import { RecordForm } from '#client/src/ui/record-form.tsx';
import { TextField } from '#client/src/ui/text-field.tsx';
import { useSetPriceBook } from './api.ts';
import { MixTable } from './mix-table.tsx';

interface PriceBookFormProps {
  readonly projectId: string;
  readonly priceBook: PriceBook;
  readonly units: UnitSystem;
  /** Strength of concrete in the letters of the project’s code. */
  readonly fcSymbol: string;
  readonly isReadOnly: boolean;
}

export function PriceBookForm({ projectId, priceBook, units, fcSymbol, isReadOnly }: PriceBookFormProps) {
  const save = useSetPriceBook(projectId);
  const form = useForm<PriceBook>({ resolver: zodResolver(priceBookSchema), defaultValues: priceBook });
  const { control, register } = form;
  const { errors } = form.formState;
  const currency = useWatch({ control, name: 'currency' });
  const money = (kind: 'money-per-mass' | 'money-per-surface') => `${currency}${unitLabel(kind, units)}`;

  return (
    <>
      <p className="mb-4 max-w-prose text-muted">
        A rate left blank is not known: costs that need it stay blank too. Nothing is ever taken as zero
        unless 0 is typed.
      </p>
      <RecordForm
        form={form}
        stored={priceBook}
        isReadOnly={isReadOnly}
        isSaving={save.isPending}
        saveText="Save price book"
        savedText="Price book saved. Pinned candidates keep the rates they were pinned with."
        onSave={save.mutateAsync}
      >
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
        <FieldGroup title="Concrete mixes" lead={`Matched to a section by its ${fcSymbol}, exactly.`}>
          <MixTable
            control={control}
            units={units}
            fcSymbol={fcSymbol}
            currency={currency}
            isReadOnly={isReadOnly}
          />
        </FieldGroup>
      </RecordForm>
    </>
  );
}
