import type { DisplayKind } from '../print/units.ts';

/** An amount per length of beam before it is numbered and printed. */
export interface QuantityItem {
  readonly id: string;
  readonly item: string;
  readonly how: string;
  readonly value: number | null;
  readonly kind: DisplayKind;
}
