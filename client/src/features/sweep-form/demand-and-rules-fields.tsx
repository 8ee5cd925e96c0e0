import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { CodeSymbols } from '#shared/engine/rules/code-symbols.ts';
import type { BarStandard, Support } from '#shared/engine/section.ts';
import { SUPPORT_OPTIONS } from '#client/src/lib/support-options.ts';
import { CheckboxField } from '#client/src/ui/checkbox-field.tsx';
import { SelectField } from '#client/src/ui/select-field.tsx';
import { NumberField } from '#client/src/ui/number-field.tsx';
import { BarRack } from '#client/src/section-fields/bar-rack.tsx';
import { errorUnder, type FieldErrors } from '#client/src/lib/field-errors.ts';
import type { SweepFormValues } from './sweep-form-values.ts';

interface PartProps<Part> {
  readonly units: UnitSystem;
  readonly values: Part;
  readonly errors: FieldErrors;
  readonly onChange: (values: Part) => void;
}

interface DemandProps extends PartProps<SweepFormValues['demand']> {
  readonly symbols: CodeSymbols;
  /** Tension at the top. */
  readonly hogs: boolean;
}

/** What the section must do; taken from the beam, to be changed for this sweep only. */
export function DemandFields({ units, symbols, hogs, values, errors, onChange }: DemandProps) {
  return (
    <div className="grid grid-cols-2 gap-x-8 gap-y-4 md:grid-cols-3">
      <NumberField
        label={`Moment ${symbols.moment}`}
        hint={hogs ? 'factored, hogging' : 'factored, sagging'}
        kind="moment"
        units={units}
        value={values.muNmm}
        error={errors.get('demand.muNmm')}
        onChange={(muNmm) => onChange({ ...values, muNmm })}
      />
      <NumberField
        label="Ductility μφ at least"
        hint="empty: not asked for"
        kind="ratio"
        units={units}
        value={values.ductilityTarget}
        error={errors.get('demand.ductilityTarget')}
        onChange={(ductilityTarget) => onChange({ ...values, ductilityTarget })}
      />
      <NumberField
        label="Depth h at most"
        hint="empty: no cap"
        kind="length"
        units={units}
        value={values.depthCapMm}
        error={errors.get('demand.depthCapMm')}
        onChange={(depthCapMm) => onChange({ ...values, depthCapMm })}
      />
      <NumberField
        label={`Shear ${symbols.shear}`}
        hint="empty: not asked for"
        kind="force"
        units={units}
        value={values.vuN ?? null}
        error={errors.get('demand.vuN')}
        onChange={(vuN) => onChange({ ...values, vuN })}
      />
      <NumberField
        label="Span"
        hint="for the least depth and the slab"
        kind="span"
        units={units}
        value={values.spanMm ?? null}
        error={errors.get('demand.spanMm')}
        onChange={(spanMm) => onChange({ ...values, spanMm })}
      />
      <SelectField
        label="Span is held"
        hint="for the least depth"
        options={SUPPORT_OPTIONS}
        value={values.support ?? ''}
        error={errors.get('demand.support')}
        onChange={(event) => onChange({ ...values, support: (event.target.value || null) as Support | null })}
      />
    </div>
  );
}

interface RulesProps extends PartProps<SweepFormValues['rules']> {
  readonly standard: BarStandard;
}

/** The office's own rules: what may be built, whatever the code allows. */
export function RulesFields({ units, standard, values, errors, onChange }: RulesProps) {
  const number = (key: keyof SweepFormValues['rules']) => errors.get(`rules.${key}`);
  return (
    <div className="grid gap-5">
      <div className="grid grid-cols-2 gap-x-8 gap-y-4 md:grid-cols-3">
        <NumberField
          label="Layers at most"
          hint="on each face"
          kind="count"
          units={units}
          value={values.maxLayers}
          error={number('maxLayers')}
          onChange={(maxLayers) => onChange({ ...values, maxLayers })}
        />
        <NumberField
          label="h/b at least"
          hint="empty: any"
          kind="ratio"
          units={units}
          value={values.minDepthToWidth}
          error={number('minDepthToWidth')}
          onChange={(minDepthToWidth) => onChange({ ...values, minDepthToWidth })}
        />
        <NumberField
          label="h/b at most"
          hint="empty: any"
          kind="ratio"
          units={units}
          value={values.maxDepthToWidth}
          error={number('maxDepthToWidth')}
          onChange={(maxDepthToWidth) => onChange({ ...values, maxDepthToWidth })}
        />
        <NumberField
          label="As wide as a column of"
          hint="empty: any width"
          kind="length"
          units={units}
          value={values.columnWidthMm}
          error={number('columnWidthMm')}
          onChange={(columnWidthMm) => onChange({ ...values, columnWidthMm })}
        />
        <NumberField
          label="Compression steel A′s/As at least"
          hint="empty: any"
          kind="percent"
          units={units}
          value={values.minCompressionShare}
          error={number('minCompressionShare')}
          onChange={(minCompressionShare) => onChange({ ...values, minCompressionShare })}
        />
      </div>
      <div className="flex flex-wrap gap-x-8 gap-y-2">
        <CheckboxField
          label="One bar size on each face"
          checked={values.oneSizePerFace}
          onChange={(event) => onChange({ ...values, oneSizePerFace: event.target.checked })}
        />
        <CheckboxField
          label="A bar on each face for every stirrup leg"
          checked={values.requireHangers}
          onChange={(event) => onChange({ ...values, requireHangers: event.target.checked })}
        />
      </div>
      <BarRack
        legend="Sizes never used"
        standard={standard}
        chosen={values.excludedBars}
        error={errorUnder(errors, 'rules.excludedBars')}
        onChange={(excludedBars) => onChange({ ...values, excludedBars })}
      />
    </div>
  );
}
