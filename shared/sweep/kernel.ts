import { crackedAxisDepth } from '../engine/cracked-section.ts';
import type { ResolvedFlange } from '../engine/flange.ts';
import { isAtLeastTimes, isAtMostTimes, isWithinLength, requiredSteelMm2 } from '../engine/limits.ts';
import { MEASURE_IDS } from '../engine/measures.ts';
import { neutralAxisDepth } from '../engine/neutral-axis.ts';
import { isCurveMeasure } from '../engine/curve-basis.ts';
import type { Combination } from './combination.ts';
import { rowAmounts, writeAmounts } from './kernel-amounts.ts';
import { KernelCurve } from './kernel-curve.ts';
import { fixedMask, KernelDetailing } from './kernel-detailing.ts';
import {
  BAR_FIT,
  STRENGTH,
  DUCTILITY,
  TENSION_STRAIN,
  LEAST_STEEL,
  DEPTH_TO_WIDTH,
  DEPTH_CAP,
  AXIS_DEPTH,
  MOST_STEEL,
  MU_PHI,
  DESIGN_STRENGTH,
  UTILISATION,
} from './kernel-places.ts';
import { KernelSeismic } from './kernel-seismic.ts';
import {
  isAboveTension,
  isPlain,
  leastDepthMm,
  offsetOf,
  type ConcreteConstants,
  type PreparedSweep,
} from './prepared-sweep.ts';
import type { Tally } from './tally.ts';

/** Per-section columns, for comparing the hot loop with `evaluateSection`; measures are in rows of MEASURE_IDS. */
export interface SweepColumns {
  readonly masks: Uint32Array;
  readonly measures: Float64Array;
}

/** Columns being filled, and the index their first place stands for; null in a sweep. */
export type Recorder = (SweepColumns & { readonly first: number }) | null;

/** Layers of one section at most: four a face by the contract, with room for plain layers. */
const MAX_LAYERS = 16;

/** Where one innermost row (all depths of one combination) starts, and which part of it to do. */
interface Row {
  readonly firstIndex: number;
  readonly from: number;
  readonly to: number;
}

/** The hot loop over one row of depths, with what it reuses from row to row. */
export class Kernel {
  private readonly depths = new Float64Array(MAX_LAYERS);
  private readonly areas = new Float64Array(MAX_LAYERS);
  private readonly layers = { depths: this.depths, areas: this.areas, n: 0, compressionCount: 0 };
  private readonly measures = new Float64Array(MEASURE_IDS.length);
  private readonly detailing: KernelDetailing;
  private readonly seismic: KernelSeismic | null;
  /** Null where μφ is the closed path's. */
  private readonly curve: KernelCurve | null;
  private readonly ultimate;
  private readonly cracked = {
    widthMm: 0,
    modularRatio: 0,
    ratioAbove: 0,
    overhangMm: 0,
    overhangDepthMm: 0,
  };
  private readonly leastSteelSection = { fcMPa: 0, fyMPa: 0, widthMm: 0, dMm: 1 };

  private readonly prepared: PreparedSweep;
  private readonly tally: Tally;
  private readonly recorder: Recorder;

  constructor(prepared: PreparedSweep, tally: Tally, recorder: Recorder) {
    this.prepared = prepared;
    this.tally = tally;
    this.recorder = recorder;
    const { basis } = prepared.problem;
    this.detailing = new KernelDetailing(prepared);
    this.seismic = prepared.seismic && new KernelSeismic(prepared, prepared.seismic, MAX_LAYERS);
    this.curve = isCurveMeasure(basis) ? new KernelCurve(prepared) : null;
    this.ultimate = {
      blockForcePerMm: 0,
      flangeForcePerMm: 0,
      overhangForceN: 0,
      flangeReachMm: 0,
      blockStressMPa: 0,
      blockDepthFactor: 0,
      fyMPa: 0,
      esMPa: basis.esMPa,
      epsilonCu: 0,
      displacedConcrete: basis.displacedConcrete,
    };
  }

  /**
   * The hot loop: all depths of one combination. Longer than a function should be, since each hoisted value is a division
   * or a call saved a million times. Returns the number of sections that meet every check.
   */
  runRow(combination: Combination, row: Row): number {
    const { placement, tension, compression, concrete, fyMPa } = combination;
    const { problem, ruleSet, space } = this.prepared;
    const { basis, demand, rules } = problem;
    const { tally, recorder, depths, areas, measures, ultimate, cracked } = this;
    const { depthFeasible, depthEvaluated } = tally;
    const depthsMm = space.depthsMm;
    const widthMm = placement.widthMm;

    const muNmm = demand.muNmm;
    const target = demand.ductilityTarget;
    const capMm = demand.depthCapMm;
    const { minDepthToWidth, maxDepthToWidth } = rules;
    const hoistedMask = fixedMask(combination, rules, this.prepared.seismic);
    const isPlainSteel = isPlain(tension);
    const leastMm = leastDepthMm(placement, tension, compression);

    const { blockStressMPa, blockDepthFactor } = concrete;
    const esMPa = basis.esMPa;
    const epsilonCu = concrete.crushingStrain;
    // yield stress that strength counts on; the least steel and the detailing rules take fy as it is named
    const yieldMPa = ruleSet.designYieldMPa(fyMPa);
    const epsilonTy = yieldMPa / esMPa;
    const leastStrain = ruleSet.leastTensionStrain(epsilonTy) ?? -Infinity;
    const largestAxisShare = ruleSet.largestAxisShare(concrete.fcMPa) ?? Infinity;
    const faceSteelShare = ruleSet.largestFaceSteelShare;
    const largestFaceSteelMm2 = Math.max(tension.areaMm2, compression.areaMm2);
    const blockForcePerMm = blockStressMPa * widthMm * blockDepthFactor;
    const { overhangMm, overhangDepthMm } = placement.overhang;
    const overhangPerMm = blockStressMPa * overhangMm;
    ultimate.blockForcePerMm = blockForcePerMm;
    ultimate.flangeForcePerMm = blockForcePerMm + overhangPerMm * blockDepthFactor;
    ultimate.overhangForceN = overhangPerMm * overhangDepthMm;
    ultimate.flangeReachMm = overhangDepthMm / blockDepthFactor;
    ultimate.blockStressMPa = blockStressMPa;
    ultimate.blockDepthFactor = blockDepthFactor;
    ultimate.fyMPa = yieldMPa;
    ultimate.epsilonCu = epsilonCu;
    cracked.widthMm = widthMm;
    cracked.overhangMm = overhangMm;
    cracked.overhangDepthMm = overhangDepthMm;
    cracked.modularRatio = concrete.modularRatio;
    cracked.ratioAbove = concrete.ratioAbove;
    const deductionReach =
      basis.displacedConcrete === 'deduct' ? blockDepthFactor : basis.displacedConcrete === 'ignore' ? -1 : 1;
    const isYieldAtCentroid = basis.yieldCurvatureAt === 'centroid';
    const leastSteelSection = this.leastSteelSection;
    leastSteelSection.fcMPa = concrete.fcMPa;
    leastSteelSection.fyMPa = fyMPa;
    const tensionFlange = placement.flange?.face === 'tension' ? placement.flange : null;
    leastSteelSection.widthMm = widthMm;
    let leastSteelPerMm = ruleSet.leastSteelMm2(leastSteelSection);
    const asMm2 = tension.areaMm2;
    const { detailing, seismic, layers, curve } = this;
    detailing.begin(combination);
    seismic?.begin(combination);
    curve?.begin(combination);

    const nc = compression.layerCount;
    const n = nc + tension.layerCount;
    for (let i = 0; i < nc; i++) {
      depths[i] = compression.offsets[i]!;
      areas[i] = compression.areas[i]!;
    }
    for (let i = 0; i < tension.layerCount; i++) areas[n - 1 - i] = tension.areas[i]!;
    layers.n = n;
    layers.compressionCount = nc;

    const amounts = rowAmounts(combination);

    let feasibleInRow = 0;
    for (let j = row.from; j < row.to; j++) {
      const h = depthsMm[j]!;
      let mask = hoistedMask;
      if (
        (minDepthToWidth !== null && !isAtLeastTimes(h, minDepthToWidth, widthMm)) ||
        (maxDepthToWidth !== null && !isAtMostTimes(h, maxDepthToWidth, widthMm))
      )
        mask |= DEPTH_TO_WIDTH;
      if (capMm !== null && !isWithinLength(h, capMm)) mask |= DEPTH_CAP;
      mask |= detailing.sizeMask(h);
      if (seismic !== null) mask |= seismic.sizeMask(h);
      depthEvaluated[j]!++;

      const d = h - offsetOf(tension, h);
      const isPlaced =
        isWithinLength(leastMm, h) && (!isPlainSteel || isAboveTension(tension, compression, h));
      if (tension.shareOfDepth !== 0) depths[n - 1] = d;
      else for (let i = 0; i < tension.layerCount; i++) depths[n - 1 - i] = h - tension.offsets[i]!;
      if (nc > 0 && compression.shareOfDepth !== 0) depths[0] = compression.shareOfDepth * h;
      if (!isPlaced) {
        mask |= BAR_FIT;
        tally.countMask(mask);
        if (recorder) recorder.masks[row.firstIndex + j - recorder.first] = mask;
        continue;
      }

      const c = neutralAxisDepth(depths, areas, n, ultimate);
      const a = blockDepthFactor * c;
      const deductionDepth = deductionReach * c;
      const inFlange = Math.min(a, overhangDepthMm);
      let nominal = -(blockForcePerMm * c) * (a / 2) - overhangPerMm * inFlange * (inFlange / 2);
      for (let i = 0; i < n; i++) {
        const depth = depths[i]!;
        const elastic = esMPa * ((epsilonCu * (depth - c)) / c);
        const stress = elastic > yieldMPa ? yieldMPa : elastic < -yieldMPa ? -yieldMPa : elastic;
        nominal += areas[i]! * (depth < deductionDepth ? stress + blockStressMPa : stress) * depth;
      }
      const dt = depths[n - 1]!;
      const epsilonT = (epsilonCu * (dt - c)) / c;
      const design = ruleSet.strengthReduction(epsilonT, epsilonTy) * nominal;
      const kd = crackedAxisDepth(depths, areas, n, cracked);
      let muPhi = epsilonCu / c / (epsilonTy / ((isYieldAtCentroid ? d : dt) - kd));

      if (muNmm !== null && !(design >= muNmm)) mask |= STRENGTH;
      if (curve === null && target !== null && !(muPhi >= target)) mask |= DUCTILITY;
      if (!(epsilonT >= leastStrain)) mask |= TENSION_STRAIN;
      if (!(c <= largestAxisShare * d)) mask |= AXIS_DEPTH;
      if (faceSteelShare !== null && !(largestFaceSteelMm2 <= faceSteelShare * widthMm * h))
        mask |= MOST_STEEL;
      if (tensionFlange) leastSteelPerMm = this.leastSteelPerMm(tensionFlange, h);
      if (!(asMm2 >= leastSteelPerMm * d) && !this.isLeastSteelWaived(asMm2, d, concrete, fyMPa))
        mask |= LEAST_STEEL;
      mask |= detailing.placedMaskAt(j, h, d, depths[nc]!);
      if (seismic !== null) mask |= seismic.placedMaskAt(h, d, layers, nominal);
      if (curve !== null) {
        muPhi = mask === 0 ? curve.muPhi(row.firstIndex + j, layers, d, detailing) : NaN;
        if (mask === 0 && target !== null && !(muPhi >= target)) mask = DUCTILITY;
      }
      tally.countMask(mask);

      if (mask !== 0 && (mask & (mask - 1)) !== 0 && recorder === null) continue;
      writeAmounts(amounts, h, detailing, measures);
      measures[MU_PHI] = muPhi;
      measures[DESIGN_STRENGTH] = design;
      measures[UTILISATION] = muNmm === null ? NaN : muNmm / design;
      if (recorder) {
        const place = row.firstIndex + j - recorder.first;
        recorder.masks[place] = mask;
        recorder.measures.set(measures, place * MEASURE_IDS.length);
      }
      if (mask === 0) {
        feasibleInRow++;
        depthFeasible[j]!++;
        tally.addFeasible(row.firstIndex + j, measures);
      } else if ((mask & (mask - 1)) === 0) {
        const failed = 31 - Math.clz32(mask);
        if (curve !== null && mask !== DUCTILITY) {
          if (!tally.wouldBeBestWithout(failed, measures, MU_PHI)) continue;
          measures[MU_PHI] = curve.muPhi(row.firstIndex + j, layers, d, detailing);
          if (target !== null && !(measures[MU_PHI]! >= target)) continue;
        }
        tally.addFailingOnly(failed, row.firstIndex + j, measures);
      }
    }
    return feasibleInRow;
  }

  /** Least steel over d where a flange is in tension, by the width that counts at depth h, mm. */
  private leastSteelPerMm(flange: ResolvedFlange, depthMm: number): number {
    const { problem, ruleSet } = this.prepared;
    const { widthMm } = this.cracked;
    const support = problem.demand.support ?? null;
    this.leastSteelSection.widthMm = ruleSet.leastSteelWidthMm({ widthMm, depthMm, flange, support });
    return ruleSet.leastSteelMm2(this.leastSteelSection);
  }

  /** As at least 4/3 of the steel Mu requires; asked only where As,min is not met, so it need not be fast. */
  private isLeastSteelWaived(
    asMm2: number,
    dMm: number,
    concrete: ConcreteConstants,
    fyMPa: number,
  ): boolean {
    const { problem, ruleSet } = this.prepared;
    const { muNmm } = problem.demand;
    const waiver = ruleSet.leastSteelWaiver;
    if (muNmm === null || waiver === null) return false;
    const { widthMm, overhangMm, overhangDepthMm } = this.cracked;
    const { blockStressMPa } = concrete;
    const required = requiredSteelMm2(muNmm, ruleSet.tensionControlledReduction, {
      widthMm,
      dMm,
      blockStressMPa,
      fyMPa,
      overhangMm,
      overhangDepthMm,
    });
    return required < Infinity && asMm2 >= waiver * required;
  }
}
