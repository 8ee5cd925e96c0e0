import { useMemo } from 'react';
import type { Project, RunSummary } from '#shared/contract/records.ts';
import { isCurveMeasure } from '#shared/engine/curve-basis.ts';
import { MAX_SECTIONS_PER_RUN, methodOf, type RunMethod } from '#shared/sweep/run-method.ts';
import { sizeRefusal } from '#shared/sweep/size-limit.ts';
import { spaceSize } from '#shared/sweep/space.ts';
import { formatDuration, formatNumber, formatWhole } from '#shared/print/format-quantity.ts';
import type { SweepFormReading } from './read-sweep-form.ts';
import { BoundsChoice } from './bounds-choice.tsx';
import { estimatedMs, problemOf } from './space-estimate.ts';
import { useCannotFit } from './use-cannot-fit.ts';

interface SpaceTallyProps {
  readonly project: Project;
  readonly reading: SweepFormReading;
  readonly runs: readonly RunSummary[];
  readonly onMethod: (method: RunMethod | undefined) => void;
}

/** Nobody plans by fractions of a second. */
const timeText = (ms: number): string => (ms < 1000 ? 'less than 1 s' : formatDuration(ms));

/** How large the space is as it stands, what of it cannot be built anyway, and how long a run will take. */
export function SpaceTally({ project, reading, runs, onMethod }: SpaceTallyProps) {
  const definition = reading.kind === 'complete' ? reading.input.definition : null;
  const { designBasis } = project;
  const refusal = definition === null ? null : sizeRefusal(definition, designBasis);
  const problem = useMemo(
    () =>
      definition === null ||
      sizeRefusal(definition, project.designBasis) !== null ||
      spaceSize(definition.space) > MAX_SECTIONS_PER_RUN
        ? null
        : problemOf(project, definition),
    [definition, project],
  );
  const cannotFit = useCannotFit(problem);
  const size = definition === null ? null : spaceSize(definition.space);
  const isByBounds = definition !== null && methodOf(definition, designBasis) === 'bounds';
  const isTooManyToFit = size !== null && size > MAX_SECTIONS_PER_RUN;
  const share = size === null || cannotFit === null ? null : cannotFit / size;
  return (
    <div className="grid gap-3" aria-live="polite">
      <div>
        <p className="num text-3xl font-medium">{size === null ? '—' : formatWhole(size)}</p>
        <p className="text-muted">{size === 1 ? 'section in this space' : 'sections in this space'}</p>
      </div>
      <div className="h-2.5 border border-concrete-edge bg-concrete" aria-hidden="true">
        {share !== null && <div className="hatched h-full" style={{ width: `${share * 100}%` }} />}
      </div>
      <dl className="grid gap-1.5">
        <div className="flex justify-between gap-4">
          <dt className="text-muted">Bars cannot fit</dt>
          <dd className="num">
            {isTooManyToFit
              ? 'not counted'
              : share === null
                ? '…'
                : `${formatNumber(share * 100, 3, true)} %`}
          </dd>
        </div>
        <div className="flex justify-between gap-4">
          <dt className="text-muted">Left to judge</dt>
          <dd className="num">
            {isTooManyToFit
              ? 'not counted'
              : size === null || cannotFit === null
                ? '…'
                : formatWhole(size - cannotFit)}
          </dd>
        </div>
        <div className="flex justify-between gap-4">
          <dt className="text-muted">A run takes about</dt>
          <dd className="num">
            {size === null || refusal !== null
              ? '…'
              : isByBounds
                ? 'seconds to minutes'
                : timeText(estimatedMs(size, runs, isCurveMeasure(designBasis)))}
          </dd>
        </div>
      </dl>
      <BoundsChoice
        size={size}
        isByCurve={isCurveMeasure(designBasis)}
        value={definition?.method}
        onChange={onMethod}
      />
      {isCurveMeasure(designBasis) && (
        <p className="border-l-2 border-near-mark py-1 pl-3 text-sm text-near">
          △ The design basis reads μφ off the full curve. It is drawn for every section that meets all else,
          so the time depends on how many do.
        </p>
      )}
      {reading.kind === 'incomplete' && (
        <p className="flex gap-1.5 text-sm text-fails">
          <span aria-hidden="true">▲</span>
          {reading.errors.size === 1
            ? 'One field needs attention.'
            : `${reading.errors.size} fields need attention.`}
        </p>
      )}
      {refusal !== null && (
        <p className="flex gap-1.5 text-sm text-fails">
          <span aria-hidden="true">▲</span>
          {refusal.message}.
        </p>
      )}
      {size !== null && cannotFit === size && (
        <p className="flex gap-1.5 text-sm text-near">
          <span aria-hidden="true">▲</span>
          None of them can be placed: wider sections, fewer or smaller bars, or one more layer would help.
        </p>
      )}
    </div>
  );
}
