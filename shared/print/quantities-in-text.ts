import type { UnitSystem } from '../contract/design-basis.ts';
import { formatQuantity } from './format-quantity.ts';
import type { DisplayKind } from './units.ts';

const KIND_OF_SI_UNIT: Readonly<Record<string, readonly [kind: DisplayKind, factor: number]>> = {
  mm: ['length', 1],
  'mm²': ['area', 1],
  MPa: ['stress', 1],
  'N·mm': ['moment', 1],
  'kN·m': ['moment', 1e6],
  N: ['force', 1],
  kN: ['force', 1000],
  'kg/m': ['mass-per-length', 1],
};

/** Units of storage that nobody reads, in either system. */
const STORED_ONLY = ['N·mm', 'N'];

const SI_QUANTITY = /(-?\d[\d,]*(?:\.\d+)?(?:e[+-]?\d+)?) (N·mm|kN·m|mm²|mm|MPa|kN|N|kg\/m)(?![\w·²³⁴/])/g;

/**
 * Messages of the contract and reasons of the engine speak SI. Their quantities are printed again in the reader's units,
 * so that someone typing inches is not told a limit in millimetres.
 */
export function quantitiesInText(text: string, units: UnitSystem): string {
  return text.replace(SI_QUANTITY, (whole, digits: string, unit: string) => {
    const known = KIND_OF_SI_UNIT[unit];
    if (known === undefined || (units === 'si' && !STORED_ONLY.includes(unit))) return whole;
    const [kind, factor] = known;
    return formatQuantity(Number(digits.replaceAll(',', '')) * factor, kind, units);
  });
}
