import { type ComponentProps } from 'react';
import { Link, type LinkProps } from 'react-router-dom';
import { classNames } from '#client/src/lib/class-names.ts';

/** `solid` for the one thing a page is for, `line` for the rest, `text` inside rows, `danger` for what cannot be undone. */
export type ButtonLook = 'solid' | 'line' | 'text' | 'danger';

const LOOK: Readonly<Record<ButtonLook, string>> = {
  solid:
    'border border-steel-solid bg-steel-solid px-3.5 py-1.5 font-semibold text-on-solid hover:enabled:bg-ink hover:enabled:border-ink hover:enabled:text-paper',
  line: 'border border-ink px-3.5 py-1.5 font-semibold text-ink hover:enabled:bg-ink hover:enabled:text-paper',
  text: 'px-1 py-0.5 underline decoration-concrete-edge hover:enabled:decoration-current',
  danger:
    'border border-fails px-3.5 py-1.5 font-semibold text-fails hover:enabled:bg-fails hover:enabled:text-paper',
};

const base =
  'inline-flex items-center justify-center gap-2 whitespace-nowrap text-center disabled:opacity-55 aria-disabled:opacity-55';

interface ButtonProps extends ComponentProps<'button'> {
  readonly look?: ButtonLook;
  /** Work is under way: the button keeps its width, says so to screen readers and cannot be pressed twice. */
  readonly isBusy?: boolean;
}

export function Button({ look = 'line', isBusy = false, className, children, ...rest }: ButtonProps) {
  return (
    <button
      type="button"
      {...rest}
      disabled={rest.disabled === true || isBusy}
      aria-busy={isBusy || undefined}
      className={classNames(base, LOOK[look], isBusy && 'cursor-progress', className)}
    >
      {children}
      {isBusy && <span className="busy-dots" aria-hidden="true" />}
    </button>
  );
}

/** A link that looks like a button, for going somewhere. */
export function ButtonLink({
  look = 'line',
  className,
  ...rest
}: LinkProps & { readonly look?: ButtonLook }) {
  const hover = LOOK[look].replaceAll('hover:enabled:', 'hover:');
  return <Link {...rest} className={classNames(base, hover, 'print:hidden', className)} />;
}

/** A link that looks like a button, to a file that the service hands over. */
export function FileLink({
  look = 'line',
  className,
  ...rest
}: ComponentProps<'a'> & { readonly look?: ButtonLook }) {
  const hover = LOOK[look].replaceAll('hover:enabled:', 'hover:');
  return <a {...rest} className={classNames(base, hover, 'print:hidden', className)} />;
}
