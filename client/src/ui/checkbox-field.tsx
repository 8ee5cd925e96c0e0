import { useId, type ComponentProps, type ReactNode } from 'react';
import { classNames } from '#client/src/lib/class-names.ts';

interface CheckboxFieldProps extends Omit<ComponentProps<'input'>, 'type' | 'children'> {
  readonly label: ReactNode;
  readonly hint?: ReactNode;
  readonly error?: string | null | undefined;
  readonly isLabelHidden?: boolean;
}

export function CheckboxField(props: CheckboxFieldProps) {
  const { label, hint, error, isLabelHidden = false, className, ...input } = props;
  const id = useId();
  return (
    <div className={classNames('min-w-0', className)}>
      <label className="inline-flex min-h-6 items-center gap-2">
        <input
          {...input}
          type="checkbox"
          className="size-4 shrink-0 accent-steel-solid"
          aria-describedby={hint === undefined && !error ? undefined : `${id}-more`}
          aria-invalid={Boolean(error) || undefined}
        />
        <span className={isLabelHidden ? 'sr-only' : undefined}>{label}</span>
      </label>
      {(hint !== undefined || Boolean(error)) && (
        <p id={`${id}-more`} className={classNames('ml-6 text-xs', error ? 'text-fails' : 'text-muted')}>
          {error ? `▲ ${error}` : hint}
        </p>
      )}
    </div>
  );
}
