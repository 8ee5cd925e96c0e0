import { type ComponentProps, type ReactNode } from 'react';
import { FieldFrame, type FieldFrameProps } from './field-frame.tsx';

type ListFieldProps = FieldFrameProps &
  Omit<ComponentProps<'input'>, 'className' | 'children' | 'type' | 'onChange'> & {
    readonly unitText?: ReactNode;
    readonly onChange: (text: string) => void;
  };

/** One line that takes several numbers; what was typed stays as it was typed. */
export function ListField(props: ListFieldProps) {
  const { label, hint, error, isLabelHidden, className, unitText, onChange, ...input } = props;
  return (
    <FieldFrame label={label} hint={hint} error={error} isLabelHidden={isLabelHidden} className={className}>
      {(ids) => (
        <span className="flex items-baseline gap-2">
          <input
            {...input}
            {...ids}
            type="text"
            autoComplete="off"
            className="ruled num w-full min-w-12"
            onChange={(event) => onChange(event.target.value)}
          />
          {unitText !== undefined && unitText !== '' && (
            <span className="shrink-0 text-xs text-muted">{unitText}</span>
          )}
        </span>
      )}
    </FieldFrame>
  );
}
