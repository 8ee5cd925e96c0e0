import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { BARS } from '#shared/engine/bars.ts';
import type { BarStandard } from '#shared/engine/section.ts';
import { Button } from '#client/src/ui/button.tsx';
import { NumberField } from '#client/src/ui/number-field.tsx';
import { SelectField } from '#client/src/ui/select-field.tsx';
import { SpacingChoice } from './spacing-choice.tsx';
import { type FieldErrors } from '#client/src/lib/field-errors.ts';
import type { StirrupValues } from './stirrup-values.ts';

interface StirrupsFieldProps {
  readonly units: UnitSystem;
  readonly standard: BarStandard;
  readonly values: readonly StirrupValues[];
  readonly errors: FieldErrors;
  /** Of the list in the form's input. */
  readonly path: string;
  /** A choice may be a section without stirrups. */
  readonly mayBeNone?: boolean;
  readonly onChange: (values: readonly StirrupValues[]) => void;
}

/** Sizes above this are not bent into stirrups (ACI 25.3.2 ends at No. 8 and 25 mm). */
const LARGEST_STIRRUP_MM = 26;

const small = (text: string) => <span className="text-xs font-normal text-muted">{text}</span>;

/** The choices of stirrups, one line each; every choice multiplies the space. */
export function StirrupsField(props: StirrupsFieldProps) {
  const { units, standard, values, errors, path, mayBeNone = false, onChange } = props;
  const sizes = BARS[standard].filter((bar) => bar.diameterMm <= LARGEST_STIRRUP_MM);
  const options = [
    ...(mayBeNone ? [{ value: '', label: 'no stirrups' }] : []),
    ...sizes.map((bar) => ({ value: bar.designation, label: bar.designation })),
  ];
  const change = (place: number, part: Partial<StirrupValues>) =>
    onChange(values.map((stirrup, k) => (k === place ? { ...stirrup, ...part } : stirrup)));
  const listError = errors.get(path);
  return (
    <fieldset className="grid gap-x-5 gap-y-2 border-t border-rule py-3 sm:grid-cols-[9.5rem_1fr_5.5rem] sm:items-start">
      <legend className="sr-only">Stirrups</legend>
      <div className="sm:pt-6" aria-hidden="true">
        <span className="font-medium">Stirrups</span>
        <span className="block text-xs text-muted">closed</span>
      </div>
      <div className="grid gap-2">
        {values.map((stirrup, k) => (
          <div key={k} className="flex flex-wrap items-start gap-4">
            <SelectField
              className="w-28"
              label={small('size')}
              options={options}
              value={stirrup.bar}
              error={errors.get(`${path}.${k}.bar`)}
              onChange={(event) => change(k, { bar: event.target.value })}
            />
            {stirrup.bar !== '' && (
              <>
                <NumberField
                  className="w-28"
                  label={small(stirrup.isDesigned ? 'spacing at most' : 'spacing')}
                  kind="length"
                  units={units}
                  value={stirrup.spacingMm}
                  error={errors.get(`${path}.${k}.spacingMm`)}
                  onChange={(spacingMm) => change(k, { spacingMm })}
                />
                <NumberField
                  className="w-20"
                  label={small('legs')}
                  kind="count"
                  units={units}
                  value={stirrup.legs}
                  error={errors.get(`${path}.${k}.legs`)}
                  onChange={(legs) => change(k, { legs })}
                />
                <SpacingChoice
                  className="pt-5"
                  isHintHidden
                  isDesigned={stirrup.isDesigned}
                  onChange={(isDesigned) => change(k, { isDesigned })}
                />
              </>
            )}
            {values.length > 1 && (
              <Button
                look="text"
                className="mt-5"
                aria-label={`Remove stirrup choice ${k + 1}`}
                onClick={() => onChange(values.filter((_, other) => other !== k))}
              >
                Remove
              </Button>
            )}
          </div>
        ))}
        {values.some((stirrup) => stirrup.bar !== '' && stirrup.isDesigned) && (
          <p className="text-xs text-muted">
            Designed: each section takes the widest spacing in the project’s steps that meets shear, least
            stirrups, ties and hoops.
          </p>
        )}
        {listError !== undefined && <p className="text-xs text-fails">▲ {listError}</p>}
        <div>
          <Button
            look="text"
            className="text-sm"
            onClick={() =>
              onChange([...values, values.at(-1) ?? { bar: '', legs: 2, spacingMm: null, isDesigned: false }])
            }
          >
            Add another choice
          </Button>
        </div>
      </div>
      <p className="num text-right text-muted sm:pt-6">
        {values.length} {values.length === 1 ? 'choice' : 'choices'}
      </p>
    </fieldset>
  );
}
