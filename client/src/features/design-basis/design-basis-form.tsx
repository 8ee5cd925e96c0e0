import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { designBasisSchema, UNIT_SYSTEMS, type ProjectDesignBasis } from '#shared/contract/design-basis.ts';
import {
  BAR_STANDARDS,
  BEND_ALLOWANCES,
  DISPLACED_CONCRETE,
  RULE_SET_IDS,
  YIELD_CURVATURE_AT,
} from '#shared/engine/section.ts';
import {
  barStandardLabel,
  bendAllowanceLabel,
  displacedConcreteLabel,
  optionsOf,
  ruleSetLabel,
  unitSystemLabel,
  yieldCurvatureLabel,
} from '#shared/print/basis-labels.ts';
import { placeIssues } from '#client/src/lib/form-issues.ts';
import { Button } from '#client/src/ui/button.tsx';
import { FieldGroup } from '#client/src/ui/field-group.tsx';
import { FormActions } from '#client/src/ui/form-actions.tsx';
import { FormError } from '#client/src/ui/form-error.tsx';
import { FormNumberField } from '#client/src/ui/form-number-field.tsx';
import { SelectField } from '#client/src/ui/select-field.tsx';
import { notify } from '#client/src/ui/toast.tsx';
import { useUnsavedGuard } from '#client/src/ui/use-unsaved-guard.tsx';
import { useSetDesignBasis } from './api.ts';

interface DesignBasisFormProps {
  readonly projectId: string;
  readonly basis: ProjectDesignBasis;
  readonly isReadOnly: boolean;
}

export function DesignBasisForm({ projectId, basis, isReadOnly }: DesignBasisFormProps) {
  const save = useSetDesignBasis(projectId);
  const [failure, setFailure] = useState<string | null>(null);
  const form = useForm({ resolver: zodResolver(designBasisSchema), defaultValues: basis });
  const { errors, isDirty } = form.formState;
  const guard = useUnsavedGuard(isDirty);
  const { control, register } = form;
  const units = useWatch({ control, name: 'units' });

  const submit = form.handleSubmit(async (values) => {
    setFailure(null);
    try {
      await save.mutateAsync(values);
      form.reset(values);
      notify.done('Design basis saved. Runs already made keep the one they were made with.');
    } catch (error) {
      setFailure(placeIssues(error, form.setError, (path) => path in values));
    }
  });

  return (
    <form onSubmit={(event) => void submit(event)} noValidate>
      <fieldset disabled={isReadOnly} className="min-w-0">
        <FieldGroup title="Code and units">
          <SelectField
            label="Design code"
            hint="Edition and clauses every check cites. The M editions carry their own rounded metric coefficients."
            options={optionsOf(RULE_SET_IDS, ruleSetLabel)}
            error={errors.ruleSet?.message}
            {...register('ruleSet')}
          />
          <SelectField
            label="Bar standard"
            hint="Which bar sizes exist, with their areas and masses."
            options={optionsOf(BAR_STANDARDS, barStandardLabel)}
            error={errors.barStandard?.message}
            {...register('barStandard')}
          />
          <SelectField
            label="Units"
            hint="What is typed and read in this project. Stored values do not change."
            options={optionsOf(UNIT_SYSTEMS, unitSystemLabel)}
            error={errors.units?.message}
            {...register('units')}
          />
        </FieldGroup>
        <FieldGroup title="Materials">
          <FormNumberField
            control={control}
            name="fyMPa"
            kind="stress"
            units={units}
            label="Yield strength fy"
            hint="Longitudinal bars. New sweeps start from it."
          />
          <FormNumberField
            control={control}
            name="fytMPa"
            kind="stress"
            units={units}
            label="Yield strength fyt"
            hint="Stirrups."
          />
          <FormNumberField
            control={control}
            name="esMPa"
            kind="stress"
            units={units}
            label="Steel modulus Es"
            hint="Slope of the steel’s stress–strain line up to yield."
          />
        </FieldGroup>
        <FieldGroup title="Placing the bars">
          <FormNumberField
            control={control}
            name="coverMm"
            kind="length"
            units={units}
            label="Clear cover"
            hint="From the concrete’s face to the stirrup. New sweeps start from it."
          />
          <FormNumberField
            control={control}
            name="maxAggregateMm"
            kind="length"
            units={units}
            label="Largest aggregate"
            hint="Concrete must pass between the bars: the least gap follows from it."
          />
          <FormNumberField
            control={control}
            name="slabMm"
            kind="length"
            units={units}
            label="Slab thickness"
            hint="This height of both sides needs no formwork. 0 for a free beam."
          />
          <SelectField
            label="Bars at the stirrup’s bend"
            hint="A thick bar cannot reach into the corner of a bent stirrup; leaving this out places bars a little too far apart."
            options={optionsOf(BEND_ALLOWANCES, bendAllowanceLabel)}
            {...register('bendAllowance')}
          />
        </FieldGroup>
        <FieldGroup title="Conventions of the calculation">
          <SelectField
            label="Concrete where compression bars stand"
            hint="A bar cannot share its place with concrete: its stress is reduced by that of the concrete it displaces."
            options={optionsOf(DISPLACED_CONCRETE, displacedConcreteLabel)}
            {...register('displacedConcrete')}
          />
          <SelectField
            label="Yield curvature"
            hint="Where the steel must reach fy for curvature at yield, the denominator of μφ."
            options={optionsOf(YIELD_CURVATURE_AT, yieldCurvatureLabel)}
            {...register('yieldCurvatureAt')}
          />
        </FieldGroup>
      </fieldset>
      {!isReadOnly && (
        <FormActions isDirty={isDirty}>
          <Button look="solid" type="submit" isBusy={save.isPending} disabled={!isDirty}>
            Save design basis
          </Button>
          {isDirty && (
            <Button look="text" onClick={() => form.reset(basis)}>
              Take back the changes
            </Button>
          )}
          <FormError message={failure} />
        </FormActions>
      )}
      {guard.element}
    </form>
  );
}
