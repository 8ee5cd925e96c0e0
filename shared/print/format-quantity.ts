import type { UnitSystem } from '../contract/design-basis.ts';
import { displayUnit, toDisplay, type DisplayKind } from './units.ts';

interface NumberStyle {
  /** Significant figures. */
  readonly digits: number;
  /** Drop zeros at the end: for values that were chosen (27 in, 4 ksi), not computed (μφ 6.00). */
  readonly isTrimmed: boolean;
}

const CHOSEN: NumberStyle = { digits: 4, isTrimmed: true };
const COMPUTED: NumberStyle = { digits: 3, isTrimmed: false };

const STYLE: Partial<Record<DisplayKind, NumberStyle>> = {
  length: CHOSEN,
  span: CHOSEN,
  stress: CHOSEN,
  count: { digits: 6, isTrimmed: true },
  strain: { digits: 3, isTrimmed: false },
  percent: { digits: 3, isTrimmed: true },
  moment: { digits: 4, isTrimmed: true },
  force: { digits: 4, isTrimmed: true },
  money: { digits: 4, isTrimmed: true },
  'money-per-mass': CHOSEN,
  'money-per-volume': CHOSEN,
  'money-per-surface': CHOSEN,
  'co2e-per-mass': CHOSEN,
  'co2e-per-volume': CHOSEN,
};

export interface FormatOptions {
  /** Significant figures instead of the kind's own. */
  readonly digits?: number;
  /** Leave the unit out, where a heading carries it. */
  readonly hideUnit?: boolean;
}

/** Smaller than this is the rounding of the arithmetic itself, e.g. a residual of equilibrium. */
const NOISE = 1e-12;
/** Smaller than this is read more easily as a power of ten. */
const POWER_BELOW = 1e-5;

/** A number for reading: figures beyond `digits` are rounded away, thousands are grouped, minus is a true minus. */
export function formatNumber(value: number, digits = 3, isTrimmed = false): string {
  if (!Number.isFinite(value)) return '';
  if (Math.abs(value) < NOISE) return '0';
  if (Math.abs(value) < POWER_BELOW) return asPowerOfTen(value, digits);
  const rounded = Number(value.toPrecision(digits));
  const decimals = Math.max(0, digits - 1 - exponentOf(rounded));
  return withDecimals(rounded, isTrimmed ? 0 : decimals, decimals);
}

const exponentOf = (value: number): number => Math.floor(Math.log10(Math.abs(value)));

const formats = new Map<string, Intl.NumberFormat>();

/** Kept, because making one takes longer than all the rest of writing a number, and a page writes thousands. */
function formatOf(least: number, most: number): Intl.NumberFormat {
  const key = `${least} ${most}`;
  const known = formats.get(key);
  if (known !== undefined) return known;
  const made = new Intl.NumberFormat('en-US', { minimumFractionDigits: least, maximumFractionDigits: most });
  formats.set(key, made);
  return made;
}

const withDecimals = (value: number, least: number, most: number): string =>
  formatOf(least, most).format(value).replace('-', '−');

function asPowerOfTen(value: number, digits: number): string {
  const [mantissa = '', exponent = ''] = value.toExponential(digits - 1).split('e');
  const raised = [...exponent.replace('+', '')]
    .map((sign) => '⁻⁰¹²³⁴⁵⁶⁷⁸⁹'['-0123456789'.indexOf(sign)])
    .join('');
  return `${mantissa.replace('-', '−')} × 10${raised}`;
}

/** Prints a stored value in the project's units. What is not known prints as nothing, never as zero. */
export function formatQuantity(
  stored: number | null | undefined,
  kind: DisplayKind,
  units: UnitSystem,
  options: FormatOptions = {},
): string {
  if (stored === null || stored === undefined || !Number.isFinite(stored)) return '';
  const style = STYLE[kind] ?? COMPUTED;
  const text = formatNumber(toDisplay(stored, kind, units), options.digits ?? style.digits, style.isTrimmed);
  const { label } = displayUnit(kind, units);
  if (options.hideUnit || label === '') return text;
  return label === '%' || label.startsWith('/') ? `${text}${label}` : `${text} ${label}`;
}

/** Decimals a value is printed with; negative where even its tens or hundreds are rounded. */
function decimalsShown(stored: number, kind: DisplayKind, units: UnitSystem): number {
  const text = formatQuantity(stored, kind, units, { hideUnit: true });
  const decimals = text.split('.')[1]?.length ?? 0;
  if (decimals > 0 || stored === 0) return decimals;
  const { digits } = STYLE[kind] ?? COMPUTED;
  return Math.min(0, digits - 1 - exponentOf(toDisplay(stored, kind, units)));
}

/** A value's difference to a baseline, `+1.2` or `−1.2`, no finer than the two are printed. */
export function formatDifferenceTo(
  value: number,
  baseline: number,
  kind: DisplayKind,
  units: UnitSystem,
): string {
  const shown = [value, baseline].map((stored) => decimalsShown(stored, kind, units));
  const decimals = Math.min(...shown) < 0 ? Math.min(...shown) : Math.max(...shown);
  const place = 10 ** Math.max(0, -decimals);
  const difference = toDisplay(value - baseline, kind, units);
  const rounded = decimals < 0 ? Math.round(difference / place) * place : difference;
  const text = withDecimals(rounded, Math.max(0, decimals), Math.max(0, decimals));
  if (Number(text.replaceAll(',', '').replace('−', '-')) === 0) return '±0';
  return value > baseline ? `+${text}` : text;
}

/** Money with its currency in front, `USD 99.20/ft`; nothing where a rate is missing. */
export function formatMoney(
  stored: number | null | undefined,
  currency: string | null | undefined,
  kind: 'money' | 'money-per-length',
  units: UnitSystem,
): string {
  const text = formatQuantity(stored, kind, units);
  return text === '' ? '' : `${currency ?? ''} ${text}`.trim();
}

/** What a field shows for a stored value: every figure a person types, no grouping, no noise of conversion. */
export function fieldText(stored: number | null, kind: DisplayKind, units: UnitSystem): string {
  if (stored === null || !Number.isFinite(stored)) return '';
  const displayed = Number(toDisplay(stored, kind, units).toPrecision(7));
  return Math.abs(displayed) >= 1e-6 && Math.abs(displayed) < 1e15
    ? displayed.toLocaleString('en-US', { useGrouping: false, maximumFractionDigits: 9 })
    : String(displayed);
}

export const formatWhole = (value: number): string => Math.round(value).toLocaleString('en-US');

/** `1.2 s`, `340 ms`, `2 min 5 s`. */
export function formatDuration(ms: number): string {
  if (ms < 1000) return `${Math.round(ms)} ms`;
  if (ms < 60_000) return `${formatNumber(ms / 1000, 2)} s`;
  return `${Math.floor(ms / 60_000)} min ${Math.round((ms % 60_000) / 1000)} s`;
}

/** A day a reader can place at once, `14 May 2026`; with the time of day when `isTimed`. */
export function formatDate(iso: string, isTimed = false): string {
  const day: Intl.DateTimeFormatOptions = { day: 'numeric', month: 'short', year: 'numeric' };
  const time: Intl.DateTimeFormatOptions = isTimed
    ? { hour: '2-digit', minute: '2-digit', hour12: false }
    : {};
  return new Date(iso).toLocaleString('en-GB', { ...day, ...time });
}
