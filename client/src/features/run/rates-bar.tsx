import { useId, useState } from 'react';
import { LEAST_CHANGE, MOST_CHANGE, RATE_KEYS, type RateKey } from '#shared/sweep/rate-changes.ts';
import { formatWhole } from '#shared/print/format-quantity.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import { messageOf } from '#client/src/lib/api-error.ts';
import { Button } from '#client/src/ui/button.tsx';
import { NumberField } from '#client/src/ui/number-field.tsx';
import { rateName, ratesText, ratesWords, withBase, withChange, type AskedRates } from './asked-rates.ts';
import { winnerWords } from './ranking-words.ts';
import type { RunAddressControls } from './use-run-address.ts';
import type { RankedRun } from './use-ranking.ts';

interface RatesBarProps {
  readonly ranked: RankedRun;
  readonly address: RunAddressControls;
  readonly reader: MeasureReader;
}

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

const isOutOfBounds = (share: number | null) =>
  share !== null && (share * 100 < LEAST_CHANGE || share * 100 > MOST_CHANGE);

/** One rate's change; what cannot be read or is out of bounds changes nothing yet. */
function ChangeField(props: {
  readonly rate: RateKey;
  readonly asked: AskedRates | null;
  readonly onChange: (asked: AskedRates | null) => void;
}) {
  const { rate, onChange } = props;
  const asked = props.asked ?? { base: 'run', changes: {} };
  const percent = asked.changes[rate] ?? 0;
  const [typed, setTyped] = useState({ share: percent === 0 ? null : percent / 100, percent });
  // A minus sign alone is on its way to a number: it stays while the address stays.
  const share = typed.percent === percent ? typed.share : percent === 0 ? null : percent / 100;
  const take = (next: number | null) => {
    const wanted = Math.round((next ?? 0) * 1e4) / 100;
    const isTaken = wanted >= LEAST_CHANGE && wanted <= MOST_CHANGE;
    setTyped({ share: next, percent: isTaken ? wanted : percent });
    if (isTaken && wanted !== percent) onChange(withChange(asked, rate, wanted));
  };
  return (
    <NumberField
      label={capital(rateName(rate))}
      kind="percent"
      units="si"
      value={share}
      error={isOutOfBounds(share) ? `From ${LEAST_CHANGE} % to ${MOST_CHANGE} %` : null}
      placeholder="0"
      onChange={take}
    />
  );
}

function Outcome({ ranked, reader, address }: RatesBarProps) {
  const { asked, ranking, isBusy, error, retry } = ranked;
  if (asked === null) return null;
  return (
    <div className="grid gap-1 border-l-4 border-near-mark bg-sheet py-1.5 pl-3 text-sm" role="status">
      <p>
        <strong className="font-semibold">Ranked at {ratesWords(asked)}.</strong> Not the run’s own record:
        the run and what is pinned from it keep the rates they were frozen with.
      </p>
      {error !== null ? (
        <p className="text-fails">
          {messageOf(error)}{' '}
          <Button look="text" onClick={retry}>
            Try again
          </Button>
        </p>
      ) : ranking === null ? (
        <p className="text-muted">Ranking the sections…</p>
      ) : (
        <p className={isBusy ? 'text-muted' : undefined}>
          {winnerWords(ranking, reader)}{' '}
          <span className="text-muted">{formatWhole(ranking.bandCount)} in the near-best band.</span>
        </p>
      )}
      <p>
        <Button look="text" onClick={() => address.write({ rates: null })}>
          Back to the run’s own rates
        </Button>
      </p>
    </div>
  );
}

/** At which rates the run's sections are ranked: its own, or others, which are then said not to be its own. */
export function RatesBar(props: RatesBarProps) {
  const { ranked, address } = props;
  const id = useId();
  const asked = ranked.asked;
  const write = (next: AskedRates | null) => address.write({ rates: ratesText(next) });
  if (!ranked.isOffered) return null;
  return (
    <section aria-label="Rates ranked by" className="grid gap-1.5">
      <div className="flex flex-wrap items-baseline gap-x-3 gap-y-1 text-sm text-muted">
        <label htmlFor={id}>Rates</label>
        <select
          id={id}
          value={asked?.base ?? 'run'}
          className="ruled max-w-56 bg-paper py-0.5 text-ink"
          onChange={(event) => write(withBase(asked, event.target.value === 'today' ? 'today' : 'run'))}
        >
          <option value="run">the run’s own</option>
          <option value="today">price book of today</option>
        </select>
        <details className="min-w-0 flex-1">
          <summary className="w-fit underline decoration-concrete-edge">
            {asked !== null && Object.keys(asked.changes).length > 0 ? 'Changed' : 'Change'} by per cent
          </summary>
          <div className="grid grid-cols-2 gap-x-4 gap-y-2 pt-2 sm:grid-cols-3">
            {RATE_KEYS.map((rate) => (
              <ChangeField key={rate} rate={rate} asked={asked} onChange={write} />
            ))}
          </div>
        </details>
      </div>
      <Outcome {...props} />
    </section>
  );
}
