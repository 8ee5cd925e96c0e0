import { formatNumber } from '../print/format-quantity.ts';

/** Three decimals, and never `1.000` for a ratio that is past its limit. */
export function ratioText(ratio: number): string {
  if (ratio > 99) return '> 99';
  if (ratio > 1 && ratio < 1.0005) return formatNumber(ratio, 7);
  return ratio.toFixed(3);
}
