import { errorUnder, type FieldErrors } from '#client/src/lib/field-errors.ts';
import { BarRack } from '#client/src/section-fields/bar-rack.tsx';
import { StirrupsField } from '#client/src/section-fields/stirrups-field.tsx';
import { CheckboxField } from '#client/src/ui/checkbox-field.tsx';
import { FieldGroup } from '#client/src/ui/field-group.tsx';
import { ListField } from '#client/src/ui/list-field.tsx';
import { NumberField } from '#client/src/ui/number-field.tsx';
import { unitLabel } from '#shared/print/units.ts';
import type { StandardValues } from './standard-values.ts';

interface StandardPartProps {
  readonly values: StandardValues;
  readonly errors: FieldErrors;
  readonly onChange: (values: StandardValues) => void;
}

/** The bar list: what the office keeps for each face, and the stirrups it bends. */
export function BarListFields({ values, errors, onChange }: StandardPartProps) {
  return (
    <FieldGroup title="Bar list" lead="Sizes the office keeps. A sweep tries every one chosen here.">
      <div className="grid gap-5 sm:col-span-2 xl:col-span-3">
        <BarRack
          legend="Tension face"
          standard={values.barStandard}
          chosen={values.tension}
          error={errorUnder(errors, 'bars.tension')}
          onChange={(tension) => onChange({ ...values, tension })}
        />
        <BarRack
          legend="Compression face"
          standard={values.barStandard}
          chosen={values.compression}
          error={errorUnder(errors, 'bars.compression')}
          onChange={(compression) => onChange({ ...values, compression })}
        />
        <StirrupsField
          units={values.units}
          standard={values.barStandard}
          values={values.stirrups}
          errors={errors}
          path="bars.stirrups"
          onChange={(stirrups) => onChange({ ...values, stirrups })}
        />
      </div>
    </FieldGroup>
  );
}

/** Mixes and the steps sizes are formed in. */
export function MixesAndStepsFields({ values, errors, onChange }: StandardPartProps) {
  const { units } = values;
  return (
    <FieldGroup
      title="Mixes and increments"
      lead="Strengths that are ordered, and the steps beams are formed in."
    >
      <ListField
        className="sm:col-span-2 xl:col-span-3"
        label="Concrete strengths"
        hint="parted by commas"
        unitText={unitLabel('stress', units)}
        value={values.mixesText}
        error={errorUnder(errors, 'mixesMPa')}
        onChange={(mixesText) => onChange({ ...values, mixesText })}
      />
      <NumberField
        label="Width b in steps of"
        kind="length"
        units={units}
        value={values.widthStepMm}
        error={errors.get('increments.widthMm')}
        onChange={(widthStepMm) => onChange({ ...values, widthStepMm })}
      />
      <NumberField
        label="Depth h in steps of"
        kind="length"
        units={units}
        value={values.depthStepMm}
        error={errors.get('increments.depthMm')}
        onChange={(depthStepMm) => onChange({ ...values, depthStepMm })}
      />
    </FieldGroup>
  );
}

/** What may be built, whatever the code allows. */
export function StandardRulesFields({ values, errors, onChange }: StandardPartProps) {
  const { rules, units } = values;
  const change = (part: Partial<StandardValues['rules']>) =>
    onChange({ ...values, rules: { ...rules, ...part } });
  const NUMBERS = [
    { key: 'maxLayers', label: 'Layers at most', hint: 'on each face', kind: 'count' },
    { key: 'minDepthToWidth', label: 'h/b at least', hint: 'empty: any', kind: 'ratio' },
    { key: 'maxDepthToWidth', label: 'h/b at most', hint: 'empty: any', kind: 'ratio' },
    { key: 'minCompressionShare', label: 'A′s/As at least', hint: 'empty: any', kind: 'percent' },
  ] as const;
  return (
    <FieldGroup title="Rules" lead="What the office builds, whatever the code allows.">
      {NUMBERS.map(({ key, label, hint, kind }) => (
        <NumberField
          key={key}
          label={label}
          hint={hint}
          kind={kind}
          units={units}
          value={rules[key]}
          error={errors.get(`rules.${key}`)}
          onChange={(value) => change({ [key]: value })}
        />
      ))}
      <CheckboxField
        label="One bar size on each face"
        checked={rules.oneSizePerFace}
        onChange={(event) => change({ oneSizePerFace: event.target.checked })}
      />
      <CheckboxField
        label="A bar on each face for every stirrup leg"
        checked={rules.requireHangers}
        onChange={(event) => change({ requireHangers: event.target.checked })}
      />
    </FieldGroup>
  );
}
