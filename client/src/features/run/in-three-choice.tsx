import { MEASURE_IDS, type MeasureId } from '#shared/engine/measures.ts';
import { formatWhole } from '#shared/print/format-quantity.ts';
import { measureLabel } from '#shared/print/measure-labels.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import type { ExploreKey } from '#shared/sweep/explore-axis.ts';
import type { View } from '#shared/sweep/problem.ts';
import type { ResultInThree } from '#shared/sweep/result.ts';
import { CheckboxField } from '#client/src/ui/checkbox-field.tsx';

interface InThreeChoiceProps {
  readonly view: View;
  readonly third: ExploreKey | null;
  readonly inThree: ResultInThree | null;
  readonly isByBounds: boolean;
  readonly reader: MeasureReader;
  readonly onChange: (isInThree: boolean) => void;
}

const isMeasure = (key: ExploreKey | null): key is MeasureId => MEASURE_IDS.some((id) => id === key);

/** What the marks are, once the front in three measures is asked for. */
function marksText(inThree: ResultInThree | null, leading: string): string {
  if (inThree === null) return 'The front in three measures is being found; the marks are those of the line.';
  const { count, points } = inThree;
  if (count === null && points.length === 0)
    return 'More sections than can be held are on the front in three measures. Set the axes to measures that go together more closely, or make the ranges of the sweep shorter; the marks are those of the line.';
  const are = points.length === 1 ? 'section that no other equals' : 'sections that no other equals';
  const words = `Marks: ${formatWhole(points.length)} ${are} or beats in all three measures. Line: the front in two.`;
  return count === null || count === points.length
    ? words
    : `${words} There are ${formatWhole(count)}; marked and listed are those with the best ${leading}.`;
}

/** Offers the front in three measures where the marks tell a measure that no axis shows. */
export function InThreeChoice(props: InThreeChoiceProps) {
  const { view, third, inThree, isByBounds, reader, onChange } = props;
  if (!isMeasure(third) || third === view.x || third === view.y) return null;
  const isOn = view.z === third;
  return (
    <span className="flex flex-wrap items-baseline gap-x-3 gap-y-1 text-xs text-muted">
      <CheckboxField
        label="Front in three measures"
        checked={isOn}
        disabled={isByBounds}
        hint={isByBounds ? 'A run by bounds finds fronts in two measures only.' : undefined}
        onChange={(event) => onChange(event.target.checked)}
      />
      {isOn && (
        <span role="status">{marksText(inThree, measureLabel(view.x, reader.units).name.toLowerCase())}</span>
      )}
    </span>
  );
}
