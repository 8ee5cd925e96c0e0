import { useMemo, useRef, useState, type ReactNode } from 'react';
import type { Project, EvaluateInput } from '#shared/contract/records.ts';
import { BARS } from '#shared/engine/bars.ts';
import type { Support } from '#shared/engine/section.ts';
import { SUPPORT_OPTIONS } from '#client/src/lib/support-options.ts';
import { messageOf } from '#client/src/lib/api-error.ts';
import { errorsByField, errorUnder, issuesOf } from '#client/src/lib/field-errors.ts';
import { Button } from '#client/src/ui/button.tsx';
import { FormError } from '#client/src/ui/form-error.tsx';
import { ListField } from '#client/src/ui/list-field.tsx';
import { NumberField } from '#client/src/ui/number-field.tsx';
import { SegmentedControl } from '#client/src/ui/segmented-control.tsx';
import { SelectField } from '#client/src/ui/select-field.tsx';
import { codeSymbols } from '#shared/print/code-symbols.ts';
import type { DisplayKind } from '#shared/print/units.ts';
import { FlangeFields } from '#client/src/section-fields/flange-fields.tsx';
import { SpacingChoice } from '#client/src/section-fields/spacing-choice.tsx';
import { ConventionFields } from './convention-fields.tsx';
import { LayersField } from './layers-field.tsx';
import { readSectionForm } from './read-section-form.ts';
import type { SectionFormValues } from './section-form-values.ts';

interface SectionFormProps {
  readonly project: Project;
  readonly initial: SectionFormValues;
  readonly isBusy: boolean;
  readonly refusal: unknown;
  readonly onEdit: (form: SectionFormValues) => void;
  readonly onEvaluate: (input: EvaluateInput) => void;
}

const STEEL_WAYS = [
  { value: 'bars', label: 'Bars' },
  { value: 'layers', label: 'Plain layers' },
] as const;

type NumberKey = {
  [K in keyof SectionFormValues]: SectionFormValues[K] extends number | null ? K : never;
}[keyof SectionFormValues];

function Part({ title, children }: { readonly title: string; readonly children: ReactNode }) {
  return (
    <section className="grid gap-4 border-t border-ink pt-2 pb-6">
      <h2 className="text-sm font-semibold">{title}</h2>
      {children}
    </section>
  );
}

/** One section typed in, by bars or exactly as printed in layers, judged when asked. */
export function SectionForm({ project, initial, isBusy, refusal, onEdit, onEvaluate }: SectionFormProps) {
  const { units, barStandard, ruleSet } = project.designBasis;
  const symbols = codeSymbols(ruleSet);
  const [form, setForm] = useState(initial);
  const [sent, setSent] = useState<SectionFormValues | null>(null);
  const [isAsked, setAsked] = useState(false);
  const element = useRef<HTMLFormElement>(null);
  const reading = useMemo(() => readSectionForm(form), [form]);
  const isRefused = refusal !== null && sent === form;
  const errors = useMemo(() => {
    if (reading.kind === 'complete') return errorsByField(isRefused ? issuesOf(refusal) : []);
    // An empty form is no mistake yet: what is missing is told once the section has been asked for.
    return isAsked ? reading.errors : errorsByField([]);
  }, [reading, refusal, isRefused, isAsked]);

  const change = (part: Partial<SectionFormValues>) => {
    const next = { ...form, ...part };
    setForm(next);
    onEdit(next);
  };
  const number = (key: NumberKey, label: string, kind: DisplayKind, path: string) => (
    <NumberField
      label={label}
      kind={kind}
      units={units}
      value={form[key]}
      error={errors.get(path)}
      onChange={(value) => change({ [key]: value })}
    />
  );
  const submit = () => {
    setAsked(true);
    if (reading.kind === 'complete') {
      setSent(form);
      onEvaluate(reading.input);
      return;
    }
    requestAnimationFrame(() =>
      element.current?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus(),
    );
  };
  const hogs = form.flange.shape !== 'none' && form.flange.face === 'tension';
  const sizes = [
    { value: '', label: 'none' },
    ...BARS[barStandard].map((bar) => ({ value: bar.designation, label: bar.designation })),
  ];

  return (
    <form
      ref={element}
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      <Part title="Concrete">
        <div className="grid grid-cols-2 gap-x-6 gap-y-4 sm:grid-cols-3">
          {number('widthMm', 'Width b', 'length', 'section.widthMm')}
          {number('depthMm', 'Depth h', 'length', 'section.depthMm')}
          {number('fcMPa', `Concrete ${symbols.fc}`, 'stress', 'section.fcMPa')}
          {number('fyMPa', `Steel ${symbols.fy}`, 'stress', 'section.fyMPa')}
          {number('coverMm', 'Clear cover', 'length', 'section.coverMm')}
        </div>
        <FlangeFields
          units={units}
          values={form.flange}
          demand={form}
          basis={project.designBasis}
          websMm={form.widthMm === null || Number.isNaN(form.widthMm) ? [] : [form.widthMm]}
          errors={errors}
          path="section.flange"
          onChange={(flange) => change({ flange })}
        />
      </Part>
      <Part title="Steel">
        <SegmentedControl
          legend="How the steel is given"
          options={STEEL_WAYS}
          value={form.steel}
          onChange={(steel) => change({ steel })}
        />
        {form.steel === 'bars' ? (
          <div className="grid gap-x-6 gap-y-4 sm:grid-cols-3">
            <ListField
              label={hogs ? 'Top bars' : 'Bottom bars'}
              hint={barStandard === 'astm' ? 'as 3-#8 or 2-#8 + 2-#6' : 'as 3-25 or 2-25 + 2-20'}
              value={form.tensionText}
              error={errorUnder(errors, 'section.reinforcement.tension')}
              onChange={(tensionText) => change({ tensionText })}
            />
            <ListField
              label={hogs ? 'Bottom bars' : 'Top bars'}
              hint="empty: none"
              value={form.compressionText}
              error={errorUnder(errors, 'section.reinforcement.compression')}
              onChange={(compressionText) => change({ compressionText })}
            />
            {number('maxLayers', 'Layers at most', 'count', 'rules.maxLayers')}
          </div>
        ) : (
          <LayersField
            units={units}
            hogs={hogs}
            layers={form.layers}
            errors={errors}
            onChange={(layers) => change({ layers })}
          />
        )}
        <div className="grid grid-cols-2 gap-x-6 gap-y-4 sm:grid-cols-3">
          <SelectField
            label="Stirrups"
            options={sizes}
            value={form.stirrupBar}
            error={errors.get('section.stirrup.bar')}
            onChange={(event) => change({ stirrupBar: event.target.value })}
          />
          {form.stirrupBar !== '' &&
            number(
              'spacingMm',
              form.isSpacingDesigned ? 'Spacing at most' : 'Spacing',
              'length',
              'section.stirrup.spacingMm',
            )}
          {form.stirrupBar !== '' && number('legs', 'Legs', 'count', 'section.stirrup.legs')}
        </div>
        {form.stirrupBar !== '' && (
          <SpacingChoice
            isDesigned={form.isSpacingDesigned}
            onChange={(isSpacingDesigned) => change({ isSpacingDesigned })}
          />
        )}
      </Part>
      <Part title="What it must do">
        <div className="grid grid-cols-2 gap-x-6 gap-y-4 sm:grid-cols-3">
          {number('muNmm', `Moment ${symbols.moment}`, 'moment', 'demand.muNmm')}
          {number('ductilityTarget', 'Ductility μφ at least', 'ratio', 'demand.ductilityTarget')}
          {number('depthCapMm', 'Depth h at most', 'length', 'demand.depthCapMm')}
          {number('vuN', `Shear ${symbols.shear}`, 'force', 'demand.vuN')}
          {number('spanMm', 'Span', 'span', 'demand.spanMm')}
          <SelectField
            label="Span is held"
            options={SUPPORT_OPTIONS}
            value={form.support ?? ''}
            error={errors.get('demand.support')}
            onChange={(event) => change({ support: (event.target.value || null) as Support | null })}
          />
        </div>
      </Part>
      <Part title="Conventions">
        <ConventionFields values={form} onChange={change} />
      </Part>
      <div className="grid gap-3">
        {isRefused && <FormError message={messageOf(refusal)} />}
        <div className="flex flex-wrap items-center gap-4">
          <Button look="solid" type="submit" isBusy={isBusy}>
            Evaluate
          </Button>
          {sent !== null && sent !== form && (
            <p className="text-sm text-near">△ Changed since: the result beside is of the section before.</p>
          )}
        </div>
      </div>
    </form>
  );
}
