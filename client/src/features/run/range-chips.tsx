import { formatWhole } from '#shared/print/format-quantity.ts';
import { Button } from '#client/src/ui/button.tsx';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import { rangeWords } from '#shared/print/range-words.ts';
import { filterEntries, withRange } from '#shared/sweep/range-filters.ts';
import type { Explore } from './use-explore.ts';

interface RangeChipsProps {
  readonly explore: Explore;
  /** Sections of the whole run that meet every check, and on its front. */
  readonly feasible: number | null;
  readonly frontCount: number;
  readonly reader: MeasureReader;
}

/** The ranges that are set, in sight of everything they act on, and what lies within them. Nothing but a hand takes one out. */
export function RangeChips({ explore, feasible, frontCount, reader }: RangeChipsProps) {
  const { filters, setFilters, shown, state } = explore;
  const entries = filterEntries(filters);
  if (entries.length === 0) return null;
  const found =
    shown.count === null || feasible === null
      ? `${formatWhole(shown.front.length)} of the ${formatWhole(frontCount)} sections on the front${state === 'coming' ? ', counting all …' : ''}`
      : `${formatWhole(shown.count)} of ${formatWhole(feasible)} sections, front ${formatWhole(shown.front.length)}`;
  return (
    <section
      aria-label="Ranges set"
      className="flex flex-wrap items-center gap-x-2 gap-y-1.5 border-b border-ink pb-2 text-sm"
    >
      <span className="text-xs font-semibold text-muted">Only</span>
      {entries.map(([key, range]) => {
        const words = rangeWords(key, range, reader);
        return (
          <span key={key} className="inline-flex items-center border border-ink">
            <span className="num px-2 py-0.5">{words}</span>
            <button
              type="button"
              aria-label={`Take out ${words}`}
              className="min-h-6 min-w-6 border-l border-rule leading-none hover:bg-ink hover:text-paper"
              onClick={() => setFilters(withRange(filters, key, { low: null, high: null }), true)}
            >
              ×
            </button>
          </span>
        );
      })}
      <Button look="text" className="text-sm" onClick={() => setFilters({}, true)}>
        Clear all
      </Button>
      <span className="num ml-auto text-muted" role="status">
        {found}
      </span>
    </section>
  );
}
