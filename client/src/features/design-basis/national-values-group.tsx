import { useState } from 'react';
import { useWatch, type UseFormReturn } from 'react-hook-form';
import type { ProjectDesignBasis } from '#shared/contract/design-basis.ts';
import {
  RECOMMENDED_VALUES,
  TABLED_CRACK_WIDTHS_MM,
  type NationalValues,
} from '#shared/engine/rules/national-values.ts';
import { formatNumber, formatQuantity } from '#shared/print/format-quantity.ts';
import { toDisplay } from '#shared/print/units.ts';
import { Button } from '#client/src/ui/button.tsx';
import { CheckboxField } from '#client/src/ui/checkbox-field.tsx';
import { FieldGroup } from '#client/src/ui/field-group.tsx';
import { Fold } from '#client/src/ui/fold.tsx';
import { FormNumberField } from '#client/src/ui/form-number-field.tsx';
import { SelectField } from '#client/src/ui/select-field.tsx';
import { NATIONAL_FIELDS } from '#shared/print/national-fields.ts';

type Typed = NonNullable<ProjectDesignBasis['nationalValues']>;

/** How many values the project sets otherwise than the standard recommends. */
function differing(values: NationalValues | null | undefined): number {
  return Object.entries(values ?? {}).filter(
    ([name, value]) => value !== undefined && value !== RECOMMENDED_VALUES[name as keyof NationalValues],
  ).length;
}

/** The values of EN 1992-1-1 that a national annex sets: the recommended ones until typed over. */
export function NationalValuesGroup({ form }: { readonly form: UseFormReturn<ProjectDesignBasis> }) {
  const { control, setValue, formState } = form;
  const [units, values] = useWatch({ control, name: ['units', 'nationalValues'] });
  const count = differing(values);
  const hasError = formState.errors.nationalValues !== undefined;
  // Opened for an error it stays open, also once the error is mended.
  const [hadError, setHadError] = useState(false);
  if (hasError && !hadError) setHadError(true);
  const takeRecommended = () => {
    for (const { fields } of NATIONAL_FIELDS)
      for (const { name } of fields)
        setValue(`nationalValues.${name}`, undefined, { shouldDirty: true, shouldValidate: hadError });
    setValue('nationalValues.isPlasticAnalysis', undefined, { shouldDirty: true });
    setValue('nationalValues.crackWidthMm', undefined, { shouldDirty: true });
  };
  return (
    <Fold
      isOpen={hadError}
      title="National values"
      note={
        count === 0
          ? 'all as recommended'
          : `${count} ${count === 1 ? 'differs' : 'differ'} from the recommended`
      }
    >
      <p className="max-w-prose pb-2 text-sm text-muted">
        EN 1992-1-1 leaves these to the country. An empty field takes the value it shows, which the standard
        recommends.
      </p>
      {NATIONAL_FIELDS.map(({ title, fields }) => (
        <FieldGroup key={title} title={title}>
          {fields.map(({ name, label, clause, kind }) => (
            <FormNumberField
              key={name}
              control={control}
              name={`nationalValues.${name}`}
              isOptional
              kind={kind}
              units={units}
              label={label}
              hint={clause}
              placeholder={formatNumber(toDisplay(RECOMMENDED_VALUES[name], kind, units), 4, true)}
            />
          ))}
          {title === 'Bending' && (
            <CheckboxField
              className="self-end"
              label="Plastic analysis"
              hint="5.6.2(2): x/d bounded without checking rotations."
              checked={values?.isPlasticAnalysis === true}
              onChange={({ target }) =>
                setValue('nationalValues.isPlasticAnalysis', target.checked ? true : undefined, {
                  shouldDirty: true,
                })
              }
            />
          )}
          {title === 'Placing and cracks' && (
            <SelectField
              label="Crack width wk"
              hint="Table 7.3N"
              options={TABLED_CRACK_WIDTHS_MM.map((mm) => ({
                value: String(mm),
                label: formatQuantity(mm, 'length', 'si'),
              }))}
              value={String(values?.crackWidthMm ?? RECOMMENDED_VALUES.crackWidthMm)}
              onChange={({ target }) =>
                setValue('nationalValues.crackWidthMm', Number(target.value) as Typed['crackWidthMm'], {
                  shouldDirty: true,
                })
              }
            />
          )}
        </FieldGroup>
      ))}
      <Button disabled={count === 0} onClick={takeRecommended}>
        Back to the recommended values
      </Button>
    </Fold>
  );
}
