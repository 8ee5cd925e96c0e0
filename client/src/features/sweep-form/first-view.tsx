import type { Project } from '#shared/contract/records.ts';
import type { MeasureId } from '#shared/engine/measures.ts';
import type { View } from '#shared/sweep/problem.ts';
import { MeasureChoice } from '#client/src/charts/measure-choice.tsx';
import type { FieldErrors } from '#client/src/lib/field-errors.ts';
import { unavailableReason } from '#client/src/lib/measure-availability.ts';
import type { SweepFormReading } from './read-sweep-form.ts';

interface FirstViewProps {
  readonly project: Project;
  readonly reading: SweepFormReading;
  readonly view: View;
  readonly errors: FieldErrors;
  readonly onChange: (view: View) => void;
}

/** The two measures a run opens with; any others can be compared afterwards. */
export function FirstView({ project, reading, view, errors, onChange }: FirstViewProps) {
  const { units } = project.designBasis;
  const reasonAgainst = (measure: MeasureId): string | null => {
    if (reading.kind === 'incomplete') return null;
    const { space, demand } = reading.input.definition;
    return unavailableReason(measure, { space, demand, units, basis: { rates: project.priceBook } });
  };
  const problems = (['x', 'y'] as const).flatMap((side) => {
    const reason = reasonAgainst(view[side]);
    const message =
      errors.get(`view.${side}`) ?? (reason === null ? undefined : `This measure has ${reason}.`);
    return message === undefined ? [] : [message];
  });
  return (
    <div className="grid gap-2">
      <div className="flex flex-wrap items-baseline gap-x-3 gap-y-2">
        <MeasureChoice
          side="y"
          value={view.y}
          units={units}
          reasonAgainst={reasonAgainst}
          onChange={(y) => onChange({ x: view.x === y ? view.y : view.x, y })}
        />
        <span className="text-muted">against</span>
        <MeasureChoice
          side="x"
          value={view.x}
          units={units}
          reasonAgainst={reasonAgainst}
          onChange={(x) => onChange({ x, y: view.y === x ? view.x : view.y })}
        />
      </div>
      {problems.map((problem) => (
        <p key={problem} className="flex gap-1.5 text-xs text-fails">
          <span aria-hidden="true">▲</span>
          {problem}
        </p>
      ))}
      <p className="text-xs text-muted">Any other two can be compared once it has run.</p>
    </div>
  );
}
