import { useWatch, type UseFormReturn } from 'react-hook-form';
import type { ProjectDesignBasis } from '#shared/contract/design-basis.ts';
import { BARS } from '#shared/engine/bars.ts';
import { ruleSetOf } from '#shared/engine/rules/rule-set-of.ts';
import { seismicSystemsOf } from '#shared/engine/seismic.ts';
import { leastStirrupSpacingMm, stirrupStepMm } from '#shared/engine/stirrup-design.ts';
import { optionsOf } from '#shared/print/basis-labels.ts';
import { seismicSystemLabel } from '#shared/print/ductility-labels.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { FieldGroup } from '#client/src/ui/field-group.tsx';
import { FormNumberField } from '#client/src/ui/form-number-field.tsx';
import { SelectField } from '#client/src/ui/select-field.tsx';

/** Side bars of beams are small; thicker ones count in strength in every office. */
const LARGEST_SKIN_BAR_MM = 20;

/** A basis from before side bars were checked says nothing of them until a size is chosen. */
const NOT_CHECKED = 'not-checked';
const NONE = 'none';

/** What stirrups, side bars and hoops are built by. */
export function DetailingGroup({ form }: { readonly form: UseFormReturn<ProjectDesignBasis> }) {
  const { control, register, formState } = form;
  const [units, ruleSet, barStandard, skinBar] = useWatch({
    control,
    name: ['units', 'ruleSet', 'barStandard', 'skinBar'],
  });
  const rules = ruleSetOf({ ruleSet });
  const shown = (mm: number) => formatQuantity(mm, 'length', units, { hideUnit: true });
  const sizes = BARS[barStandard].filter((bar) => bar.diameterMm <= LARGEST_SKIN_BAR_MM);
  return (
    <FieldGroup title="Stirrups, side bars, seismic">
      <FormNumberField
        control={control}
        name="stirrupStepMm"
        isOptional
        kind="length"
        units={units}
        label="Step of stirrup spacings"
        placeholder={shown(stirrupStepMm({}, rules.units))}
        hint="Designed spacings are multiples of it. Empty: the number shown."
      />
      <FormNumberField
        control={control}
        name="leastStirrupSpacingMm"
        isOptional
        kind="length"
        units={units}
        label="Closest stirrups"
        placeholder={shown(leastStirrupSpacingMm({}, rules.units))}
        hint="Closer ones are not built: the section fails. Empty: the number shown."
      />
      <SelectField
        label="Side bars of deep beams"
        hint={`${rules.clauses.skinSteel}. They count in weight, not in strength.`}
        options={[
          ...(skinBar === undefined ? [{ value: NOT_CHECKED, label: 'not checked' }] : []),
          { value: NONE, label: 'none: deep beams fail' },
          ...sizes.map(({ designation }) => ({ value: designation, label: designation })),
        ]}
        error={formState.errors.skinBar?.message}
        value={skinBar === undefined ? NOT_CHECKED : (skinBar ?? NONE)}
        onChange={({ target }) =>
          form.setValue('skinBar', target.value === NONE ? null : target.value, { shouldDirty: true })
        }
      />
      <SelectField
        label="Seismic system"
        hint="Of the frame the beams belong to. Its detailing is then checked."
        options={optionsOf(seismicSystemsOf(rules), seismicSystemLabel)}
        error={formState.errors.seismicSystem?.message}
        {...register('seismicSystem')}
      />
      <FormNumberField
        control={control}
        name="barOversize"
        isOptional
        kind="ratio"
        units={units}
        label="Outside of a bar over its name"
        placeholder="1"
        hint="Deformations make bars 1.10 to 1.18 times as thick where they are fitted. Empty: as named."
      />
    </FieldGroup>
  );
}
