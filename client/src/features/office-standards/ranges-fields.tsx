import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { FieldErrors } from '#client/src/lib/field-errors.ts';
import { errorUnder } from '#client/src/lib/field-errors.ts';
import { Button } from '#client/src/ui/button.tsx';
import { ListField } from '#client/src/ui/list-field.tsx';
import { NumberField } from '#client/src/ui/number-field.tsx';
import { TextField } from '#client/src/ui/text-field.tsx';
import { EMPTY_RANGES, type RangesValues } from './standard-values.ts';

interface RangesFieldsProps {
  readonly units: UnitSystem;
  readonly values: readonly RangesValues[];
  readonly errors: FieldErrors;
  readonly isReadOnly: boolean;
  readonly onChange: (values: readonly RangesValues[]) => void;
}

const ENDS = [
  { key: 'leastWidthMm', label: 'b from' },
  { key: 'mostWidthMm', label: 'b to' },
  { key: 'leastDepthMm', label: 'h from' },
  { key: 'mostDepthMm', label: 'h to' },
] as const;

/** Usual ranges, one group of fields for each kind of beam. */
export function RangesFields({ units, values, errors, isReadOnly, onChange }: RangesFieldsProps) {
  const change = (place: number, part: Partial<RangesValues>) =>
    onChange(values.map((ranges, k) => (k === place ? { ...ranges, ...part } : ranges)));
  return (
    <div className="grid gap-4 sm:col-span-2 xl:col-span-3">
      {values.map((ranges, k) => (
        <fieldset key={k} className="grid min-w-0 gap-x-8 gap-y-3 border-b border-rule pb-4 sm:grid-cols-4">
          <legend className="sr-only">{ranges.name === '' ? `Kind of beam ${k + 1}` : ranges.name}</legend>
          <TextField
            className="sm:col-span-3"
            label="Kind of beam"
            value={ranges.name}
            error={errors.get(`ranges.${k}.name`)}
            onChange={(event) => change(k, { name: event.target.value })}
          />
          <div className="flex items-end justify-end">
            {!isReadOnly && values.length > 1 && (
              <Button
                look="text"
                aria-label={`Remove ${ranges.name === '' ? `kind of beam ${k + 1}` : ranges.name}`}
                onClick={() => onChange(values.filter((_, other) => other !== k))}
              >
                Remove
              </Button>
            )}
          </div>
          {ENDS.map(({ key, label }) => (
            <NumberField
              key={key}
              label={label}
              kind="length"
              units={units}
              value={ranges[key]}
              error={errors.get(`ranges.${k}.${key}`)}
              onChange={(stored) => change(k, { [key]: stored })}
            />
          ))}
          <ListField
            className="sm:col-span-2"
            label="Bars at the tension face"
            hint="numbers, as 2–8 or 2, 4, 6"
            value={ranges.tensionText}
            error={errorUnder(errors, `ranges.${k}.tensionCounts`)}
            onChange={(tensionText) => change(k, { tensionText })}
          />
          <ListField
            className="sm:col-span-2"
            label="Bars at the compression face"
            hint="beside none, which is always tried"
            value={ranges.compressionText}
            error={errorUnder(errors, `ranges.${k}.compressionCounts`)}
            onChange={(compressionText) => change(k, { compressionText })}
          />
        </fieldset>
      ))}
      {!isReadOnly && (
        <div>
          <Button onClick={() => onChange([...values, EMPTY_RANGES])}>Add a kind of beam</Button>
        </div>
      )}
    </div>
  );
}
