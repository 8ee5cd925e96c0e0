import type { MeasureId } from '#shared/engine/measures.ts';
import type { View } from '#shared/sweep/problem.ts';
import type { ViewResult } from '#shared/sweep/result.ts';
import type { SectionSource } from './section-source.ts';

interface SteelAloneNoteProps {
  readonly result: ViewResult;
  readonly source: SectionSource;
  readonly isCostAvailable: boolean;
  readonly onView: (view: View) => void;
}

/** Least steel alone drives every section to the deepest there is; said where it happens, with what to ask instead. */
export function SteelAloneNote({ result, source, isCostAvailable, onView }: SteelAloneNoteProps) {
  const best = result.front[0];
  const depths = result.axisCounts.depth.map((count) => count.value);
  if (best === undefined || result.view.x !== 'steelKgPerM' || depths.length < 2) return null;
  if (source.sectionAt(best.index).depthMm < Math.max(...depths)) return null;
  const offer = (measure: MeasureId, words: string) => (
    <button
      type="button"
      className="text-ink underline decoration-concrete-edge hover:decoration-current"
      onClick={() =>
        onView(measure === 'depthMm' ? { x: 'steelKgPerM', y: measure } : { x: measure, y: result.view.y })
      }
    >
      {words}
    </button>
  );
  return (
    <p className="border-l-2 border-near-mark py-0.5 pl-3 text-sm text-muted">
      The least steel sits at the deepest section of the range: by steel alone it always will. Compare{' '}
      {offer('depthMm', 'steel against depth')}
      {isCostAvailable && <> or {offer('costPerM', 'cost with formwork')}</>} as well.
    </p>
  );
}
