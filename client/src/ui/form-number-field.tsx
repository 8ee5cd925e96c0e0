import { Controller, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { NumberField, type NumberFieldProps } from './number-field.tsx';

type FormNumberFieldProps<F extends FieldValues> = Omit<
  NumberFieldProps,
  'value' | 'onChange' | 'onBlur' | 'name'
> & {
  readonly control: Control<F>;
  readonly name: FieldPath<F>;
  /** An empty field is left out of the record instead of being null in it. */
  readonly isOptional?: boolean;
};

/** A NumberField bound to one path of a form; the form holds SI. */
export function FormNumberField<F extends FieldValues>({
  control,
  name,
  isOptional = false,
  ...field
}: FormNumberFieldProps<F>) {
  return (
    <Controller
      control={control}
      name={name}
      render={({ field: bound, fieldState }) => (
        <NumberField
          {...field}
          name={bound.name}
          inputRef={bound.ref}
          value={bound.value ?? null}
          onChange={(stored) => bound.onChange(isOptional ? (stored ?? undefined) : stored)}
          onBlur={bound.onBlur}
          error={field.error ?? fieldState.error?.message}
        />
      )}
    />
  );
}
