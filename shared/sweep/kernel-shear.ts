import { isWithinLength } from '../engine/limits.ts';
import {
  concreteShearN,
  designShearN,
  detailingSpacingMm,
  isSpacingHalved,
  longestAlongMm,
  stirrupSpacingLimitMm,
  strengthSpacingMm,
  type ShearConstants,
} from '../engine/shear.ts';
import type { SpacingRules } from '../engine/stirrup-design.ts';
import type { Combination } from './combination.ts';
import type { FaceEntry } from './face-table.ts';
import { SHEAR, STIRRUP_SPACING } from './kernel-places.ts';
import type { RowColumns } from './row-columns.ts';

/** What shear asks at each depth, of one tension set and one concrete. */
interface ShearColumns {
  /** Whose they are, and the places that are filled. */
  shear: ShearConstants | null;
  from: number;
  to: number;
  /** Checks that stirrups as given fail. */
  readonly givenMasks: Int32Array;
  /** Of designed stirrups, with the least there may be: Vc or VRd,c, N, */
  readonly concreteN: Float64Array;
  /** the least of the limits that do not ask for the compression bars, and the one held against what is built, mm. */
  readonly limitMm: Float64Array;
  readonly detailMm: Float64Array;
}

/**
 * Shear of one row of depths after the other. Neither the compression set nor fy has a part in it, so what is worked out for
 * one concrete serves all rows until the tension set changes.
 */
export class KernelShear {
  private readonly columns: RowColumns;
  /** NaN where no shear is asked. */
  private readonly vuN: number;
  private readonly known: ShearColumns[] = [];
  private used = 0;
  private tension: FaceEntry | null = null;

  constructor(columns: RowColumns, vuN: number) {
    this.columns = columns;
    this.vuN = vuN;
  }

  /** Columns of stirrups as given, filled at places [from, to); d is to be filled there. */
  given({ shear, tension }: Combination, from: number, to: number): ShearColumns {
    const known = this.columnsOf(shear, tension);
    if (from >= known.from && to <= known.to) return known;
    const { vuN } = this;
    const { d } = this.columns;
    const { givenMasks } = known;
    for (let j = from; j < to; j++) {
      const dMm = d[j]!;
      const concreteN = concreteShearN(shear, dMm, tension.areaMm2);
      const mask = designShearN(shear, dMm, concreteN) >= vuN ? 0 : SHEAR;
      const limitMm = stirrupSpacingLimitMm(shear, vuN, dMm, concreteN);
      const isClose = limitMm === Infinity || isWithinLength(shear.spacingMm, limitMm);
      givenMasks[j] = isClose ? mask : mask | STIRRUP_SPACING;
    }
    return markFilled(known, from, to);
  }

  /** The same of stirrups that are designed by these rules. */
  designed(
    { shear, tension }: Combination,
    { widestMm, hoopsOfDepth, hoopsOfEffectiveDepth }: SpacingRules,
    from: number,
    to: number,
  ): ShearColumns {
    const known = this.columnsOf(shear, tension);
    if (from >= known.from && to <= known.to) return known;
    const { vuN } = this;
    const { h, d } = this.columns;
    const { concreteN, limitMm, detailMm } = known;
    const isAsked = vuN === vuN;
    const alwaysMm = Math.min(widestMm, shear.avMm2 / shear.leastAvPerMm);
    for (let j = from; j < to; j++) {
      const dMm = d[j]!;
      const ofConcrete = isAsked ? concreteShearN(shear, dMm, tension.areaMm2, 0) : NaN;
      const ofStrength = isAsked ? strengthSpacingMm(shear, vuN, dMm, ofConcrete) : Infinity;
      const isHalved = isAsked && isSpacingHalved(shear, vuN, dMm, ofConcrete);
      concreteN[j] = ofConcrete;
      detailMm[j] = detailingSpacingMm(shear, dMm, isHalved);
      const byDepth = Math.min(longestAlongMm(shear, dMm, isHalved), hoopsOfDepth * h[j]!);
      limitMm[j] = Math.min(alwaysMm, ofStrength, byDepth, hoopsOfEffectiveDepth * dMm);
    }
    return markFilled(known, from, to);
  }

  private columnsOf(shear: ShearConstants, tension: FaceEntry): ShearColumns {
    if (tension !== this.tension) this.used = 0;
    this.tension = tension;
    for (let i = 0; i < this.used; i++) if (this.known[i]!.shear === shear) return this.known[i]!;
    const columns = (this.known[this.used] ??= shearColumns(this.columns.h.length));
    this.used++;
    columns.shear = shear;
    return markFilled(columns, 0, 0);
  }
}

const markFilled = (columns: ShearColumns, from: number, to: number): ShearColumns => {
  columns.from = from;
  columns.to = to;
  return columns;
};

const shearColumns = (length: number): ShearColumns => ({
  shear: null,
  from: 0,
  to: 0,
  givenMasks: new Int32Array(length),
  concreteN: new Float64Array(length),
  limitMm: new Float64Array(length),
  detailMm: new Float64Array(length),
});
