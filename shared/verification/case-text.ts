import type { Comparison } from './comparison.ts';
import { printedText } from './number-text.ts';
import type { CaseValue, Provenance, PublishedCase } from './published-case.ts';

/** Names of the case files as the trade writes them; what follows a name there stays as words. */
const SYMBOLS: readonly (readonly [key: string, symbol: string])[] = [
  ['phiMn', 'φMn'],
  ['phiVc', 'φVc'],
  ['phiVs', 'φVs'],
  ['phi_cr', 'φcr'],
  ['phi_y', 'φy'],
  ['phi_u', 'φu'],
  ['phi', 'φ'],
  ['eps_t', 'εt'],
  ['eps', 'ε'],
  ['rho_b', 'ρb'],
  ['rho_min', 'ρmin'],
  ['rho_max', 'ρmax'],
  ['mu_phi', 'μφ'],
  ['mu_delta', 'μΔ'],
  ['beta1', 'β1'],
  ['As_min', 'As,min'],
  ['As_req', 'As,req'],
  ['As2', 'A′s'],
  ['d2', 'd′'],
  ['fs2', 'f′s'],
  ['fc_top', 'fc top'],
  ['fc_at_yield_share', 'fc/f′c at yield'],
  ['fc', 'f′c'],
  ['c_dt', 'c/dt'],
  ['z_over_d', 'z/d'],
  ['fl_over_fco', 'f′l/f′co'],
  ['lp_over_l', 'lp/l'],
];

/** `phi_14_at_c_dt_0p5` → `φ 14 at c/dt 0.5`. */
function symbolText(key: string): string {
  const start = SYMBOLS.find(([name]) => key === name || key.startsWith(`${name}_`));
  const rest = start ? key.slice(start[0].length) : key;
  const words = rest
    .replaceAll(/(\d)p(\d)/g, '$1.$2')
    .replaceAll('c_dt', 'c/dt')
    .replaceAll('_', ' ')
    .replaceAll(/\b(mm|in)2\b/g, '$1²')
    .replaceAll(/\bphi/g, 'φ')
    .replaceAll(/\beps\b/g, 'ε')
    .replaceAll(/\brho\b/g, 'ρ');
  return `${start?.[1] ?? ''}${words}`.trim();
}

function valueText(value: CaseValue): string {
  if (value === null) return 'left out';
  if (typeof value === 'number') return printedText(value);
  if (typeof value === 'string') return value;
  if (Array.isArray(value)) {
    const items = value as readonly CaseValue[];
    return items.some(Array.isArray)
      ? items.map((item) => `(${valueText(item)})`).join(', ')
      : items.map(valueText).join(', ');
  }
  return Object.entries(value)
    .map(([key, inner]) => `${symbolText(key)} ${valueText(inner)}`)
    .join(', ');
}

/** What a comparison is of: the quantity and, in a list, the inputs it belongs to. */
export const quantityText = ({ quantity }: Comparison): string => symbolText(quantity);

export const placeText = ({ places }: Comparison): string =>
  places
    .map(({ input, value }) => `${input === null ? '' : `${symbolText(input)} `}${valueText(value)}`)
    .join('; ');

/** The inputs one by one, in the units of the source. */
export const inputTexts = ({ inputs }: PublishedCase): { readonly name: string; readonly text: string }[] =>
  Object.entries(inputs).map(([key, value]) => ({ name: symbolText(key), text: valueText(value) }));

/** `length in, stress psi`; null where the numbers have no units or name their own. */
export const unitsText = ({ units }: PublishedCase): string | null =>
  units
    ? Object.entries(units)
        .map(([quantity, unit]) => `${quantity} ${unit}`)
        .join(', ')
    : null;

export const PROVENANCE_TEXT: Readonly<Record<Provenance, string>> = {
  read: 'read in the source',
  memory: 'from memory',
  derived: 'worked out for this project',
};

export function provenanceText({ provenance, provenance_note, recall_confidence }: PublishedCase): string {
  const more = provenance_note ?? (recall_confidence === undefined ? '' : `recall ${recall_confidence}`);
  return more === '' ? PROVENANCE_TEXT[provenance] : `${PROVENANCE_TEXT[provenance]}: ${more}`;
}
