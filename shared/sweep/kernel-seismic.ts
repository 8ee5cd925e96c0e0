import { isAtLeastTimes, isWithinLength } from '../engine/limits.ts';
import {
  reversedMomentNmm,
  reversedOverhang,
  setOverhang,
  type ReversalConstants,
} from '../engine/reversal.ts';
import type { FaceSteelLimits, SeismicRules } from '../engine/rules/seismic-rules.ts';
import { faceLeastMm2, faceMostMm2, leastWebMm } from '../engine/seismic.ts';
import type { Combination } from './combination.ts';
import { SEISMIC_REVERSAL, SEISMIC_SPAN, SEISMIC_STEEL, SEISMIC_WIDTH } from './kernel-places.ts';
import { offsetOf, type PreparedSweep } from './prepared-sweep.ts';

/** Sorted layers of the section looked at; the first n entries are used. */
export interface KernelLayers {
  readonly depths: Float64Array;
  readonly areas: Float64Array;
  n: number;
}

/** What a moment frame asks of the sections of one row of depths; made only where a system is asked. */
export class KernelSeismic {
  private readonly seismic: SeismicRules;
  private readonly prepared: PreparedSweep;
  private readonly spanMm: number;
  private readonly reversed;
  private readonly ultimate: ReversalConstants;
  private combination: Combination | null = null;
  private tensionLimits: FaceSteelLimits | null = null;
  private compressionLimits: FaceSteelLimits | null = null;
  private isYieldTooHigh = false;

  constructor(prepared: PreparedSweep, seismic: SeismicRules, layerCount: number) {
    const { basis, demand } = prepared.problem;
    this.seismic = seismic;
    this.prepared = prepared;
    this.spanMm = demand.spanMm ? demand.spanMm : NaN;
    this.reversed = { depths: new Float64Array(layerCount), areas: new Float64Array(layerCount) };
    this.ultimate = {
      blockForcePerMm: 0,
      flangeForcePerMm: 0,
      overhangForceN: 0,
      flangeReachMm: 0,
      overhangPerMm: 0,
      overhangDepthMm: 0,
      blockStressMPa: 0,
      blockDepthFactor: 0,
      fyMPa: 0,
      esMPa: basis.esMPa,
      epsilonCu: 0,
      displacedConcrete: basis.displacedConcrete,
    };
  }

  /** Everything that the depths of one combination share. */
  begin(combination: Combination): void {
    const { seismic, ultimate } = this;
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
    ultimate.blockStressMPa = concrete.blockStressMPa;
    ultimate.blockDepthFactor = concrete.blockDepthFactor;
    ultimate.blockForcePerMm = concrete.blockStressMPa * placement.widthMm * concrete.blockDepthFactor;
    ultimate.fyMPa = ruleSet.designYieldMPa(fyMPa);
    ultimate.epsilonCu = concrete.crushingStrain;
    setOverhang(ultimate, reversedOverhang(placement.widthMm, placement.flange));
  }

  /** Least width in depth h, mm. */
  sizeMask(h: number): number {
    const { leastWidth } = this.seismic;
    if (!leastWidth || isWithinLength(leastWebMm(leastWidth, h), this.combination!.placement.widthMm))
      return 0;
    return SEISMIC_WIDTH;
  }

  /** Span, steel of both faces and the strength bent the other way against `nominalNmm`, for placed bars. */
  placedMaskAt(h: number, d: number, layers: KernelLayers, nominalNmm: number): number {
    const { seismic, spanMm } = this;
    let mask = 0;
    const leastSpan = seismic.leastSpanToDepth;
    if (leastSpan !== null && spanMm === spanMm && !isAtLeastTimes(spanMm, leastSpan, d))
      mask |= SEISMIC_SPAN;
    if (this.tensionLimits !== null && (this.isYieldTooHigh || !this.isSteelWithin(h, d)))
      mask |= SEISMIC_STEEL;
    const share = seismic.reversalShare;
    if (share === null) return mask;
    const hasSteel = this.combination!.compression.areaMm2 > 0;
    const reversedNmm = reversedMomentNmm(layers, hasSteel, h, this.ultimate, this.reversed);
    return isAtLeastTimes(reversedNmm, share, nominalNmm) ? mask : mask | SEISMIC_REVERSAL;
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
