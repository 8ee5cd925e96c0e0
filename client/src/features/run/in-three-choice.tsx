import { MEASURE_IDS, type MeasureId } from '#shared/engine/measures.ts';
import { formatWhole } from '#shared/print/format-quantity.ts';
import { measureLabel } from '#shared/print/measure-labels.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import { MOST_HELD_IN_THREE } from '#shared/sweep/front-in-three.ts';
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
function marksText(inThree: ResultInThree | null, best: string): string {
  if (inThree === null) return 'The front in three measures is being found; the marks are those of the line.';
  const { count, points } = inThree;
  if (count === null && points.length === 0)
    return `More than ${formatWhole(MOST_HELD_IN_THREE)} sections are on the front in three measures: too many to be held. The marks are those of the line. Another third measure, or shorter ranges in the sweep, give a shorter one.`;
  const sections = `${formatWhole(points.length)} ${points.length === 1 ? 'section' : 'sections'}`;
  const words = `Marks: ${sections} that can be bettered in none of the three measures without loss in another. Line: the same in the two of the axes.`;
  return count === null || count === points.length
    ? words
    : `${words} There are ${formatWhole(count)}; marked and listed are those with the ${best}.`;
}

/** Offers the front in three measures where the marks tell a measure that no axis shows. */
export function InThreeChoice(props: InThreeChoiceProps) {
  const { view, third, inThree, isByBounds, reader, onChange } = props;
  if (!isMeasure(third) || third === view.x || third === view.y) return null;
  const isOn = view.z === third;
  const leading = measureLabel(view.x, reader.units);
  const best = `${leading.better === 'less' ? 'least' : 'most'} ${leading.name.toLowerCase()}`;
  return (
    <>
      <CheckboxField
        className="text-xs text-muted"
        label="Front in three measures"
        checked={isOn}
        disabled={isByBounds}
        hint={isByBounds ? 'A run by bounds finds fronts in two measures only.' : undefined}
        onChange={(event) => onChange(event.target.checked)}
      />
      {isOn && (
        <span role="status" className="order-last basis-full text-xs text-muted">
          {marksText(inThree, best)}
        </span>
      )}
    </>
  );
}
