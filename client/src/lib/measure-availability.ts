import type { UnitSystem } from '#shared/contract/design-basis.ts';
import type { MeasureId } from '#shared/engine/measures.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { measureGaps, type MeasureGap, type MeasureSetting } from '#shared/sweep/measure-gaps.ts';

const MOST_NAMED = 3;
const named = (gaps: readonly string[]): string =>
  gaps.length > MOST_NAMED ? `${gaps.slice(0, MOST_NAMED).join(', ')} …` : gaps.join(', ');

function gapText(gap: MeasureGap, units: UnitSystem): string {
  if (gap.kind === 'rate') return gap.of;
  return gap.kind === 'mix' ? `concrete ${formatQuantity(gap.fcMPa, 'stress', units)}` : gap.kind;
}

/** Why a measure cannot be compared by in this space; null where it can. */
export function unavailableReason(
  measure: MeasureId,
  setting: MeasureSetting & { readonly units: UnitSystem },
): string | null {
  const gaps = measureGaps(measure, setting);
  if (gaps.length === 0) return null;
  if (measure === 'utilisation') return 'needs a moment';
  if (measure === 'barCount') return 'plain areas have no bars';
  if (setting.basis.rates === null) return 'no rates to be seen';
  const what = named(gaps.map((gap) => gapText(gap, setting.units)));
  return measure === 'costPerM' ? `no rate for ${what}` : `no factor for ${what}`;
}
