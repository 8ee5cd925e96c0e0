import type { UnitSystem } from '../contract/design-basis.ts';
import { isInputKey, type ExploreKey, type InputKey } from '../sweep/explore-axis.ts';
import { codeSymbols } from './code-symbols.ts';
import { formatQuantity } from './format-quantity.ts';
import { measureLabel } from './measure-labels.ts';
import type { MeasureReader } from './measure-reader.ts';
import { unitLabel, type DisplayKind } from './units.ts';

export interface ExploreLabel {
  readonly name: string;
  readonly symbol: string;
  readonly kind: DisplayKind;
  /** With the currency where it is money; empty for a plain number. */
  readonly unit: string;
}

const INPUTS: Readonly<Record<InputKey, Omit<ExploreLabel, 'unit'>>> = {
  fc: { name: 'Concrete', symbol: 'f′c', kind: 'stress' },
  tensionSteel: { name: 'Tension steel', symbol: 'As', kind: 'area' },
  compressionSteel: { name: 'Compression steel', symbol: 'A′s', kind: 'area' },
  fy: { name: 'Steel', symbol: 'fy', kind: 'stress' },
  cover: { name: 'Clear cover', symbol: 'cover', kind: 'length' },
};

/** Strengths in the letters of the code. */
function inputLabel(key: InputKey, code: MeasureReader['code']): Omit<ExploreLabel, 'unit'> {
  if (code === undefined || (key !== 'fc' && key !== 'fy')) return INPUTS[key];
  return { ...INPUTS[key], symbol: codeSymbols(code)[key] };
}

export function exploreLabel(key: ExploreKey, { units, currency, code }: MeasureReader): ExploreLabel {
  const label = isInputKey(key) ? inputLabel(key, code) : measureLabel(key, units, code);
  const unit = unitLabel(label.kind, units);
  const { name, symbol, kind } = label;
  return { name, symbol, kind, unit: kind === 'money-per-length' ? `${currency ?? ''}${unit}` : unit };
}

/** `Depth h`, and `Steel` or `Clear cover` where the symbol is the name or its last word. */
export const exploreTitle = ({ name, symbol }: Pick<ExploreLabel, 'name' | 'symbol'>): string =>
  name === symbol || name.endsWith(` ${symbol}`) ? name : `${name} ${symbol}`;

/** The value with its unit, as in `24 in` and `72.7 USD/ft`. */
export function exploreText(key: ExploreKey, value: number | null, reader: MeasureReader): string {
  const { kind, unit } = exploreLabel(key, reader);
  const number = formatQuantity(value, kind, reader.units, { hideUnit: true });
  return number === '' || unit === '' ? number : `${number} ${unit}`;
}

export const bareText = (key: ExploreKey, value: number | null, units: UnitSystem): string =>
  formatQuantity(value, exploreLabel(key, { units, currency: null }).kind, units, { hideUnit: true });
