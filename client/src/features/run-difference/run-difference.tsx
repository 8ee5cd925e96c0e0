import { useMemo, type ReactNode } from 'react';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { BestsTable } from './bests-table.tsx';
import type { ComparedRuns } from './compared-run.ts';
import { CountsTable } from './counts-table.tsx';
import { FrontChanges } from './front-changes.tsx';
import { inputDifferences } from './input-differences.ts';
import { InputsTable } from './inputs-table.tsx';
import { WinnersTable } from './winners-table.tsx';

interface RunDifferenceProps extends ComparedRuns {
  readonly units: UnitSystem;
}

function Part({
  title,
  lead,
  children,
}: {
  readonly title: string;
  readonly lead?: string;
  readonly children: ReactNode;
}) {
  return (
    <section aria-label={title} className="border-t border-ink pt-2 pb-7">
      <h2 className="pb-2 text-sm font-semibold">
        {title}
        {lead !== undefined && <span className="font-normal text-muted"> {lead}</span>}
      </h2>
      {children}
    </section>
  );
}

/** One run set against another: the winners, what was asked otherwise, and what came of it. */
export function RunDifference({ baseline, other, units }: RunDifferenceProps) {
  const differences = useMemo(
    () => inputDifferences(baseline.run, other.run, units),
    [baseline.run, other.run, units],
  );
  const currency = baseline.run.basis.rates?.currency ?? other.run.basis.rates?.currency ?? null;
  const reader = { units, currency, code: other.run.basis.ruleSet };
  const compared = { baseline, other };
  const isSameResult = baseline.result.hash === other.result.hash;
  return (
    <div className="grid grid-cols-[minmax(0,1fr)]">
      {isSameResult && (
        <p className="mb-5 border-l-2 border-meets py-1 pl-3">
          Both gave the same result: <span className="num">{other.result.hash}</span>.
        </p>
      )}
      <Part title="The best of each">
        <WinnersTable {...compared} reader={reader} />
      </Part>
      <Part title="What was asked otherwise" lead="ranges, demand, rules, design basis, rates, engine">
        <InputsTable
          differences={differences}
          names={[`Run ${baseline.run.number}`, `Run ${other.run.number}`]}
        />
      </Part>
      <Part title="The front">
        <FrontChanges {...compared} reader={reader} />
      </Part>
      <Part title="The best of each measure by itself">
        <BestsTable {...compared} reader={reader} />
      </Part>
      <Part title="How many">
        <CountsTable {...compared} />
      </Part>
    </div>
  );
}
