import type { UnitSystem } from '#shared/contract/design-basis.ts';
import { expandAxis } from '#shared/sweep/axis.ts';
import { parseValueList } from '#client/src/lib/value-list.ts';
import { AXIS_KIND } from './read-sweep-form.ts';
import { axisCount } from './space-estimate.ts';
import type { AxisName, AxisValues } from './sweep-form-values.ts';

/** The values an axis makes as typed; none while it cannot be read. */
export function axisValues(axis: AxisValues, name: AxisName, units: UnitSystem): readonly number[] {
  if (axisCount(axis, name, units) === null) return [];
  if (axis.kind === 'range')
    return expandAxis({ kind: 'range', from: axis.from!, to: axis.to!, step: axis.step! });
  const list = parseValueList(axis.listText, AXIS_KIND[name], units);
  return list.kind === 'values' ? list.values : [];
}
