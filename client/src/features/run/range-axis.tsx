import { useRef, type KeyboardEvent, type PointerEvent } from 'react';
import { MEASURE_DIRECTION } from '#shared/engine/measures.ts';
import { NumberField } from '#client/src/ui/number-field.tsx';
import type { Spread } from './cut.ts';
import { isInputKey, type ExploreKey } from '#shared/sweep/explore-axis.ts';
import { bareText, exploreLabel, exploreText, exploreTitle } from '#shared/print/explore-label.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import type { ValueRange } from '#shared/sweep/range-filters.ts';
import { movedRange, shareOn, steppedValue, valueAt, type RangeScale } from './range-scale.ts';

/** A handle is as tall as a finger needs at least (WCAG 2.2, 2.5.8). */
const HANDLE_PX = 24;
/** Height of an axis, and the room above and below it that a handle at its end stands in. */
export const AXIS_PX = 230;
export const AXIS_PAD_PX = HANDLE_PX;
/** What stands above the axis in its column: its name, its unit, and the upper end to type. */
export const AXIS_HEAD_PX = 72;
/** The longest bar of a spread, as a share of its column. */
const BAR_SHARE = 0.36;

interface RangeAxisProps {
  readonly axis: ExploreKey;
  readonly columnPx: number;
  readonly spread: Spread;
  readonly scale: RangeScale;
  readonly range: ValueRange;
  readonly selected: number | null;
  readonly reader: MeasureReader;
  readonly onRange: (range: ValueRange, isSettled: boolean) => void;
}

const OPEN: ValueRange = { low: null, high: null };
const STEPS_OF_KEY: Readonly<Record<string, number>> = {
  ArrowUp: 1,
  ArrowRight: 1,
  ArrowDown: -1,
  ArrowLeft: -1,
  PageUp: 5,
  PageDown: -5,
};

const yOf = (scale: RangeScale, value: number): number =>
  AXIS_PAD_PX + (1 - Math.min(1, Math.max(0, shareOn(scale, value)))) * AXIS_PX;

/** One end of a range: a wide bracket to drag, or to move by the arrow keys. */
function Handle(props: RangeAxisProps & { readonly end: 'low' | 'high' }) {
  const { axis, end, scale, range, reader, onRange } = props;
  const label = exploreLabel(axis, reader);
  const value = range[end] ?? scale[end];
  /** Where a hand that drags has brought it; what is settled once it lets go. */
  const dragged = useRef<ValueRange | null>(null);
  const set = (next: number, isSettled: boolean) => {
    const moved = movedRange(range, end, next, scale);
    dragged.current = isSettled ? null : moved;
    onRange(moved, isSettled);
  };
  const drag = (event: PointerEvent<HTMLButtonElement>) => {
    if (!event.currentTarget.hasPointerCapture(event.pointerId)) return;
    const frame = event.currentTarget.parentElement!.getBoundingClientRect();
    const share = 1 - (event.clientY - frame.top - AXIS_PAD_PX) / AXIS_PX;
    set(valueAt(scale, share, label.kind, reader.units), false);
  };
  const press = (event: KeyboardEvent) => {
    const steps = STEPS_OF_KEY[event.key];
    if (event.key === 'Home' || event.key === 'End') set(event.key === 'Home' ? scale.low : scale.high, true);
    else if (steps !== undefined)
      set(steppedValue(scale, { from: value, steps }, label.kind, reader.units), true);
    else return;
    event.preventDefault();
  };
  const isSet = range[end] !== null;
  const y = yOf(scale, value);
  return (
    <button
      type="button"
      role="slider"
      aria-orientation="vertical"
      aria-label={`${exploreTitle(label)} ${end === 'low' ? 'at least' : 'at most'}`}
      aria-valuemin={scale.low}
      aria-valuemax={scale.high}
      aria-valuenow={value}
      aria-valuetext={isSet ? exploreText(axis, value, reader) : 'open'}
      className={`absolute left-1/2 flex h-6 w-11 -translate-x-1/2 cursor-ns-resize touch-none justify-center ${end === 'low' ? 'items-start' : 'items-end'}`}
      style={end === 'low' ? { top: y } : { top: y - HANDLE_PX }}
      onPointerDown={(event) => {
        event.currentTarget.setPointerCapture(event.pointerId);
        event.currentTarget.focus();
      }}
      onPointerMove={drag}
      onLostPointerCapture={() => {
        if (dragged.current !== null) onRange(dragged.current, true);
        dragged.current = null;
      }}
      onKeyDown={press}
    >
      <svg width="34" height="12" aria-hidden="true" className={end === 'low' ? '' : '-scale-y-100'}>
        <path
          d="M 1 0 V 6 H 33 V 0 M 17 6 v 5"
          className={`fill-none ${isSet ? 'stroke-steel' : 'stroke-concrete-edge'}`}
          strokeWidth={isSet ? 2.4 : 1.6}
        />
      </svg>
    </button>
  );
}

/** How many sections have which value: all of them pale, those within every range solid. */
function SpreadBars({ spread, columnPx }: { readonly spread: Spread; readonly columnPx: number }) {
  const middle = columnPx / 2;
  const most = Math.max(...spread.all, 1);
  const tall = AXIS_PX / spread.all.length;
  const path = (counts: readonly number[]) =>
    counts
      .map((count, bin) =>
        count === 0
          ? ''
          : `M ${middle} ${AXIS_PAD_PX + AXIS_PX - (bin + 1) * tall + 0.5} h ${Math.max(1.5, (count / most) * BAR_SHARE * columnPx)} v ${tall - 1} H ${middle} z`,
      )
      .join('');
  return (
    <svg aria-hidden="true" width={columnPx} height={AXIS_PX + 2 * AXIS_PAD_PX} className="absolute inset-0">
      <path d={path(spread.all)} className="fill-meets" opacity={0.2} />
      <path d={path(spread.within)} className="fill-meets" opacity={0.6} />
      <line x1={middle} x2={middle} y1={AXIS_PAD_PX} y2={AXIS_PAD_PX + AXIS_PX} className="stroke-ink" />
    </svg>
  );
}

/** One axis of the ranges: its spread, its two handles, and the same two ends to type. */
export function RangeAxis(props: RangeAxisProps) {
  const { axis, columnPx, spread, scale, range, selected, reader, onRange } = props;
  const label = exploreLabel(axis, reader);
  const better = isInputKey(axis) ? null : MEASURE_DIRECTION[axis];
  const field = (end: 'low' | 'high') => (
    <NumberField
      label={`${exploreTitle(label)} ${end === 'low' ? 'from' : 'to'}`}
      isLabelHidden
      className="mx-1 text-sm [&_input]:border-rule [&_input]:px-0 [&_input]:py-0.5 [&_input]:text-center"
      kind={label.kind}
      units={reader.units}
      unitText=""
      placeholder={bareText(axis, scale[end], reader.units)}
      value={range[end]}
      onChange={(value) => {
        if (value === null || Number.isFinite(value)) onRange({ ...range, [end]: value }, true);
      }}
    />
  );
  return (
    <div
      className="shrink-0 text-center"
      style={{ width: columnPx }}
      role="group"
      aria-label={exploreTitle(label)}
    >
      <div className="grid content-start" style={{ height: AXIS_HEAD_PX }}>
        <p className="text-sm font-semibold whitespace-nowrap" title={exploreTitle(label)}>
          {label.symbol}
          {better !== null && (
            <span className="font-normal text-muted" title={`${better} is better`}>
              {better === 'less' ? ' ↓' : ' ↑'}
            </span>
          )}
        </p>
        <p className="h-4.5 text-xs text-muted">{label.unit}</p>
        {field('high')}
      </div>
      <div className="relative" style={{ height: AXIS_PX + 2 * AXIS_PAD_PX }}>
        <SpreadBars spread={spread} columnPx={columnPx} />
        {selected !== null && (
          <span
            aria-hidden="true"
            className="absolute left-1/2 size-2.5 -translate-1/2 rotate-45 border border-paper bg-steel"
            style={{ top: yOf(scale, selected) }}
          />
        )}
        <Handle {...props} end="high" />
        <Handle {...props} end="low" />
      </div>
      {field('low')}
      <button
        type="button"
        className={`mt-1 min-h-6 text-xs underline decoration-concrete-edge hover:decoration-current ${range.low === null && range.high === null ? 'invisible' : ''}`}
        onClick={() => onRange(OPEN, true)}
      >
        Open<span className="sr-only"> {exploreTitle(label)}</span>
      </button>
    </div>
  );
}
