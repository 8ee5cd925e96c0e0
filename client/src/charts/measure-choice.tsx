import { useId } from 'react';
import type { RuleSetId } from '#shared/engine/section.ts';
import { MEASURE_IDS, type MeasureId } from '#shared/engine/measures.ts';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { measureLabel } from '#shared/print/measure-labels.ts';

interface MeasureChoiceProps {
  readonly side: 'x' | 'y';
  readonly value: MeasureId;
  readonly units: UnitSystem;
  /** Puts symbols in the code's own letters. */
  readonly code?: RuleSetId;
  /** Why a measure cannot be chosen; null where it can. */
  readonly reasonAgainst: (measure: MeasureId) => string | null;
  readonly onChange: (measure: MeasureId) => void;
}

/** One of the two measures compared, chosen where its axis is named. */
export function MeasureChoice({ side, value, units, code, reasonAgainst, onChange }: MeasureChoiceProps) {
  const id = useId();
  return (
    <span className="inline-flex min-w-0">
      <label htmlFor={id} className="sr-only">
        {side === 'x' ? 'Measure across (leading)' : 'Measure up'}
      </label>
      <select
        id={id}
        value={value}
        className="ruled max-w-46 bg-paper font-semibold"
        onChange={(event) => onChange(event.target.value as MeasureId)}
      >
        {MEASURE_IDS.map((measure) => {
          const label = measureLabel(measure, units, code);
          const reason = reasonAgainst(measure);
          const name = label.symbol === label.name ? label.name : `${label.name} ${label.symbol}`;
          return (
            <option
              key={measure}
              value={measure}
              disabled={reason !== null}
              className="bg-paper text-ink disabled:text-muted"
            >
              {reason === null ? name : `${name}: ${reason}`}
            </option>
          );
        })}
      </select>
    </span>
  );
}
