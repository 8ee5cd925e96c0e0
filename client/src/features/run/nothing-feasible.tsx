import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import type { ViewResult } from '#shared/sweep/result.ts';
import { checkLabel } from '#shared/print/check-labels.ts';
import { formatNumber, formatWhole } from '#shared/print/format-quantity.ts';
import { RatioBar } from '#client/src/ui/ratio-bar.tsx';
import { sizeText } from '#shared/print/section-text.ts';
import { EmptyState } from '#client/src/ui/empty-state.tsx';
import { BoundsLedger, NotCounted } from './bounds-note.tsx';
import { checkWords } from './check-words.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import { measureText } from './measure-text.ts';
import { missedChecks } from './missed-checks.ts';
import type { SectionSource } from './section-source.ts';

interface NothingFeasibleProps {
  readonly result: ViewResult;
  readonly definition: SweepDefinition;
  readonly source: SectionSource;
  readonly reader: MeasureReader;
  readonly onSelect: (index: number) => void;
}

/** No section meets every check: which check took most, and the sections that miss by one check only. */
export function NothingFeasible({ result, definition, source, reader, onSelect }: NothingFeasibleProps) {
  const worst = result.failures.toSorted((a, b) => b.failed - a.failed)[0];
  const nearest = missedChecks(result, source).flatMap(({ check, nearest: one }) =>
    one === null ? [] : [{ check, ...one }],
  );
  if (result.bounds !== undefined)
    return (
      <EmptyState
        title={
          result.bounds.isProven
            ? `None of ${formatWhole(result.sectionCount)} sections meets every check`
            : 'No section that meets every check was found before the search was stopped'
        }
      >
        <div className="grid gap-3">
          <BoundsLedger result={result} bounds={result.bounds} />
          <NotCounted />
        </div>
      </EmptyState>
    );
  const byMiss = nearest.toSorted((a, b) => (a.result?.ratio ?? Infinity) - (b.result?.ratio ?? Infinity));
  return (
    <EmptyState title={`None of ${formatWhole(result.evaluated)} sections meets every check`}>
      <div className="grid gap-3">
        {worst !== undefined && worst.failed > 0 && (
          <p>
            {checkLabel(worst.check).name} removed most:{' '}
            <span className="num">{formatNumber((worst.failed / result.evaluated) * 100, 3, true)} %</span> do
            not reach {checkWords(worst.check, definition, reader)}.
          </p>
        )}
        {nearest.length === 0 ? (
          <p>No section that can be placed fails one check only. Widen the ranges, or ask for less.</p>
        ) : (
          <div>
            <p>The best sections that fail one check only, the nearest miss first:</p>
            <ul className="mt-2 grid gap-2">
              {byMiss.map(({ check, index, value, result: judged }) => (
                <li key={check} className="grid items-center gap-x-4 sm:grid-cols-[minmax(0,1fr)_16rem_6rem]">
                  <span>
                    without {checkWords(check, definition, reader)}:{' '}
                    <button
                      type="button"
                      className="num text-ink underline decoration-concrete-edge hover:decoration-current"
                      onClick={() => onSelect(index)}
                    >
                      {sizeText(source.sectionAt(index), reader.units)}
                    </button>
                  </span>
                  <RatioBar ratio={judged?.ratio ?? null} passes={false} />
                  <span className="num text-right">{measureText(result.view.x, value, reader)}</span>
                </li>
              ))}
            </ul>
          </div>
        )}
      </div>
    </EmptyState>
  );
}
