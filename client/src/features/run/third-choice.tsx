import { useId } from 'react';
import { sizeOf, tintOf } from '#client/src/charts/front-marks.ts';
import { MARK_STYLES, type MarkStyle } from '#client/src/charts/front-chart-input.ts';
import { useChartColours } from '#client/src/charts/use-chart-colours.ts';
import { SegmentedControl } from '#client/src/ui/segmented-control.tsx';
import type { ExploreKey } from '#shared/sweep/explore-axis.ts';
import { bareText, exploreLabel, exploreTitle } from '#shared/print/explore-label.ts';
import type { ThirdMeasure } from './mark-scale.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';

interface ThirdChoiceProps {
  readonly value: ExploreKey | null;
  readonly style: MarkStyle;
  readonly keys: readonly ExploreKey[];
  readonly third: ThirdMeasure | null;
  readonly reader: MeasureReader;
  readonly onChange: (key: ExploreKey | null, style: MarkStyle) => void;
}

const STYLE_NAMES: Readonly<Record<MarkStyle, string>> = { tint: 'Tint', size: 'Size' };
const STEPS = [0, 0.25, 0.5, 0.75, 1] as const;

/** The marks from the least value to the most, drawn as the chart draws them. */
function Legend({ third, reader }: { readonly third: ThirdMeasure; readonly reader: MeasureReader }) {
  const colours = useChartColours();
  const { key, low, high, scale } = third;
  const { unit } = exploreLabel(key, reader);
  if (low === high)
    return (
      <span className="num whitespace-nowrap">
        all {bareText(key, low, reader.units)} {unit}
      </span>
    );
  return (
    <span className="inline-flex items-center gap-1.5 whitespace-nowrap">
      <span className="num">{bareText(key, low, reader.units)}</span>
      <svg width={STEPS.length * 18} height="20" aria-hidden="true">
        {STEPS.map((share, k) => {
          const half = (scale.style === 'size' ? sizeOf(share) : 12) / 2;
          return (
            <path
              key={share}
              d={`M ${9 + k * 18} ${10 - half} l ${half} ${half} l ${-half} ${half} l ${-half} ${-half} z`}
              fill={scale.style === 'tint' ? tintOf(colours, share) : colours.paper}
              stroke={colours.ink}
              strokeWidth={1.3}
            />
          );
        })}
      </svg>
      <span className="num">
        {bareText(key, high, reader.units)} {unit}
      </span>
    </span>
  );
}

/** What the marks of the front tell beside their place: a third measure by tint or size. */
export function ThirdChoice({ value, style, keys, third, reader, onChange }: ThirdChoiceProps) {
  const id = useId();
  return (
    <span className="flex flex-wrap items-center gap-x-3 gap-y-1 text-xs text-muted">
      <label htmlFor={id}>Marks tell</label>
      <select
        id={id}
        value={value ?? ''}
        className="ruled max-w-44 bg-paper py-0.5 text-ink"
        onChange={(event) => onChange(keys.find((key) => key === event.target.value) ?? null, style)}
      >
        <option value="">nothing more</option>
        {keys.map((key) => (
          <option key={key} value={key}>
            {exploreTitle(exploreLabel(key, reader))}
          </option>
        ))}
      </select>
      {third !== null && (
        <>
          <SegmentedControl
            legend="How the marks tell it"
            options={MARK_STYLES.map((one) => ({ value: one, label: STYLE_NAMES[one] }))}
            value={style}
            onChange={(next) => onChange(value, next)}
          />
          <Legend third={third} reader={reader} />
        </>
      )}
    </span>
  );
}
