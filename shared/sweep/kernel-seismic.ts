import { isAtLeastTimes, isWithinLength } from '../engine/limits.ts';
import {
  isReversalMet,
  reversalOf,
  reversedOverhang,
  setBlock,
  setOverhang,
  type Reversal,
} from '../engine/reversal.ts';
import type { FaceSteelLimits, SeismicRules } from '../engine/rules/seismic-rules.ts';
import { faceLeastMm2, faceMostMm2, leastWebMm } from '../engine/seismic.ts';
import type { Combination } from './combination.ts';
import type { FaceEntry } from './face-table.ts';
import type { KernelFlexure } from './kernel-flexure.ts';
import { SEISMIC_REVERSAL, SEISMIC_SPAN, SEISMIC_STEEL, SEISMIC_WIDTH } from './kernel-places.ts';
import { offsetOf, type PreparedSweep } from './prepared-sweep.ts';
import { RowAxis } from './row-axis.ts';
import type { RowColumns } from './row-columns.ts';

/** A strength nearer to its limit than this share of what makes it up is worked out. */
const BOUND_MARGIN = 1e-6;

/** What a moment frame asks of the sections of one row of depths; made only where a system is asked. */
export class KernelSeismic {
  private readonly seismic: SeismicRules;
  private readonly prepared: PreparedSweep;
  private readonly spanMm: number;
  private readonly reversal: Reversal;
  private readonly faces = { asMm2: 0, dMm: 0, asPrimeMm2: 0, dPrimeMm: 0 };
  private combination: Combination | null = null;
  private tensionLimits: FaceSteelLimits | null = null;
  private compressionLimits: FaceSteelLimits | null = null;
  private isYieldTooHigh = false;
  private readonly axis: RowAxis;
  private readonly line = { slopeN: 0, startNmm: 0 };
  private readonly columns: RowColumns;

  constructor(prepared: PreparedSweep, seismic: SeismicRules, columns: RowColumns, layerCount: number) {
    const { basis, demand } = prepared.problem;
    this.seismic = seismic;
    this.prepared = prepared;
    this.spanMm = demand.spanMm ? demand.spanMm : NaN;
    this.reversal = reversalOf(basis, layerCount);
    this.axis = new RowAxis(layerCount);
    this.columns = columns;
  }

  /** Everything that the depths of one combination share. */
  begin(combination: Combination): void {
    const { seismic } = this;
    const { ruleSet, problem } = this.prepared;
    const { placement, concrete, fyMPa } = combination;
    this.combination = combination;
    if (seismic.steelLimits) {
      const materials = {
        fcMPa: concrete.fcMPa,
        fyMPa,
        esMPa: problem.basis.esMPa,
        ductilityTarget: problem.demand.ductilityTarget,
      };
      this.tensionLimits = seismic.steelLimits('tension', materials);
      this.compressionLimits = seismic.steelLimits('compression', materials);
      this.isYieldTooHigh = seismic.largestFyMPa !== null && !(fyMPa <= seismic.largestFyMPa);
    }
    if (seismic.reversalShare === null) return;
    setBlock(this.reversal, {
      blockStressMPa: concrete.blockStressMPa,
      blockDepthFactor: concrete.blockDepthFactor,
      crushingStrain: concrete.crushingStrain,
      widthMm: placement.widthMm,
      yieldMPa: ruleSet.designYieldMPa(fyMPa),
    });
    this.faces.asMm2 = combination.tension.areaMm2;
    this.faces.asPrimeMm2 = combination.compression.areaMm2;
    setOverhang(this.reversal, reversedOverhang(placement.widthMm, placement.flange));
  }

  /** Adds the least width to the size masks at places [from, to). */
  addSizeMasks(from: number, to: number): void {
    const { leastWidth } = this.seismic;
    if (!leastWidth) return;
    const { h, sizeMasks } = this.columns;
    const { widthMm } = this.combination!.placement;
    for (let j = from; j < to; j++)
      if (!isWithinLength(leastWebMm(leastWidth, h[j]!), widthMm)) sizeMasks[j]! |= SEISMIC_WIDTH;
  }

  /** Adds span, steel of both faces and the strength bent the other way, for placed bars at places [from, to). */
  addPlacedMasks(from: number, to: number, flexure: KernelFlexure): void {
    const { spanMm } = this;
    const leastSpan = this.seismic.leastSpanToDepth;
    const { d, masks } = this.columns;
    if (leastSpan !== null && spanMm === spanMm)
      for (let j = from; j < to; j++)
        if (!isAtLeastTimes(spanMm, leastSpan, d[j]!)) masks[j]! |= SEISMIC_SPAN;
    if (this.tensionLimits !== null) this.addSteel(from, to);
    if (this.seismic.reversalShare !== null) this.addReversal(from, to, this.seismic.reversalShare, flexure);
  }

  private addSteel(from: number, to: number): void {
    const { placement, tension, compression } = this.combination!;
    const { h, d, masks } = this.columns;
    const { widthMm } = placement;
    const ofTension = this.tensionLimits!;
    const ofCompression = this.compressionLimits!;
    const asMm2 = tension.areaMm2;
    const otherMm2 = compression.areaMm2;
    const hasOther = compression.layerCount > 0;
    const share = compression.shareOfDepth;
    const offsetMm = compression.centroidOffsetMm;
    for (let j = from; j < to; j++) {
      const dMm = d[j]!;
      const otherDepthMm = hasOther ? h[j]! - (share === 0 ? offsetMm : share * h[j]!) : dMm;
      const isWithin =
        !this.isYieldTooHigh &&
        asMm2 >= faceLeastMm2(ofTension, widthMm, dMm, otherMm2) &&
        asMm2 <= faceMostMm2(ofTension, widthMm, dMm, otherMm2) &&
        otherMm2 >= faceLeastMm2(ofCompression, widthMm, otherDepthMm, asMm2) &&
        otherMm2 <= faceMostMm2(ofCompression, widthMm, otherDepthMm, asMm2);
      if (!isWithin) masks[j]! |= SEISMIC_STEEL;
    }
  }

  /**
   * Where the steel then in tension yields at an axis that the row shares, strength bent the other way is a straight line in
   * the depth, which settles all but the sections near the limit; the others are looked at one by one.
   */
  private addReversal(from: number, to: number, share: number, flexure: KernelFlexure): void {
    const { tension, compression } = this.combination!;
    const { h, nominal, masks } = this.columns;
    const { axis, reversal } = this;
    axis.find(tension, compression, h[to - 1]!, reversal.ultimate);
    const { slopeN, startNmm } = sharedMoment(axis.axisMm, tension, compression, reversal, this.line);
    const innermostMm = compression.layerCount > 0 ? compression.offsets[compression.layerCount - 1]! : 0;
    const fromMm = axis.fromMm * (1 + BOUND_MARGIN) + innermostMm;
    for (let j = from; j < to; j++) {
      const leastNmm = share * nominal[j]!;
      const gained = slopeN * h[j]!;
      const slack = BOUND_MARGIN * (leastNmm + gained);
      const over = gained + startNmm - leastNmm;
      if (h[j]! >= fromMm && over > slack && leastNmm > 0) continue;
      if (h[j]! >= fromMm && over < -slack && leastNmm > 0) masks[j]! |= SEISMIC_REVERSAL;
      else if (!this.isReversalMetAt(j, leastNmm, flexure)) masks[j]! |= SEISMIC_REVERSAL;
    }
  }

  private isReversalMetAt(j: number, leastNmm: number, flexure: KernelFlexure): boolean {
    const { h, d } = this.columns;
    flexure.place(j);
    this.faces.dMm = d[j]!;
    this.faces.dPrimeMm = offsetOf(this.combination!.compression, h[j]!);
    return isReversalMet(flexure.layers, this.faces, h[j]!, leastNmm, this.reversal);
  }
}

/** Strength bent the other way with the axis at c and all steel then in tension at yield: N per mm of depth, and N·mm at 0. */
function sharedMoment(
  c: number,
  compressed: FaceEntry,
  pulled: FaceEntry,
  { ultimate: k, overhangPerMm, overhangDepthMm }: Reversal,
  line: { slopeN: number; startNmm: number },
): { readonly slopeN: number; readonly startNmm: number } {
  const a = k.blockDepthFactor * c;
  const deductionDepth = k.displacedConcrete === 'deduct' ? a : k.displacedConcrete === 'ignore' ? -1 : c;
  const inFlange = Math.min(a, overhangDepthMm);
  let moment = -(k.blockForcePerMm * c) * (a / 2) - overhangPerMm * inFlange * (inFlange / 2);
  for (let i = 0; i < compressed.layerCount; i++) {
    const depth = compressed.offsets[i]!;
    const elastic = (k.esMPa * k.epsilonCu * (depth - c)) / c;
    const stress = Math.max(-k.fyMPa, Math.min(k.fyMPa, elastic));
    moment += compressed.areas[i]! * (depth < deductionDepth ? stress + k.blockStressMPa : stress) * depth;
  }
  line.slopeN = 0;
  for (let i = 0; i < pulled.layerCount; i++) {
    line.slopeN += pulled.areas[i]! * k.fyMPa;
    moment -= pulled.areas[i]! * k.fyMPa * pulled.offsets[i]!;
  }
  line.startNmm = moment;
  return line;
}
