import type { ShearConstants } from '../engine/shear.ts';
import type { FaceEntry } from './face-table.ts';
import type { ConcreteConstants, Placement } from './prepared-sweep.ts';

/** One combination of everything but the depth. */
export interface Combination {
  readonly placement: Placement;
  readonly tension: FaceEntry;
  readonly compression: FaceEntry;
  readonly concrete: ConcreteConstants;
  readonly shear: ShearConstants;
  readonly fyMPa: number;
}
