import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import type { ViewResult } from '#shared/sweep/result.ts';
import { checkLabel } from '#shared/print/check-labels.ts';
import { formatDifferenceTo, formatNumber, formatWhole } from '#shared/print/format-quantity.ts';
import { measureLabel } from '#shared/print/measure-labels.ts';
import { NotCounted } from './bounds-note.tsx';
import { checkWords } from './check-words.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import { measureText } from './measure-text.ts';
import { pricesOfChecks } from './price-of-checks.ts';

interface FellOutProps {
  readonly result: ViewResult;
  readonly definition: SweepDefinition;
  readonly reader: MeasureReader;
  /** μφ is read off the full curve. */
  readonly isByCurve: boolean;
  readonly onSelect: (index: number) => void;
  /** Shows it all in full. */
  readonly onMore: () => void;
}

/** So many prices are told here; the rest in full elsewhere. */
const PRICES_TOLD = 4;

/** Why the rest fell out: one section may fail several checks, so the shares overlap. */
function Shares({ result }: { readonly result: ViewResult }) {
  const rows = result.failures.filter(({ failed }) => failed > 0).toSorted((a, b) => b.failed - a.failed);
  const most = rows[0]?.failed ?? 1;
  if (rows.length === 0)
    return <p className="text-sm text-muted">Nothing: every section meets every check.</p>;
  return (
    <table className="w-full text-sm" aria-label="Checks by the share of sections that fail them">
      <thead className="sr-only">
        <tr>
          <th scope="col">Check</th>
          <th scope="col">Share that fails it</th>
        </tr>
      </thead>
      <tbody>
        {rows.map(({ check, failed, failedOnlyThis }) => (
          <tr key={check} className="align-baseline">
            <th scope="row" className="py-0.5 text-left font-normal">
              {checkLabel(check).name}
            </th>
            <td className="w-[54%] py-0.5 pl-2">
              <span className="flex items-center gap-2">
                <span
                  className="relative h-2.5 min-w-0 flex-1"
                  title={`${formatWhole(failed)} fail it, ${formatWhole(failedOnlyThis)} of them nothing else`}
                >
                  <span
                    className="hatched absolute inset-y-0 left-0 border border-concrete-edge"
                    style={{ width: `${(failed / most) * 100}%` }}
                  />
                  <span
                    className="absolute inset-y-0 left-0 bg-fails"
                    style={{ width: `${(failedOnlyThis / most) * 100}%` }}
                  />
                </span>
                <span className="num w-14 shrink-0 text-right">
                  {formatNumber((failed / result.evaluated) * 100, 3, true)} %
                </span>
                <span className="sr-only">{formatWhole(failedOnlyThis)} of them nothing else</span>
              </span>
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

/** What was asked in vain or at a price, check by check. */
export function FellOut({ result, definition, reader, isByCurve, onSelect, onMore }: FellOutProps) {
  const prices = pricesOfChecks(result);
  const { x } = result.view;
  if (result.bounds !== undefined)
    return (
      <section className="border-t border-rule pt-3">
        <h2 className="pb-1 text-xs font-semibold text-muted">Why the rest fell out</h2>
        <NotCounted />
      </section>
    );
  return (
    <section className="border-t border-rule pt-3">
      <h2 className="pb-1 text-xs font-semibold text-muted">Why the rest fell out</h2>
      <Shares result={result} />
      <p className="flex flex-wrap items-center gap-x-1.5 pt-1 text-xs text-muted">
        <span className="inline-block h-2 w-4 bg-fails" aria-hidden="true" /> nothing else
        <button
          type="button"
          className="ml-auto min-h-6 text-ink underline decoration-concrete-edge hover:decoration-current"
          onClick={onMore}
        >
          In full, with the nearest misses
        </button>
      </p>
      {isByCurve && (
        <p className="pt-1 text-xs text-muted">
          Curvature ductility is read off the full curve, so it was asked only of sections that meet every
          other check.
        </p>
      )}
      {prices.length > 0 && (
        <ul className="mt-3 grid gap-1.5 text-sm text-muted">
          {prices.slice(0, PRICES_TOLD).map(({ check, index, without, best }) => (
            <li key={check}>
              Without {checkWords(check, definition, reader)} the best would be{' '}
              <button
                type="button"
                className="num text-ink underline decoration-concrete-edge hover:decoration-current"
                onClick={() => onSelect(index)}
                title="Look at that section"
              >
                {measureText(x, without, reader)}
              </button>
              {best !== null && (
                <>
                  {' '}
                  (
                  <span className="num">
                    {formatDifferenceTo(without, best, measureLabel(x, reader.units).kind, reader.units)}
                  </span>
                  )
                </>
              )}
              .
            </li>
          ))}
        </ul>
      )}
    </section>
  );
}
