import type { MeasureId } from '#shared/engine/measures.ts';
import { formatMoney, formatNumber, formatQuantity } from '#shared/print/format-quantity.ts';
import { measureLabel } from '#shared/print/measure-labels.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';
import { displayUnit } from '#shared/print/units.ts';
import type { ChartAxis } from '#client/src/charts/front-chart-input.ts';

/** One measure's value as a reader meets it: `18.9 lb/ft`, `USD 99.2/ft`, `6.02`. */
export function measureText(
  measure: MeasureId,
  value: number | null,
  reader: MeasureReader,
  hideUnit = false,
): string {
  const { kind } = measureLabel(measure, reader.units);
  if (kind === 'money-per-length' && !hideUnit)
    return formatMoney(value, reader.currency, kind, reader.units);
  return formatQuantity(value, kind, reader.units, { hideUnit });
}

const unitText = (measure: MeasureId, { units, currency }: MeasureReader): string => {
  const label = measureLabel(measure, units);
  return label.kind === 'money-per-length' ? `${currency ?? ''}${label.unit}` : label.unit;
};

/** The measure as an axis of the chart. */
export function chartAxis(measure: MeasureId, reader: MeasureReader, isLog: boolean): ChartAxis {
  const label = measureLabel(measure, reader.units, reader.code);
  const isNamed = label.symbol === label.name || label.kind === 'co2e-per-length';
  return {
    title: isNamed ? label.name : `${label.name} ${label.symbol}`,
    unit: unitText(measure, reader),
    direction: label.better,
    isLog,
    perSi: 1 / displayUnit(label.kind, reader.units).perUnit,
    formatTick: (shown) => formatNumber(shown, 6, true),
  };
}
