import { useMemo } from 'react';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { SectionDrawing } from '#client/src/drawing/section-drawing.tsx';
import { sizeText, steelText } from '#shared/print/section-text.ts';
import { BuiltSteelNote } from '#client/src/sheet/built-steel-note.tsx';
import { CheckTable } from '#client/src/sheet/check-table.tsx';
import { LimitsNote } from '#client/src/sheet/limits-note.tsx';
import { QuantitiesTable } from '#client/src/sheet/quantities-table.tsx';
import { TakeoffTable } from '#client/src/sheet/takeoff-table.tsx';
import { WorkingTable } from '#client/src/sheet/working-table.tsx';
import { LazySectionStudy } from '#client/src/study/lazy-section-study.tsx';
import { Fold } from '#client/src/ui/fold.tsx';
import type { ShownCandidate } from './comparison.ts';
import { FrozenInputs } from './frozen-inputs.tsx';

interface CandidateSheetProps {
  readonly candidate: ShownCandidate;
  readonly units: UnitSystem;
  readonly hasMoney: boolean;
}

/** The body of a candidate: drawing and checks, then inputs, quantities and working. */
export function CandidateSheet({ candidate, units, hasMoney }: CandidateSheetProps) {
  const { section, evaluation, basis, demand, rules } = candidate.snapshot;
  const context = useMemo(() => ({ basis, demand, rules }), [basis, demand, rules]);
  const isDuctilityChecked = evaluation.checks.some((check) => check.id === 'curvature-ductility');
  return (
    <div className="grid min-w-0 grid-cols-[minmax(0,1fr)] gap-8">
      <div className="grid items-start gap-8 grid-cols-[minmax(0,1fr)] xl:grid-cols-[22rem_minmax(0,1fr)]">
        <figure className="keep-together">
          <SectionDrawing
            variant="large"
            section={section}
            evaluation={evaluation}
            standard={basis.barStandard}
            units={units}
          />
          <figcaption className="mt-2 flex flex-wrap items-baseline gap-x-3">
            <span className="text-lg font-semibold">{sizeText(section, units)}</span>
            <span className="num text-steel">{steelText(section, units)}</span>
            <BuiltSteelNote section={section} evaluation={evaluation} units={units} />
          </figcaption>
        </figure>
        <div className="grid min-w-0 gap-5">
          <CheckTable checks={evaluation.checks} units={units} code={basis.ruleSet} />
          {evaluation.ductility !== null && !isDuctilityChecked && (
            <p className="text-sm text-muted">μφ: {evaluation.ductility.definition}</p>
          )}
          <LimitsNote evaluation={evaluation} />
        </div>
      </div>
      <Part title="What it was computed from">
        <FrozenInputs snapshot={candidate.snapshot} beam={candidate.beam} units={units} />
      </Part>
      <div className="@container grid min-w-0">
        <LazySectionStudy
          section={section}
          evaluation={evaluation}
          context={context}
          units={units}
          isMoneyHidden={!hasMoney}
          space={null}
          part={({ id, title, body }) =>
            id === 'curve' ? (
              <Part key={id} title={title}>
                <div className="pb-5">{body}</div>
              </Part>
            ) : (
              <Fold key={id} title={title}>
                {body}
              </Fold>
            )
          }
        />
        {!candidate.isReproducedByCurrentEngine && (
          <p className="pb-3 text-xs text-near">
            △ Computed now, by today’s engine, from the inputs frozen here.
          </p>
        )}
      </div>
      <div className="grid grid-cols-[minmax(0,1fr)] gap-8 xl:grid-cols-2">
        <Part title="Quantities per length">
          <QuantitiesTable
            section={section}
            quantities={evaluation.quantities}
            units={units}
            isMoneyHidden={!hasMoney}
          />
        </Part>
        <Part title="Takeoff">
          <TakeoffTable section={section} takeoff={candidate.takeoff} units={units} hasMoney={hasMoney} />
        </Part>
      </div>
      <Part title="Working">
        <WorkingTable working={evaluation.working} units={units} />
      </Part>
      <p className="num flex flex-wrap gap-x-6 gap-y-1 border-t border-ink pt-2 text-xs">
        <span>engine {candidate.snapshot.engineVersion}</span>
        <span className="break-all">SHA-256 {candidate.hash}</span>
      </p>
    </div>
  );
}

function Part({ title, children }: { readonly title: string; readonly children: React.ReactNode }) {
  return (
    <section className="min-w-0">
      <h2 className="mb-2 border-t border-ink pt-2 font-semibold">{title}</h2>
      {children}
    </section>
  );
}
