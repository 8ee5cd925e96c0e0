import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { CodeSymbols } from '#shared/engine/rules/code-symbols.ts';
import { NumberField } from '#client/src/ui/number-field.tsx';
import { ListField } from '#client/src/ui/list-field.tsx';
import { SegmentedControl } from '#client/src/ui/segmented-control.tsx';
import { quantitiesInText } from '#shared/print/quantities-in-text.ts';
import { unitLabel } from '#shared/print/units.ts';
import { AXIS_KIND } from './read-sweep-form.ts';
import { errorUnder, type FieldErrors } from '#client/src/lib/field-errors.ts';
import type { AxisName, AxisValues } from './sweep-form-values.ts';

type AxisLabel = { readonly name: string; readonly symbol: string };

const labelsOf = ({ fc, fy }: CodeSymbols): Readonly<Record<AxisName, AxisLabel>> => ({
  width: { name: 'Width', symbol: 'b' },
  depth: { name: 'Depth', symbol: 'h' },
  fc: { name: 'Concrete', symbol: fc },
  fy: { name: 'Steel', symbol: fy },
  cover: { name: 'Clear cover', symbol: 'to the stirrup' },
});

const WAYS = [
  { value: 'range', label: 'Range' },
  { value: 'list', label: 'List' },
] as const;

const ENDS = [
  { key: 'from', label: 'from' },
  { key: 'to', label: 'to' },
  { key: 'step', label: 'by' },
] as const;

interface AxisFieldProps {
  readonly name: AxisName;
  readonly units: UnitSystem;
  readonly symbols: CodeSymbols;
  readonly values: AxisValues;
  readonly errors: FieldErrors;
  /** How many values it makes; null while it cannot be read. */
  readonly valueCount: number | null;
  readonly onChange: (values: AxisValues) => void;
}

/** One axis of the space: a range with a step, or the values one by one. */
export function AxisField({ name, units, symbols, values, errors, valueCount, onChange }: AxisFieldProps) {
  const label = labelsOf(symbols)[name];
  const kind = AXIS_KIND[name];
  const full = `${label.name} ${label.symbol}`;
  const listError = errorUnder(errors, `space.${name}.values`);
  return (
    <fieldset className="grid gap-x-5 gap-y-2 border-t border-rule py-3 sm:grid-cols-[9.5rem_7.5rem_1fr_5.5rem] sm:items-start">
      <legend className="sr-only">{full}</legend>
      <p className="sm:pt-6" aria-hidden="true">
        <span className="font-medium">{label.name}</span> <span className="text-muted">{label.symbol}</span>
      </p>
      <SegmentedControl
        className="sm:pt-5"
        legend={`${full}: range or list`}
        options={WAYS}
        value={values.kind}
        onChange={(way) => onChange({ ...values, kind: way })}
      />
      {values.kind === 'range' ? (
        <div className="grid grid-cols-3 gap-4">
          {ENDS.map(({ key, label: end }) => (
            <NumberField
              key={key}
              label={
                <span className="text-xs font-normal text-muted">
                  <span className="sr-only">{full} </span>
                  {end}
                </span>
              }
              kind={kind}
              units={units}
              value={values[key]}
              error={errors.get(`space.${name}.${key}`)}
              onChange={(stored) => onChange({ ...values, [key]: stored })}
            />
          ))}
        </div>
      ) : (
        <ListField
          label={
            <span className="text-xs font-normal text-muted">
              <span className="sr-only">{full} </span>values, parted by commas
            </span>
          }
          unitText={unitLabel(kind, units)}
          value={values.listText}
          error={listError === undefined ? undefined : quantitiesInText(listError, units)}
          onChange={(listText) => onChange({ ...values, listText })}
        />
      )}
      <p className="num text-right text-muted sm:pt-6" aria-live="polite">
        {valueCount === null ? '' : `${valueCount} ${valueCount === 1 ? 'value' : 'values'}`}
      </p>
    </fieldset>
  );
}
