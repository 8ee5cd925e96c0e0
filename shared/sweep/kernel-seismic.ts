import { isAtLeastTimes, isWithinLength } from '../engine/limits.ts';
import {
  isReversalMet,
  reversalOf,
  reversedOverhang,
  setBlock,
  setOverhang,
  type Reversal,
  type SortedLayers,
} from '../engine/reversal.ts';
import type { FaceSteelLimits, SeismicRules } from '../engine/rules/seismic-rules.ts';
import { faceLeastMm2, faceMostMm2, leastWebMm } from '../engine/seismic.ts';
import type { Combination } from './combination.ts';
import { SEISMIC_REVERSAL, SEISMIC_SPAN, SEISMIC_STEEL, SEISMIC_WIDTH } from './kernel-places.ts';
import { offsetOf, type PreparedSweep } from './prepared-sweep.ts';

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

  constructor(prepared: PreparedSweep, seismic: SeismicRules, layerCount: number) {
    const { basis, demand } = prepared.problem;
    this.seismic = seismic;
    this.prepared = prepared;
    this.spanMm = demand.spanMm ? demand.spanMm : NaN;
    this.reversal = reversalOf(basis, layerCount);
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

  /** Least width in depth h, mm. */
  sizeMask(h: number): number {
    const { leastWidth } = this.seismic;
    if (!leastWidth || isWithinLength(leastWebMm(leastWidth, h), this.combination!.placement.widthMm))
      return 0;
    return SEISMIC_WIDTH;
  }

  /** Span, steel of both faces and the strength bent the other way against `nominalNmm`, for placed bars. */
  placedMaskAt(h: number, d: number, layers: SortedLayers, nominalNmm: number): number {
    const { seismic, spanMm } = this;
    let mask = 0;
    const leastSpan = seismic.leastSpanToDepth;
    if (leastSpan !== null && spanMm === spanMm && !isAtLeastTimes(spanMm, leastSpan, d))
      mask |= SEISMIC_SPAN;
    if (this.tensionLimits !== null && (this.isYieldTooHigh || !this.isSteelWithin(h, d)))
      mask |= SEISMIC_STEEL;
    const share = seismic.reversalShare;
    if (share === null) return mask;
    this.faces.dMm = d;
    this.faces.dPrimeMm = offsetOf(this.combination!.compression, h);
    const isMet = isReversalMet(layers, this.faces, h, share * nominalNmm, this.reversal);
    return isMet ? mask : mask | SEISMIC_REVERSAL;
  }

  private isSteelWithin(h: number, d: number): boolean {
    const { placement, tension, compression } = this.combination!;
    const { widthMm } = placement;
    const ofTension = this.tensionLimits!;
    const ofCompression = this.compressionLimits!;
    const asMm2 = tension.areaMm2;
    const otherMm2 = compression.areaMm2;
    const otherDepthMm = compression.layerCount === 0 ? d : h - offsetOf(compression, h);
    return (
      asMm2 >= faceLeastMm2(ofTension, widthMm, d, otherMm2) &&
      asMm2 <= faceMostMm2(ofTension, widthMm, d, otherMm2) &&
      otherMm2 >= faceLeastMm2(ofCompression, widthMm, otherDepthMm, asMm2) &&
      otherMm2 <= faceMostMm2(ofCompression, widthMm, otherDepthMm, asMm2)
    );
  }
}
