import { useMemo } from 'react';
import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { Candidate } from '#shared/contract/records.ts';
import { useSearchValue } from '#client/src/lib/use-search-value.ts';
import { LazyCurveComparison } from '#client/src/study/lazy-curve-comparison.tsx';
import { SelectField } from '#client/src/ui/select-field.tsx';
import { CompareTable } from './compare-table.tsx';
import { areComparable } from './comparison.ts';
import { PriceFlipNote } from './price-flip-note.tsx';
import { COMPARE_MIN } from './selection.ts';

interface ComparePanelProps {
  readonly candidates: readonly Candidate[];
  readonly units: UnitSystem;
  readonly hasMoney: boolean;
}

const NO_BASELINE = '';

export function ComparePanel({ candidates, units, hasMoney }: ComparePanelProps) {
  const [baselineId, setBaseline] = useSearchValue(
    'base',
    (id) => candidates.find((candidate) => candidate.id === id)?.id ?? null,
  );
  const curves = useMemo(
    () =>
      candidates.map(({ id, label, snapshot: { section, basis, demand, rules } }) => ({
        id,
        label,
        section,
        context: { basis, demand, rules },
      })),
    [candidates],
  );
  if (candidates.length === 0) return null;
  return (
    <section aria-label="Side by side" className="border-t border-ink pt-4">
      <div className="mb-4 flex flex-wrap items-end justify-between gap-x-8 gap-y-3">
        <h2 className="text-lg font-semibold">Side by side</h2>
        {candidates.length >= COMPARE_MIN && (
          <SelectField
            className="w-56"
            label="Differences to"
            value={baselineId ?? NO_BASELINE}
            onChange={(event) => setBaseline(event.target.value === NO_BASELINE ? null : event.target.value)}
            options={[
              { value: NO_BASELINE, label: 'none' },
              ...candidates.map((candidate) => ({
                value: candidate.id,
                label: `${candidate.label}, ${candidate.beam.mark}`,
              })),
            ]}
          />
        )}
      </div>
      {candidates.length < COMPARE_MIN ? (
        <p className="text-muted">Tick one more candidate to compare it with {candidates[0]!.label}.</p>
      ) : (
        <>
          {!areComparable(candidates) && (
            <p className="mb-3 text-sm text-muted">
              These candidates are for different beams: no best is named, and totals are each beam’s own.
            </p>
          )}
          <CompareTable candidates={candidates} units={units} baselineId={baselineId} hasMoney={hasMoney} />
          {hasMoney && <PriceFlipNote candidates={candidates} />}
          <section className="mt-8" aria-label="Curves of all">
            <h3 className="mb-2 border-t border-ink pt-2 font-semibold">
              Moment–curvature, one over the other
            </h3>
            <LazyCurveComparison sections={curves} units={units} />
          </section>
        </>
      )}
    </section>
  );
}
