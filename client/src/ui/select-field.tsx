import { type ComponentProps } from 'react';
import { FieldFrame, type FieldFrameProps } from './field-frame.tsx';

export interface SelectOption<V extends string> {
  readonly value: V;
  readonly label: string;
}

type SelectFieldProps<V extends string> = FieldFrameProps &
  Omit<ComponentProps<'select'>, 'className' | 'children'> & { readonly options: readonly SelectOption<V>[] };

/** The browser's own list: it works with every keyboard, screen reader and phone. */
export function SelectField<V extends string>(props: SelectFieldProps<V>) {
  const { label, hint, error, isLabelHidden, className, options, ...select } = props;
  return (
    <FieldFrame label={label} hint={hint} error={error} isLabelHidden={isLabelHidden} className={className}>
      {(ids) => (
        <select {...select} {...ids} className="ruled w-full bg-paper">
          {options.map((option) => (
            <option key={option.value} value={option.value} className="bg-paper text-ink">
              {option.label}
            </option>
          ))}
        </select>
      )}
    </FieldFrame>
  );
}
