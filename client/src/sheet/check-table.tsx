import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { CheckResult } from '#shared/engine/evaluation.ts';
import type { RuleSetId } from '#shared/engine/section.ts';
import { checkLabel } from '#shared/print/check-labels.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { quantitiesInText } from '#shared/print/quantities-in-text.ts';
import { unitLabel } from '#shared/print/units.ts';
import { RatioBar } from '#client/src/ui/ratio-bar.tsx';
import { TableFrame } from '#client/src/ui/table-frame.tsx';

interface CheckTableProps {
  readonly checks: readonly CheckResult[];
  readonly units: UnitSystem;
  readonly code: RuleSetId;
}

/** Every check with its clause, what is asked, what is there, and the ratio against its limit. */
export function CheckTable({ checks, units, code }: CheckTableProps) {
  return (
    <TableFrame label="Checks">
      <thead>
        <tr>
          <th scope="col">Check</th>
          <th scope="col" className="figure">
            Demand
          </th>
          <th scope="col" className="figure">
            Capacity
          </th>
          <th scope="col">Ratio to the limit</th>
        </tr>
      </thead>
      <tbody>
        {checks.map((check) => (
          <CheckRow key={check.id} check={check} units={units} code={code} />
        ))}
      </tbody>
    </TableFrame>
  );
}

function CheckRow({ check, units, code }: Omit<CheckTableProps, 'checks'> & { readonly check: CheckResult }) {
  const { name, symbol } = checkLabel(check.id, code);
  const unit = unitLabel(check.kind, units);
  const print = (value: number | null) => formatQuantity(value, check.kind, units, { hideUnit: true });
  return (
    <tr>
      <th scope="row" className="min-w-20 sm:min-w-32">
        <span className="font-medium">
          {name} {symbol !== '' && <span className="text-muted">{symbol}</span>}
        </span>
        <span className="block text-2xs font-normal text-muted">
          {check.clause}
          {unit !== '' && `, ${unit}`}
        </span>
        {check.reason !== '' && (
          <span className={`block text-2xs font-normal ${check.passes ? 'text-muted' : 'text-fails'}`}>
            {quantitiesInText(check.reason, units)}
          </span>
        )}
      </th>
      <td className="figure">{print(check.demand)}</td>
      <td className="figure">{print(check.capacity)}</td>
      <td className="w-[38%] min-w-33 sm:min-w-34">
        <RatioBar ratio={check.ratio} passes={check.passes} isExact={check.kind === 'count'} />
      </td>
    </tr>
  );
}
