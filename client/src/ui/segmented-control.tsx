import { useId } from 'react';
import { classNames } from '#client/src/lib/class-names.ts';

interface SegmentedControlProps<V extends string> {
  /** Read out, and shown when `isLegendShown`. */
  readonly legend: string;
  readonly isLegendShown?: boolean;
  readonly options: readonly { readonly value: V; readonly label: string; readonly title?: string }[];
  readonly value: V;
  readonly onChange: (value: V) => void;
  readonly isDisabled?: boolean;
  readonly className?: string;
}

/** One of a few, side by side: radio buttons underneath, so arrow keys work as everywhere. */
export function SegmentedControl<V extends string>(props: SegmentedControlProps<V>) {
  const name = useId();
  return (
    <fieldset className={classNames('min-w-0', props.className)} disabled={props.isDisabled}>
      <legend className={props.isLegendShown ? 'mb-1 text-sm font-medium' : 'sr-only'}>{props.legend}</legend>
      <div className="inline-flex border border-ink">
        {props.options.map((option) => (
          <label
            key={option.value}
            title={option.title}
            className="relative cursor-pointer px-2.5 py-0.5 text-sm has-checked:bg-ink has-checked:text-paper has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-ink"
          >
            <input
              type="radio"
              className="absolute inset-0 cursor-pointer appearance-none opacity-0"
              name={name}
              value={option.value}
              checked={option.value === props.value}
              onChange={() => props.onChange(option.value)}
            />
            {option.label}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
