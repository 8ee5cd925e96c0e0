import { useMemo, useState } from 'react';
import type { Run } from '#shared/contract/records.ts';
import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import { expandAxis } from '#shared/sweep/axis.ts';
import type { View } from '#shared/sweep/problem.ts';
import type { EdgeAxis, ViewResult } from '#shared/sweep/result.ts';
import { formatNumber, formatQuantity } from '#shared/print/format-quantity.ts';
import { unavailableReason } from '#client/src/lib/measure-availability.ts';
import { Button } from '#client/src/ui/button.tsx';
import { NumberField } from '#client/src/ui/number-field.tsx';
import { edgeFindings, type EdgeFinding } from './edge-findings.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import type { SectionSource } from './section-source.ts';

/** A changed sweep to run, and what was changed in a few words. */
export interface SweepVariation {
  readonly definition: SweepDefinition;
  readonly words: string;
}

interface EdgeOffersProps {
  readonly run: Run;
  readonly view: View;
  readonly result: ViewResult;
  readonly source: SectionSource;
  readonly reader: MeasureReader;
  readonly isCostAvailable: boolean;
  readonly onView: (view: View) => void;
  /** Null for who may not run sweeps. */
  readonly onVary: ((variation: SweepVariation) => void) | null;
  readonly isBusy: boolean;
}

interface EndWords {
  readonly symbol: string;
  readonly kind: 'length' | 'stress';
  readonly low: string;
  readonly high: string;
}

const WORDS: Readonly<Record<EdgeAxis, EndWords>> = {
  width: { symbol: 'b', kind: 'length', low: 'the narrowest width', high: 'the widest width' },
  depth: { symbol: 'h', kind: 'length', low: 'the shallowest depth', high: 'the deepest depth' },
  fc: { symbol: 'f′c', kind: 'stress', low: 'the weakest concrete', high: 'the strongest concrete' },
};

const LINK = 'text-ink underline decoration-concrete-edge hover:decoration-current';

function findingText({ axis, end, value, isBestThere, share }: EdgeFinding, reader: MeasureReader): string {
  const words = WORDS[axis];
  const place = `${words[end]} asked for, ${formatQuantity(value, words.kind, reader.units)}`;
  const part = `${formatNumber(share * 100, 2, true)} % of the front`;
  if (!isBestThere) return `${part} lies at ${place}.`;
  return share > 0 && share < 1
    ? `The best lies at ${place}, with ${part}.`
    : share === 1
      ? `The whole front lies at ${place}.`
      : `The best lies at ${place}.`;
}

function Extend({ finding, props }: { readonly finding: EdgeFinding; readonly props: EdgeOffersProps }) {
  const { run, view, reader, onVary, isBusy } = props;
  const { axis, extended } = finding;
  if (extended === null || onVary === null) return null;
  const { symbol, kind } = WORDS[axis];
  const to = formatQuantity(extended.to, kind, reader.units);
  const { space, demand } = extended.definition;
  const setting = { space, demand, basis: run.basis, units: reader.units };
  const missing = [view.x, view.y, run.definition.view.x, run.definition.view.y]
    .map((measure) => unavailableReason(measure, setting))
    .find((reason) => reason !== null);
  if (missing !== undefined) return <span> Past it, {missing}.</span>;
  return (
    <Button
      className="px-2 py-0.5 text-sm"
      isBusy={isBusy}
      onClick={() => onVary({ definition: extended.definition, words: `${symbol} to ${to}` })}
    >
      Extend to {to} and run
    </Button>
  );
}

/** A cap proposed for a first try: nine tenths of the depth that won. */
const FIRST_CAP = 0.9;

function CapDepth({ props, onDone }: { readonly props: EdgeOffersProps; readonly onDone: () => void }) {
  const { run, result, source, reader, onVary, isBusy } = props;
  const best = result.front[0];
  const depths = expandAxis(run.definition.space.depth);
  const wished = (best === undefined ? 0 : source.sectionAt(best.index).depthMm) * FIRST_CAP;
  const [capMm, setCapMm] = useState<number | null>(
    depths.findLast((depth) => depth <= wished) ?? depths[0] ?? null,
  );
  const isSound = capMm !== null && Number.isFinite(capMm) && capMm > 0;
  const send = () => {
    if (!isSound || onVary === null) return;
    const definition = { ...run.definition, demand: { ...run.definition.demand, depthCapMm: capMm } };
    onVary({ definition, words: `h at most ${formatQuantity(capMm, 'length', reader.units)}` });
  };
  return (
    <form
      className="mt-1 flex flex-wrap items-end gap-3"
      onSubmit={(event) => {
        event.preventDefault();
        send();
      }}
    >
      <NumberField
        label="Depth h at most"
        kind="length"
        units={reader.units}
        value={capMm}
        onChange={setCapMm}
        className="w-40"
      />
      <Button type="submit" className="px-2 py-0.5 text-sm" isBusy={isBusy} disabled={!isSound}>
        Run with this cap
      </Button>
      <Button look="text" className="text-sm" onClick={onDone}>
        Not now
      </Button>
    </form>
  );
}

/** Least steel drives every section to the deepest, strongest and widest there is: what to ask beside it. */
function OtherQuestions({ props }: { readonly props: EdgeOffersProps }) {
  const { view, isCostAvailable, onView, onVary } = props;
  const [isCapping, setCapping] = useState(false);
  const offers = [
    ...(isCostAvailable && view.x !== 'costPerM' && view.y !== 'costPerM'
      ? [{ words: 'compare cost with formwork', act: () => onView({ x: 'costPerM', y: view.y }) }]
      : []),
    ...(view.x !== 'depthMm' && view.y !== 'depthMm'
      ? [{ words: 'set depth against it', act: () => onView({ x: view.x, y: 'depthMm' as const }) }]
      : []),
    ...(onVary === null ? [] : [{ words: 'cap the depth', act: () => setCapping(true) }]),
  ];
  if (offers.length === 0) return null;
  return (
    <>
      <p>
        {view.x === 'steelKgPerM' && 'By steel alone the deepest, widest and strongest section always wins. '}
        One may{' '}
        {offers.map(({ words, act }, k) => (
          <span key={words}>
            {k > 0 && (k === offers.length - 1 ? ' or ' : ', ')}
            <button type="button" className={LINK} onClick={act}>
              {words}
            </button>
          </span>
        ))}
        .
      </p>
      {isCapping && <CapDepth props={props} onDone={() => setCapping(false)} />}
    </>
  );
}

/** Where a range stops before the best does: said at once, with the way on. */
export function EdgeOffers(props: EdgeOffersProps) {
  const { run, result, source, reader } = props;
  const findings = useMemo(
    () => edgeFindings(result, run.definition, source),
    [result, run.definition, source],
  );
  if (findings.length === 0) return null;
  const isPinnedHigh = findings.some(({ end }) => end === 'high');
  return (
    <section
      aria-label="At the end of a range"
      className="grid gap-1.5 border-l-2 border-near-mark py-0.5 pl-3 text-sm text-muted print:hidden"
    >
      <ul className="grid gap-1.5">
        {findings.map((finding) => (
          <li key={`${finding.axis} ${finding.end}`} className="flex flex-wrap items-center gap-x-3 gap-y-1">
            <span>{findingText(finding, reader)}</span>
            <Extend finding={finding} props={props} />
          </li>
        ))}
      </ul>
      {isPinnedHigh && <OtherQuestions props={props} />}
    </section>
  );
}
