import type { UnitSystem } from '../contract/design-basis.ts';
import type { ResolvedFlange } from '../engine/flange.ts';
import { formatQuantity } from './format-quantity.ts';

const SHAPE = { t: 'T', l: 'L' } as const;
const FACE = { compression: 'in compression', tension: 'in tension' } as const;

/** `T, 72 × 4 in, in compression`: the slab that counts, effective width by thickness. */
export function flangeText(flange: ResolvedFlange, units: UnitSystem): string {
  const width = formatQuantity(flange.widthMm, 'length', units, { hideUnit: true });
  return `${SHAPE[flange.shape]}, ${width} × ${formatQuantity(flange.thicknessMm, 'length', units)}, ${FACE[flange.face]}`;
}
