import type { SweepDefinition } from '#shared/contract/sweep-definition.ts';
import type { CheckId } from '#shared/engine/evaluation.ts';
import { checkLabel } from '#shared/print/check-labels.ts';
import { formatQuantity } from '#shared/print/format-quantity.ts';
import type { MeasureReader } from '#shared/print/measure-reader.ts';

/** What a check asks for in this run, short enough for a sentence: `μφ ≥ 6`, `h ≤ 28 in`, `the bar fit`. */
export function checkWords(
  check: CheckId,
  { demand, rules }: Pick<SweepDefinition, 'demand' | 'rules'>,
  { units, code }: MeasureReader,
): string {
  const { symbol } = checkLabel(check, code);
  const length = (mm: number) => formatQuantity(mm, 'length', units);
  if (check === 'strength' && demand.muNmm !== null)
    return `${symbol} ≥ ${formatQuantity(demand.muNmm, 'moment', units)}`;
  if (check === 'curvature-ductility' && demand.ductilityTarget !== null)
    return `μφ ≥ ${formatQuantity(demand.ductilityTarget, 'count', units)}`;
  if (check === 'shear' && typeof demand.vuN === 'number')
    return `${symbol} ≥ ${formatQuantity(demand.vuN, 'force', units)}`;
  if (check === 'depth-cap' && demand.depthCapMm !== null) return `h ≤ ${length(demand.depthCapMm)}`;
  if (check === 'column-width' && rules.columnWidthMm !== null) return `b = ${length(rules.columnWidthMm)}`;
  if (check === 'compression-share' && rules.minCompressionShare !== null)
    return `${symbol} ≥ ${formatQuantity(rules.minCompressionShare, 'percent', units)}`;
  return `the ${checkLabel(check).name.toLowerCase()}`;
}
