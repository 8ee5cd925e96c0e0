import { Controller, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { NumberField, type NumberFieldProps } from './number-field.tsx';

type FormNumberFieldProps<F extends FieldValues> = Omit<
  NumberFieldProps,
  'value' | 'onChange' | 'onBlur' | 'name'
> & {
  readonly control: Control<F>;
  readonly name: FieldPath<F>;
};

/** A NumberField bound to one path of a form; the form holds SI. */
export function FormNumberField<F extends FieldValues>({ control, name, ...field }: FormNumberFieldProps<F>) {
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
          onChange={bound.onChange}
          onBlur={bound.onBlur}
          error={field.error ?? fieldState.error?.message}
        />
      )}
    />
  );
}
