import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { CheckResult } from '#shared/engine/evaluation.ts';
import type { RuleSetId } from '#shared/engine/section.ts';
import { checkLabel } from '#shared/print/check-labels.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { quantitiesInText } from '#shared/print/quantities-in-text.ts';
import { RatioBar } from '#client/src/ui/ratio-bar.tsx';

interface CheckListProps {
  readonly checks: readonly CheckResult[];
  readonly units: UnitSystem;
  readonly code: RuleSetId;
  /** Significant figures of demand and capacity. */
  readonly digits: number;
}

/** A width of 11.25 in that is needed must not read 11.2. */
const LENGTH_FIGURES = 4;

/** What is asked and what is there, in that order; empty where the check has no numbers. */
function numbersOf({ demand, capacity, kind }: CheckResult, units: UnitSystem, figures: number): string {
  const digits = kind === 'length' ? Math.max(figures, LENGTH_FIGURES) : figures;
  const asked = formatQuantity(demand, kind, units, { digits, hideUnit: capacity !== null });
  const there = formatQuantity(capacity, kind, units, { digits });
  if (asked === '') return there;
  return there === '' ? `${asked} needed` : `${asked} asked, ${there} there`;
}

function CheckRow({
  check,
  units,
  code,
  digits,
}: Omit<CheckListProps, 'checks'> & { readonly check: CheckResult }) {
  const { name, symbol } = checkLabel(check.id, code);
  const numbers = numbersOf(check, units, digits);
  return (
    <li className="border-t border-rule py-2">
      <div className="grid grid-cols-[minmax(0,1fr)_minmax(11.5rem,1.1fr)] items-baseline gap-x-3">
        <p className="min-w-0">
          {name} {symbol !== '' && <span className="whitespace-nowrap">{symbol}</span>}
        </p>
        <RatioBar ratio={check.ratio} passes={check.passes} />
      </div>
      <div className="flex flex-wrap justify-between gap-x-4 text-xs text-muted">
        <span>{check.clause}</span>
        {numbers !== '' && <span className="num">{numbers}</span>}
      </div>
      {!check.passes && <p className="mt-0.5 text-xs text-fails">{quantitiesInText(check.reason, units)}</p>}
    </li>
  );
}

/** Every check that applies to the section, with its clause, its numbers and how near the limit it is. */
export function CheckList({ checks, units, code, digits }: CheckListProps) {
  return (
    <ul className="border-b border-rule">
      {checks.map((check) => (
        <CheckRow key={check.id} check={check} units={units} code={code} digits={digits} />
      ))}
    </ul>
  );
}
