import type { Comparison } from '#shared/verification/comparison.ts';
import { placeText, quantityText } from '#shared/verification/case-text.ts';
import { allowedText, computedText, differenceText, printedText } from '#shared/verification/number-text.ts';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { VerdictMark } from '#client/src/ui/verdict-mark.tsx';

interface ValueTableProps {
  readonly caseId: string;
  readonly comparisons: readonly Comparison[];
}

/** Each printed value beside ours, the difference beside what is allowed. */
export function ValueTable({ caseId, comparisons }: ValueTableProps) {
  return (
    <TableFrame
      label={`${caseId}, printed and computed values`}
      columnShares={[24, 18, 20, 14, 13, 11]}
      minWidth="43rem"
    >
      <thead>
        <tr>
          <th scope="col">Value</th>
          <th scope="col" className="figure">
            Printed
          </th>
          <th scope="col" className="figure">
            Computed
          </th>
          <th scope="col" className="figure">
            Difference
          </th>
          <th scope="col" className="figure">
            Allowed
          </th>
          <th scope="col">Result</th>
        </tr>
      </thead>
      <tbody>
        {comparisons.map((comparison) => (
          <ValueRow key={comparison.name} comparison={comparison} />
        ))}
      </tbody>
    </TableFrame>
  );
}

function ValueRow({ comparison }: { readonly comparison: Comparison }) {
  const place = placeText(comparison);
  return (
    <tr className="middle">
      <th scope="row">
        {quantityText(comparison)}
        {place !== '' && <span className="num ml-2 font-normal text-muted">{place}</span>}
      </th>
      <td className="figure">{printedText(comparison.printed)}</td>
      <td className="figure">{computedText(comparison)}</td>
      <td className="figure">{differenceText(comparison)}</td>
      <td className="figure">{allowedText(comparison.allowed)}</td>
      <td>
        <VerdictMark
          verdict={comparison.isWithin ? 'meets' : 'fails'}
          word={comparison.isWithin ? 'within' : 'outside'}
        />
      </td>
    </tr>
  );
}
