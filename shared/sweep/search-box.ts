import { isAtLeastTimes, isAtMostTimes, isWithinLength, requiredSteelMm2 } from '../engine/limits.ts';
import type { MeasureId } from '../engine/measures.ts';
import { concreteM3PerM, formworkM2PerM } from '../engine/pricing.ts';
import { stirrupKgPerM } from '../engine/stirrup-length.ts';
import type { ConcreteConstants, Placement, PreparedSweep } from './prepared-sweep.ts';
import type { SetNode } from './set-tree.ts';
import {
  mostCurvatureDuctility,
  mostMomentNmm,
  leastAxisMm,
  neededTensionMm2,
  type BoxExtremes,
} from './strength-bound.ts';
import { signOf } from './tally.ts';

/** A product of runs of neighbours on the axes inside one placement and one fy: sets, strengths, depths. */
export interface SearchBox {
  readonly of: OpenPlacement;
  readonly tension: SetNode;
  readonly compression: SetNode;
  /** Half-open ranges of places on the f′c and depth axes. */
  readonly fcFrom: number;
  readonly fcTo: number;
  readonly depthFrom: number;
  readonly depthTo: number;
  /** What no section of the box betters in the view's measures, oriented. */
  x: number;
  y: number;
}

/** A width, cover, stirrup and fy being searched. */
export interface OpenPlacement {
  readonly placement: Placement;
  /** Number of the combination of width, cover and stirrup, and place of fy. */
  readonly combination: number;
  readonly fyAt: number;
  readonly bounds: BoxBounds;
}

/** Rounding between a bound's arithmetic and the hot loop's, and the grid amounts are put on. */
const RELATIVE_SLACK = 1e-9;
const GRID_SLACK = 2e-9;
const lowered = (bound: number) => bound - RELATIVE_SLACK * Math.abs(bound) - GRID_SLACK;
const raised = (bound: number) => bound + RELATIVE_SLACK * Math.abs(bound);

/** Bounds of the boxes of one placement and one fy. */
export class BoxBounds {
  private readonly prepared: PreparedSweep;
  private readonly placement: Placement;
  private readonly extremes: BoxExtremes;
  private readonly isDuctilityBounded: boolean;
  /** As,min over d for each strength, mm; it is proportional to d (see `RuleSet`). */
  private readonly leastSteelPerMm: Float64Array;
  private readonly required;

  constructor(prepared: PreparedSweep, placement: Placement, fyMPa: number) {
    this.prepared = prepared;
    this.placement = placement;
    const { basis } = prepared.problem;
    const { widthMm, overhang } = placement;
    this.leastSteelPerMm = Float64Array.from(prepared.concretes, ({ fcMPa }) =>
      prepared.ruleSet.leastSteelMm2({ fcMPa, fyMPa, widthMm, dMm: 1 }),
    );
    this.required = { widthMm, dMm: 0, blockStressMPa: 0, fyMPa, ...overhang };
    this.isDuctilityBounded = (basis.ductilityMeasure ?? 'closed') === 'closed';
    this.extremes = {
      widthMm: placement.widthMm + placement.overhang.overhangMm,
      mostBlockStressMPa: 0,
      mostBlockPerMm2: 0,
      leastDisplacedMPa: 0,
      leastDeductionReach: 1,
      leastCrushingStrain: 0,
      mostCrushingStrain: 0,
      leastModularRatio: 0,
      mostModularRatio: 0,
      mostRatioAbove: 0,
      yieldMPa: prepared.ruleSet.designYieldMPa(fyMPa),
      esMPa: basis.esMPa,
      leastTensionMm2: 0,
      mostTensionMm2: 0,
      mostCompressionMm2: 0,
      mostTensionDepthMm: 0,
      mostOutermostDepthMm: 0,
      leastInnermostDepthMm: 0,
      leastCompressionDepthMm: 0,
      mostCompressionDepthMm: 0,
      leastTensionCentroidMm: 0,
      leastCompressionCentroidMm: 0,
      compressionSpreadMm: 0,
    };
  }

  /** Fills in the box's bounds. False where no section of it can meet the checks, whatever the front holds. */
  bound(box: SearchBox): boolean {
    const { problem, space, view } = this.prepared;
    const { demand, rules } = problem;
    const leastH = space.depthsMm[box.depthFrom]!;
    const mostH = space.depthsMm[box.depthTo - 1]!;
    const { tension, compression } = box;
    if (!isWithinLength(tension.leastReachMm + compression.leastReachMm, mostH)) return false;
    const share = rules.minCompressionShare;
    if (share !== null && !isAtLeastTimes(compression.mostAreaMm2, share, tension.leastAreaMm2)) return false;
    this.fill(box, leastH, mostH);
    const reduction = this.prepared.ruleSet.strengthReduction(
      1,
      this.extremes.yieldMPa / this.extremes.esMPa,
    );
    const mostDesign = raised(reduction * mostMomentNmm(this.extremes));
    if (demand.muNmm !== null && mostDesign < demand.muNmm) return false;
    if (!this.raiseTension(box, leastH, mostH, reduction)) return false;
    const mostDuctility = this.isDuctilityBounded ? raised(mostCurvatureDuctility(this.extremes)) : Infinity;
    if (demand.ductilityTarget !== null && mostDuctility < demand.ductilityTarget) return false;
    if (this.isAxisTooDeep(box)) return false;
    box.x = this.oriented(view.x, box, leastH, { mostDesign, mostDuctility });
    box.y = this.oriented(view.y, box, leastH, { mostDesign, mostDuctility });
    return true;
  }

  private fill({ tension, compression, fcFrom, fcTo }: SearchBox, leastH: number, mostH: number): void {
    const e = this.extremes;
    const { concretes } = this.prepared;
    e.mostBlockStressMPa =
      e.mostBlockPerMm2 =
      e.mostCrushingStrain =
      e.mostModularRatio =
      e.mostRatioAbove =
        0;
    e.leastCrushingStrain = e.leastModularRatio = e.leastDisplacedMPa = Infinity;
    e.leastDeductionReach = 1;
    const { displacedConcrete } = this.prepared.problem.basis;
    for (let i = fcFrom; i < fcTo; i++) {
      const k = concretes[i]!;
      e.mostBlockStressMPa = Math.max(e.mostBlockStressMPa, k.blockStressMPa);
      e.mostBlockPerMm2 = Math.max(e.mostBlockPerMm2, k.blockStressMPa * k.blockDepthFactor);
      e.leastDisplacedMPa = Math.min(e.leastDisplacedMPa, k.blockStressMPa);
      if (displacedConcrete === 'deduct')
        e.leastDeductionReach = Math.min(e.leastDeductionReach, k.blockDepthFactor);
      e.leastCrushingStrain = Math.min(e.leastCrushingStrain, k.crushingStrain);
      e.mostCrushingStrain = Math.max(e.mostCrushingStrain, k.crushingStrain);
      e.leastModularRatio = Math.min(e.leastModularRatio, k.modularRatio);
      e.mostModularRatio = Math.max(e.mostModularRatio, k.modularRatio);
      e.mostRatioAbove = Math.max(e.mostRatioAbove, k.ratioAbove);
    }
    if (displacedConcrete === 'ignore') e.leastDisplacedMPa = 0;
    e.leastTensionMm2 = tension.leastAreaMm2;
    e.mostTensionMm2 = tension.mostAreaMm2;
    e.mostCompressionMm2 = compression.mostAreaMm2;
    e.mostTensionDepthMm = mostH * (1 - tension.leastShare) - tension.leastCentroidMm;
    e.mostOutermostDepthMm = mostH * (1 - tension.leastShare) - tension.nearestMm;
    e.leastInnermostDepthMm = leastH * (1 - tension.mostShare) - tension.furthestMm;
    const hasSteel = compression.mostAreaMm2 > 0;
    e.leastCompressionDepthMm = hasSteel ? compression.leastShare * leastH + compression.nearestMm : 0;
    e.mostCompressionDepthMm = compression.mostShare * mostH + compression.furthestMm;
    e.leastTensionCentroidMm = leastH * (1 - tension.mostShare) - tension.mostCentroidMm;
    e.leastCompressionCentroidMm = hasSteel
      ? compression.leastShare * leastH + compression.leastCentroidMm
      : 0;
    e.compressionSpreadMm = compression.mostSpreadMm;
  }

  /** Of the box's sets only those with enough steel count from here on; false where none has. */
  private raiseTension(box: SearchBox, leastH: number, mostH: number, reduction: number): boolean {
    const e = this.extremes;
    const { muNmm } = this.prepared.problem.demand;
    const forStrength = muNmm === null ? 0 : neededTensionMm2(e, muNmm / reduction);
    const needed = Math.max(forStrength, this.leastSteelMm2(box, leastH, mostH)) * (1 - RELATIVE_SLACK);
    e.leastTensionMm2 = Math.max(box.tension.leastAreaMm2, needed);
    return e.leastTensionMm2 <= box.tension.mostAreaMm2;
  }

  /** Tension strain or axis depth cannot be met even with the axis as high as it can be. */
  private isAxisTooDeep({ fcFrom, fcTo }: SearchBox): boolean {
    const e = this.extremes;
    const { ruleSet, concretes } = this.prepared;
    const axisMm = leastAxisMm(e);
    const leastStrain = ruleSet.leastTensionStrain(e.yieldMPa / e.esMPa);
    if (
      leastStrain !== null &&
      raised((e.mostCrushingStrain * (e.mostOutermostDepthMm - axisMm)) / axisMm) < leastStrain
    )
      return true;
    let mostShare = 0;
    for (let i = fcFrom; i < fcTo; i++)
      mostShare = Math.max(mostShare, ruleSet.largestAxisShare(concretes[i]!.fcMPa) ?? Infinity);
    return axisMm > raised(mostShare * e.mostTensionDepthMm);
  }

  /** As,min of the box's least d and weakest concrete, or its waiver's where that asks for less. */
  private leastSteelMm2({ tension, fcFrom, fcTo }: SearchBox, leastH: number, mostH: number): number {
    const { ruleSet, problem } = this.prepared;
    const leastD = leastH * (1 - tension.mostShare) - tension.mostCentroidMm;
    let leastPerMm = Infinity;
    for (let i = fcFrom; i < fcTo; i++) leastPerMm = Math.min(leastPerMm, this.leastSteelPerMm[i]!);
    const { muNmm } = problem.demand;
    const { leastSteelWaiver } = ruleSet;
    if (muNmm === null || leastSteelWaiver === null) return leastPerMm * leastD;
    // The stronger the block, the nearer its force lies to the face, and the less steel a moment needs.
    const { required } = this;
    required.blockStressMPa = this.extremes.mostBlockStressMPa;
    required.dMm = mostH * (1 - tension.leastShare) - tension.leastCentroidMm;
    const needed = requiredSteelMm2(muNmm, ruleSet.tensionControlledReduction, required);
    return Math.min(leastPerMm * leastD, leastSteelWaiver * needed);
  }

  private oriented(
    measure: MeasureId,
    box: SearchBox,
    leastH: number,
    most: { readonly mostDesign: number; readonly mostDuctility: number },
  ): number {
    const { problem } = this.prepared;
    const { widthMm } = this.placement;
    switch (measure) {
      case 'steelKgPerM':
        return lowered(this.leastSteelKg(box, leastH));
      case 'costPerM':
        return lowered(this.leastOverStrengths(box, leastH, costOf));
      case 'co2eKgPerM':
        return lowered(this.leastOverStrengths(box, leastH, co2eOf));
      case 'depthMm':
        return leastH;
      case 'widthMm':
        return widthMm;
      case 'concreteM3PerM':
        return lowered(concreteM3PerM(widthMm, leastH));
      case 'formworkM2PerM':
        return lowered(this.formworkM2(leastH));
      case 'barCount':
        return box.tension.fewestBars + box.compression.fewestBars;
      case 'curvatureDuctility':
        return signOf(measure) * most.mostDuctility;
      case 'designStrengthNmm':
        return signOf(measure) * most.mostDesign;
      case 'utilisation':
        return problem.demand.muNmm === null ? NaN : lowered(problem.demand.muNmm / most.mostDesign);
    }
  }

  private formworkM2(depthMm: number): number {
    const { widthMm, unformed } = this.placement;
    return formworkM2PerM(widthMm, depthMm, unformed.slabMm, unformed.hasEdge);
  }

  private leastStirrupKg(leastH: number): number {
    const { stirrup, widthMm } = this.placement;
    return stirrup ? stirrupKgPerM(stirrup, widthMm, leastH) : 0;
  }

  private leastLongitudinalKg({ tension, compression }: SearchBox): number {
    const needed = this.extremes.leastTensionMm2 * tension.leastKgPerMm2;
    return Math.max(tension.leastKgPerM, needed) + compression.leastKgPerM;
  }

  private leastSteelKg(box: SearchBox, leastH: number): number {
    return this.leastLongitudinalKg(box) + this.leastStirrupKg(leastH);
  }

  /** Least over the strengths that have a rate; NaN where none has. */
  private leastOverStrengths(box: SearchBox, leastH: number, of: (amounts: Amounts) => number): number {
    const { widthMm } = this.placement;
    const longitudinalKg = this.leastLongitudinalKg(box);
    const stirrupKg = this.leastStirrupKg(leastH);
    const concreteM3 = concreteM3PerM(widthMm, leastH);
    const formworkM2 = this.formworkM2(leastH);
    let least = NaN;
    for (let i = box.fcFrom; i < box.fcTo; i++) {
      const { pricing } = this.prepared.concretes[i]!;
      const amount = of({ pricing, longitudinalKg, stirrupKg, concreteM3, formworkM2 });
      if (!(amount >= least)) least = amount === amount ? amount : least;
    }
    return least;
  }
}

interface Amounts {
  readonly pricing: ConcreteConstants['pricing'];
  readonly longitudinalKg: number;
  readonly stirrupKg: number;
  readonly concreteM3: number;
  readonly formworkM2: number;
}

function costOf({ pricing, longitudinalKg, stirrupKg, concreteM3, formworkM2 }: Amounts): number {
  const withWaste = 1 + pricing.wasteShare;
  const steel = longitudinalKg * (1 + pricing.lapShare) * withWaste * pricing.longitudinalPerKg;
  const stirrups = stirrupKg === 0 ? 0 : stirrupKg * withWaste * pricing.stirrupPerKg;
  return steel + stirrups + concreteM3 * pricing.concretePerM3 + formworkM2 * pricing.formworkPerM2;
}

function co2eOf({ pricing, longitudinalKg, stirrupKg, concreteM3 }: Amounts): number {
  const withLaps = longitudinalKg + stirrupKg + longitudinalKg * pricing.lapShare;
  return (
    withLaps * (1 + pricing.wasteShare) * pricing.steelCo2ePerKg + concreteM3 * pricing.concreteCo2ePerM3
  );
}

/** Places of the depths that pass every check which looks at b and h alone; ascending depths make them one run. */
export function depthRange(prepared: PreparedSweep, placement: Placement, fyMPa: number): [number, number] {
  const { space, problem, ruleSet } = prepared;
  const { demand, rules } = problem;
  const { widthMm } = placement;
  const { spanMm, support } = demand;
  const least = spanMm && support ? ruleSet.leastDepthMm(spanMm, support, fyMPa) : -Infinity;
  const isAllowed = (h: number) =>
    (rules.minDepthToWidth === null || isAtLeastTimes(h, rules.minDepthToWidth, widthMm)) &&
    (rules.maxDepthToWidth === null || isAtMostTimes(h, rules.maxDepthToWidth, widthMm)) &&
    (demand.depthCapMm === null || isWithinLength(h, demand.depthCapMm)) &&
    isWithinLength(least, h) &&
    isWithinLength(placement.leastForStirrupMm, h);
  const from = space.depthsMm.findIndex(isAllowed);
  return from === -1 ? [0, 0] : [from, space.depthsMm.findLastIndex(isAllowed) + 1];
}
