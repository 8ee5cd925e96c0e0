import { checkLabel } from '#shared/print/check-labels.ts';
import { formatNumber, formatWhole } from '#shared/print/format-quantity.ts';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import type { ComparedRuns } from './compared-run.ts';
import { checkDifferences, countDifferences } from './result-differences.ts';

const whole = (count: number | null) => (count === null ? 'not counted' : formatWhole(count));
const percent = (share: number) => `${formatNumber(share * 100, 3, true)} %`;

function signed(before: number | null, after: number | null): string {
  if (before === null || after === null) return '';
  if (before === after) return '±0';
  return after > before ? `+${formatWhole(after - before)}` : `−${formatWhole(before - after)}`;
}

/** A share's change, in percentage points. */
function signedPoints(before: number, after: number): string {
  const points = Math.round((after - before) * 1000) / 10;
  if (points === 0) return '±0';
  return `${points > 0 ? '+' : '−'}${formatNumber(Math.abs(points), 3, true)}`;
}

/** How many sections there are, meet every check, are on the front, and fail each check. */
export function CountsTable({ baseline, other }: ComparedRuns) {
  const counts = countDifferences(baseline.result, other.result);
  const checks = checkDifferences(baseline.result, other.result);
  const heads = [`Run ${baseline.run.number}`, `Run ${other.run.number}`];
  return (
    <TableFrame label="How many sections" minWidth="40rem" columnShares={[28, 24, 24, 12, 12]}>
      <thead>
        <tr>
          <th scope="col">Sections</th>
          {heads.map((head, k) => (
            <th key={k} scope="col" className="figure">
              {head}
            </th>
          ))}
          <th scope="col" className="figure">
            Difference
          </th>
          <th scope="col">
            <span className="sr-only">In points</span>
          </th>
        </tr>
      </thead>
      <tbody>
        {counts.map(({ label, before, after }) => (
          <tr key={label}>
            <th scope="row" className="font-normal">
              {label}
            </th>
            <td className="figure">{whole(before)}</td>
            <td className="figure">{whole(after)}</td>
            <td className="figure">{signed(before, after)}</td>
            <td />
          </tr>
        ))}
      </tbody>
      {checks.length > 0 && (
        <tbody>
          <tr>
            <th scope="rowgroup" colSpan={5} className="pt-4! font-semibold">
              Fail the check, of those evaluated{' '}
            </th>
          </tr>
          {checks.map(({ check, before, after, failedBefore, failedAfter }) => (
            <tr key={check}>
              <th scope="row" className="font-normal">
                {checkLabel(check).name}
              </th>
              <td className="figure" title={formatWhole(failedBefore)}>
                {percent(before)}
              </td>
              <td className="figure" title={formatWhole(failedAfter)}>
                {percent(after)}
              </td>
              <td className="figure">{signedPoints(before, after)}</td>
              <td className="text-xs text-muted">points</td>
            </tr>
          ))}
        </tbody>
      )}
    </TableFrame>
  );
}
