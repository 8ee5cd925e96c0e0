import { zodResolver } from '@hookform/resolvers/zod';
import { useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import {
  savedDesignBasisSchema,
  UNIT_SYSTEMS,
  type ProjectDesignBasis,
} from '#shared/contract/design-basis.ts';
import {
  BAR_STANDARDS,
  BEND_ALLOWANCES,
  RULE_SET_IDS,
  type BarStandard,
  type RuleSetId,
} from '#shared/engine/section.ts';
import {
  barStandardLabel,
  bendAllowanceLabel,
  optionsOf,
  ruleSetLabel,
  unitSystemLabel,
} from '#shared/print/basis-labels.ts';
import { codeSymbols } from '#shared/print/code-symbols.ts';
import { FieldGroup } from '#client/src/ui/field-group.tsx';
import { FormNumberField } from '#client/src/ui/form-number-field.tsx';
import { RecordForm } from '#client/src/ui/record-form.tsx';
import { SelectField } from '#client/src/ui/select-field.tsx';
import { useSetDesignBasis } from './api.ts';
import { basisFormValues, withCode, withStandard } from './basis-form-values.ts';
import { DetailingGroup } from './detailing-group.tsx';
import { DuctilityGroup } from './ductility-group.tsx';
import { NationalValuesGroup } from './national-values-group.tsx';

interface DesignBasisFormProps {
  readonly projectId: string;
  readonly basis: ProjectDesignBasis;
  readonly isReadOnly: boolean;
}

export function DesignBasisForm({ projectId, basis, isReadOnly }: DesignBasisFormProps) {
  const save = useSetDesignBasis(projectId);
  const [stored] = useState(() => basisFormValues(basis));
  const form = useForm<ProjectDesignBasis>({
    resolver: zodResolver(savedDesignBasisSchema),
    defaultValues: stored,
  });
  const { control, register } = form;
  const { errors } = form.formState;
  const [units, ruleSet] = useWatch({ control, name: ['units', 'ruleSet'] });
  const symbols = codeSymbols(ruleSet);
  const codeField = register('ruleSet');
  const standardField = register('barStandard');
  /** Sets what a choice brings along, as if each had been chosen. */
  const follow = (part: Partial<ProjectDesignBasis>) => {
    for (const [key, value] of Object.entries(part))
      form.setValue(key as keyof ProjectDesignBasis, value, { shouldDirty: true });
  };

  return (
    <RecordForm
      form={form}
      stored={basisFormValues(basis)}
      isReadOnly={isReadOnly}
      isSaving={save.isPending}
      saveText="Save design basis"
      savedText="Design basis saved. Runs already made keep the one they were made with."
      onSave={save.mutateAsync}
    >
      <FieldGroup title="Code and units">
        <SelectField
          label="Design code"
          hint="Edition and clauses every check cites. The M editions carry their own rounded metric coefficients."
          options={optionsOf(RULE_SET_IDS, ruleSetLabel)}
          error={errors.ruleSet?.message}
          {...codeField}
          onChange={(event) => {
            follow(withCode(form.getValues(), event.target.value as RuleSetId));
            void codeField.onChange(event);
          }}
        />
        <SelectField
          label="Bar standard"
          hint="Which bar sizes exist, with their areas and masses."
          options={optionsOf(BAR_STANDARDS, barStandardLabel)}
          error={errors.barStandard?.message}
          {...standardField}
          onChange={(event) => {
            follow(withStandard(form.getValues(), event.target.value as BarStandard));
            void standardField.onChange(event);
          }}
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
          label={`Yield strength ${symbols.fy}`}
          hint="Longitudinal bars. New sweeps start from it."
        />
        <FormNumberField
          control={control}
          name="fytMPa"
          kind="stress"
          units={units}
          label={`Yield strength ${symbols.fyt}`}
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
      <DetailingGroup form={form} />
      <DuctilityGroup form={form} />
      {ruleSet === 'en1992' && <NationalValuesGroup form={form} />}
    </RecordForm>
  );
}
