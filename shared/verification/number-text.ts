import type { Allowed, Comparison } from './comparison.ts';

/** Below this a relative difference is the rounding of the arithmetic itself, and may be another on another machine. */
const NOISE = 1e-12;
/** Below this a relative difference is no longer told by its figures. */
const LEAST_PERCENT_SHOWN = 1e-5;
const POWER_BELOW = 1e-4;
const POWER_FROM = 1e7;
/** A double holds more, but the last ones may differ from machine to machine. */
const MOST_DIGITS = 10;
const LEAST_DIGITS = 4;

const SUPERSCRIPT: Readonly<Record<string, string>> = {
  '-': '⁻',
  '0': '⁰',
  '1': '¹',
  '2': '²',
  '3': '³',
  '4': '⁴',
  '5': '⁵',
  '6': '⁶',
  '7': '⁷',
  '8': '⁸',
  '9': '⁹',
};

const tenTo = (exponent: number) => `10${[...String(exponent)].map((c) => SUPERSCRIPT[c]).join('')}`;

/** Significant figures a number is written with: 285 has three, 0.00788 three, 3.95e-5 three. */
const figuresOf = (value: number) =>
  value
    .toExponential()
    .replace(/e.*$/, '')
    .replace(/[^0-9]/g, '').length;

/** At most `digits` figures, zeros at the end dropped unless `isPadded`; thousands grouped, a true minus. */
function written(value: number, digits: number, isPadded: boolean): string {
  if (!Number.isFinite(value)) return 'no number';
  if (value === 0) return '0';
  const size = Math.abs(value);
  const sign = value < 0 ? '−' : '';
  const [mantissa, power] = size.toExponential(digits - 1).split('e') as [string, string];
  const exponent = Number(power);
  if (size < POWER_BELOW || size >= POWER_FROM)
    return `${sign}${isPadded ? mantissa : String(Number(mantissa))} × ${tenTo(exponent)}`;
  const decimals = Math.max(0, digits - 1 - exponent);
  return (
    sign +
    Number(size.toPrecision(digits)).toLocaleString('en-US', {
      minimumFractionDigits: isPadded ? decimals : 0,
      maximumFractionDigits: decimals,
    })
  );
}

export const printedText = (value: number): string => written(value, MOST_DIGITS, false);

/** Ours with two figures more than the printed one has, so that the difference can be seen. */
export function computedText({ printed, computed }: Comparison): string {
  const digits = Math.min(MOST_DIGITS, Math.max(LEAST_DIGITS, figuresOf(printed) + 2));
  return written(computed, digits, true);
}

function percent(share: number): string {
  if (Number.isNaN(share)) return 'no number';
  if (share < NOISE) return '0 %';
  if (share < LEAST_PERCENT_SHOWN) return '< 0.001 %';
  return `${written(share * 100, 2, false)} %`;
}

/** Ours less the printed value, of the printed value. */
export function differenceText({ printed, computed, relative }: Comparison): string {
  const text = percent(relative);
  if (relative < LEAST_PERCENT_SHOWN || Number.isNaN(relative)) return text;
  return `${computed > printed ? '+' : '−'}${text}`;
}

/** The size of a difference, without its sense. */
export const differenceSizeText = ({ relative }: Comparison): string => percent(relative);

export function allowedText(allowed: Allowed): string {
  if (allowed.kind === 'below') return 'below printed';
  if (allowed.kind === 'absolute') return `± ${written(allowed.by, 3, false)}`;
  return `± ${written(allowed.by * 100, 2, false)} %`;
}
