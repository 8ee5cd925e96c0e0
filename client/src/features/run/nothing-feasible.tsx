import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import type { ViewResult } from '#shared/sweep/result.ts';
import { checkLabel } from '#shared/print/check-labels.ts';
import { formatNumber, formatWhole } from '#shared/print/format-quantity.ts';
import { EmptyState } from '#client/src/ui/empty-state.tsx';
import { checkWords } from './check-words.ts';
import { measureText, type MeasureReader } from './measure-text.ts';
import { pricesOfChecks } from './price-of-checks.ts';

interface NothingFeasibleProps {
  readonly result: ViewResult;
  readonly definition: SweepDefinition;
  readonly reader: MeasureReader;
  readonly onSelect: (index: number) => void;
}

/** No section meets every check: which check took most, and the sections that miss by one check only. */
export function NothingFeasible({ result, definition, reader, onSelect }: NothingFeasibleProps) {
  const worst = result.failures.toSorted((a, b) => b.failed - a.failed)[0];
  const nearest = pricesOfChecks(result);
  return (
    <EmptyState title={`None of ${formatWhole(result.evaluated)} sections meets every check`}>
      <div className="grid gap-3">
        {worst !== undefined && worst.failed > 0 && (
          <p>
            {checkLabel(worst.check).name} removed most:{' '}
            <span className="num">{formatNumber((worst.failed / result.evaluated) * 100, 3, true)} %</span> do
            not reach {checkWords(worst.check, definition, reader.units)}.
          </p>
        )}
        {nearest.length === 0 ? (
          <p>No section that can be placed fails one check only. Widen the ranges, or ask for less.</p>
        ) : (
          <div>
            <p>The nearest sections fail one check only:</p>
            <ul className="mt-1 grid gap-1">
              {nearest.map(({ check, index, without }) => (
                <li key={check}>
                  without {checkWords(check, definition, reader.units)}:{' '}
                  <button
                    type="button"
                    className="num text-ink underline decoration-concrete-edge hover:decoration-current"
                    onClick={() => onSelect(index)}
                  >
                    {measureText(result.view.x, without, reader)}
                  </button>
                </li>
              ))}
            </ul>
          </div>
        )}
      </div>
    </EmptyState>
  );
}
