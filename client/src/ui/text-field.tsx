import { type ComponentProps } from 'react';
import { classNames } from '#client/src/lib/class-names.ts';
import { FieldFrame, type FieldFrameProps } from './field-frame.tsx';

type TextFieldProps = FieldFrameProps & Omit<ComponentProps<'input'>, 'className' | 'children'>;

export function TextField({ label, hint, error, isLabelHidden, className, ...input }: TextFieldProps) {
  return (
    <FieldFrame label={label} hint={hint} error={error} isLabelHidden={isLabelHidden} className={className}>
      {(ids) => <input type="text" {...input} {...ids} className="ruled w-full" />}
    </FieldFrame>
  );
}

type TextAreaFieldProps = FieldFrameProps & Omit<ComponentProps<'textarea'>, 'className' | 'children'>;

export function TextAreaField({ label, hint, error, isLabelHidden, className, ...area }: TextAreaFieldProps) {
  return (
    <FieldFrame label={label} hint={hint} error={error} isLabelHidden={isLabelHidden} className={className}>
      {(ids) => <textarea rows={3} {...area} {...ids} className={classNames('ruled w-full resize-y')} />}
    </FieldFrame>
  );
}
