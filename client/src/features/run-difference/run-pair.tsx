import type { RunSummary } from '#shared/contract/records.ts';
import { formatDate } from '#shared/print/format-quantity.ts';
import { Button } from '#client/src/ui/button.tsx';
import { SelectField } from '#client/src/ui/select-field.tsx';

/** A run that may be compared, with the sweep it is of. */
export interface ComparableRun extends Pick<RunSummary, 'id' | 'number' | 'createdAt' | 'startedBy'> {
  readonly sweepName: string;
}

interface RunPairProps {
  readonly runs: readonly ComparableRun[];
  readonly baselineId: string;
  readonly otherId: string;
  readonly onChoose: (pair: { readonly baselineId: string; readonly otherId: string }) => void;
}

/** Which two runs are set against each other; any other two of the beam may be chosen. */
export function RunPair({ runs, baselineId, otherId, onChoose }: RunPairProps) {
  const isOneSweep = new Set(runs.map(({ sweepName }) => sweepName)).size === 1;
  const options = runs.map(({ id, number, createdAt, startedBy, sweepName }) => ({
    value: id,
    label: `${isOneSweep ? `Run ${number}` : `${sweepName}, run ${number}`}, ${formatDate(createdAt)}, ${startedBy.name}`,
  }));
  return (
    <div className="flex flex-wrap items-end gap-x-5 gap-y-2">
      <SelectField
        className="w-72 max-w-full"
        label="Baseline"
        options={options.filter(({ value }) => value !== otherId)}
        value={baselineId}
        onChange={(event) => onChoose({ baselineId: event.target.value, otherId })}
      />
      <SelectField
        className="w-72 max-w-full"
        label="Run set against it"
        options={options.filter(({ value }) => value !== baselineId)}
        value={otherId}
        onChange={(event) => onChoose({ baselineId, otherId: event.target.value })}
      />
      <Button onClick={() => onChoose({ baselineId: otherId, otherId: baselineId })}>Swap</Button>
    </div>
  );
}
