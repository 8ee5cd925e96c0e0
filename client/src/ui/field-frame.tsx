import { useId, type ReactNode } from 'react';
import { classNames } from '#client/src/lib/class-names.ts';

export interface FieldFrameProps {
  readonly label: ReactNode;
  /** One plain line below the label: what it is for. */
  readonly hint?: ReactNode;
  readonly error?: string | null | undefined;
  readonly isLabelHidden?: boolean;
  readonly className?: string;
}

export interface FieldIds {
  readonly id: string;
  readonly 'aria-describedby': string | undefined;
  readonly 'aria-invalid': boolean | undefined;
}

/** Label, hint, control and, beside it, what is wrong. The control is named and described by its surroundings. */
export function FieldFrame(props: FieldFrameProps & { readonly children: (ids: FieldIds) => ReactNode }) {
  const id = useId();
  const { label, hint, error, isLabelHidden, className, children } = props;
  const hasError = error !== null && error !== undefined && error !== '';
  const hasHint = hint !== undefined && hint !== null && hint !== '';
  const describedBy = classNames(hasHint && `${id}-hint`, hasError && `${id}-error`);
  return (
    <div className={classNames('min-w-0', className)}>
      <label htmlFor={id} className={isLabelHidden ? 'sr-only' : 'mb-0.5 block text-sm font-medium'}>
        {label}
      </label>
      {children({
        id,
        'aria-describedby': describedBy === '' ? undefined : describedBy,
        'aria-invalid': hasError || undefined,
      })}
      {hasError && (
        <p id={`${id}-error`} className="mt-1 flex gap-1.5 text-xs text-fails">
          <span aria-hidden="true">▲</span>
          <span>{error}</span>
        </p>
      )}
      {hasHint && (
        <p id={`${id}-hint`} className="mt-1 text-xs text-muted">
          {hint}
        </p>
      )}
    </div>
  );
}
