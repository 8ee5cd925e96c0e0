import type { UnitSystem } from '../contract/design-basis.ts';
import type { SheetValue } from '../contract/records.ts';
import { formatNumber } from '../print/format-quantity.ts';
import { toDisplay } from '../print/units.ts';
import type { NumberedLine } from './sheet.ts';

/** A checker's own value meets the sheet's within this share of it. */
export const OWN_VALUE_TOLERANCE = 0.01;

export interface OwnValueComparison {
  readonly meets: boolean;
  /** (own − sheet)/sheet in per cent, `+0.12 %`; empty where the sheet's value is nought. */
  readonly difference: string;
}

/** Slack for a difference of exactly the tolerance, which a double cannot always hold. */
const SLACK = 1e-9;

export function compareOwnValue(own: number, onSheet: number): OwnValueComparison {
  if (onSheet === 0) return { meets: own === 0, difference: '' };
  const share = (own - onSheet) / Math.abs(onSheet);
  return { meets: Math.abs(share) <= OWN_VALUE_TOLERANCE + SLACK, difference: percentText(100 * share) };
}

/** Two decimals; beyond a hundred per cent none, where the typed unit was most likely another one. */
function percentText(percent: number): string {
  const size = Math.abs(percent);
  const digits = size >= 100 ? Math.round(Math.min(size, 1e6)).toLocaleString('en-US') : size.toFixed(2);
  const sign = Number(digits.replaceAll(',', '')) === 0 ? '±' : percent < 0 ? '−' : '+';
  return `${sign}${digits}\u00a0%`;
}

export interface OwnValueText extends OwnValueComparison {
  readonly amount: string;
  /** The verdict as a word; the shape comes with the page. */
  readonly word: 'meets' | 'differs';
  readonly by: string;
}

/** Own values for a line as they are printed, those of each person. */
export function ownValueTexts(
  values: readonly SheetValue[],
  line: NumberedLine,
  units: UnitSystem,
): OwnValueText[] {
  return values
    .filter((value) => value.line === line.id)
    .map(({ value, onSheet, by }) => {
      const compared = compareOwnValue(value, onSheet);
      return {
        ...compared,
        // As it was written: a slide rule's three figures are not made five.
        amount: formatNumber(toDisplay(value, line.kind, units), 5, true),
        word: compared.meets ? 'meets' : 'differs',
        by: by.name,
      };
    });
}
