import type { DuctilityByConvention } from '#shared/engine/ductility-conventions.ts';
import { formatNumber } from '#shared/print/format-quantity.ts';

interface DuctilityRangeProps {
  readonly conventions: readonly DuctilityByConvention[];
  /** Least μφ asked for; null for none. */
  readonly target: number | null;
}

/** Room to the right of the largest value. */
const SCALE_AIR = 1.08;

/** From the least to the largest μφ: what the choice of convention alone makes of it. */
function rangeText(values: readonly number[]): string {
  if (values.length === 0) return 'No bar yields under any convention.';
  const [low, high] = [Math.min(...values), Math.max(...values)];
  const ends =
    formatNumber(low) === formatNumber(high)
      ? formatNumber(low)
      : `${formatNumber(low)} to ${formatNumber(high)}`;
  return `μφ of this section is ${ends}, by which convention is meant.`;
}

/** μφ by every convention on one scale, the one that is held against the target marked. */
export function DuctilityRange({ conventions, target }: DuctilityRangeProps) {
  const values = conventions.flatMap(({ value }) => (value === null ? [] : [value]));
  const scale = SCALE_AIR * Math.max(1, target ?? 0, ...values);
  const share = (value: number) => `${(100 * value) / scale}%`;
  return (
    <div className="grid gap-2">
      <p className="text-sm">
        {rangeText(values)}
        {target !== null && (
          <>
            {' '}
            The tick is the target, <span className="num">{formatNumber(target, 3, true)}</span>.
          </>
        )}
      </p>
      <ul className="border-b border-rule">
        {conventions.map((one) => (
          <li key={one.id} className="border-t border-rule py-1.5">
            <div className="flex items-baseline justify-between gap-3 text-sm">
              <p className={one.isMeasure ? 'font-medium' : ''}>
                {one.label}
                {one.isMeasure && (
                  <span className="ml-2 text-xs font-normal text-muted">the project’s measure</span>
                )}
              </p>
              <p className="num">{one.value === null ? 'no yield' : formatNumber(one.value)}</p>
            </div>
            <div className="relative h-3" aria-hidden="true">
              <div className="absolute inset-x-0 top-1.5 border-t border-rule" />
              {target !== null && (
                <div className="absolute inset-y-0 border-l border-ink" style={{ left: share(target) }} />
              )}
              {one.value !== null && (
                <div
                  className={`absolute top-0.5 size-2 -translate-x-1/2 rotate-45 border border-ink ${one.isMeasure ? 'bg-ink' : 'bg-paper'}`}
                  style={{ left: share(one.value) }}
                />
              )}
            </div>
            <p className="text-2xs text-muted">{one.definition}</p>
          </li>
        ))}
      </ul>
    </div>
  );
}
