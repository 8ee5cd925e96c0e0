import { useMemo } from 'react';
import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import type { ViewResult } from '#shared/sweep/result.ts';
import { checkLabel } from '#shared/print/check-labels.ts';
import { formatDifferenceTo, formatNumber, formatWhole } from '#shared/print/format-quantity.ts';
import { barsText, sizeText, steelText } from '#shared/print/section-text.ts';
import { measureLabel } from '#shared/print/measure-labels.ts';
import { RatioBar } from '#client/src/ui/ratio-bar.tsx';
import { TableFrame } from '#client/src/ui/table-frame.tsx';
import { BoundsLedger, NotCounted } from './bounds-note.tsx';
import { checkSequence } from './check-sequence.ts';
import { checkWords } from './check-words.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import { measureText } from './measure-text.ts';
import { ladder, missedChecks, type MissedCheck, type Rung } from './missed-checks.ts';
import type { SectionSource } from './section-source.ts';
import { SequenceList } from './sequence-list.tsx';

interface WhyPanelProps {
  readonly result: ViewResult;
  readonly definition: SweepDefinition;
  readonly source: SectionSource;
  readonly reader: MeasureReader;
  readonly selectedIndex: number | null;
  readonly onSelect: (index: number) => void;
}

const percent = (part: number, whole: number): string =>
  whole === 0 ? '' : `${formatNumber((part / whole) * 100, 3, true)} %`;

/** From all sections to those that meet every check, each step as long as what is left. */
function Ladder({ rungs }: { readonly rungs: readonly Rung[] }) {
  const whole = rungs[0]?.count ?? 0;
  return (
    <ol className="grid gap-1 text-sm" aria-label="From all sections to those that meet every check">
      {rungs.map(({ words, count }, k) => (
        <li
          key={words}
          className="grid grid-cols-[6.5rem_minmax(0,1fr)] items-center gap-x-3 sm:grid-cols-[6.5rem_11rem_minmax(0,1fr)_4rem]"
        >
          <span className="num text-right">{formatWhole(count)}</span>
          <span className={k === rungs.length - 1 ? 'font-semibold text-meets' : ''}>{words}</span>
          <span className="col-span-2 h-2.5 border-b border-rule sm:col-span-1" aria-hidden="true">
            <span
              className={`block h-full ${k === rungs.length - 1 ? 'bg-meets' : 'bg-concrete-edge/50'}`}
              style={{ width: `${whole === 0 ? 0 : (count / whole) * 100}%`, minWidth: count > 0 ? 2 : 0 }}
            />
          </span>
          <span className="num hidden text-right text-muted sm:block">{percent(count, whole)}</span>
        </li>
      ))}
    </ol>
  );
}

function FailedBar({ missed, most }: { readonly missed: MissedCheck; readonly most: number }) {
  const { failed, failedOnlyThis } = missed;
  return (
    <span className="relative block h-3 min-w-20" aria-hidden="true">
      <span
        className="hatched absolute inset-y-0 left-0 border border-concrete-edge"
        style={{ width: `${(failed / most) * 100}%` }}
      />
      <span
        className="absolute inset-y-0 left-0 bg-fails"
        style={{ width: `${(failedOnlyThis / most) * 100}%`, minWidth: failedOnlyThis > 0 ? 2 : 0 }}
      />
    </span>
  );
}

function Nearest({ missed, props }: { readonly missed: MissedCheck; readonly props: WhyPanelProps }) {
  const { result, source, reader, selectedIndex, onSelect } = props;
  const { nearest } = missed;
  const { x } = result.view;
  if (nearest === null)
    return (
      <td colSpan={3} className="text-muted">
        {missed.failedOnlyThis > 0
          ? 'bars that cannot be placed have no numbers'
          : 'no section fails it alone'}
      </td>
    );
  const { section } = source.evaluatedAt(nearest.index);
  const { reinforcement } = section;
  const bars =
    reinforcement.kind === 'bars'
      ? `${barsText(reinforcement.tension)} + ${barsText(reinforcement.compression)}`
      : steelText(section, reader.units);
  const best = result.front[0]?.x ?? null;
  const { kind } = measureLabel(x, reader.units);
  return (
    <>
      <td>
        <button
          type="button"
          aria-pressed={selectedIndex === nearest.index}
          className="num text-left whitespace-nowrap underline decoration-concrete-edge hover:decoration-current aria-pressed:font-semibold"
          onClick={() => onSelect(nearest.index)}
        >
          {sizeText(section, reader.units)}
          <span className="block whitespace-nowrap text-steel">{bars}</span>
        </button>
      </td>
      <td className="min-w-48">
        <RatioBar ratio={nearest.result?.ratio ?? null} passes={false} />
      </td>
      <td className="figure">
        {measureText(x, nearest.value, reader, true)}
        {best !== null && (
          <span className={`block text-xs ${nearest.isBetter === true ? 'text-ink' : 'text-muted'}`}>
            {formatDifferenceTo(nearest.value, best, kind, reader.units)}
          </span>
        )}
      </td>
    </>
  );
}

/** Why the rest fell out: how many each check took, what it alone keeps out, and by how much that misses. */
export function WhyPanel(props: WhyPanelProps) {
  const { result, definition, source, reader } = props;
  const sequence = useMemo(() => checkSequence(result), [result]);
  const missed = useMemo(() => missedChecks(result, source), [result, source]);
  const label = measureLabel(result.view.x, reader.units);
  const most = missed[0]?.failed ?? 1;
  if (result.bounds !== undefined)
    return (
      <section aria-label="Why the rest fell out, in full" className="grid gap-4">
        <BoundsLedger result={result} bounds={result.bounds} />
        <NotCounted />
      </section>
    );
  return (
    <section aria-label="Why the rest fell out, in full" className="grid grid-cols-[minmax(0,1fr)] gap-5">
      {sequence === null ? <Ladder rungs={ladder(result)} /> : <SequenceList sequence={sequence} />}
      {missed.length === 0 ? (
        <p className="text-sm text-muted">Nothing fell out: every section meets every check.</p>
      ) : (
        <div>
          <p className="flex flex-wrap items-center gap-x-4 gap-y-1 pb-2 text-xs text-muted">
            <span>Each check by itself:</span>
            <span className="inline-flex items-center gap-1.5">
              <span
                className="hatched inline-block h-2.5 w-6 border border-concrete-edge"
                aria-hidden="true"
              />
              fail it, whatever else they fail
            </span>
            <span className="inline-flex items-center gap-1.5">
              <span className="inline-block h-2.5 w-6 bg-fails" aria-hidden="true" />
              fail nothing else
            </span>
          </p>
          <TableFrame label="Checks, what they took and what they cost" minWidth="42rem">
            <thead>
              <tr>
                <th scope="col">Check</th>
                <th scope="col">Sections that fail it</th>
                <th scope="col">Best without it</th>
                <th scope="col">Misses by</th>
                <th scope="col" className="figure">
                  {label.name}
                  <span className="block text-xs font-normal">against the best</span>
                </th>
              </tr>
            </thead>
            <tbody>
              {missed.map((one) => (
                <tr key={one.check} className="middle">
                  <th scope="row">
                    {checkLabel(one.check).name}
                    <span className="num block text-xs font-normal text-muted">
                      {checkWords(one.check, definition, reader).replace(/^the .*/, '')}
                    </span>
                  </th>
                  <td>
                    <FailedBar missed={one} most={most} />
                    <span className="num mt-1 block text-xs whitespace-nowrap">
                      {percent(one.failed, result.evaluated)}
                      <span className="text-muted">, {formatWhole(one.failedOnlyThis)} only this</span>
                    </span>
                  </td>
                  <Nearest missed={one} props={props} />
                </tr>
              ))}
            </tbody>
          </TableFrame>
        </div>
      )}
    </section>
  );
}
