import { MAX_SECTIONS_BY_BOUNDS, MAX_SECTIONS_PER_RUN, type RunMethod } from '#shared/sweep/run-method.ts';
import { formatWhole } from '#shared/print/format-quantity.ts';
import { CheckboxField } from '#client/src/ui/checkbox-field.tsx';

interface BoundsChoiceProps {
  /** Sections of the space; null while it cannot be read. */
  readonly size: number | null;
  /** μφ is read off the full curve, which has no bounds. */
  readonly isByCurve: boolean;
  readonly value: RunMethod | undefined;
  readonly onChange: (method: RunMethod | undefined) => void;
}

/** Below this every section is evaluated before a search would have begun. */
const WORTH_ASKING = 1_000_000;

/** What a search by bounds finds, and what it leaves out. */
const WHAT_IT_IS =
  'Finds the same exact front without evaluating every section: those whose bounds fail a check, or that a section found beats, are ruled out in groups. How many meet every check and why the rest fell out is not counted then.';

/** Whether the space is searched by bounds; where it is too large for anything else, that it will be. */
export function BoundsChoice({ size, isByCurve, value, onChange }: BoundsChoiceProps) {
  if (isByCurve || size === null || size > MAX_SECTIONS_BY_BOUNDS) return null;
  if (size > MAX_SECTIONS_PER_RUN)
    return (
      <CheckboxField
        label="Search by bounds"
        hint={`More than the ${formatWhole(MAX_SECTIONS_PER_RUN)} that can be evaluated one by one. ${WHAT_IT_IS}`}
        checked
        disabled
        readOnly
      />
    );
  if (size < WORTH_ASKING && value !== 'bounds') return null;
  return (
    <CheckboxField
      label="Search by bounds"
      hint={WHAT_IT_IS}
      checked={value === 'bounds'}
      onChange={(event) => onChange(event.target.checked ? 'bounds' : undefined)}
    />
  );
}
