import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Run } from '#shared/contract/records.ts';
import { INPUT_GROUPS, type InputGroup, type RunInput } from './run-input.ts';
import { runInputs } from './run-inputs.ts';

export interface InputDifference {
  readonly label: string;
  /** As it prints in the baseline and in the other run; null where that one has no such input. */
  readonly before: string | null;
  readonly after: string | null;
}

export interface InputDifferences {
  readonly group: InputGroup;
  readonly rows: readonly InputDifference[];
}

type Compared = Pick<Run, 'definition' | 'basis' | 'engineVersion'>;

const isSame = (a: unknown, b: unknown) => JSON.stringify(a) === JSON.stringify(b);

function differenceOf(before: RunInput | undefined, after: RunInput | undefined): InputDifference[] {
  const label = before?.label ?? after?.label ?? '';
  if (before === undefined || after === undefined)
    return [{ label, before: before?.text ?? null, after: after?.text ?? null }];
  if (isSame(before.stored, after.stored)) return [];
  // Apart by less than is printed: the stored values say by what.
  if (before.text === after.text)
    return typeof before.stored === 'number' && typeof after.stored === 'number'
      ? [{ label, before: `${before.text} (${before.stored})`, after: `${after.text} (${after.stored})` }]
      : [];
  return [{ label, before: before.text, after: after.text }];
}

/** What went into one run otherwise than into the other, by group; groups without a difference are left out. */
export function inputDifferences(
  baseline: Compared,
  other: Compared,
  units: UnitSystem,
): readonly InputDifferences[] {
  const before = runInputs(baseline, units);
  const after = runInputs(other, units);
  return INPUT_GROUPS.flatMap((group) => {
    const [olds, news] = [before, after].map((inputs) => inputs.filter((one) => one.group === group)) as [
      RunInput[],
      RunInput[],
    ];
    const labels = [...new Set([...olds, ...news].map(({ label }) => label))];
    const rows = labels.flatMap((label) =>
      differenceOf(
        olds.find((one) => one.label === label),
        news.find((one) => one.label === label),
      ),
    );
    return rows.length === 0 ? [] : [{ group, rows }];
  });
}
