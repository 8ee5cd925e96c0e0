import { useMemo, useRef, useState } from 'react';
import { UNIT_SYSTEMS, type UnitSystem } from '#shared/contract/design-basis.ts';
import type { OfficeStandard } from '#shared/contract/office-standard.ts';
import { BAR_STANDARDS, type BarStandard } from '#shared/engine/section.ts';
import { BARS } from '#shared/engine/bars.ts';
import { barStandardLabel, optionsOf, unitSystemLabel } from '#shared/print/basis-labels.ts';
import { messageOf } from '#client/src/lib/api-error.ts';
import { errorsByField, issuesOf, type FieldErrors } from '#client/src/lib/field-errors.ts';
import { Button } from '#client/src/ui/button.tsx';
import { FieldGroup } from '#client/src/ui/field-group.tsx';
import { FormActions } from '#client/src/ui/form-actions.tsx';
import { FormError } from '#client/src/ui/form-error.tsx';
import { SelectField } from '#client/src/ui/select-field.tsx';
import { TextField } from '#client/src/ui/text-field.tsx';
import { notify } from '#client/src/ui/toast.tsx';
import { useUnsavedGuard } from '#client/src/ui/use-unsaved-guard.tsx';
import { useSaveOfficeStandard } from './api.ts';
import { BarListFields, MixesAndStepsFields, StandardRulesFields } from './bars-and-sizes-fields.tsx';
import { RangesFields } from './ranges-fields.tsx';
import {
  EMPTY_STANDARD,
  readStandard,
  standardValues,
  withBarStandard,
  withUnits,
  type StandardValues,
} from './standard-values.ts';

interface StandardFormProps {
  /** Null for a new one. */
  readonly standard: OfficeStandard | null;
  readonly isReadOnly: boolean;
  readonly onSaved: (standard: OfficeStandard) => void;
}

const NO_ERRORS: FieldErrors = new Map();

/** One standard of the office: whom it is for, what is kept, and the ranges of each kind of beam. */
export function StandardForm({ standard, isReadOnly, onSaved }: StandardFormProps) {
  const stored = useMemo(() => (standard === null ? EMPTY_STANDARD : standardValues(standard)), [standard]);
  const [values, setValues] = useState(stored);
  const [tried, setTried] = useState<StandardValues | null>(null);
  const save = useSaveOfficeStandard(standard?.id ?? null);
  const element = useRef<HTMLFormElement>(null);
  const reading = useMemo(() => readStandard(values), [values]);
  const isDirty = !isReadOnly && values !== stored;
  const guard = useUnsavedGuard(isDirty);
  // A new form is not full of complaints before anything was typed in it.
  const own =
    reading.kind === 'incomplete' && (standard !== null || tried !== null) ? reading.errors : NO_ERRORS;
  const theirs = tried === values ? errorsByField(issuesOf(save.error)) : NO_ERRORS;
  const errors = new Map([...theirs, ...own]);
  const { units, barStandard } = values;
  const part = { values, errors, onChange: setValues };

  const submit = () => {
    setTried(values);
    if (reading.kind === 'complete')
      save.mutate(reading.input, {
        onSuccess: (answer) => {
          guard.release();
          notify.done(`${answer.name} is saved. Sweeps made before keep their ranges.`);
          onSaved(answer);
        },
      });
    else
      requestAnimationFrame(() =>
        element.current?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus(),
      );
  };

  return (
    <form
      ref={element}
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      <fieldset disabled={isReadOnly} className="min-w-0">
        <FieldGroup
          title="For which projects"
          lead="Offered to sweeps of projects with these bars in these units."
        >
          <TextField
            label="Name of the standard"
            value={values.name}
            error={errors.get('name')}
            onChange={(event) => setValues({ ...values, name: event.target.value })}
          />
          <SelectField
            label="Bars"
            options={optionsOf(BAR_STANDARDS, barStandardLabel)}
            value={barStandard}
            onChange={(event) => {
              const next = event.target.value as BarStandard;
              setValues(withBarStandard(values, next, BARS[next][0]!.designation));
            }}
          />
          <SelectField
            label="Units"
            options={optionsOf(UNIT_SYSTEMS, unitSystemLabel)}
            value={units}
            onChange={(event) => setValues(withUnits(values, event.target.value as UnitSystem))}
          />
        </FieldGroup>
        <BarListFields {...part} />
        <MixesAndStepsFields {...part} />
        <FieldGroup
          title="Usual ranges"
          lead="One set for each kind of beam; each is a preset of the sweep form."
        >
          <RangesFields
            units={units}
            values={values.ranges}
            errors={errors}
            isReadOnly={isReadOnly}
            onChange={(ranges) => setValues({ ...values, ranges })}
          />
        </FieldGroup>
        <StandardRulesFields {...part} />
      </fieldset>
      {!isReadOnly && (
        <FormActions isDirty={isDirty}>
          <Button look="solid" type="submit" isBusy={save.isPending} disabled={!isDirty}>
            Save the standard
          </Button>
          {isDirty && standard !== null && (
            <Button look="text" onClick={() => setValues(stored)}>
              Take back the changes
            </Button>
          )}
          <FormError message={save.isError && tried === values ? messageOf(save.error) : null} />
        </FormActions>
      )}
      {guard.element}
    </form>
  );
}
