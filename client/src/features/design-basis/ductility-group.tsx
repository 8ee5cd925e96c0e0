import { useWatch, type UseFormReturn } from 'react-hook-form';
import type { ProjectDesignBasis } from '#shared/contract/design-basis.ts';
import { curveChoicesOf } from '#shared/engine/curve-basis.ts';
import {
  CONCRETE_LAW_IDS,
  STEEL_LAW_IDS,
  type ConcreteLawId,
  type CurveChoices,
  type SteelLawId,
} from '#shared/engine/curve-choices.ts';
import {
  DISPLACED_CONCRETE,
  DUCTILITY_MEASURES,
  YIELD_CURVATURE_AT,
  type DuctilityMeasure,
} from '#shared/engine/section.ts';
import { displacedConcreteLabel, optionsOf, yieldCurvatureLabel } from '#shared/print/basis-labels.ts';
import { concreteLawLabel, ductilityMeasureLabel, steelLawLabel } from '#shared/print/ductility-labels.ts';
import { CheckboxField } from '#client/src/ui/checkbox-field.tsx';
import { FieldGroup } from '#client/src/ui/field-group.tsx';
import { SelectField } from '#client/src/ui/select-field.tsx';

/** The code's own law, whatever it is. */
const OF_THE_CODE = '';

/** How ductility is measured, and by which laws the full curve is drawn. */
export function DuctilityGroup({ form }: { readonly form: UseFormReturn<ProjectDesignBasis> }) {
  const { control, register, setValue } = form;
  const basis = useWatch({ control }) as ProjectDesignBasis;
  const measure: DuctilityMeasure = basis.ductilityMeasure ?? 'closed';
  const codeLaw = curveChoicesOf({ ...basis, curve: undefined, rates: null }).concreteLaw;
  const { curve } = basis;
  const laws: CurveChoices = curve ?? { concreteLaw: codeLaw, steelLaw: 'elastic-plastic' };
  const setLaws = (next: CurveChoices | undefined) => setValue('curve', next, { shouldDirty: true });
  return (
    <FieldGroup
      title="Conventions of the calculation"
      lead="μφ depends on what is called yield and what is called the end. Whatever is chosen is printed beside every μφ."
    >
      <SelectField
        label="μφ is measured by"
        hint={ductilityMeasureLabel(measure).meaning}
        options={optionsOf(DUCTILITY_MEASURES, (id) => ductilityMeasureLabel(id).label)}
        {...register('ductilityMeasure')}
      />
      <SelectField
        label="Yield curvature"
        hint="Where the steel must reach fy for curvature at yield, the denominator of μφ."
        options={optionsOf(YIELD_CURVATURE_AT, yieldCurvatureLabel)}
        {...register('yieldCurvatureAt')}
      />
      <SelectField
        label="Concrete where compression bars stand"
        hint="A bar cannot share its place with concrete: its stress is reduced by that of the concrete it displaces."
        options={optionsOf(DISPLACED_CONCRETE, displacedConcreteLabel)}
        {...register('displacedConcrete')}
      />
      <SelectField
        label="Concrete of the full curve"
        hint={concreteLawLabel(laws.concreteLaw).meaning}
        options={[
          { value: OF_THE_CODE, label: `As for the code: ${concreteLawLabel(codeLaw).label}` },
          ...optionsOf(CONCRETE_LAW_IDS, (id) => concreteLawLabel(id).label),
        ]}
        value={curve?.concreteLaw ?? OF_THE_CODE}
        onChange={({ target }) =>
          setLaws(
            target.value === OF_THE_CODE
              ? undefined
              : { ...laws, concreteLaw: target.value as ConcreteLawId },
          )
        }
      />
      <SelectField
        label="Steel of the full curve"
        hint={steelLawLabel(laws.steelLaw).meaning}
        options={optionsOf(STEEL_LAW_IDS, (id) => steelLawLabel(id).label)}
        value={laws.steelLaw}
        onChange={({ target }) => setLaws({ ...laws, steelLaw: target.value as SteelLawId })}
      />
      <CheckboxField
        className="self-end"
        label="Draw tension before cracking"
        hint="The stiff branch up to the first crack; μφ is not changed by it."
        checked={laws.hasTensionBeforeCracking === true}
        onChange={({ target }) =>
          setLaws({ ...laws, hasTensionBeforeCracking: target.checked ? true : undefined })
        }
      />
    </FieldGroup>
  );
}
