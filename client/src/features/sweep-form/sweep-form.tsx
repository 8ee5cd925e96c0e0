import { useEffect, useMemo, useRef, useState, type ReactNode } from 'react';
import type { Project, RunSummary } from '#shared/contract/records.ts';
import { codeSymbols } from '#shared/print/code-symbols.ts';
import { sizeRefusal } from '#shared/sweep/size-limit.ts';
import { messageOf } from '#client/src/lib/api-error.ts';
import { preloadChart } from '#client/src/charts/chart.tsx';
import { Button } from '#client/src/ui/button.tsx';
import { FormError } from '#client/src/ui/form-error.tsx';
import { TextField } from '#client/src/ui/text-field.tsx';
import { askedInVain } from './asked-in-vain.ts';
import { DemandFields, RulesFields } from './demand-and-rules-fields.tsx';
import { FORM_ROOT, readSweepForm, type SweepInput } from './read-sweep-form.ts';
import { errorsByField, issuesOf } from '#client/src/lib/field-errors.ts';
import { FirstView } from './first-view.tsx';
import type { OfficePreset } from './office-preset.ts';
import { PresetField } from './preset-field.tsx';
import { SpaceFields } from './space-fields.tsx';
import { SpaceTally } from './space-tally.tsx';
import type { SweepFormValues } from './sweep-form-values.ts';

export interface SweepFormProps {
  readonly project: Project;
  readonly initial: SweepFormValues;
  readonly runs: readonly RunSummary[];
  /** What the form can be filled from; null where the reader fills none. */
  readonly presets: readonly OfficePreset[] | null;
  readonly isBusy: boolean;
  /** What the service answered to the last attempt; null after success or before any. */
  readonly refusal: unknown;
  readonly mayRun: boolean;
  readonly onEdit: (form: SweepFormValues) => void;
  readonly onSave: (input: SweepInput) => void;
  readonly onRun: (input: SweepInput) => void;
  readonly secondary?: ReactNode;
}

/** A form's part: its name in the margin, its fields beside it. */
function Part({ title, children }: { readonly title: string; readonly children: ReactNode }) {
  return (
    <section className="border-t border-ink pt-2 pb-7">
      <h2 className="pb-2 text-sm font-semibold">{title}</h2>
      {children}
    </section>
  );
}

/** The design space of a sweep, its targets and rules. Everything typed is kept whatever happens. */
export function SweepForm(props: SweepFormProps) {
  const { project, initial, runs, presets, isBusy, refusal, mayRun, onEdit, onSave, onRun } = props;
  const { units, barStandard } = project.designBasis;
  const [form, setForm] = useState(initial);
  const [answered, setAnswered] = useState<SweepFormValues | null>(null);
  const element = useRef<HTMLFormElement>(null);
  const reading = useMemo(() => readSweepForm(form, units), [form, units]);
  useEffect(preloadChart, []);

  const size =
    reading.kind === 'complete' ? sizeRefusal(reading.input.definition, project.designBasis) : null;
  const errors = useMemo(() => {
    const own = reading.kind === 'incomplete' ? reading.errors : errorsByField(size?.issues ?? []);
    const theirs = errorsByField(answered === form ? issuesOf(refusal) : [], FORM_ROOT);
    return new Map([...theirs, ...own]);
  }, [reading, size, refusal, answered, form]);

  const change = (next: SweepFormValues) => {
    setForm(next);
    onEdit(next);
  };
  const submit = (send: (input: SweepInput) => void) => {
    if (reading.kind === 'complete' && size === null) {
      setAnswered(form);
      send(reading.input);
      return;
    }
    element.current?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus();
  };
  const vain = useMemo(() => askedInVain(form, units), [form, units]);
  const isRefused = refusal !== null && answered === form;

  return (
    <form
      ref={element}
      noValidate
      className="grid gap-x-12 lg:grid-cols-[minmax(0,1fr)_18rem]"
      onSubmit={(event) => {
        event.preventDefault();
        submit(mayRun ? onRun : onSave);
      }}
    >
      <div className="min-w-0">
        <TextField
          className="max-w-md pb-6"
          label="Name of the sweep"
          value={form.name}
          error={errors.get('name')}
          onChange={(event) => change({ ...form, name: event.target.value })}
        />
        <Part title="What it must do">
          <DemandFields
            units={units}
            symbols={codeSymbols(project.designBasis.ruleSet)}
            hogs={form.flange.shape !== 'none' && form.flange.face === 'tension'}
            values={form.demand}
            errors={errors}
            onChange={(demand) => change({ ...form, demand })}
          />
        </Part>
        <Part title="What may vary">
          {presets !== null && <PresetField presets={presets} units={units} form={form} onChange={change} />}
          <SpaceFields
            units={units}
            basis={project.designBasis}
            form={form}
            errors={errors}
            onChange={change}
          />
        </Part>
        <Part title="What to compare first">
          <FirstView
            project={project}
            reading={reading}
            view={form.view}
            errors={errors}
            onChange={(view) => change({ ...form, view })}
          />
        </Part>
        <Part title="What the office builds">
          <RulesFields
            units={units}
            standard={barStandard}
            values={form.rules}
            errors={errors}
            onChange={(rules) => change({ ...form, rules })}
          />
        </Part>
      </div>
      <aside
        className="border-t border-ink pt-3 lg:sticky lg:top-4 lg:self-start"
        aria-label="Size of the space"
      >
        <SpaceTally
          project={project}
          reading={reading}
          runs={runs}
          onMethod={(method) => change({ ...form, method })}
        />
        {vain.length > 0 && (
          <ul className="mt-3 grid gap-1 border-l-2 border-near-mark py-0.5 pl-3 text-sm text-near">
            {vain.map((words) => (
              <li key={words}>△ {words}.</li>
            ))}
          </ul>
        )}
        <div className="mt-6 grid gap-3">
          {isRefused && <FormError message={messageOf(refusal)} />}
          <div className="flex flex-wrap gap-3">
            {mayRun && (
              <Button look="solid" type="submit" isBusy={isBusy}>
                Run
              </Button>
            )}
            {mayRun && (
              <Button isBusy={isBusy} onClick={() => submit(onSave)}>
                Save
              </Button>
            )}
            {props.secondary}
          </div>
          {!mayRun && (
            <p className="text-sm text-muted">Your role reads sweeps; engineers change and run them.</p>
          )}
        </div>
      </aside>
    </form>
  );
}
