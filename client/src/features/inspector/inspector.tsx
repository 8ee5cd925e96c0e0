import { useState, type ReactNode } from 'react';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { EvaluationContext } from '#shared/engine/evaluate.ts';
import type { Evaluation } from '#shared/engine/evaluation.ts';
import type { BarStandard, SectionInput } from '#shared/engine/section.ts';
import { SectionDrawing } from '#client/src/drawing/section-drawing.tsx';
import { codeSymbols } from '#shared/print/code-symbols.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { quantitiesInText } from '#shared/print/quantities-in-text.ts';
import { sizeText, steelText, stirrupText } from '#shared/print/section-text.ts';
import type { Space } from '#shared/sweep/problem.ts';
import { LazySectionStudy } from '#client/src/study/lazy-section-study.tsx';
import { Fold } from '#client/src/ui/fold.tsx';
import { SegmentedControl } from '#client/src/ui/segmented-control.tsx';
import { BuiltSteelNote } from '#client/src/sheet/built-steel-note.tsx';
import { LimitsNote } from '#client/src/sheet/limits-note.tsx';
import { CheckList } from './check-list.tsx';
import { DuctilityNote } from './ductility-note.tsx';
import { QuantitiesList } from './quantities-list.tsx';
import { WorkingLines } from './working-lines.tsx';

export interface InspectorProps {
  readonly section: SectionInput;
  readonly evaluation: Evaluation;
  readonly standard: BarStandard;
  readonly units: UnitSystem;
  /** What the section was judged by, the same object while it is the same: with it, what lies behind the checks is shown. */
  readonly context?: EvaluationContext | undefined;
  /** The space the section was swept in, and the way to another of its sections. */
  readonly space?: Space | undefined;
  readonly onSelect?: ((index: number) => void) | undefined;
  /** Pinning, links: whatever the page offers on a section. */
  readonly actions?: ReactNode;
  readonly areWorkingLinesOpen?: boolean;
}

const FIGURES = [
  { value: '3', label: '3' },
  { value: '4', label: '4' },
  { value: '5', label: '5' },
] as const;
type Figures = (typeof FIGURES)[number]['value'];

/** Why the bars cannot be placed and the width at which they could; empty where they can. */
function misfitWords({ arrangement }: Evaluation, units: UnitSystem): string {
  if (arrangement === null || arrangement.fits) return '';
  const needed = Math.max(
    ...arrangement.faces.filter((face) => !face.fits).map((face) => face.widthNeededMm),
    0,
  );
  const width = needed > 0 ? `; b of ${formatQuantity(needed, 'length', units)} would do` : '';
  return `${quantitiesInText(arrangement.reason, units)}${width}`;
}

function VerdictLine({ evaluation, units }: { readonly evaluation: Evaluation; readonly units: UnitSystem }) {
  const failing = evaluation.checks.filter((check) => !check.passes).length;
  if (evaluation.meetsListedChecks)
    return <p className="font-medium text-meets">✓ Meets the listed checks</p>;
  const reason = misfitWords(evaluation, units);
  return (
    <div className="text-fails">
      <p className="font-medium">
        ✕ Fails {failing} of {evaluation.checks.length} listed{' '}
        {evaluation.checks.length === 1 ? 'check' : 'checks'}
      </p>
      {reason !== '' && <p className="text-sm">{reason}</p>}
    </div>
  );
}

/** One section, completely: drawn, checked, measured, worked out, with what nobody has checked. */
export function Inspector(props: InspectorProps) {
  const { section, evaluation, standard, units, actions } = props;
  const [figures, setFigures] = useState<Figures>('3');
  const digits = Number(figures);
  const symbols = codeSymbols(evaluation.ruleSet.id);
  const stress = (mpa: number) => formatQuantity(mpa, 'stress', units);
  return (
    <article className="@container" aria-label={`Section ${sizeText(section, units)}`}>
      <div className="grid items-start gap-x-10 gap-y-4 @3xl:grid-cols-2">
        <div className="grid min-w-0 gap-4">
          <header>
            <h2 className="flex flex-wrap items-baseline gap-x-3">
              <span className="text-xl font-semibold">{sizeText(section, units)}</span>
              <span className="num text-base text-steel">{steelText(section, units)}</span>
            </h2>
            <p className="text-sm text-muted">
              {symbols.fc} {stress(section.fcMPa)}, {symbols.fy} {stress(section.fyMPa)}, stirrups{' '}
              {stirrupText(evaluation.stirrups ?? section.stirrup, units)}
            </p>
            <BuiltSteelNote section={section} evaluation={evaluation} units={units} />
          </header>
          <div className="flex justify-center">
            <SectionDrawing
              variant="large"
              section={section}
              evaluation={evaluation}
              standard={standard}
              units={units}
            />
          </div>
          <VerdictLine evaluation={evaluation} units={units} />
          {actions}
        </div>
        <div className="grid min-w-0 gap-4">
          <section>
            <div className="flex flex-wrap items-center justify-between gap-2 pb-2">
              <h3 className="text-sm font-semibold">
                Checks <span className="font-normal text-muted">{evaluation.ruleSet.title}</span>
              </h3>
              <div className="flex items-center gap-2 text-xs text-muted">
                <span aria-hidden="true">figures</span>
                <SegmentedControl
                  legend="Significant figures"
                  options={FIGURES}
                  value={figures}
                  onChange={setFigures}
                />
              </div>
            </div>
            <CheckList
              checks={evaluation.checks}
              units={units}
              code={evaluation.ruleSet.id}
              digits={Math.max(digits, 3)}
            />
          </section>
          <div>
            <Fold title="Ductility and its convention" isOpen>
              <DuctilityNote evaluation={evaluation} units={units} digits={digits} />
            </Fold>
            <Fold title={units === 'us' ? 'Quantities per foot' : 'Quantities per metre'}>
              <QuantitiesList
                section={section}
                quantities={evaluation.quantities}
                units={units}
                digits={digits}
              />
            </Fold>
          </div>
        </div>
      </div>
      {props.context !== undefined && (
        <LazySectionStudy
          section={section}
          evaluation={evaluation}
          context={props.context}
          units={units}
          isMoneyHidden={props.context.basis.rates === null}
          space={props.space ?? null}
          onSelect={props.onSelect}
          part={({ id, title, body }) => (
            <Fold key={id} title={title}>
              {body}
            </Fold>
          )}
        />
      )}
      {evaluation.working.length > 0 && (
        <Fold title="Working, line by line" isOpen={props.areWorkingLinesOpen === true}>
          <div className="gap-x-10 @3xl:columns-2">
            <WorkingLines steps={evaluation.working} units={units} digits={digits} />
          </div>
        </Fold>
      )}
      <div className="border-t border-ink pt-3">
        <LimitsNote evaluation={evaluation} />
      </div>
    </article>
  );
}
