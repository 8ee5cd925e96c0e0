import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { isAtLeastTimes, isAtMostTimes, isSameLength, isWithinLength } from '#shared/engine/limits.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import { axisValues } from './axis-values.ts';
import type { SweepFormValues } from './sweep-form-values.ts';

/** What a form asks that no section of it can meet, or that takes part of it out for sure, a sentence each. */
export function askedInVain(form: SweepFormValues, units: UnitSystem): readonly string[] {
  const { demand, rules, steel } = form;
  const length = (mm: number) => formatQuantity(mm, 'length', units);
  const widths = axisValues(form.axes.width, 'width', units);
  const depths = axisValues(form.axes.depth, 'depth', units);
  if (widths.length === 0 || depths.length === 0) return [];
  const { columnWidthMm: column, minDepthToWidth: low, maxDepthToWidth: high } = rules;
  const cap = demand.depthCapMm;
  const isRatioMet = (b: number, h: number) =>
    (low === null || isAtLeastTimes(h, low, b)) && (high === null || isAtMostTimes(h, high, b));
  const chosen = [steel.tension, steel.compression].flatMap((face) =>
    face.kind === 'bars' ? face.sizes : [],
  );
  const unused = rules.excludedBars.filter((bar) => chosen.includes(bar));
  return [
    ...(column !== null && !widths.some((b) => isSameLength(b, column))
      ? [`No width is that of the column, ${length(column)}`]
      : []),
    ...(cap !== null && !depths.some((h) => isWithinLength(h, cap))
      ? [`No depth is within the cap of ${length(cap)}`]
      : []),
    ...(!widths.some((b) => depths.some((h) => isRatioMet(b, h)))
      ? ['No depth and width make an h/b that is allowed']
      : []),
    ...(unused.length > 0
      ? [`${unused.join(', ')} ${unused.length === 1 ? 'is' : 'are'} chosen, and never used by the rules`]
      : []),
  ];
}
