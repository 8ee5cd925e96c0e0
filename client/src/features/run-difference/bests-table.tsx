import { formatDifferenceTo, formatMoney, formatQuantity } from '#shared/print/format-quantity.ts';
import { measureLabel } from '#shared/print/measure-labels.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import type { ComparedRuns } from './compared-run.ts';
import { bestDifferences, type BestDifference } from './result-differences.ts';
import { VerdictText } from './verdict-text.tsx';

interface BestsTableProps extends ComparedRuns {
  readonly reader: MeasureReader;
}

function Row({ row, reader }: { readonly row: BestDifference; readonly reader: MeasureReader }) {
  const { measure, before, after, verdict } = row;
  const label = measureLabel(measure, reader.units, reader.code);
  const text = (best: BestDifference['before']) => {
    if (best === null) return 'none';
    return label.kind === 'money-per-length'
      ? formatMoney(best.value, reader.currency, label.kind, reader.units)
      : formatQuantity(best.value, label.kind, reader.units);
  };
  return (
    <tr>
      <th scope="row" className="font-normal">
        {label.better === 'less' ? 'Least' : 'Most'} {label.name.toLowerCase()}
      </th>
      <td className="figure">{text(before)}</td>
      <td className="figure">{text(after)}</td>
      <td className="figure">
        {before !== null && after !== null
          ? formatDifferenceTo(after.value, before.value, label.kind, reader.units)
          : ''}
      </td>
      <td>
        <VerdictText verdict={verdict} />
      </td>
    </tr>
  );
}

/** The best there is of each measure by itself, whatever the section. */
export function BestsTable({ baseline, other, reader }: BestsTableProps) {
  const rows = bestDifferences(baseline.result, other.result);
  if (rows.length === 0)
    return <p className="text-muted">Neither run has a section that meets every check.</p>;
  return (
    <TableFrame label="Best of each measure" minWidth="40rem" columnShares={[28, 24, 24, 12, 12]}>
      <thead>
        <tr>
          <th scope="col">Measure</th>
          <th scope="col" className="figure">
            Run {baseline.run.number}
          </th>
          <th scope="col" className="figure">
            Run {other.run.number}
          </th>
          <th scope="col" className="figure">
            Difference
          </th>
          <th scope="col">
            <span className="sr-only">Direction</span>
          </th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <Row key={row.measure} row={row} reader={reader} />
        ))}
      </tbody>
    </TableFrame>
  );
}
