import { useState, type ReactNode, type Ref } from 'react';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { fieldText } from '#shared/print/format-quantity.ts';
import { parseNumber } from '#client/src/lib/parse-number.ts';
import { quantitiesInText } from '#shared/print/quantities-in-text.ts';
import { toStored, unitLabel, type DisplayKind } from '#shared/print/units.ts';
import { FieldFrame, type FieldFrameProps } from './field-frame.tsx';

export interface NumberFieldProps extends FieldFrameProps {
  readonly kind: DisplayKind;
  readonly units: UnitSystem;
  /** Stored (SI) value; null for an empty field, NaN for text that is not a number. */
  readonly value: number | null;
  readonly onChange: (stored: number | null) => void;
  readonly onBlur?: () => void;
  readonly name?: string;
  readonly inputRef?: Ref<HTMLInputElement>;
  readonly isDisabled?: boolean;
  readonly isReadOnly?: boolean;
  readonly placeholder?: string;
  /** Printed instead of the unit, e.g. a currency per pound. */
  readonly unitText?: ReactNode;
}

/**
 * Reads and prints in the project's units and hands over SI. Exactly what was typed stays in the field, also when it
 * cannot be read; it is printed anew only when the value is changed from outside or the units change.
 */
export function NumberField(props: NumberFieldProps) {
  const { kind, units, value } = props;
  const unit = unitLabel(kind, units);
  const [typed, setTyped] = useState({ text: fieldText(value, kind, units), value, units, kind });

  const isOutdated = !Object.is(typed.value, value) || typed.units !== units || typed.kind !== kind;
  const text = isOutdated ? fieldText(value, kind, units) : typed.text;
  const parsed = parseNumber(text, unit);
  const problem = parsed.kind === 'unreadable' ? parsed.problem : null;
  const error = props.error == null ? problem : (problem ?? quantitiesInText(props.error, units));

  const onType = (nextText: string) => {
    const next = parseNumber(nextText, unit);
    const stored =
      next.kind === 'number' ? toStored(next.value, kind, units) : next.kind === 'empty' ? null : Number.NaN;
    setTyped({ text: nextText, value: stored, units, kind });
    props.onChange(stored);
  };

  return (
    <FieldFrame
      label={props.label}
      hint={props.hint}
      error={error}
      isLabelHidden={props.isLabelHidden}
      className={props.className}
    >
      {(ids) => (
        <span className="flex items-baseline gap-2">
          <input
            {...ids}
            ref={props.inputRef}
            name={props.name}
            type="text"
            inputMode="decimal"
            autoComplete="off"
            className="ruled num w-full max-w-44 min-w-12 text-right"
            disabled={props.isDisabled}
            readOnly={props.isReadOnly}
            placeholder={props.placeholder}
            value={text}
            onChange={(event) => onType(event.target.value)}
            onBlur={props.onBlur}
          />
          {(props.unitText ?? unit) !== '' && (
            <span className="shrink-0 text-xs text-muted">{props.unitText ?? unit}</span>
          )}
        </span>
      )}
    </FieldFrame>
  );
}
