import { formatQuantity } from '../print/format-quantity.ts';

/** Below this the rest is the rounding of the arithmetic. */
const ROUNDING = 1e-12;

/** What equilibrium leaves over, as a share. */
export const residualText = (value: number): string =>
  Math.abs(value) < ROUNDING ? 'under 10⁻¹²' : formatQuantity(value, 'ratio', 'si', { digits: 2 });
