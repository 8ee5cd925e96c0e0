import { SelectField } from '#client/src/ui/select-field.tsx';
import { BEND_ALLOWANCES, DISPLACED_CONCRETE, YIELD_CURVATURE_AT } from '#shared/engine/section.ts';
import type { SectionFormValues } from './section-form-values.ts';

type Conventions = Pick<SectionFormValues, 'displacedConcrete' | 'yieldCurvatureAt' | 'bendAllowance'>;

const DISPLACED_LABEL = {
  deduct: 'deducted inside the block',
  'deduct-above-axis': 'deducted above the neutral axis',
  ignore: 'not deducted',
} as const;
const YIELD_LABEL = {
  'outermost-layer': 'outermost tension layer',
  centroid: 'centroid of the tension steel',
} as const;
const BEND_LABEL = { 'corner-in-bend': 'corner bars in the bend', none: 'no bend allowance' } as const;

interface ConventionFieldsProps {
  readonly values: Conventions;
  readonly onChange: (part: Partial<Conventions>) => void;
}

const optionsOf = <V extends string>(values: readonly V[], labels: Readonly<Record<V, string>>) =>
  values.map((value) => ({ value, label: labels[value] }));

/** The conventions a printed example may have used; the project's own until changed here. */
export function ConventionFields({ values, onChange }: ConventionFieldsProps) {
  return (
    <div className="grid gap-x-8 gap-y-4 sm:grid-cols-3 xl:grid-cols-1">
      <SelectField
        label="Displaced concrete"
        options={optionsOf(DISPLACED_CONCRETE, DISPLACED_LABEL)}
        value={values.displacedConcrete}
        onChange={(event) =>
          onChange({ displacedConcrete: event.target.value as Conventions['displacedConcrete'] })
        }
      />
      <SelectField
        label="Yield curvature at"
        options={optionsOf(YIELD_CURVATURE_AT, YIELD_LABEL)}
        value={values.yieldCurvatureAt}
        onChange={(event) =>
          onChange({ yieldCurvatureAt: event.target.value as Conventions['yieldCurvatureAt'] })
        }
      />
      <SelectField
        label="Stirrup bend"
        options={optionsOf(BEND_ALLOWANCES, BEND_LABEL)}
        value={values.bendAllowance}
        onChange={(event) => onChange({ bendAllowance: event.target.value as Conventions['bendAllowance'] })}
      />
    </div>
  );
}
