import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { DesignBasis } from '#shared/engine/section.ts';
import type { FieldErrors } from '#client/src/lib/field-errors.ts';
import { FlangeFields } from '#client/src/section-fields/flange-fields.tsx';
import { axisEnds } from './space-estimate.ts';
import type { SweepFormValues } from './sweep-form-values.ts';

interface SlabFieldProps {
  readonly units: UnitSystem;
  readonly basis: Pick<DesignBasis, 'ruleSet'>;
  readonly form: SweepFormValues;
  readonly errors: FieldErrors;
  readonly onChange: (form: SweepFormValues) => void;
}

/** The slab every section of the space works with; its effective width follows each web. */
export function SlabField({ units, basis, form, errors, onChange }: SlabFieldProps) {
  return (
    <fieldset className="grid gap-x-5 gap-y-2 border-t border-rule py-3 sm:grid-cols-[9.5rem_minmax(0,1fr)] sm:items-start">
      <legend className="sr-only">Slab</legend>
      <div aria-hidden="true">
        <span className="font-medium">Slab</span>
        <span className="block text-xs text-muted">the same for all</span>
      </div>
      <FlangeFields
        units={units}
        values={form.flange}
        demand={form.demand}
        basis={basis}
        websMm={axisEnds(form.axes.width, 'width', units)}
        errors={errors}
        path="space.flange"
        onChange={(flange) => onChange({ ...form, flange })}
      />
    </fieldset>
  );
}
